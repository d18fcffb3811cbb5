import {
  type Draft,
  type FindingContext,
  gainIfCured,
  gravest,
  type MeasuredRun,
  partOf,
  partSeverity,
  severityOf,
} from './finding-context';
import { arcsec, ratio, roundArcsec } from './numbers-in-words';
import { CLEAR_SIGMAS, THRESHOLDS } from './thresholds';

const GEARS =
  'Switch the power off before hands go near gears, hold the tube before releasing a clutch, and follow the maker’s manual.';

/** Dec backlash: what the gap is, and what it did. */
export function backlashFindings(run: MeasuredRun, context: FindingContext): Draft[] {
  const { backlash } = run;
  if (!backlash?.determined) return [];
  const part = partOf(run, 'dec', 'backlash');
  const harm = part === null ? 'fine' : partSeverity(part, context);
  const star = context.rig.seeingFwhmArcsec;
  const wide =
    star === undefined ? 'fine' : severityOf(backlash.arcsec / star, THRESHOLDS.backlashPerStar);
  const severity = gravest(harm, wide);
  const size = roundArcsec(backlash.arcsec);
  const did =
    part === null || harm === 'fine'
      ? 'it cost little tonight'
      : `it cost ${arcsec(part.rmsArcsec)} RMS`;
  return [
    {
      axis: 'dec',
      onMount: true,
      code: 'backlash',
      severity,
      sentence: `Dec backlash is ${size}: ${did}.`,
      evidence: [
        `Between ${roundArcsec(backlash.low)} and ${roundArcsec(backlash.high)}, from ${backlash.reversals} reversals.`,
      ],
      nextStep:
        severity === 'fine'
          ? 'Leave it as it is.'
          : 'Guide Dec one way against the drift, or adjust the Dec worm mesh.',
      gain: part === null ? null : gainIfCured(run, context, { dec: part.rmsArcsec ** 2 }),
      caution: severity === 'fine' ? null : GEARS,
    },
  ];
}

/** Dec that sticks: small corrections do less than large ones, beyond what the gap explains. */
export function stictionFindings(_run: MeasuredRun, { smallResponse }: FindingContext): Draft[] {
  if (smallResponse === null) return [];
  const { ratio: part, standardError } = smallResponse;
  if (part + CLEAR_SIGMAS * standardError > 1 || part > THRESHOLDS.stiction.watch) return [];
  return [
    {
      axis: 'dec',
      onMount: true,
      code: 'stiction',
      severity: part <= THRESHOLDS.stiction.act ? 'act' : 'watch',
      sentence: `Dec sticks: small corrections move the star ${ratio(part)} times as far as large ones do.`,
      evidence: [`± ${ratio(standardError)}; 1 would be free.`],
      nextStep:
        'Balance Dec slightly off, raise its minimum move, and check the mesh for tightness.',
      gain: null,
      caution: GEARS,
    },
  ];
}
