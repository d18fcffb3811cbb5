import { describe, expect, it } from 'vitest';
import { turnInto } from './turning';

describe('turnInto', () => {
  it('agrees with cosine and sine to the rounding of the angle', () => {
    const times = Float64Array.from(
      { length: 5000 },
      (_, i) => (i - 1000) * 2.0137 + (i % 7) * 0.1,
    );
    const cosines = new Float64Array(times.length);
    const sines = new Float64Array(times.length);
    for (const frequency of [1 / 480, 0.0371, 0.25]) {
      turnInto(times, 3, frequency, cosines, sines);
      times.forEach((time, i) => {
        const angle = 2 * Math.PI * frequency * (time - 3);
        // Angles reach 13,000 radians: one rounding of that is 2e-12.
        expect(Math.abs(cosines[i]! - Math.cos(angle))).toBeLessThan(4e-12);
        expect(Math.abs(sines[i]! - Math.sin(angle))).toBeLessThan(4e-12);
      });
    }
  });

  it('keeps its place beyond the integers of 32 bits', () => {
    const [cosines, sines] = [new Float64Array(1), new Float64Array(1)];
    turnInto(Float64Array.of(2 ** 25), 0, 0.25, cosines, sines);
    expect(cosines[0]).toBe(1);
    expect(sines[0]).toBe(0);
  });
});
