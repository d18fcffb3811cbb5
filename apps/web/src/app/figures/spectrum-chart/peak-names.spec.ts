import { placePeakNames, type Box } from './peak-names';

const PLOT: Box = { left: 0, right: 900, top: 0, bottom: 200 };
const flat = () => 190;

describe('placePeakNames', () => {
  it('puts a name over its peak', () => {
    expect(placePeakNames([{ xPx: 400, yPx: 100, widthPx: 80 }], PLOT, flat)).toEqual([
      { index: 0, centrePx: 400, bottomPx: 91 },
    ]);
  });

  it('moves the name of a weaker neighbour aside', () => {
    const [strong, weak] = placePeakNames(
      [
        { xPx: 400, yPx: 100, widthPx: 80 },
        { xPx: 430, yPx: 104, widthPx: 80 },
      ],
      PLOT,
      flat,
    );
    expect(Math.abs(strong!.centrePx - weak!.centrePx)).toBeGreaterThanOrEqual(80);
  });

  it('keeps names inside the plot', () => {
    const [first] = placePeakNames([{ xPx: 5, yPx: 100, widthPx: 80 }], PLOT, flat);
    expect(first!.centrePx).toBe(40);
  });

  it('raises a name above a taller part of the curve', () => {
    const [name] = placePeakNames([{ xPx: 400, yPx: 150, widthPx: 80 }], PLOT, () => 60);
    expect(name!.bottomPx).toBe(51);
  });

  it('leaves out a name that finds no place', () => {
    const peaks = Array.from({ length: 8 }, () => ({ xPx: 400, yPx: 100, widthPx: 80 }));
    const placed = placePeakNames(peaks, PLOT, flat);
    expect(placed.map((name) => name.index)).toEqual([0, 1, 2]); // middle, left, right
  });
});
