import { describe, expect, it } from 'vitest';
import { playInto } from './play';

const played = (driver: number[], width: number, lag: number) => [
  ...playInto(driver, width, lag, new Float64Array(driver.length)),
];

// All expected places by hand from the definition.
describe('play of a gear', () => {
  it('holds the driven side until the gap is crossed', () => {
    expect(played([0, 1, 2, 1, 0, -1, -2, -1, 0, 1], 2, 2)).toEqual([
      -2, -1, 0, 0, 0, -1, -2, -2, -2, -1,
    ]);
  });

  it('follows exactly without a gap', () => {
    expect(played([0, 1, -3, 2], 0, 0)).toEqual([0, 1, -3, 2]);
  });

  it('starts as far behind as it is told', () => {
    expect(played([0, 1, 2, 3], 2, 1)).toEqual([-1, -1, 0, 1]);
    expect(played([0, 1, 2, 3], 2, 0)).toEqual([0, 0, 0, 1]);
  });

  it('never leaves the gap', () => {
    const driver = Array.from({ length: 200 }, (_, n) => 5 * Math.sin(n * 0.7) + Math.cos(n / 9));
    played(driver, 1.5, 1.5).forEach((place, n) => {
      expect(place).toBeLessThanOrEqual(driver[n]!);
      expect(place).toBeGreaterThanOrEqual(driver[n]! - 1.5);
    });
  });

  it('may write over its input', () => {
    const driver = Float64Array.from([0, 2, 1, -1]);
    expect([...playInto(driver, 1, 1, driver)]).toEqual([-1, 1, 1, -1]);
  });
});
