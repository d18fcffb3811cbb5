import type { SeriesChannel } from '@stillpier/contract';

/** The channels of a guide error, in the order in which they are asked for. */
export const ERROR_CHANNELS = [
  'raError',
  'decError',
  'setAside',
] as const satisfies SeriesChannel[];

interface Extent {
  readonly leastArcsec: Float32Array;
  readonly greatestArcsec: Float32Array;
}

/** A stretch of a run's guide error as the series answer holds it; see the contract's `seriesQuerySchema`. */
export interface RunStretch {
  readonly fromSeconds: number;
  readonly toSeconds: number;
  readonly thinned: boolean;
  /** Since the start of the run. */
  readonly timeSeconds: Float64Array;
  readonly ra: Extent;
  readonly dec: Extent;
  /** 1 where the step holds a frame that is set aside. */
  readonly setAside: Uint8Array;
}

const HEAD_BYTES = 8;
const FLOAT_BYTES = 4;

/** @throws {RangeError} When the answer is shorter than its head says. */
export function readRunStretch(
  answer: ArrayBuffer,
  fromSeconds: number,
  toSeconds: number,
): RunStretch {
  const head = new DataView(answer);
  const n = head.getUint32(0, true);
  const thinned = head.getUint32(4, true) === 1;
  const column = (at: number): Float32Array =>
    littleEndianFloats(answer, HEAD_BYTES + at * n * FLOAT_BYTES, n);
  const times = column(0);
  const extent = (channel: number): Extent => {
    if (thinned) {
      return {
        leastArcsec: column(1 + 2 * channel),
        greatestArcsec: column(2 + 2 * channel),
      };
    }
    const frames = column(1 + channel);
    return { leastArcsec: frames, greatestArcsec: frames };
  };
  return {
    fromSeconds,
    toSeconds,
    thinned,
    timeSeconds: Float64Array.from(times, (seconds) => fromSeconds + seconds),
    ra: extent(0),
    dec: extent(1),
    setAside: Uint8Array.from(extent(2).greatestArcsec, (code) => (code > 0 ? 1 : 0)),
  };
}

function littleEndianFloats(buffer: ArrayBuffer, offset: number, count: number): Float32Array {
  const view = new DataView(buffer, offset, count * FLOAT_BYTES);
  return Float32Array.from({ length: count }, (_, i) => view.getFloat32(i * FLOAT_BYTES, true));
}
