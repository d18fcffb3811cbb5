import { describe, expect, it } from 'vitest';
import { cutIntoSteps, extremes, framesWithin } from './series-stretch';

// Expected values by the definitions in series-stretch.ts, counted by hand.
const every = (count: number, seconds: number) =>
  Float64Array.from({ length: count }, (_, i) => i * seconds);

describe('framesWithin', () => {
  it.each([
    ['both ends', 4, 8, { from: 2, to: 5 }],
    ['between two frames', 4.5, 5.5, { from: 3, to: 3 }],
    ['beyond the end', 16, Infinity, { from: 8, to: 10 }],
    ['all', 0, Infinity, { from: 0, to: 10 }],
    ['before the first', -5, -1, { from: 0, to: 0 }],
  ])('takes %s', (_what, from, to, range) => {
    expect(framesWithin(every(10, 2), from, to)).toEqual(range);
  });
});

describe('cutIntoSteps', () => {
  it('gives every frame to one step, in order', () => {
    const { timeSeconds, frames } = cutIntoSteps(every(101, 2), 10);
    expect(frames[0]).toEqual({ from: 0, to: 10 });
    expect(frames[9]).toEqual({ from: 90, to: 101 });
    frames.slice(1).forEach(({ from }, i) => {
      expect(from).toBe(frames[i]?.to);
    });
    expect(timeSeconds[0]).toBe(10); // the middle of 0 to 20 s
  });

  it('keeps a gap in time as an empty step, so that no line is drawn across', () => {
    const times = Float64Array.from([...every(100, 1), ...every(100, 1).map((t) => t + 300)]);
    const { frames } = cutIntoSteps(times, 40);
    expect(frames.filter(({ from, to }) => from === to).length).toBeGreaterThan(15);
  });

  it('leaves out a step that is empty only because frames do not come on the beat', () => {
    const times = every(12, 1).map((t, i) => t + (i % 2) * 0.9); // pairs
    const { frames } = cutIntoSteps(times, 11);
    expect(frames.every(({ from, to }) => to > from)).toBe(true);
    expect(frames.at(-1)?.to).toBe(12);
  });
});

describe('extremes', () => {
  it('keeps a spike of one frame, and passes over frames without a star', () => {
    const samples = Float32Array.from([1, NaN, 5, -2, NaN, NaN]);
    const { least, greatest } = extremes(samples, [
      { from: 0, to: 4 },
      { from: 4, to: 6 },
      { from: 6, to: 6 },
    ]);
    expect([...least]).toEqual([-2, NaN, NaN]);
    expect([...greatest]).toEqual([5, NaN, NaN]);
  });
});
