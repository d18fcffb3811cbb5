/**
 * The item in the middle when each counts as often as its weight says; null for none. It is always one of the items,
 * so that measures that belong together (as a star's aspect and its angle) can be read from the same one.
 */
export function weightedMedianItem<Item>(
  items: readonly Item[],
  valueOf: (item: Item) => number | null,
  weightOf: (item: Item) => number,
): Item | null {
  const counted = items
    .map((item) => ({ item, size: valueOf(item), weight: weightOf(item) }))
    .filter((each): each is typeof each & { size: number } => each.size !== null)
    .sort((a, b) => a.size - b.size);
  const half = counted.reduce((sum, { weight }) => sum + weight, 0) / 2;
  let below = 0;
  for (const { item, weight } of counted) {
    below += weight;
    if (below >= half) return item;
  }
  return null;
}
