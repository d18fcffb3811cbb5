import { describe, expect, it } from 'vitest';
import { RandomSource } from '../simulation/random-source';
import { bumpsOf } from './bumps';

const noise = (seed: number) => {
  const random = new RandomSource(seed);
  return Float64Array.from({ length: 3000 }, () => 0.5 * random.normal());
};

describe('gusts and bumps', () => {
  it('are hardly ever found in noise', () => {
    // Beyond 4.5 sigmas comes 1 Gaussian frame in 147,000; the running median's own noise makes it a few.
    const frames = [1, 2, 3, 4, 5, 6, 7, 8].reduce(
      (sum, seed) => sum + bumpsOf(noise(seed), 2).filter((bump) => bump !== 0).length,
      0,
    );
    expect(frames).toBeLessThan(6); // of 24,000
  });

  it('are taken with their tail', () => {
    const motion = noise(9);
    [6, 4, 2.5, 1.5].forEach((size, n) => {
      motion[1000 + n] = size;
    });
    const bumps = bumpsOf(motion, 2);
    expect(bumps[1000]).toBeGreaterThan(5);
    expect(bumps[1002]).toBeGreaterThan(1);
    expect(bumps.subarray(0, 995).every((bump) => bump === 0)).toBe(true);
  });

  it('are no slow motion', () => {
    const slow = noise(10).map((value, n) => value + 8 * Math.sin((2 * Math.PI * n) / 300));
    expect(bumpsOf(slow, 2).filter((bump) => bump !== 0).length).toBeLessThan(3);
  });

  it('need no star in every frame', () => {
    const motion = noise(11);
    motion.fill(NaN, 500, 700);
    expect(bumpsOf(motion, 2).every(Number.isFinite)).toBe(true);
    expect(bumpsOf(new Float64Array(20).fill(NaN), 2).every((bump) => bump === 0)).toBe(true);
  });
});
