const GOLDEN = (Math.sqrt(5) - 1) / 2;

/**
 * Place of the least value of a function with one minimum between two places, to within `width`. One call a step, and
 * each step shrinks the bracket by 0.618.
 *
 * @see J. Kiefer, Proc. Amer. Math. Soc. 4 (1953) 502.
 */
export function goldenSection(
  cost: (x: number) => number,
  from: number,
  to: number,
  width: number,
): number {
  let [low, high] = [from, to];
  let left = high - GOLDEN * (high - low);
  let right = low + GOLDEN * (high - low);
  let leftCost = cost(left);
  let rightCost = cost(right);
  while (high - low > width) {
    if (leftCost < rightCost) {
      [high, right, rightCost] = [right, left, leftCost];
      left = high - GOLDEN * (high - low);
      leftCost = cost(left);
    } else {
      [low, left, leftCost] = [left, right, rightCost];
      right = low + GOLDEN * (high - low);
      rightCost = cost(right);
    }
  }
  return (low + high) / 2;
}
