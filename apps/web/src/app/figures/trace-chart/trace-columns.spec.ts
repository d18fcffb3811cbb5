import { traceColumns } from './trace-columns';
import { nearestIndex, type TraceStretch } from './trace-stretch';

function stretchOf(ra: number[], setAside: number[] = ra.map(() => 0)): TraceStretch {
  const raArcsec = Float32Array.from(ra);
  const decArcsec = Float32Array.from(ra, () => 0);
  return {
    fromSeconds: 0,
    toSeconds: ra.length,
    thinned: false,
    timeSeconds: Float64Array.from(ra, (_, i) => i),
    ra: { leastArcsec: raArcsec, greatestArcsec: raArcsec },
    dec: { leastArcsec: decArcsec, greatestArcsec: decArcsec },
    setAside: Uint8Array.from(setAside),
  };
}

describe('traceColumns', () => {
  it('keeps the full extent and the mean of the frames of a column', () => {
    const frames = Array.from({ length: 80 }, (_, i) => (i % 8 === 0 ? 4 : 0));
    const { ra, stepSeconds } = traceColumns(
      stretchOf(frames),
      { fromSeconds: 0, toSeconds: 80 },
      10,
    );
    expect(stepSeconds).toBe(8);
    expect(ra).toHaveLength(1);
    expect(ra[0]).toHaveLength(10);
    expect(ra[0]![3]).toEqual({
      seconds: 28,
      leastArcsec: 0,
      greatestArcsec: 4,
      meanArcsec: 0.5, // one 4 among eight frames
    });
  });

  it('leaves frames that are set aside out of extent and mean', () => {
    const frames = Array.from({ length: 80 }, (_, i) => (i === 20 ? 99 : 1));
    const aside = frames.map((value) => (value === 99 ? 1 : 0));
    const { ra } = traceColumns(stretchOf(frames, aside), { fromSeconds: 0, toSeconds: 80 }, 10);
    expect(ra.flat().map((column) => column.greatestArcsec)).toEqual(Array(10).fill(1));
  });

  it('breaks the line where a stretch is set aside', () => {
    const frames = Array.from({ length: 80 }, () => 1);
    const aside = frames.map((_, i) => (i >= 32 && i < 56 ? 2 : 0));
    const { ra } = traceColumns(stretchOf(frames, aside), { fromSeconds: 0, toSeconds: 80 }, 10);
    expect(ra.map((segment) => segment.length)).toEqual([4, 3]);
  });

  it('shows single frames once there is room for them', () => {
    const frames = Array.from({ length: 80 }, (_, i) => i);
    const { ra, stepSeconds } = traceColumns(
      stretchOf(frames),
      { fromSeconds: 10, toSeconds: 20 },
      400,
    );
    expect(stepSeconds).toBe(0);
    // One frame to either side, so that the line runs out of sight.
    expect(ra[0]!.map((column) => column.meanArcsec)).toEqual([
      9, 10, 11, 12, 13, 14, 15, 16, 17, 18, 19, 20,
    ]);
  });

  it('never takes thinned steps for single frames', () => {
    const thinned = { ...stretchOf(Array.from({ length: 80 }, () => 1)), thinned: true };
    const { stepSeconds } = traceColumns(thinned, { fromSeconds: 10, toSeconds: 20 }, 400);
    expect(stepSeconds).toBeGreaterThan(0);
  });

  it('draws nothing of an empty stretch', () => {
    expect(traceColumns(stretchOf([]), { fromSeconds: 0, toSeconds: 10 }, 100)).toEqual({
      stepSeconds: 0,
      ra: [],
      dec: [],
    });
  });
});

describe('nearestIndex', () => {
  it('finds the frame beside the pointer', () => {
    const times = Float64Array.of(0, 2, 4, 10);
    expect([-5, 0.9, 1.1, 6.9, 7.1, 99].map((t) => nearestIndex(times, t))).toEqual([
      0, 0, 1, 2, 3, 3,
    ]);
    expect(nearestIndex(new Float64Array(), 1)).toBe(-1);
  });
});
