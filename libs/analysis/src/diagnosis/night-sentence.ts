import { type BudgetPart } from '../analysis-document';
import { type AxisName, type MeasuredRun } from './finding-context';
import { guidedLines } from './guided-lines';
import { arcsec, AXIS_NAMES, seconds } from './numbers-in-words';
import { THRESHOLDS } from './thresholds';

/** A piece of a sentence; numbers are strong, so that a page can set them bold. */
export interface SentencePiece {
  readonly text: string;
  readonly strong: boolean;
}

/** One name for both axes: what happens to one happens to the other. */
const GUSTS = 'Gusts and bumps';

/** What brought so much of the variance of all frames. */
interface Cause {
  readonly name: string;
  readonly share: number;
}

/**
 * The one sentence at the top of a night: the cause first, its size, what curing it would gain. Over all runs given, each
 * frame weighing the same. At most 34 words.
 */
export function nightSentence(runs: readonly MeasuredRun[]): SentencePiece[] {
  const measured = runs.filter(({ total }) => total !== null);
  const frames = measured.reduce((sum, { used }) => sum + used, 0);
  if (frames === 0) return [plain('No run of this night could be analysed.')];
  const squares = measured.reduce(
    (sum, { used, total }) => sum + used * (total?.rmsArcsec ?? 0) ** 2,
    0,
  );
  const rms = Math.sqrt(squares / frames);
  if (squares === 0)
    return [plain('The guide star never moved in this log: nothing can be told from it.')];

  const { floor, told, causes } = causesOf(measured, squares);
  const worst = causes[0];
  if (floor >= THRESHOLDS.floorShare.watch && floor >= (worst?.share ?? 0)) {
    return skyLimited(Math.sqrt(floor) * rms, rms);
  }
  if (worst !== undefined && worst.share >= THRESHOLDS.share.watch) {
    return limitedBy(worst, rms);
  }
  if (!told) {
    return [
      plain('Guiding reached '),
      strong(arcsec(rms)),
      plain(
        ' RMS; what limited it cannot be told from this log, because it does not tell the mount’s own motion.',
      ),
    ];
  }
  return [
    plain('No single cause limited this night: guiding reached '),
    strong(arcsec(rms)),
    plain(' RMS.'),
  ];
}

function skyLimited(floorArcsec: number, rmsArcsec: number): SentencePiece[] {
  return [
    plain('The sky limited your stars, not the mount. Seeing made '),
    strong(arcsec(floorArcsec)),
    plain(' of the '),
    strong(arcsec(rmsArcsec)),
    plain(' RMS.'),
  ];
}

function limitedBy({ name, share }: Cause, rmsArcsec: number): SentencePiece[] {
  return [
    plain(
      `${name} limited this night: without ${name === GUSTS ? 'them' : 'it'} RMS would fall from `,
    ),
    strong(arcsec(rmsArcsec)),
    plain(' to '),
    strong(arcsec(rmsArcsec * Math.sqrt(Math.max(0, 1 - share)))),
    plain('.'),
  ];
}

function causesOf(runs: readonly MeasuredRun[], squares: number) {
  const shares = new Map<string, number>();
  let floor = 0;
  let told = false;
  for (const run of runs) {
    for (const axis of ['ra', 'dec'] as const) {
      const ofAll = (run.used * (run[axis]?.rmsArcsec ?? 0) ** 2) / squares;
      for (const { part, share } of run.budget?.[axis] ?? []) {
        if (part === 'unexplained') continue;
        if (part === 'seeing floor') {
          floor += share * ofAll;
          told ||= share > 0;
          continue;
        }
        for (const cause of namedCauses(run, part, share, axis)) {
          shares.set(cause.name, (shares.get(cause.name) ?? 0) + cause.share * ofAll);
        }
      }
    }
  }
  const causes = [...shares]
    .map(([name, share]): Cause => ({ name, share }))
    .sort((a, b) => b.share - a.share);
  return { floor, told, causes };
}

/** A part of one axis under the names that it has for people; lines are the worm's or those of another gear. */
function namedCauses(run: MeasuredRun, part: BudgetPart, share: number, axis: AxisName): Cause[] {
  if (part === 'gusts and bumps') return [{ name: GUSTS, share }];
  const name = `${AXIS_NAMES[axis]} ${part}`;
  const lines = part === 'periodic error' ? guidedLines(run, axis) : null;
  if (lines === null) return [{ name, share }];
  const { worm, otherShare, strongestOther } = lines;
  if (strongestOther === null) {
    return [{ name: axis === 'ra' ? name : 'A periodic motion in Dec', share: worm.share }];
  }
  const other =
    strongestOther.label === null
      ? `${AXIS_NAMES[axis]} motion every ${seconds(strongestOther.periodSeconds)}`
      : `The ${strongestOther.label} in ${AXIS_NAMES[axis]}`;
  return [
    { name, share: worm.share },
    { name: other, share: otherShare },
  ];
}

const plain = (text: string): SentencePiece => ({ text, strong: false });
const strong = (text: string): SentencePiece => ({ text, strong: true });
