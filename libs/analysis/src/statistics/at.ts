/** The value at an index, NaN beyond the ends: hot loops read through this, and the engine inlines it. */
export function at(values: ArrayLike<number>, index: number): number {
  return values[index] ?? NaN;
}
