import { type Part, type Peak } from '../analysis-document';
import { labelPeriod, namedPeriods } from '../spectrum/label-period';
import { type AxisName, type MeasuredRun, partOf } from './finding-context';

/**
 * Whether a line of the guided error is the worm's own or one of its harmonics: by its name, or by the period that the
 * spectrum offers where the rig tells no worm.
 */
export function isWorms({ label, periodSeconds }: Peak, run: MeasuredRun): boolean {
  if (label !== null) return label.startsWith('worm');
  const { periodicError, durationSeconds } = run;
  if (periodicError?.periodFrom !== 'spectrum') return false;
  const worm = namedPeriods({ mount: { wormPeriodSeconds: periodicError.periodSeconds } });
  return labelPeriod(periodSeconds, 1 / durationSeconds, worm) !== null;
}

/** The strongest line that is not the worm's, and how the budget's 'periodic error' divides between worm and others. */
export interface GuidedLines {
  readonly worm: Part;
  readonly strongestOther: Peak | null;
  /** Share of the axis' variance by lines that are not the worm's. */
  readonly otherShare: number;
}

/**
 * The budget's part 'periodic error' holds all significant lines of an axis: here it is divided by the power that the guided
 * error shows in those of the worm and in the others. Null without a budget.
 */
export function guidedLines(run: MeasuredRun, axis: AxisName): GuidedLines | null {
  const part = partOf(run, axis, 'periodic error');
  const measured = run[axis];
  if (part === null || measured === null) return null;
  const peaks = run.spectrum?.[axis].peaks ?? [];
  const power = (lines: readonly Peak[]) =>
    lines.reduce((sum, { amplitudeArcsec }) => sum + amplitudeArcsec ** 2, 0);
  const others = peaks.filter((peak) => !isWorms(peak, run));
  const other = power(others);
  const otherShare = other === 0 ? 0 : part.share * (other / power(peaks));
  const share = part.share - otherShare;
  return {
    worm: {
      part: 'periodic error',
      share,
      rmsArcsec: measured.rmsArcsec * Math.sqrt(share),
      rmsIfCuredArcsec: measured.rmsArcsec * Math.sqrt(1 - share),
    },
    strongestOther: others[0] ?? null,
    otherShare,
  };
}
