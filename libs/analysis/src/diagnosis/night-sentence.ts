import { type BudgetPart } from '../analysis-document';
import { type AxisName, type MeasuredRun } from './finding-context';
import { arcsec, AXIS_NAMES } from './numbers-in-words';
import { THRESHOLDS } from './thresholds';

/** A piece of a sentence; numbers are strong, so that a page can set them bold. */
export interface SentencePiece {
  readonly text: string;
  readonly strong: boolean;
}

/** What brought so much of the variance of all frames. */
interface Cause {
  readonly name: string;
  readonly share: number;
}

/** Causes that have one name for both axes: what happens to one happens to the other. */
const OF_BOTH_AXES: Partial<Record<BudgetPart, string>> = {
  'gusts and bumps': 'Gusts and bumps',
};

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
    plain(`${name} limited this night: without it RMS would fall from `),
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
        const name = nameOf(part, axis);
        shares.set(name, (shares.get(name) ?? 0) + share * ofAll);
      }
    }
  }
  const causes = [...shares]
    .map(([name, share]): Cause => ({ name, share }))
    .sort((a, b) => b.share - a.share);
  return { floor, told, causes };
}

function nameOf(part: BudgetPart, axis: AxisName): string {
  if (part === 'periodic error' && axis === 'dec') return 'A periodic motion in Dec';
  return OF_BOTH_AXES[part] ?? `${AXIS_NAMES[axis]} ${part}`;
}

const plain = (text: string): SentencePiece => ({ text, strong: false });
const strong = (text: string): SentencePiece => ({ text, strong: true });
