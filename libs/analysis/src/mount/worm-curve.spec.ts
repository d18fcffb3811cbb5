import { describe, expect, it } from 'vitest';
import { foldedCurve } from './folded-curve';
import { type FittedLine } from './motion-line';
import { curveMeasures, describePeriodicError, phaseDegrees } from './worm-curve';

const line = (frequency: number, cosine: number, sine: number): FittedLine => ({
  frequency,
  cosine,
  sine,
  amplitude: Math.hypot(cosine, sine),
  standardError: 0.01,
});

describe("the worm's curve", () => {
  it('of one sine is twice its amplitude wide, as steep as 2πA/T, and A/√2 in RMS', () => {
    // checks.json 3.7, derived: amplitude 10, period 478.6894: 0.131258 ″/s.
    const { peakToPeak, steepest, rms } = curveMeasures([line(1 / 478.6894, 6, 8)]);
    expect(peakToPeak).toBeCloseTo(20, 3); // points a quarter of a degree apart miss less than 1e-5
    expect(steepest).toBeCloseTo(0.131258, 5);
    expect(rms).toBeCloseTo(Math.sqrt(50), 12);
  });

  it('counts phase as in A·cos(2πft + phase)', () => {
    expect(phaseDegrees(line(1, 1, 0))).toBeCloseTo(0, 12);
    expect(phaseDegrees(line(1, 0, -1))).toBeCloseTo(90, 12);
    expect(phaseDegrees(line(1, 0, 1))).toBeCloseTo(270, 12);
  });

  it('is told as axis angle where the declination is known', () => {
    const worm = {
      periodSeconds: 480,
      periodFrom: 'rig' as const,
      turns: 7.5,
      harmonics: [line(1 / 480, 3, 0)],
      otherLines: [],
      trend: new Float64Array(1),
      driftStandardError: 0,
    };
    const curve = [{ phase: 0.5, medianArcsec: 1, q1Arcsec: null, q3Arcsec: 2 }];
    const sky = describePeriodicError(worm, curve, null);
    const axis = describePeriodicError(worm, curve, 0.5);
    expect([sky.atAxis, axis.atAxis]).toEqual([false, true]);
    expect(axis.peakToPeakArcsec).toBeCloseTo(2 * sky.peakToPeakArcsec, 12);
    expect(axis.harmonics[0]!.amplitudeArcsec).toBeCloseTo(6, 12);
    expect(axis.curve).toEqual([{ phase: 0.5, medianArcsec: 2, q1Arcsec: null, q3Arcsec: 4 }]);
  });
});

describe('the folded curve', () => {
  // Half seconds: no frame falls on the border of two bins, where rounding would choose.
  const time = Float64Array.from({ length: 7200 }, (_, n) => n + 0.5);

  it('has the medians and quartiles of 72 bins', () => {
    const motion = time.map((t) => Math.floor((t % 720) / 10) + (Math.floor(t / 720) % 2));
    const curve = foldedCurve(time, motion, 720);
    expect(curve).toHaveLength(72);
    curve.forEach(({ phase, medianArcsec, q1Arcsec, q3Arcsec }, bin) => {
      expect(phase).toBeCloseTo((bin + 0.5) / 72, 12);
      // Half of the turns are one higher: by hand.
      expect([q1Arcsec, medianArcsec, q3Arcsec]).toEqual([bin, bin + 0.5, bin + 1]);
    });
  });

  it('leaves bins that no frame falls into empty', () => {
    const motion = time.map((t) => (t % 720 < 10 ? NaN : 1));
    expect(foldedCurve(time, motion, 720)[0]).toMatchObject({ medianArcsec: null, q1Arcsec: null });
  });
});
