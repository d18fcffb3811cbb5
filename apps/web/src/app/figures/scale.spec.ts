import { linearScale, logScale, logTicks, roundStep } from './scale';

describe('scales', () => {
  it('map the ends of the domain onto the ends of the range', () => {
    const scale = linearScale([-2, 2], [104, 0]);
    expect([scale(-2), scale(0), scale(2)]).toEqual([104, 52, 0]);
  });

  it('give equal ratios equal steps', () => {
    const scale = logScale([10, 1000], [0, 200]);
    expect(scale(100)).toBeCloseTo(100, 9); // the middle of two decades
  });

  it('step by 1, 2 or 5', () => {
    expect([roundStep(10, 5), roundStep(0.6, 4), roundStep(7, 4)]).toEqual([2, 0.2, 2]);
  });

  it('tick a period axis by 1, 2, 5', () => {
    expect(logTicks(8, 1000)).toEqual([10, 20, 50, 100, 200, 500, 1000]);
  });
});
