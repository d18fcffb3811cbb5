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
  /** Codes of the analysis, 0 kept; where thinned, the greatest of the step. */
  readonly setAside: Uint8Array;
}

const HEAD_BYTES = 8;
const FLOAT_BYTES = 4;
/** Times come as Float32 from the start of their stretch: two of one frame differ by rounding alone. */
const SAME_SECONDS = 0.01;

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
    setAside: Uint8Array.from(extent(2).greatestArcsec),
  };
}

function littleEndianFloats(buffer: ArrayBuffer, offset: number, count: number): Float32Array {
  const view = new DataView(buffer, offset, count * FLOAT_BYTES);
  return Float32Array.from({ length: count }, (_, i) => view.getFloat32(i * FLOAT_BYTES, true));
}

/** Stretches that follow each other as one; a frame on the seam of two stands in both and is taken once. */
export function joinedStretches(stretches: readonly RunStretch[]): RunStretch {
  const kept = stretches.map((stretch, i) => {
    const seamSeconds = stretches[i - 1]?.timeSeconds.at(-1) ?? -Infinity;
    const from = stretch.timeSeconds.findIndex((seconds) => seconds > seamSeconds + SAME_SECONDS);
    return { stretch, from: from < 0 ? stretch.timeSeconds.length : from };
  });
  const floats = (part: (stretch: RunStretch) => Float32Array): Float32Array =>
    Float32Array.from(kept.flatMap(({ stretch, from }) => [...part(stretch).subarray(from)]));
  return {
    fromSeconds: stretches[0]?.fromSeconds ?? 0,
    toSeconds: stretches.at(-1)?.toSeconds ?? 0,
    thinned: stretches.some(({ thinned }) => thinned),
    timeSeconds: Float64Array.from(
      kept.flatMap(({ stretch, from }) => [...stretch.timeSeconds.subarray(from)]),
    ),
    ra: {
      leastArcsec: floats(({ ra }) => ra.leastArcsec),
      greatestArcsec: floats(({ ra }) => ra.greatestArcsec),
    },
    dec: {
      leastArcsec: floats(({ dec }) => dec.leastArcsec),
      greatestArcsec: floats(({ dec }) => dec.greatestArcsec),
    },
    setAside: Uint8Array.from(
      kept.flatMap(({ stretch, from }) => [...stretch.setAside.subarray(from)]),
    ),
  };
}
