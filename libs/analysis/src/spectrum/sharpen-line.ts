import { at } from '../statistics/at';
import { turnInto } from './turning';

/** A sine with its own straight line: c + d τ + a cos ωτ + b sin ωτ, τ the time from `origin`. */
export interface SharpLine {
  readonly frequency: number;
  readonly origin: number;
  readonly constant: number;
  readonly slope: number;
  readonly cosine: number;
  readonly sine: number;
}

/** Cosines and sines of one line at all times. */
export interface Circle {
  readonly cosines: Float64Array;
  readonly sines: Float64Array;
}

const PARAMETERS = 5;
const STEPS = 3;
/** Steps end when the frequency moves by less than this part of its reach. */
const SETTLED = 1e-4;

/**
 * One sine in a series by least squares with its frequency free: Gauss-Newton steps from a frequency that is known to
 * a fraction of the resolution width, on the samples' own times, with a straight line free beside it (taking a trend
 * off first would take part of a slow sine with it). O(n).
 *
 * @param t n times.
 * @param y n values.
 * @param frequency First guess, in cycles per unit of t.
 * @param reach The frequency moves from the guess by this at most.
 * @param circle Room to work in, as long as t.
 */
export function sharpenLine(
  t: Float64Array,
  y: Float64Array,
  frequency: number,
  reach: number,
  circle: Circle,
): SharpLine {
  const origin = (at(t, 0) + at(t, t.length - 1)) / 2;
  let line: SharpLine = { frequency, origin, constant: 0, slope: 0, cosine: 0, sine: 0 };
  for (let step = 0; step <= STEPS; step++) {
    const solved = gaussNewton(t, y, line, step > 0, circle);
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
    if (step > 0 && Math.abs(turn ?? 0) < SETTLED * reach) break;
  }
  return line;
}

/** Adds `factor` times the sine alone to a series. O(n). */
export function addSine(
  values: Float64Array,
  t: Float64Array,
  line: SharpLine,
  factor: number,
  { cosines, sines }: Circle,
): void {
  turnInto(t, line.origin, line.frequency, cosines, sines);
  const [cosine, sine] = [factor * line.cosine, factor * line.sine];
  for (let i = 0; i < values.length; i++) {
    values[i] = at(values, i) + cosine * at(cosines, i) + sine * at(sines, i);
  }
}

export function amplitudeOf(line: SharpLine): number {
  return Math.hypot(line.cosine, line.sine);
}

/**
 * Coefficients and the step in angular frequency, from sums over 1, τ, cos, sin and the sine's slope in frequency;
 * null when the samples do not tell them. The sums are plain variables and not a matrix: this is the hottest loop.
 */
function gaussNewton(
  t: Float64Array,
  y: Float64Array,
  line: SharpLine,
  turns: boolean,
  { cosines, sines }: Circle,
): Float64Array | null {
  turnInto(t, line.origin, line.frequency, cosines, sines);
  const scale = Math.max(Math.abs(at(t, 0) - line.origin), Number.MIN_VALUE);
  let u1 = 0;
  let uu = 0;
  let c1 = 0;
  let cu = 0;
  let cc = 0;
  let s1 = 0;
  let su = 0;
  let sc = 0;
  let ss = 0;
  let d1 = 0;
  let du = 0;
  let dc = 0;
  let ds = 0;
  let dd = 0;
  let v1 = 0;
  let vu = 0;
  let vc = 0;
  let vs = 0;
  let vd = 0;
  for (let i = 0; i < t.length; i++) {
    const time = at(t, i) - line.origin;
    const c = at(cosines, i);
    const s = at(sines, i);
    const u = time / scale;
    const d = u * (line.sine * c - line.cosine * s);
    const v = at(y, i);
    u1 += u;
    uu += u * u;
    c1 += c;
    cu += c * u;
    cc += c * c;
    s1 += s;
    su += s * u;
    sc += s * c;
    ss += s * s;
    d1 += d;
    du += d * u;
    dc += d * c;
    ds += d * s;
    dd += d * d;
    v1 += v;
    vu += v * u;
    vc += v * c;
    vs += v * s;
    vd += v * d;
  }
  const size = turns ? PARAMETERS : PARAMETERS - 1;
  const rows = [[t.length], [u1, uu], [c1, cu, cc], [s1, su, sc, ss], [d1, du, dc, ds, dd]];
  const solved = solveSymmetric(rows.slice(0, size), [v1, vu, vc, vs, vd].slice(0, size));
  if (solved === null) return null;
  solved[1] = at(solved, 1) / scale;
  if (turns) solved[4] = at(solved, 4) / scale;
  return solved;
}

/** Cholesky solution of a positive definite system given by the rows of its lower half; null when it is not definite. */
function solveSymmetric(
  rows: readonly (readonly number[])[],
  right: readonly number[],
): Float64Array | null {
  const n = right.length;
  const factor = new Float64Array(n * n);
  for (const [i, row] of rows.entries()) {
    for (const [j, value] of row.entries()) {
      let sum = value;
      for (let k = 0; k < j; k++) sum -= at(factor, i * n + k) * at(factor, j * n + k);
      if (i !== j) factor[i * n + j] = sum / at(factor, j * n + j);
      else if (sum > 1e-12 * value) factor[i * n + i] = Math.sqrt(sum);
      else return null;
    }
  }
  const solved = Float64Array.from(right);
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
