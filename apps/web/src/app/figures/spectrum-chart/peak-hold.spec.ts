import { peakHeld } from './peak-hold';

describe('peakHeld', () => {
  it('loses no peak however many periods fall on one step', () => {
    const periodSeconds = Array.from({ length: 4000 }, (_, i) => 8 * (1000 / 8) ** (i / 3999));
    const raAmplitudeArcsec = periodSeconds.map((_, i) => (i === 2222 ? 0.5 : 0.01));
    const decAmplitudeArcsec = periodSeconds.map((_, i) => (i === 100 ? 0.3 : 0.02));
    const held = peakHeld({ periodSeconds, raAmplitudeArcsec, decAmplitudeArcsec }, 600);
    expect(held.periodSeconds.length).toBeLessThanOrEqual(401); // 600 px in steps of 1.5 px
    expect(Math.max(...held.raAmplitudeArcsec)).toBe(0.5);
    expect(Math.max(...held.decAmplitudeArcsec)).toBe(0.3);
    const at = held.raAmplitudeArcsec.indexOf(0.5);
    expect(held.periodSeconds[at]).toBe(periodSeconds[2222]);
  });

  it('sorts periods that come longest first', () => {
    const held = peakHeld(
      { periodSeconds: [100, 10], raAmplitudeArcsec: [1, 2], decAmplitudeArcsec: [3, 4] },
      600,
    );
    expect(held.periodSeconds).toEqual([10, 100]);
    expect(held.raAmplitudeArcsec).toEqual([2, 1]);
  });

  it('leaves an empty curve empty', () => {
    const empty = { periodSeconds: [], raAmplitudeArcsec: [], decAmplitudeArcsec: [] };
    expect(peakHeld(empty, 600)).toEqual(empty);
  });
});
