import { at } from './at';

/**
 * Rearranges `values` so that the k-th smallest (0-based) stands at index k, with nothing larger before it and
 * nothing smaller after it. O(n) on average; the pivot is the median of three, so that sorted and constant series
 * (frames in order of time, a clipped column) stay linear. Changes `values`.
 *
 * @returns the k-th smallest value.
 * @see C. A. R. Hoare, Algorithm 65: FIND, Comm. ACM 4 (1961) 321.
 */
export function selectInPlace(values: Float64Array, k: number): number {
  let low = 0;
  let high = values.length - 1;
  while (high > low) {
    const pivot = medianOfThree(at(values, low), at(values, (low + high) >> 1), at(values, high));
    let i = low;
    let j = high;
    while (i <= j) {
      while (at(values, i) < pivot) i++;
      while (at(values, j) > pivot) j--;
      if (i <= j) {
        swap(values, i, j);
        i++;
        j--;
      }
    }
    if (k <= j) high = j;
    else if (k >= i) low = i;
    else break;
  }
  return at(values, k);
}

function medianOfThree(a: number, b: number, c: number): number {
  return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
}

function swap(values: Float64Array, i: number, j: number): void {
  const kept = at(values, i);
  values[i] = at(values, j);
  values[j] = kept;
}
