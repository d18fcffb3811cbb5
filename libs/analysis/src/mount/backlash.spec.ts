import { describe, expect, it } from 'vitest';
import { type NightScenario, PLAIN_NIGHT } from '../simulation/night-scenario';
import { simulateNight } from '../simulation/simulate-night';
import { type BacklashInput, fitBacklash, type PlayFit, reversalsOf } from './backlash';

const DITHER = 1;

/** A simulated night as the fit takes it, with the response that the simulator knows. */
function nightInput(scenario: NightScenario, seed: number, responsePrior: number): BacklashInput {
  const { frames, truth } = simulateNight(scenario, seed);
  const perMs = truth.dec.response[0]!.positive / 1000;
  return {
    timeSeconds: frames.timeSeconds,
    cadenceSeconds: scenario.cadenceSeconds,
    errorArcsec: frames.decError,
    commandArcsec: frames.decCorrection!.map((ms) => ms * perMs),
    ditherFrames: [...frames.state!].flatMap((state, n) => (state === DITHER ? [n] : [])),
    commandArcsecPerMs: perMs,
    responsePrior,
  };
}

const withGap = (decBacklashArcsec: number, more: Partial<NightScenario> = {}): NightScenario => ({
  ...PLAIN_NIGHT,
  ...more,
  drive: { ...PLAIN_NIGHT.drive, ...more.drive, decBacklashArcsec },
});

const POLAR = { polar: { azimuthArcmin: 3, altitudeArcmin: 2 } };
const DITHERS = { dithers: { everySeconds: 300, sizeArcsec: 4, settledArcsec: 1.5 } };
const ROUGH = {
  drive: { ...PLAIN_NIGHT.drive, decWandering: { sigmaArcsec: 0.5, memorySeconds: 120 } },
};
const SEEDS = [1, 2, 3, 4];

const fitted = (scenario: NightScenario, prior: number) =>
  SEEDS.map((seed) => fitBacklash(nightInput(scenario, seed, prior)) as PlayFit);

describe('Dec backlash on simulated nights', () => {
  it.each([
    ['a plain night', {}],
    ['a polar error', POLAR],
    ['dithers and a polar error', { ...POLAR, ...DITHERS }],
    ['a rough drive', ROUGH],
  ])('finds gaps of 1 and 3 arcsec through %s, with a known guide rate', (_, more) => {
    for (const gap of [1, 3]) {
      for (const fit of fitted(withGap(gap, more), 0.03)) {
        // SCIENCE 7 asks for 15 % or 0.4 arcsec; with the guide rate known it reaches 15 % at 1 arcsec.
        expect(Math.abs(fit.arcsec - gap)).toBeLessThan(0.15);
        expect(fit.determined).toBe(true);
        expect(fit.ms! / (1000 / 7.52)).toBeCloseTo(gap, 0); // 0.5 · 15.04 arcsec a second
      }
    }
  });

  it('finds it within 0.4 arcsec when the response is free by a third', () => {
    for (const fit of fitted(withGap(3, { ...POLAR, ...DITHERS }), 0.3)) {
      expect(Math.abs(fit.arcsec - 3)).toBeLessThan(0.45); // SCIENCE 7: 15 %
    }
  });

  it.each([
    ['a plain night', {}],
    ['a polar error', POLAR],
    ['a rough drive', ROUGH],
    [
      'correlated seeing',
      { seeing: { whiteSigmaArcsec: 0.4, correlated: { sigmaArcsec: 0.3, memorySeconds: 4 } } },
    ],
  ])('sees no gap where there is none: %s', (_, more) => {
    const fits = fitted(withGap(0, more), 0.03);
    expect(fits.filter(({ determined }) => determined)).toEqual([]);
    for (const fit of fits) expect(fit.high).toBeLessThan(0.4); // a limit below SCIENCE 7's tolerance
  });

  it('an interval holds its value', () => {
    for (const fit of fitted(withGap(1), 0.03)) {
      expect(fit.low).toBeLessThanOrEqual(fit.arcsec);
      expect(fit.high).toBeGreaterThanOrEqual(fit.arcsec);
    }
  });
});

describe('what cannot be told', () => {
  it('says how few reversals there were', () => {
    const input = nightInput(withGap(1), 1, 0.03);
    const oneWay = { ...input, commandArcsec: input.commandArcsec.map(Math.abs) };
    expect(fitBacklash(oneWay)).toEqual({ why: expect.stringContaining('0 times') as string });
  });

  it('says when the star does not follow', () => {
    const input = nightInput(withGap(0), 1, 1);
    const deaf = { ...input, commandArcsec: input.commandArcsec.map((_, n) => Math.sin(n * n)) };
    const fit = fitBacklash(deaf);
    expect('why' in fit ? fit.why : fit.determined).not.toBe(true);
  });

  it('says so when the Dec error never changes', () => {
    const input = nightInput(withGap(0), 1, 0.05);
    const still = { ...input, errorArcsec: input.errorArcsec.map(() => 0.3) };
    expect(fitBacklash(still)).toEqual({ why: expect.stringContaining('not follow') as string });
  });

  it('counts reversals past frames without a correction (by hand)', () => {
    expect(reversalsOf(Float64Array.of(1, 0, -1, -2, 0, 0, 3, 3, -1))).toBe(3);
  });
});
