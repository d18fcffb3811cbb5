import { at } from './at';
import { requireSameLength, requireSeries, SeriesError } from './series-error';

export interface LeastSquares {
  /** One a column. */
  readonly coefficients: Float64Array;
  /** p × p, row after row: s² (XᵀX)⁻¹ with s² = residualSquares / freedom; all zero when nothing is left over. */
  readonly covariance: Float64Array;
  readonly residualSquares: number;
  /** n − p. */
  readonly freedom: number;
}

/** A column whose length shrinks below this part of itself in the elimination hangs on the columns before it. */
const DEPENDENT_COLUMN = 1e-11;

/**
 * Ordinary linear least squares, min |y − X b|², by Householder's QR decomposition: it works on the columns
 * themselves, where the normal equations would square their condition. O(n p²).
 *
 * @param columns p columns of X, each of n values; not changed.
 * @param y n values, n ≥ p; not changed.
 * @throws {SeriesError} `too-short` (n < p or no column), `length-mismatch`, `not-finite`, `no-spread` (a column
 *   hangs on others).
 * @see G. H. Golub, C. F. Van Loan, Matrix Computations, 4th ed., alg. 5.2.1 and sec. 5.3.
 */
export function leastSquares(
  columns: readonly ArrayLike<number>[],
  y: ArrayLike<number>,
): LeastSquares {
  const p = columns.length;
  requireSeries('leastSquares', y, Math.max(1, p));
  if (p === 0) throw new SeriesError('too-short', 'leastSquares needs at least one column');
  const q = columns.map((column) => {
    requireSameLength('leastSquares', column, y);
    requireSeries('leastSquares', column, 1);
    return Float64Array.from(column);
  });
  const right = Float64Array.from(y);
  const diagonal = triangularise(q, right);

  const coefficients = new Float64Array(p);
  for (let i = p - 1; i >= 0; i--) {
    let value = at(right, i);
    for (let j = i + 1; j < p; j++) value -= upper(q, i, j) * at(coefficients, j);
    coefficients[i] = value / at(diagonal, i);
  }
  let residualSquares = 0;
  for (let i = p; i < right.length; i++) residualSquares += at(right, i) ** 2;
  const freedom = y.length - p;
  const variance = freedom > 0 ? residualSquares / freedom : 0;
  return { coefficients, covariance: inverseGram(q, diagonal, variance), residualSquares, freedom };
}

/** Turns the columns into R (above the diagonal, in place) and `right` into Qᵀy; returns R's diagonal. */
function triangularise(q: readonly Float64Array[], right: Float64Array): Float64Array {
  const diagonal = new Float64Array(q.length);
  q.forEach((pivot, k) => {
    const whole = norm(pivot, 0);
    const length = norm(pivot, k);
    if (length <= DEPENDENT_COLUMN * whole || whole === 0) {
      throw new SeriesError('no-spread', `leastSquares: column ${String(k)} hangs on the others`);
    }
    const head = at(pivot, k);
    const r = head > 0 ? -length : length;
    diagonal[k] = r;
    // The reflection's vector: the column below the diagonal, with its head moved away from cancellation.
    pivot[k] = head - r;
    const scale = 1 / (r * (head - r));
    for (const other of [...q.slice(k + 1), right]) {
      let product = 0;
      for (let i = k; i < pivot.length; i++) product += at(pivot, i) * at(other, i);
      const step = product * scale;
      for (let i = k; i < pivot.length; i++) other[i] = at(other, i) + step * at(pivot, i);
    }
  });
  return diagonal;
}

function norm(values: Float64Array, from: number): number {
  let squares = 0;
  for (let i = from; i < values.length; i++) squares += at(values, i) ** 2;
  return Math.sqrt(squares);
}

/** R above its diagonal: column j keeps it in its first j places. */
function upper(q: readonly Float64Array[], i: number, j: number): number {
  return q[j]?.[i] ?? NaN;
}

/** variance · R⁻¹ R⁻ᵀ, row after row. */
function inverseGram(
  q: readonly Float64Array[],
  diagonal: Float64Array,
  variance: number,
): Float64Array {
  const p = q.length;
  const inverse = new Float64Array(p * p);
  for (let j = 0; j < p; j++) {
    inverse[j * p + j] = 1 / at(diagonal, j);
    for (let i = j - 1; i >= 0; i--) {
      let sum = 0;
      for (let k = i + 1; k <= j; k++) sum += upper(q, i, k) * at(inverse, k * p + j);
      inverse[i * p + j] = -sum / at(diagonal, i);
    }
  }
  const gram = new Float64Array(p * p);
  for (let i = 0; i < p; i++) {
    for (let j = 0; j < p; j++) {
      let sum = 0;
      for (let k = Math.max(i, j); k < p; k++) {
        sum += at(inverse, i * p + k) * at(inverse, j * p + k);
      }
      gram[i * p + j] = variance * sum;
    }
  }
  return gram;
}
