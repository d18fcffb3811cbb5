import { describe, expect, it } from 'vitest';
import { RandomSource } from '../simulation/random-source';
import { labelPeriod, namedPeriods } from './label-period';
import { runSpectrum, seriesPeaks } from './run-spectrum';

const SPACING = 2;
/** Times of 2 s; with gaps 8 of every 150 frames are missing, as a dither takes them. */
const times = (count: number, gaps: boolean) =>
  Float64Array.from({ length: count }, (_, i) => i * SPACING).filter(
    (_, i) => !gaps || i % 150 >= 8,
  );
const samplings: [string, boolean][] = [
  ['fft', false],
  ['lomb-scargle', true],
];
const used = (t: Float64Array, ra: Float64Array, dec: Float64Array) => ({
  frame: Int32Array.from(t, (time) => time / SPACING),
  timeSeconds: t,
  raErrorArcsec: ra,
  decErrorArcsec: dec,
});

describe.each(samplings)('a pure sine by %s', (method, gaps) => {
  it.each([5, 5.3, 7.7, 40.2])('of %d turns has its amplitude and period', (turns) => {
    const t = times(2400, gaps);
    const period = 4800 / turns;
    const sine = t.map((time) => 1.5 * Math.sin((2 * Math.PI * time) / period + 0.7));
    const { spectrum } = runSpectrum(used(t, sine, sine), SPACING, []);
    expect(spectrum.ra.method).toBe(method);
    expect(spectrum.ra.peaks).toHaveLength(1);
    // SCIENCE section 3: amplitude within 1 %, period within 0.1 %; least squares does far better without noise.
    expect(Math.abs(spectrum.ra.peaks[0]!.amplitudeArcsec / 1.5 - 1)).toBeLessThan(1e-6);
    expect(Math.abs(spectrum.ra.peaks[0]!.periodSeconds / period - 1)).toBeLessThan(1e-6);
    expect(spectrum.ra.peaks[0]!.falseAlarmProbability).toBeLessThan(1e-6);
  });

  it('is found beside its harmonics, a weak fast line, drift and noise', () => {
    const t = times(5400, gaps);
    const random = new RandomSource(7);
    const wave = (period: number, amplitude: number, time: number) =>
      amplitude * Math.sin((2 * Math.PI * time) / period + period);
    const y = t.map(
      (time) =>
        wave(478.69, 2, time) +
        wave(239.345, 0.8, time) +
        wave(37.3, 0.4, time) +
        0.0005 * time +
        0.5 * random.normal(),
    );
    const named = namedPeriods({ mount: { wormPeriodSeconds: 478.69 } });
    const peaks = seriesPeaks(t, y, SPACING, named);
    expect(peaks.map(({ label }) => label)).toEqual(['worm', 'worm / 2', null]);
    [2, 0.8, 0.4].forEach((amplitude, i) => {
      // Standard error of an amplitude: 0.5 · sqrt(2/5400) = 0.0096; four of them.
      expect(Math.abs(peaks[i]!.amplitudeArcsec - amplitude)).toBeLessThan(0.04);
    });
    expect(Math.abs(peaks[0]!.share - 2 / (2 + 0.32 + 0.08 + 0.25 + 2.43))).toBeLessThan(0.05);
  });
});

describe.each(samplings)('noise alone by %s', (_, gaps) => {
  /** Measured error of a loop of gain k (0: unguided) under white seeing. */
  const guided = (t: Float64Array, gain: number, seed: number) => {
    const random = new RandomSource(seed);
    let pointing = 0;
    return t.map(() => {
      const measured = pointing + random.normal();
      pointing -= gain * measured;
      return measured;
    });
  };

  it.each([0, 0.3, 0.7, 1.3])('has no peak in 95 of 100 starts at gain %d', (gain) => {
    const t = times(1800, gaps);
    let withPeaks = 0;
    for (let seed = 0; seed < 100; seed++) {
      if (seriesPeaks(t, guided(t, gain, seed), SPACING, []).length > 0) withPeaks++;
    }
    expect(withPeaks).toBeLessThanOrEqual(5);
  });

  it('that wanders like a random walk has no peak in 90 of 100 starts', () => {
    const t = times(1800, gaps);
    let withPeaks = 0;
    for (let seed = 0; seed < 100; seed++) {
      const random = new RandomSource(seed);
      let level = 0;
      const walk = t.map(() => (level += 0.1 * random.normal()) + random.normal());
      if (seriesPeaks(t, walk, SPACING, []).length > 0) withPeaks++;
    }
    // Missing frames at even distances let a steep spectrum leak to their own frequency: 10 in place of 5.
    expect(withPeaks).toBeLessThanOrEqual(10);
  });
});

describe('labels', () => {
  const named = namedPeriods({
    mount: { wormTeeth: 180, gearStages: [{ name: 'transfer gear', periodSeconds: 159.56 }] },
  });
  it.each([
    [478.7, 'worm'],
    [486, 'worm'],
    [500, null],
    [239.3, 'worm / 2'],
    [79.8, 'worm / 6'],
    [159.6, 'transfer gear'],
    [300, null],
  ])('a period of %d s is called %s within 2 %', (period, label) => {
    expect(labelPeriod(period, 1e-5, named)).toBe(label);
  });

  it('a peak of few turns takes the name that lies within its resolution', () => {
    expect(labelPeriod(520, 1 / 2000, named)).toBe('worm');
  });
});

it('the curve to draw keeps the height of a peak however few its points', () => {
  const t = times(3600, true);
  const random = new RandomSource(3);
  const ra = t.map((time) => 3 * Math.sin((2 * Math.PI * time) / 480) + 0.2 * random.normal());
  const dec = t.map(() => 0.2 * random.normal());
  const { curve } = runSpectrum(used(t, ra, dec), SPACING, []);
  const { periodsSeconds, raAmplitudeArcsec, decAmplitudeArcsec } = curve;
  const top = raAmplitudeArcsec.indexOf(Math.max(...raAmplitudeArcsec));
  expect(periodsSeconds.every((period, i) => i === 0 || period > periodsSeconds[i - 1]!)).toBe(
    true,
  );
  expect(periodsSeconds.length).toBeLessThanOrEqual(1200);
  // A line between two bins of the grid shows 2.6 to 10 % low (two to four bins a resolution width).
  expect(raAmplitudeArcsec[top]!).toBeGreaterThan(2.7);
  expect(Math.abs(periodsSeconds[top]! / 480 - 1)).toBeLessThan(0.05);
  expect(Math.max(...decAmplitudeArcsec)).toBeLessThan(0.1);
});

it('a constant series has no peak', () => {
  const t = times(100, false);
  expect(seriesPeaks(t, new Float64Array(100).fill(2), SPACING, [])).toEqual([]);
});
