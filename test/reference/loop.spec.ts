import {
  bestGain,
  errorLag1,
  type LoopFrames,
  noiseGain,
  pointingVariance,
  RandomSource,
  sensitivity,
  uncorrectedMotion,
} from '@stillpier/analysis';
import { describe, expect, it } from 'vitest';
import { allowed, check, columns, type Entry } from './checks';

const agrees = (got: number, expected: number, { tolerance, title }: Entry<unknown, unknown>) => {
  expect(Math.abs(got - expected), title).toBeLessThanOrEqual(allowed(tolerance, expected));
};
const quiet = { noise: 0, step: 0, driftPerFrame: 0, lines: [] };

describe('a guiding loop', () => {
  it('gives the open-loop motion back as in 11.1', () => {
    const entry = check('11.1') as Entry<
      { g_arcsec_per_ms: number },
      { max_abs_error: number; open_loop_ptp: number }
    >;
    const log = columns('synth_closed_loop.csv');
    const { residual_arcsec: error, pulse_ms: pulse, open_loop_arcsec: truth } = log;
    const moves = pulse!.map((ms) => ms * entry.inputs.g_arcsec_per_ms);
    const motion = uncorrectedMotion(error!, moves);
    const worst = motion.reduce((most, u, n) => Math.max(most, Math.abs(u - truth![n]!)), 0);
    agrees(worst, entry.expected.max_abs_error, entry);
    agrees(Math.max(...motion) - Math.min(...motion), entry.expected.open_loop_ptp, {
      ...entry,
      tolerance: { abs: 0.0005 }, // printed to three decimals
    });
  });

  it.each(['11.3a.0.2', '11.3a.0.5', '11.3a.0.7', '11.3a.1.0', '11.3a.1.5'])(
    'turns measurement noise into true motion as in %s',
    (id) => {
      const entry = check(id) as Entry<{ k: number }, { var_true: number }>;
      agrees((noiseGain(entry.inputs.k) ?? NaN) ** 2, entry.expected.var_true, entry);
      const variance = pointingVariance(entry.inputs.k, { ...quiet, noise: 1 });
      agrees(variance, entry.expected.var_true, entry);
    },
  );

  it.each(['11.3b.0.2', '11.3b.0.5', '11.3b.0.7', '11.3b.1.0', '11.3b.1.5'])(
    'follows random steps as in %s',
    (id) => {
      const entry = check(id) as Entry<{ k: number }, { var: number }>;
      agrees(pointingVariance(entry.inputs.k, { ...quiet, step: 1 }), entry.expected.var, entry);
    },
  );

  it.each(['11.3a.0.2', '11.3a.0.7', '11.3a.1.0', '11.3a.1.5'])(
    'leaves the lag-1 autocorrelation of %s in the measured error',
    (id) => {
      const entry = check(id) as Entry<{ k: number }, { rho1_meas: number }>;
      const got = errorLag1(noiseLoop(entry.inputs.k, 40_000));
      // 40,000 frames tell an autocorrelation to 1/√N = 0.005; four of these.
      agrees(got?.lag1 ?? NaN, entry.expected.rho1_meas, { ...entry, tolerance: { abs: 0.02 } });
    },
  );

  it.each(['11.5a', '11.5b', '11.5c'])('points best at the gain of %s', (id) => {
    const entry = check(id) as Entry<{ s: number }, number>;
    agrees(
      bestGain({ ...quiet, noise: 1, step: Math.sqrt(entry.inputs.s) }),
      entry.expected,
      entry,
    );
  });

  it('makes the true motion of 11.7 from noise', () => {
    const entry = check('11.7') as Entry<{ k: number }, { true: number }>;
    agrees(noiseGain(entry.inputs.k) ?? NaN, entry.expected.true, entry);
  });

  it.each(['11.8a', '11.8b', '11.8c'])('leaves of a slow sine the part of %s', (id) => {
    const entry = check(id) as Entry<{ k: number; period_frames: number }, number>;
    agrees(sensitivity(entry.inputs.k, entry.inputs.period_frames), entry.expected, entry);
  });

  it('neither damps nor amplifies the sine of 11.8d', () => {
    const entry = check('11.8d') as Entry<{ k: number }, { period_frames: number }>;
    agrees(sensitivity(entry.inputs.k, entry.expected.period_frames), 1, entry);
  });
});

/** Measured errors of an integrator fed with nothing but white noise. */
function noiseLoop(gain: number, count: number): LoopFrames {
  const random = new RandomSource(11);
  let pointing = 0;
  const errorArcsec = Float64Array.from({ length: count }, () => {
    const measured = pointing + random.normal();
    pointing -= gain * measured;
    return measured;
  });
  return {
    errorArcsec,
    setAside: new Uint8Array(count),
    timeSeconds: errorArcsec.map((_, n) => 2 * n),
    cadenceSeconds: 2,
  };
}
