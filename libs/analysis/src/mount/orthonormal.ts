/**
 * Columns made orthonormal in their order by Gram and Schmidt; one that hangs on those before it is left out. The columns
 * are written over. O(n p²).
 *
 * @see G. H. Golub, C. F. Van Loan, Matrix Computations, 4th ed., sec. 5.2.
 */
export function orthonormal(columns: readonly Float64Array[]): readonly Float64Array[] {
  const kept: Float64Array[] = [];
  for (const column of columns) {
    for (const before of kept) subtract(column, before, product(column, before));
    const length = Math.sqrt(product(column, column));
    if (!(length > 0)) continue;
    for (let n = 0; n < column.length; n++) column[n] = (column[n] ?? NaN) / length;
    kept.push(column);
  }
  return kept;
}

/** Takes out of a series, in place, what orthonormal columns hold of it. */
export function without(columns: readonly Float64Array[], series: Float64Array): Float64Array {
  for (const column of columns) subtract(series, column, product(series, column));
  return series;
}

/** Sum of squares that a series keeps beside orthonormal columns. */
export function squaresWithout(columns: readonly Float64Array[], series: Float64Array): number {
  let squares = product(series, series);
  for (const column of columns) squares -= product(series, column) ** 2;
  return squares;
}

export function product(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let n = 0; n < a.length; n++) sum += (a[n] ?? NaN) * (b[n] ?? NaN);
  return sum;
}

function subtract(from: Float64Array, column: Float64Array, times: number): void {
  for (let n = 0; n < from.length; n++) from[n] = (from[n] ?? NaN) - times * (column[n] ?? NaN);
}
