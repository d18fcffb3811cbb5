import { type Loop } from '../analysis-document';

export interface LoopFrames {
  readonly errorArcsec: Float64Array;
  /** 0: the frame counts in the figures. */
  readonly setAside: Uint8Array;
  readonly timeSeconds: Float64Array;
  readonly cadenceSeconds: number;
}

/** How much of a measured error one correction takes away. */
export interface LoopGain {
  readonly gain: number;
  readonly standardError: number;
}

const FEWEST_ANSWERS = 20;
/** The largest correction is a limit of the guider when it was given so often. */
const REPEATS_OF_A_LIMIT = 4;
const INTERVAL_SIGMAS = 1.96;
const NEIGHBOURS = 1.5;
const FEWEST_PAIRS = 30;

/**
 * Gain of the loop, k = −Σ d·e / Σ e², over frames whose correction is neither zero by a minimum move nor cut at a
 * maximum. The error is what the guider reads, so this regression is not biased; that of e[n+1] − e[n] on e[n] is
 * (1.35 for 0.7 under seeing). O(n).
 *
 * @param commandArcsec What each correction commands, towards +error positive.
 * @param relativeResponseError Of the response behind `commandArcsec`; it goes into the standard error.
 */
export function loopGain(
  frames: LoopFrames,
  commandArcsec: Float64Array,
  relativeResponseError: number,
): LoopGain | null {
  const answered = commandArcsec.map((command, n) =>
    frames.setAside[n] === 0 && Number.isFinite(frames.errorArcsec[n]) ? command : 0,
  );
  const limit = correctionLimit(answered);
  let count = 0;
  let [squares, products, answers] = [0, 0, 0];
  answered.forEach((command, n) => {
    if (command === 0 || command >= limit.highest || command <= limit.lowest) return;
    const error = frames.errorArcsec[n] ?? NaN;
    count++;
    squares += error * error;
    products -= error * command;
    answers += command * command;
  });
  if (count < FEWEST_ANSWERS || squares === 0) return null;
  const gain = products / squares;
  if (gain <= 0) return null;
  const left = Math.max(0, answers - gain * products);
  const statistical = Math.sqrt(left / (count - 1) / squares);
  return { gain, standardError: Math.hypot(statistical, relativeResponseError * gain) };
}

/** The corrections that a maximum has cut: the largest of either direction, when it was given again and again. */
function correctionLimit(commands: Float64Array): { lowest: number; highest: number } {
  let [lowest, highest] = [-0, 0];
  for (const command of commands) {
    lowest = Math.min(lowest, command);
    highest = Math.max(highest, command);
  }
  const often = (value: number) =>
    commands.reduce((count, command) => count + (command === value ? 1 : 0), 0) >=
    REPEATS_OF_A_LIMIT;
  return {
    lowest: lowest < 0 && often(lowest) ? lowest : -Infinity,
    highest: highest > 0 && often(highest) ? highest : Infinity,
  };
}

/**
 * Lag-1 autocorrelation of the measured error about its mean, over pairs of neighbouring frames that count. O(n).
 *
 * @returns null with fewer than 30 pairs.
 */
export function errorLag1(frames: LoopFrames): { lag1: number; pairs: number } | null {
  const { errorArcsec, setAside, timeSeconds, cadenceSeconds } = frames;
  const counts = (n: number) => setAside[n] === 0 && Number.isFinite(errorArcsec[n]);
  let [count, sum] = [0, 0];
  for (let n = 0; n < errorArcsec.length; n++) {
    if (!counts(n)) continue;
    count++;
    sum += errorArcsec[n] ?? 0;
  }
  const centre = sum / count;
  let [products, pairs, squares] = [0, 0, 0];
  let isBeforeCounted = false;
  for (let n = 0; n < errorArcsec.length; n++) {
    const isCounted = counts(n);
    if (isCounted) {
      const off = (errorArcsec[n] ?? 0) - centre;
      const spacing = (timeSeconds[n] ?? 0) - (timeSeconds[n - 1] ?? 0);
      squares += off * off;
      if (isBeforeCounted && spacing <= NEIGHBOURS * cadenceSeconds) {
        products += off * ((errorArcsec[n - 1] ?? 0) - centre);
        pairs++;
      }
    }
    isBeforeCounted = isCounted;
  }
  if (pairs < FEWEST_PAIRS || squares === 0) return null;
  return { lag1: products / pairs / (squares / count), pairs };
}

/** Part of the seeing that an integrator of gain k turns into true motion: sqrt(k/(2−k)), null for k of 2 or more. */
export function noiseGain(gain: number): number | null {
  return gain > 0 && gain < 2 ? Math.sqrt(gain / (2 - gain)) : null;
}

/**
 * REPORT's Loop. Over-correcting: the gain's 95 % interval lies above 1; without a gain, a lag-1 autocorrelation that lies
 * significantly below −0.5 (no loop up to gain 1 goes there: it is −k/2 under seeing alone, REFERENCE 11).
 */
export function describeLoop(frames: LoopFrames, gain: LoopGain | null, best: number | null): Loop {
  const autocorrelation = errorLag1(frames);
  const limit = autocorrelation && INTERVAL_SIGMAS / Math.sqrt(autocorrelation.pairs);
  return {
    gain: gain?.gain ?? null,
    gainStandardError: gain?.standardError ?? null,
    bestGain: best,
    lag1: autocorrelation?.lag1 ?? null,
    noiseGain: gain && noiseGain(gain.gain),
    overCorrecting: gain
      ? gain.gain - INTERVAL_SIGMAS * gain.standardError > 1
      : autocorrelation && autocorrelation.lag1 + (limit ?? 0) < -0.5,
  };
}
