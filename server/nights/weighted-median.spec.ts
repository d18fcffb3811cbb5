import { expect, it } from 'vitest';
import { weightedMedianItem } from './weighted-median';

const median = (...pairs: [number | null, number][]) =>
  weightedMedianItem(
    pairs,
    ([size]) => size,
    ([, weight]) => weight,
  )?.[0] ?? null;

// Expected by the definition: the smallest value at which the weights up to it reach half of all weights.
it('is the middle value when all weigh the same', () => {
  expect(median([3, 1], [1, 1], [2, 1])).toBe(2);
});
it('leans to the item with the most weight', () => {
  expect(median([0.5, 100], [0.9, 6000], [0.6, 100])).toBe(0.9);
});
it('leaves out items without a value', () => {
  expect(median([null, 9000], [0.7, 10])).toBe(0.7);
});
it('takes the lower of two that weigh the same', () => {
  expect(median([0.8, 5], [0.4, 5])).toBe(0.4);
});
it('is null for nothing', () => {
  expect(median([null, 5])).toBeNull();
});
