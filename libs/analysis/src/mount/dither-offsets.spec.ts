import { describe, expect, it } from 'vitest';
import { RandomSource } from '../simulation/random-source';
import { withoutJumps } from './dither-offsets';
import { type LevelFrames } from './whitened-least-squares';

const COUNT = 900;
const frames: LevelFrames = {
  timeSeconds: Float64Array.from({ length: COUNT }, (_, n) => 2 * n),
  cadenceSeconds: 2,
  used: new Uint8Array(COUNT).fill(1),
  restartFrames: [300, 600],
};
const lock = (n: number) => (n >= 600 ? -7 : n >= 300 ? 4 : 0);
const smooth = frames.timeSeconds.map((t) => 5 * Math.sin(t / 70));

describe('a motion without its dither jumps', () => {
  it('is the smooth motion itself where there is no noise', () => {
    const motion = smooth.map((value, n) => value + lock(n));
    withoutJumps(motion, smooth, frames, 0).forEach((value, n) => {
      expect(value).toBeCloseTo(smooth[n]!, 9);
    });
  });

  it('follows a wandering drive over the jumps', () => {
    const random = new RandomSource(1);
    let wander = 0;
    const drive = frames.timeSeconds.map(() => (wander += 0.02 * random.normal()));
    const motion = drive.map((value, n) => value + lock(n) + 0.3 * random.normal());
    const joined = withoutJumps(motion, new Float64Array(COUNT), frames, 0.0044 / 2);
    const offsets = joined.map((value, n) => value - drive[n]!);
    const mean = (from: number, to: number) =>
      offsets.subarray(from, to).reduce((sum, value) => sum + value, 0) / (to - from);
    // The levels on both sides are known to 0.08 each (steady filter: √(0.02·0.3)); four times √2 of that.
    expect(Math.abs(mean(300, 600) - mean(0, 300))).toBeLessThan(0.45);
    expect(Math.abs(mean(600, 900) - mean(300, 600))).toBeLessThan(0.45);
  });

  it('keeps frames without a star as they are', () => {
    const motion = smooth.map((value, n) => (n % 9 === 0 ? NaN : value + lock(n)));
    const used = frames.used.map((_, n) => (n % 9 === 0 ? 0 : 1));
    const joined = withoutJumps(motion, smooth, { ...frames, used }, 0.001);
    joined.forEach((value, n) => {
      if (n % 9 === 0) expect(value).toBeNaN();
      else expect(value).toBeCloseTo(smooth[n]!, 9);
    });
  });
});
