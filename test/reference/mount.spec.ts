import {
  type BudgetPart,
  bestGain,
  errorLag1,
  type LoopFrames,
  RandomSource,
  totalMeasures,
} from '@stillpier/analysis';
import { describe, expect, it } from 'vitest';
import { USUAL_KEEP_ASPECT } from '../../libs/analysis/src/analyse-run';
import { budgetByError } from '../../libs/analysis/src/mount/budget-by-error';
import { foldedCurve } from '../../libs/analysis/src/mount/folded-curve';
import { guideAgain } from '../../libs/analysis/src/mount/guide-again';
import { expectedPerUnit } from '../../libs/analysis/src/mount/response';
import { curveMeasures } from '../../libs/analysis/src/mount/worm-curve';
import { allowed, check, type Entry } from './checks';

const agrees = (got: number, expected: number, { tolerance, title }: Entry<unknown, unknown>) => {
  expect(Math.abs(got - expected), title).toBeLessThanOrEqual(allowed(tolerance, expected));
};
const count = 3000;
const times = Float64Array.from({ length: count }, (_, i) => i);
const used = (errors: Float64Array) => ({
  frame: Int32Array.from(times),
  timeSeconds: times,
  raErrorArcsec: errors,
  decErrorArcsec: errors,
});

describe('the mount', () => {
  it('answers a millisecond of correction by rate and declination (3.6)', () => {
    const entry = check('3.6') as Entry<
      { fraction: number; dec_deg: number },
      { ra_arcsec_per_ms: number; dec_arcsec_per_ms: number }
    >;
    const { fraction, dec_deg } = entry.inputs;
    const cosine = Math.cos((dec_deg * Math.PI) / 180);
    agrees(expectedPerUnit('ms', fraction, cosine)!, entry.expected.ra_arcsec_per_ms, entry);
    agrees(expectedPerUnit('ms', fraction, 1)!, entry.expected.dec_arcsec_per_ms, entry);
  });

  it('runs fastest on a sine by 2πA/T (3.7)', () => {
    const entry = check('3.7') as Entry<
      { A_arcsec: number; T_s: number },
      { peak_rate_arcsec_s: number }
    >;
    const { A_arcsec: amplitude, T_s: period } = entry.inputs;
    const line = { frequency: 1 / period, cosine: 0, sine: amplitude, amplitude, standardError: 0 };
    agrees(curveMeasures([line]).steepest, entry.expected.peak_rate_arcsec_s, entry);
  });

  it('is folded by its worm at the phases of 8.9', () => {
    const entry = check('8.9') as Entry<{ t: number[]; P: number }, { phase: number[] }>;
    entry.inputs.t.forEach((time, i) => {
      const curve = foldedCurve(Float64Array.of(time), Float64Array.of(1), entry.inputs.P);
      const bin = curve.find(({ medianArcsec }) => medianArcsec === 1)!;
      // A bin is a 72nd of a turn wide.
      expect(Math.abs(bin.phase - entry.expected.phase[i]!), entry.title).toBeLessThanOrEqual(
        0.5 / 72,
      );
    });
  });
});

describe('the variance of an error (7.6)', () => {
  const entry = check('7.6') as Entry<{ L: number; A: number }, { drift: number; sinus: number }>;
  const partOf = (errors: Float64Array, amplitude: number, name: BudgetPart) => {
    const peaks = [
      {
        periodSeconds: 300,
        amplitudeArcsec: amplitude,
        share: 1,
        falseAlarmProbability: 0,
        label: null,
      },
    ];
    const { parts } = budgetByError(used(errors), errors, 1, peaks, 'not told');
    return parts.find(({ part }) => part === name)!.rmsArcsec ** 2;
  };

  it('is L²/12 for a steady drift', () => {
    const drift = times.map((time) => (entry.inputs.L * time) / (count - 1));
    // 3000 samples of a straight line have (n + 1)/(n − 1) of its variance.
    agrees(partOf(drift, 0, 'drift'), (entry.expected.drift * (count + 1)) / (count - 1), {
      ...entry,
      tolerance: { rel: 1e-9 },
    });
  });

  it('is A²/2 for a sine', () => {
    const sine = times.map((time) => entry.inputs.A * Math.cos((2 * Math.PI * time) / 300));
    agrees(partOf(sine, entry.inputs.A, 'periodic error'), entry.expected.sinus, {
      ...entry,
      // Ten turns of a cosine carry a slope of next to nothing, which the drift takes.
      tolerance: { rel: 1e-3 },
    });
  });
});

