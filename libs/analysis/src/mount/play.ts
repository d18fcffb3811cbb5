import { at } from '../statistics/at';

/**
 * Play operator: where the driven side of a gap stands when the driving side goes along `drive`. The driven side
 * rests inside the gap and is pushed only at its ends: after a reversal it does not move until the gap is taken up.
 *
 *     out[n] = min( max(out[n−1], drive[n] − width/2), drive[n] + width/2 ),   out[0] = drive[0]
 *
 * O(n). Linear in scale: play(a·drive, a·width) = a·play(drive, width) for a > 0.
 *
 * @param drive n positions, any unit.
 * @param width Width of the gap in the unit of `drive`, 0 or more; 0 gives `drive` back.
 * @see M. A. Krasnosel'skii, A. V. Pokrovskii, Systems with Hysteresis (1989), ch. 1.
 */
export function play(drive: ArrayLike<number>, width: number): Float64Array {
  const driven = new Float64Array(drive.length);
  let position = at(drive, 0);
  for (let n = 0; n < driven.length; n++) {
    position = playStep(position, at(drive, n), width);
    driven[n] = position;
  }
  return driven;
}

/** One step of `play`: where the driven side goes when the driving side has moved to `drive`. */
export function playStep(driven: number, drive: number, width: number): number {
  return Math.min(Math.max(driven, drive - width / 2), drive + width / 2);
}
