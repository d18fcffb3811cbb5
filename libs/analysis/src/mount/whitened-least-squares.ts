import { LevelWhitening } from './level-whitening';

/** The frames that a fit rests on, and where its level starts anew. */
export interface LevelFrames {
  readonly timeSeconds: Float64Array;
  readonly cadenceSeconds: number;
  /** 1 where a frame counts, else 0. */
  readonly used: Uint8Array;
  readonly restartFrames: readonly number[];
}

export interface WhitenedFit {
  /** One a column; a column that hangs on those before it gets 0. */
  readonly coefficients: Float64Array;
  /** p × p, row after row, rows and columns of dropped columns 0. */
  readonly covariance: Float64Array;
  /** Standard deviation of the white noise of one frame. */
  readonly noise: number;
  /** Innovations of the residual, in units of the noise where F = 1; 0 where there is none. */
  readonly innovations: Float64Array;
  /** Sum of squares left when only the first k columns are fitted, k = 0 … p. */
  readonly squaresByColumns: Float64Array;
  /** Frames that leave an innovation. */
  readonly count: number;
  /** Minus twice the logarithm of the likelihood, but for a constant. */
  readonly cost: number;
}

/** A column that keeps less than this part of its square beside the columns before it is left out. */
const DEPENDENT_PART = 1e-9;

/**
 * Generalised least squares of a series on columns over a wandering level: all are turned white by `LevelWhitening`, then
 * fitted by the normal equations (Cholesky). Their condition is harmless here, the columns being scaled to one
 * length, and they cost a quarter of an orthogonal decomposition on the longest nights. O(n p²).
 *
 * @see G. H. Golub, C. F. Van Loan, Matrix Computations, 4th ed., sec. 4.2 and 5.3.
 */
export function whitenedLeastSquares(
  frames: LevelFrames,
  walkPerSecond: number,
  columns: readonly Float64Array[],
  series: Float64Array,
): WhitenedFit {
  const whitening = new LevelWhitening({ ...frames, walkPerSecond });
  const white = (values: Float64Array) => whitening.whiten(values, new Float64Array(values.length));
  const turned = columns.map(white);
  const innovations = white(series);
  const solved = solveNormal(turned, innovations);
  turned.forEach((column, j) => {
    addScaled(innovations, column, -(solved.coefficients[j] ?? 0));
  });
  const freedom = Math.max(1, whitening.count - columns.length);
  const squares = solved.squaresByColumns[columns.length] ?? 0;
  const variance = squares / freedom;
  return {
    coefficients: solved.coefficients,
    covariance: solved.inverse.map((value) => value * variance),
    noise: Math.sqrt(variance),
    innovations,
    squaresByColumns: solved.squaresByColumns,
    count: whitening.count,
    cost: costOf(whitening, squares),
  };
}

/**
 * Minus twice the logarithm of a fit's likelihood, but for a constant, as `whitenedLeastSquares` gives it: for trials
 * of the walk that need nothing else. O(n p²).
 */
export function whitenedCost(
  frames: LevelFrames,
  walkPerSecond: number,
  columns: readonly Float64Array[],
  series: Float64Array,
): number {
  const whitening = new LevelWhitening({ ...frames, walkPerSecond });
  const white = (values: Float64Array) => whitening.whiten(values, new Float64Array(values.length));
  const { squaresByColumns } = normalTriangle(columns.map(white), white(series));
  return costOf(whitening, squaresByColumns.at(-1) ?? 0);
}

/**
 * Minus twice the logarithm of the likelihood of a sum of squares, but for a constant. A residual of nothing at all has
 * none: the smallest number keeps its logarithm finite.
 */
export function costOf(whitening: LevelWhitening, squares: number): number {
  const { count, logDeterminant } = whitening;
  return count * Math.log(Math.max(squares, Number.MIN_VALUE)) + logDeterminant;
}

