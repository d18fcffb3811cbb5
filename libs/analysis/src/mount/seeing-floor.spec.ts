import { describe, expect, it } from 'vitest';
import { RandomSource } from '../simulation/random-source';
import { secondDifferenceNoise, seeingFloor } from './seeing-floor';
import { type LevelFrames } from './whitened-least-squares';

const COUNT = 3600;
const frames: LevelFrames = {
  timeSeconds: Float64Array.from({ length: COUNT }, (_, n) => 2 * n),
  cadenceSeconds: 2,
  used: new Uint8Array(COUNT).fill(1),
  restartFrames: [1000],
};
const random = new RandomSource(2);
const noise = frames.timeSeconds.map(() => 0.4 * random.normal());

describe('the seeing floor', () => {
  it('reads white noise from second differences', () => {
    // A median of 3600 tells σ to 1.17/√N = 2 %, correlation makes it 3 %; three of these.
    expect(Math.abs(secondDifferenceNoise(noise, frames)! / 0.4 - 1)).toBeLessThan(0.09);
  });

  it('minds neither drift nor jumps at restarts nor spikes', () => {
    const plain = secondDifferenceNoise(noise, frames)!;
    const moved = noise.map(
      (value, n) => value + 0.1 * n + (n >= 1000 ? 50 : 0) + (n % 100 === 50 ? 20 : 0),
    );
    expect(Math.abs(secondDifferenceNoise(moved, frames)! / plain - 1)).toBeLessThan(0.05); // 3 in 100 differences are spoilt
  });

  it('is the smaller of the two estimates', () => {
    expect(seeingFloor(noise, frames, 0.1)).toBe(0.1);
    expect(seeingFloor(noise, frames, 9)).toBe(secondDifferenceNoise(noise, frames));
  });

  it('is not told by second differences of frames far apart', () => {
    const sparse = { ...frames, timeSeconds: frames.timeSeconds.map((t) => 5 * t) };
    expect(secondDifferenceNoise(noise, sparse)).toBeNull();
    expect(seeingFloor(noise, sparse, 0.3)).toBe(0.3);
  });
});
