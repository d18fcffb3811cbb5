import { angleFromRaDegrees, roundelHalfWidthArcsec } from './star-shape';

describe('star shape', () => {
  // SCIENCE §2 measures from +Dec through +RA, DESIGN §6 from RA towards Dec: complements of each other.
  it('turns an angle from north into an angle from RA', () => {
    expect([90, 80, 0, 100, 180, 45].map(angleFromRaDegrees)).toEqual([0, 10, 90, -10, 90, 45]);
  });

  it('keeps 2″ to each side unless a star needs more', () => {
    const star = (fwhmMajorArcsec: number) => ({
      fwhmMajorArcsec,
      fwhmMinorArcsec: 2,
      aspect: 1,
      positionAngleDegrees: 0,
    });
    expect(roundelHalfWidthArcsec([])).toBe(2);
    expect(roundelHalfWidthArcsec([star(2.6), star(3)])).toBe(2);
    expect(roundelHalfWidthArcsec([star(2.6), star(8)])).toBe(4.4); // 1.1 × 8 / 2
  });
});
