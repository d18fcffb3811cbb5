/**
 * Play operator: where the driven side of a gap stands when the driver goes along its way. The driven side rests
 * inside the gap and is pushed only at its ends: after a reversal it stays until the gap is crossed.
 *
 *     place[n] = min( max(place[n−1], driver[n] − width), driver[n] ),   place[−1] = driver[0] − lag
 *
 * O(n), no allocation; `out` may be `driver` itself.
 *
 * @param driver Places of the driver, n values, any unit.
 * @param width Width of the gap in the unit of `driver`, 0 or more.
 * @param lag How far the driven side stands behind the driver at the start, 0 to `width`.
 * @param out n values, written over and returned.
 * @see M. A. Krasnosel'skii, A. V. Pokrovskii, Systems with Hysteresis (1989), ch. 1.
 */
export function playInto(
  driver: ArrayLike<number>,
  width: number,
  lag: number,
  out: Float64Array,
): Float64Array {
  let place = (driver[0] ?? NaN) - lag;
  for (let n = 0; n < out.length; n++) {
    const front = driver[n] ?? NaN;
    place = Math.min(Math.max(place, front - width), front);
    out[n] = place;
  }
  return out;
}
