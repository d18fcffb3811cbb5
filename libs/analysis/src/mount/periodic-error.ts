import { type MotionFit } from './motion-fit';
import { amplitudeError, type FittedLine, lineColumns } from './motion-line';
import { skyTrend } from './sky-trend';
import { addScaled, whitenedLeastSquares, type WhitenedFit } from './whitened-least-squares';

/** Periodic error as fitted: on the sky, before the turn into axis angles. */
export interface WormFit {
  readonly periodSeconds: number;
  readonly periodFrom: 'rig' | 'spectrum';
  readonly turns: number;
  /** Harmonics of the worm, the first first. */
  readonly harmonics: readonly FittedLine[];
  /** Significant lines that are no harmonic of the worm, strongest first. */
  readonly otherLines: readonly FittedLine[];
  /** As of `MotionFit`. */
  readonly trend: Float64Array;
  readonly driftStandardError: number;
}

export const FEWEST_TURNS = 2;
const MOST_HARMONICS = 8;
/** A worm whose period nobody told is looked for between these. */
const SHORTEST_SECONDS = 60;
const LONGEST_SECONDS = 1200;
/** A harmonic must be sampled at least so often. */
const FRAMES_A_PERIOD = 4;
/** A line this close to T / k (relative), or closer than its own resolution, is the worm's. */
const LABEL_WIDTH = 0.02;
const PERIOD_REFINEMENTS = 3;

/**
 * Periodic error of the RA drive: harmonics of the worm period fitted to the uncorrected motion together with drift and
 * the other significant lines, over a wandering level that starts anew after every dither (`whitenedLeastSquares`:
 * differenced, whitened data). The number of harmonics, 1 to 8, is that of the least Akaike criterion: it asks
 * whether the next harmonic makes the curve better, which is what peak to peak and slope need. O(n).
 *
 * @param motion The fit of the uncorrected motion without corrections.
 * @param wormSeconds The rig's period; null to take the strongest line between 60 and 1200 s and refine it.
 * @returns The fit, or why there is none.
 * @see H. Akaike, IEEE Trans. Automatic Control 19 (1974) 716.
 */
export function fitPeriodicError(
  motion: MotionFit,
  uncorrectedArcsec: Float64Array,
  wormSeconds: number | null,
): WormFit | { readonly why: string } {
  const { timeSeconds, cadenceSeconds } = motion.frames;
  const span = (timeSeconds.at(-1) ?? 0) - (timeSeconds[0] ?? 0) + cadenceSeconds;
  const period = wormSeconds ?? strongestPeriod(motion.lines);
  if (period === null) {
    return {
      why: 'The rig tells no worm period, and the uncorrected RA motion shows no clear line between 60 and 1200 s.',
    };
  }
  const turns = span / period;
  if (turns < FEWEST_TURNS) {
    return {
      why: `The run saw ${turns.toFixed(1)} turns of the worm; periodic error needs ${FEWEST_TURNS}.`,
    };
  }
  const worm = new WormDesign(motion, uncorrectedArcsec, span);
  const refined = wormSeconds ?? worm.refinedPeriod(period);
  return {
    ...worm.fit(refined),
    periodSeconds: refined,
    periodFrom: wormSeconds === null ? 'spectrum' : 'rig',
    turns: span / refined,
  };
}

function strongestPeriod(lines: readonly FittedLine[]): number | null {
  const credible = lines.find(
    ({ frequency }) => 1 / frequency >= SHORTEST_SECONDS && 1 / frequency <= LONGEST_SECONDS,
  );
  return credible === undefined ? null : 1 / credible.frequency;
}

class WormDesign {
  constructor(
    private readonly motion: MotionFit,
    private readonly series: Float64Array,
    private readonly span: number,
  ) {}

  /** Gauss and Newton's steps in the period, with the harmonics that it shows at first. */
  refinedPeriod(start: number): number {
    const { timeSeconds } = this.motion.frames;
    let { harmonics } = this.fit(start);
    let frequency = 1 / start;
    for (let step = 0; step < PERIOD_REFINEMENTS; step++) {
      const byFrequency = new Float64Array(timeSeconds.length);
      harmonics.forEach((line, k) => {
        const derivative = lineColumns(timeSeconds, line)[2];
        if (derivative) addScaled(byFrequency, derivative, k + 1);
      });
      const { columns, first } = this.columns(frequency, harmonics.length);
      const fit = this.solve([...columns, byFrequency]);
      frequency += fit.coefficients[columns.length] ?? 0;
      harmonics = harmonics.map((_, k) => fittedLine((k + 1) * frequency, fit, first + 2 * k));
    }
    return 1 / frequency;
  }

  fit(period: number) {
    const { cadenceSeconds } = this.motion.frames;
    const sampled = Math.floor(period / (FRAMES_A_PERIOD * cadenceSeconds));
    const most = Math.min(MOST_HARMONICS, Math.max(1, sampled));
    const all = this.columns(1 / period, most);
    const orders = bestOrder(this.solve(all.columns), all.first, most);
    const { columns, others, first } = this.columns(1 / period, orders);
    const fit = this.solve(columns);
    const trend = this.motion.trend.length;
    const otherLines = others.map((line, i) => fittedLine(line.frequency, fit, trend + 2 * i));
    return {
      harmonics: Array.from({ length: orders }, (_, k) =>
        fittedLine((k + 1) / period, fit, first + 2 * k),
      ),
      otherLines: otherLines.sort((a, b) => b.amplitude - a.amplitude),
      trend: fit.coefficients.slice(0, trend),
      driftStandardError: Math.sqrt(fit.covariance[0] ?? 0),
    };
  }

  private solve(columns: readonly Float64Array[]): WhitenedFit {
    const { frames, walkPerSecond } = this.motion;
    return whitenedLeastSquares(frames, walkPerSecond, columns, this.series);
  }

  /** Drift, the other lines, then from `first` on `orders` harmonics. */
  private columns(frequency: number, orders: number) {
    const { timeSeconds } = this.motion.frames;
    const others = this.motion.lines.filter((line) => !this.isHarmonic(line, frequency));
    const columns = [...skyTrend(timeSeconds)];
    const add = (each: number) => {
      const bare = { frequency: each, cosine: 0, sine: 0, amplitude: 0, standardError: 0 };
      columns.push(...lineColumns(timeSeconds, bare));
    };
    for (const line of others) add(line.frequency);
    const first = columns.length;
    for (let order = 1; order <= orders; order++) add(order * frequency);
    return { columns, others, first };
  }

  private isHarmonic(line: FittedLine, worm: number): boolean {
    const order = Math.max(1, Math.round(line.frequency / worm));
    const distance = Math.abs(line.frequency - order * worm);
    return (
      order <= MOST_HARMONICS && distance < Math.max(1 / this.span, LABEL_WIDTH * order * worm)
    );
  }
}

function bestOrder(fit: WhitenedFit, first: number, most: number): number {
  let best = 1;
  let bestCost = Infinity;
  for (let order = 1; order <= most; order++) {
    const squares = fit.squaresByColumns[first + 2 * order] ?? 0;
    const cost = fit.count * Math.log(squares) + 2 * (2 * order);
    if (cost < bestCost) [best, bestCost] = [order, cost];
  }
  return best;
}

function fittedLine(frequency: number, fit: WhitenedFit, place: number): FittedLine {
  const cosine = fit.coefficients[place] ?? 0;
  const sine = fit.coefficients[place + 1] ?? 0;
  return {
    frequency,
    cosine,
    sine,
    amplitude: Math.hypot(cosine, sine),
    standardError: amplitudeError(fit, place, cosine, sine),
  };
}
