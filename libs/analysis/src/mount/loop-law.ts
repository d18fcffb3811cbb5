import { quantile } from '../statistics/quantile';

/** How a guider answers an error: −gain · error, nothing below the minimum move, never more than the maximum. */
export interface LoopLaw {
  readonly gain: number;
  readonly minimumMoveArcsec: number;
  /** Infinity where the log shows no limit. */
  readonly maximumArcsec: number;
}

/** A limit shows by being given again and again. */
const REPEATS_OF_A_LIMIT = 4;
/** With fewer unanswered frames than this part there is no minimum move worth the name. */
const FEWEST_UNANSWERED_PART = 0.01;
/** Ends of the two sets of errors, a few odd frames left out. */
const SMALL_END = 0.02;
const LARGE_END = 0.98;

/**
 * The law behind the commands of a log. The minimum move lies between the errors that were answered and those that were not.
 * O(n) on average.
 *
 * @param errorArcsec NaN where no star was measured.
 * @param commandArcsec What each correction commands, towards +error positive; 0 for none.
 * @param gain As measured over the answered frames (`loopGain`); 0 for an axis that is not guided.
 */
export function loopLaw(
  errorArcsec: Float64Array,
  commandArcsec: Float64Array,
  gain: number,
): LoopLaw {
  const measured = errorArcsec.map((error, n) => (Number.isFinite(error) ? n : -1));
  const frames = measured.filter((n) => n >= 0);
  const sizeAt = (n: number) => Math.abs(errorArcsec[n] ?? 0);
  const answered = frames.filter((n) => commandArcsec[n] !== 0).map(sizeAt);
  const unanswered = frames.filter((n) => commandArcsec[n] === 0).map(sizeAt);
  let minimumMoveArcsec = 0;
  if (answered.length > 0 && unanswered.length > FEWEST_UNANSWERED_PART * frames.length) {
    const smallestAnswered = quantile(answered, SMALL_END);
    const largestUnanswered = quantile(unanswered, LARGE_END);
    minimumMoveArcsec = (smallestAnswered + largestUnanswered) / 2;
  }
  return { gain, minimumMoveArcsec, maximumArcsec: largestCommand(commandArcsec) };
}

function largestCommand(commandArcsec: Float64Array): number {
  const largest = commandArcsec.reduce((most, command) => Math.max(most, Math.abs(command)), 0);
  // Corrections are logged in whole steps: a thousandth covers their rounding.
  const near = commandArcsec.filter((command) => Math.abs(command) > 0.999 * largest);
  return near.length >= REPEATS_OF_A_LIMIT ? largest : Infinity;
}