describe('the star', () => {
  it('stays within 2.45 sigma of the lock position in 95 of 100 frames (7.7)', () => {
    const entry = check('7.7') as Entry<{ sigma: number }, { r95: number }>;
    const random = new RandomSource(77);
    const normal = () => Float64Array.from({ length: 100_000 }, () => random.normal());
    const axis = {
      meanArcsec: 0,
      rmsArcsec: entry.inputs.sigma,
      rmsAboutLockArcsec: entry.inputs.sigma,
      peakToPeakArcsec: 0,
      p95Arcsec: 0,
      driftArcsecPerMinute: 0,
      driftStandardError: 0,
      lag1: 0,
    };
    const frames = { ...used(times), raErrorArcsec: normal(), decErrorArcsec: normal() };
    const { p95Arcsec } = totalMeasures(frames, axis, axis, null);
    // sqrt(0.05 · 0.95 / n) over the density 0.1224 there: 0.0056; four of these.
    agrees(p95Arcsec, entry.expected.r95, { ...entry, tolerance: { abs: 0.023 } });
  });

  it('is kept by an aspect between what passes for round and for long (7.8)', () => {
    const { expected } = check('7.8') as Entry<
      unknown,
      { round_below_aspect: number; long_above_aspect: number }
    >;
    expect(USUAL_KEEP_ASPECT).toBeGreaterThan(expected.round_below_aspect);
    expect(USUAL_KEEP_ASPECT).toBeLessThan(expected.long_above_aspect);
  });
});

describe('a loop that is guided again', () => {
  it('forgets a jump by the part 1 − k a frame (11.2a)', () => {
    const entry = check('11.2a') as Entry<{ k: number[] }, { pole: number[] }>;
    entry.inputs.k.forEach((gain, i) => {
      const error = guideAgain({
        starArcsec: new Float64Array(3).fill(1),
        law: { gain, minimumMoveArcsec: 0, maximumArcsec: Infinity },
        gapArcsec: 0,
        everyFrames: 1,
      });
      agrees(error[1]!, entry.expected.pole[i]!, { ...entry, tolerance: { abs: 1e-12 } });
      agrees(error[2]!, entry.expected.pole[i]! ** 2, { ...entry, tolerance: { abs: 1e-12 } });
    });
  });

  it('leaves a white error at the best gain (11.6)', () => {
    const entry = check('11.6') as Entry<{ s: number }, { rho1_at_best_gain: number }>;
    const step = Math.sqrt(entry.inputs.s);
    const gain = bestGain({ noise: 1, step, driftPerFrame: 0, lines: [] });
    const random = new RandomSource(116);
    let place = 0;
    const starArcsec = Float64Array.from({ length: 40_000 }, () => {
      place += step * random.normal();
      return place + random.normal();
    });
    const law = { gain, minimumMoveArcsec: 0, maximumArcsec: Infinity };
    const errorArcsec = guideAgain({ starArcsec, law, gapArcsec: 0, everyFrames: 1 });
    const frames: LoopFrames = {
      errorArcsec,
      setAside: new Uint8Array(errorArcsec.length),
      timeSeconds: errorArcsec.map((_, n) => 2 * n),
      cadenceSeconds: 2,
    };
    // 40,000 frames tell an autocorrelation to 1/√N = 0.005; four of these.
    agrees(errorLag1(frames)!.lag1, entry.expected.rho1_at_best_gain, {
      ...entry,
      tolerance: { abs: 0.02 },
    });
  });
});
