import { at } from '../statistics/at';
import { pick } from '../statistics/pick';
import { type RunSeries } from './run-series';

/** The frames of a run that count, n of them, in order. */
export interface UsedFrames {
  /** Their places in the run. */
  readonly frame: Int32Array;
  readonly timeSeconds: Float64Array;
  readonly raErrorArcsec: Float64Array;
  readonly decErrorArcsec: Float64Array;
}

/** Picks the frames that are not set aside. O(n). */
export function usedFrames(series: RunSeries): UsedFrames {
  let count = 0;
  for (const code of series.setAside) if (code === 0) count++;
  const frame = new Int32Array(count);
  let place = 0;
  for (let i = 0; i < series.count; i++) if (at(series.setAside, i) === 0) frame[place++] = i;
  return {
    frame,
    timeSeconds: pick(series.timeSeconds, frame),
    raErrorArcsec: pick(series.raErrorArcsec, frame),
    decErrorArcsec: pick(series.decErrorArcsec, frame),
  };
}
