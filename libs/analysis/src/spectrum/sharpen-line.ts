import { at } from '../statistics/at';

/** A sine with its own straight line: c + d τ + a cos ωτ + b sin ωτ, τ the time from `origin`. */
export interface SharpLine {
  readonly frequency: number;
  readonly origin: number;
  readonly constant: number;
  readonly slope: number;
  readonly cosine: number;
  readonly sine: number;
}

const PARAMETERS = 5;
const STEPS = 3;

/**
 * One sine in a series by least squares with its frequency free: Gauss-Newton steps from a frequency that is known to
 * a fraction of the resolution width, on the samples' own times, with a straight line free beside it (taking a trend
 * off first would take part of a slow sine with it). One pass a step, nothing allocated a sample. O(n).
 *
 * @param t n times.
 * @param y n values.
 * @param frequency First guess, in cycles per unit of t.
 * @param reach The frequency moves from the guess by this at most.
 */
export function sharpenLine(
  t: Float64Array,
  y: Float64Array,
  frequency: number,
  reach: number,
): SharpLine {
  const origin = (at(t, 0) + at(t, t.length - 1)) / 2;
  let line: SharpLine = { frequency, origin, constant: 0, slope: 0, cosine: 0, sine: 0 };
  for (let step = 0; step <= STEPS; step++) {
    const solved = gaussNewton(t, y, line, step > 0);
    if (solved === null) return line;
    const [constant, slope, cosine, sine, turn] = solved;
    const moved = line.frequency + (turn ?? 0) / (2 * Math.PI);
    line = {
      frequency: Math.max(frequency - reach, Math.min(frequency + reach, moved)),
      origin,
      constant: constant ?? 0,
      slope: slope ?? 0,
      cosine: cosine ?? 0,
      sine: sine ?? 0,
    };
  }
  return line;
}

/** Value of the sine alone at a time. */
export function sineAt(line: SharpLine, time: number): number {
  const angle = 2 * Math.PI * line.frequency * (time - line.origin);
  return line.cosine * Math.cos(angle) + line.sine * Math.sin(angle);
}

export function amplitudeOf(line: SharpLine): number {
  return Math.hypot(line.cosine, line.sine);
}

/** Coefficients and the step in angular frequency; null when the samples do not tell them. */
function gaussNewton(
  t: Float64Array,
  y: Float64Array,
  line: SharpLine,
  turns: boolean,
): Float64Array | null {
  const size = turns ? PARAMETERS : PARAMETERS - 1;
  const normal = new Float64Array(size * size);
  const right = new Float64Array(size);
  const row = new Float64Array(size);
  const omega = 2 * Math.PI * line.frequency;
  const scale = Math.max(Math.abs(at(t, 0) - line.origin), Number.MIN_VALUE);
  for (let i = 0; i < t.length; i++) {
    const time = at(t, i) - line.origin;
    const cos = Math.cos(omega * time);
    const sin = Math.sin(omega * time);
    row[0] = 1;
    row[1] = time / scale;
    row[2] = cos;
    row[3] = sin;
    if (turns) row[4] = (time / scale) * (line.sine * cos - line.cosine * sin);
    const value = at(y, i);
    for (let p = 0; p < size; p++) {
      const rp = at(row, p);
      right[p] = at(right, p) + rp * value;
      for (let q = 0; q <= p; q++)
        normal[p * size + q] = at(normal, p * size + q) + rp * at(row, q);
    }
  }
  const solved = solveSymmetric(normal, right);
  if (solved === null) return null;
  solved[1] = at(solved, 1) / scale;
  if (turns) solved[4] = at(solved, 4) / scale;
  return solved;
}

/** Cholesky solution of a positive definite system given by its lower half; null when it is not definite. */
function solveSymmetric(lower: Float64Array, right: Float64Array): Float64Array | null {
  const n = right.length;
  const factor = lower.slice();
  for (let i = 0; i < n; i++) {
    for (let j = 0; j <= i; j++) {
      let sum = at(factor, i * n + j);
      for (let k = 0; k < j; k++) sum -= at(factor, i * n + k) * at(factor, j * n + k);
      if (i !== j) factor[i * n + j] = sum / at(factor, j * n + j);
      else if (sum > 1e-12 * at(lower, i * n + i)) factor[i * n + i] = Math.sqrt(sum);
      else return null;
    }
  }
  const solved = right.slice();
  for (let i = 0; i < n; i++) {
    for (let k = 0; k < i; k++) solved[i] = at(solved, i) - at(factor, i * n + k) * at(solved, k);
    solved[i] = at(solved, i) / at(factor, i * n + i);
  }
  for (let i = n - 1; i >= 0; i--) {
    for (let k = i + 1; k < n; k++) {
      solved[i] = at(solved, i) - at(factor, k * n + i) * at(solved, k);
    }
    solved[i] = at(solved, i) / at(factor, i * n + i);
  }
  return solved;
}
