import { describe, expect, it } from 'vitest';
import { describeLoop, loopGain, noiseGain } from './loop';
import { RandomSource } from '../simulation/random-source';

const COUNT = 2000;
const random = new RandomSource(4);
const errorArcsec = Float64Array.from({ length: COUNT }, () => random.normal());
const frames = {
  errorArcsec,
  setAside: new Uint8Array(COUNT),
  timeSeconds: errorArcsec.map((_, n) => 2 * n),
  cadenceSeconds: 2,
};

describe('the gain of a loop', () => {
  it('is exact for a guider that answers in proportion', () => {
    const gain = loopGain(
      frames,
      errorArcsec.map((error) => -0.65 * error),
      0,
    );
    expect(gain!.gain).toBeCloseTo(0.65, 12);
  });

  it('does not mind a minimum move, a maximum, or frames set aside', () => {
    const commands = errorArcsec.map((error) => {
      const wanted = Math.abs(error) < 0.3 ? 0 : -0.65 * error;
      return Math.min(0.9, Math.max(-0.9, wanted));
    });
    const setAside = frames.setAside.map((_, n) => (n < 100 ? 2 : 0));
    commands.fill(5, 0, 99);
    expect(loopGain({ ...frames, setAside }, commands, 0)!.gain).toBeCloseTo(0.65, 12);
  });

  it('carries the error of the response', () => {
    const gain = loopGain(
      frames,
      errorArcsec.map((error) => -0.5 * error),
      0.04,
    );
    expect(gain!.standardError).toBeCloseTo(0.02, 9);
  });

  it('is not told by fewer than 20 answers', () => {
    const few = errorArcsec.map((error, n) => (n < 19 ? -error : 0));
    expect(loopGain(frames, few, 0)).toBeNull();
  });
});

describe('over-correction', () => {
  it('is a gain whose interval lies above 1', () => {
    const told = (gain: number, standardError: number) =>
      describeLoop(frames, { gain, standardError }, 0.5).overCorrecting;
    expect(told(1.1, 0.02)).toBe(true);
    expect(told(1.1, 0.1)).toBe(false);
    expect(told(0.7, 0.02)).toBe(false);
  });

  it('without a gain is a lag-1 autocorrelation significantly below −0.5', () => {
    const swinging = errorArcsec.map((error, n) => 0.3 * error + (n % 2 === 0 ? 1 : -1));
    const loop = describeLoop({ ...frames, errorArcsec: swinging }, null, null);
    expect(loop.overCorrecting).toBe(true);
    expect(describeLoop(frames, null, null).overCorrecting).toBe(false);
  });

  it('has no noise gain where the loop is not stable', () => {
    expect(noiseGain(2)).toBeNull();
    expect(noiseGain(1)).toBe(1); // k/(2−k) at k = 1, checks.json 11.3a.1.0, derived
  });
});
