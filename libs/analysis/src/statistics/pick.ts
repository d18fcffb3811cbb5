import { at } from './at';

/** The values at the given indices, in their order. */
export function pick(values: ArrayLike<number>, indices: ArrayLike<number>): Float64Array {
  const picked = new Float64Array(indices.length);
  for (let i = 0; i < picked.length; i++) picked[i] = at(values, at(indices, i));
  return picked;
}