/** Cholesky's triangle of the normal equations, the columns scaled to one length. */
function normalTriangle(columns: readonly Float64Array[], y: Float64Array) {
  const p = columns.length;
  const lengths = columns.map((column) => Math.sqrt(dot(column, column)));
  const scale = lengths.map((length) => 1 / (length || 1));
  // Row p of the triangle holds y: its elimination gives the sums of squares left over.
  const lower = new Float64Array((p + 1) * (p + 1));
  const entry = (i: number, j: number) => lower[i * (p + 1) + j] ?? 0;
  const squaresByColumns = new Float64Array(p + 1);
  let left = dot(y, y);
  squaresByColumns[0] = left;
  for (let j = 0; j < p; j++) {
    const column = columns[j] ?? y;
    let square = 1;
    for (let k = 0; k < j; k++) square -= entry(j, k) ** 2;
    const kept = square > DEPENDENT_PART && (lengths[j] ?? 0) > 0;
    const diagonal = kept ? Math.sqrt(square) : 0;
    lower[j * (p + 1) + j] = diagonal;
    if (kept) {
      const products = dots(column, columns, y, j + 1);
      for (let i = j + 1; i <= p; i++) {
        let value = (products[i - j - 1] ?? 0) * (scale[j] ?? 0) * (scale[i] ?? 1);
        for (let k = 0; k < j; k++) value -= entry(i, k) * entry(j, k);
        lower[i * (p + 1) + j] = value / diagonal;
      }
    }
    left -= entry(p, j) ** 2;
    squaresByColumns[j + 1] = Math.max(0, left);
  }
  return { entry, scale, squaresByColumns };
}

function solveNormal(columns: readonly Float64Array[], y: Float64Array) {
  const p = columns.length;
  const { entry, scale, squaresByColumns } = normalTriangle(columns, y);
  const inverse = invertTriangle(entry, p);
  const coefficients = new Float64Array(p);
  const full = new Float64Array(p * p);
  for (let i = 0; i < p; i++) {
    for (let k = 0; k < p; k++) {
      coefficients[i] =
        (coefficients[i] ?? 0) + (inverse[k * p + i] ?? 0) * entry(p, k) * (scale[i] ?? 0);
      let sum = 0;
      for (let m = Math.max(i, k); m < p; m++) {
        sum += (inverse[m * p + i] ?? 0) * (inverse[m * p + k] ?? 0);
      }
      full[i * p + k] = sum * (scale[i] ?? 0) * (scale[k] ?? 0);
    }
  }
  return { coefficients, inverse: full, squaresByColumns };
}

/** L⁻¹, with zero rows and columns where L's diagonal is zero. */
function invertTriangle(entry: (i: number, j: number) => number, p: number): Float64Array {
  const inverse = new Float64Array(p * p);
  for (let j = 0; j < p; j++) {
    if (entry(j, j) === 0) continue;
    inverse[j * p + j] = 1 / entry(j, j);
    for (let i = j + 1; i < p; i++) {
      if (entry(i, i) === 0) continue;
      let sum = 0;
      for (let k = j; k < i; k++) sum += entry(i, k) * (inverse[k * p + j] ?? 0);
      inverse[i * p + j] = -sum / entry(i, i);
    }
  }
  return inverse;
}

/** Products of one column with the columns from `first` on and with y, four at a time: the column is read once for all four. */
function dots(
  column: Float64Array,
  columns: readonly Float64Array[],
  y: Float64Array,
  first: number,
): number[] {
  const others = [...columns.slice(first), y];
  const products: number[] = [];
  for (let at = 0; at < others.length; at += 4) {
    const [a = y, b = a, c = a, d = a] = others.slice(at, at + 4);
    let [sumA, sumB, sumC, sumD] = [0, 0, 0, 0];
    for (let n = 0; n < column.length; n++) {
      const value = column[n] ?? 0;
      sumA += value * (a[n] ?? 0);
      sumB += value * (b[n] ?? 0);
      sumC += value * (c[n] ?? 0);
      sumD += value * (d[n] ?? 0);
    }
    products.push(sumA, sumB, sumC, sumD);
  }
  return products;
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let n = 0; n < a.length; n++) sum += (a[n] ?? 0) * (b[n] ?? 0);
  return sum;
}

/** target += factor · values. */
export function addScaled(target: Float64Array, values: Float64Array, factor: number): void {
  for (let n = 0; n < target.length; n++) target[n] = (target[n] ?? 0) + factor * (values[n] ?? 0);
}
