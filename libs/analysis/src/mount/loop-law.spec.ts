import { describe, expect, it } from 'vitest';
import { RandomSource } from '../simulation/random-source';
import { guideAgain } from './guide-again';
import { loopLaw } from './loop-law';

const noise = (count: number, seed: number) => {
  const random = new RandomSource(seed);
  return Float64Array.from({ length: count }, () => random.normal());
};

describe('the law of a guider', () => {
  it('has the minimum move between errors answered and not', () => {
    const error = noise(2000, 1);
    const command = error.map((each) => (Math.abs(each) < 0.4 ? 0 : -0.7 * each));
    // Two in a hundred are left out at either end: a hundredth of a sigma here.
    expect(loopLaw(error, command, 0.7).minimumMoveArcsec).toBeCloseTo(0.4, 1);
  });

  it('has no minimum move where every error is answered', () => {
    const error = noise(500, 2);
    const law = loopLaw(
      error,
      error.map((each) => -each),
      1,
    );
    expect(law.minimumMoveArcsec).toBe(0);
    expect(law.maximumArcsec).toBe(Infinity);
  });

  it('has a maximum where the largest command comes again and again', () => {
    const error = noise(2000, 3);
    const command = error.map((each) => Math.max(-1, Math.min(1, -each)));
    expect(loopLaw(error, command, 1).maximumArcsec).toBe(1);
  });
});

describe('guiding again', () => {
  const law = { gain: 0.5, minimumMoveArcsec: 0, maximumArcsec: Infinity };

  it('halves a standing error from frame to frame at gain 0.5 (by hand)', () => {
    const starArcsec = Float64Array.of(8, 8, 8, 8);
    expect([...guideAgain({ starArcsec, law, gapArcsec: 0, everyFrames: 1 })]).toEqual([
      8, 4, 2, 1,
    ]);
  });

  it('leaves frames between corrections as they are (by hand)', () => {
    const starArcsec = Float64Array.of(8, 8, 8, 8);
    expect([...guideAgain({ starArcsec, law, gapArcsec: 0, everyFrames: 2 })]).toEqual([
      8, 4, 4, 2,
    ]);
  });

  it('moves the star only past half the gap, from its middle (by hand)', () => {
    const starArcsec = Float64Array.of(8, 8, 8);
    expect([...guideAgain({ starArcsec, law, gapArcsec: 2, everyFrames: 1 })]).toEqual([8, 5, 2.5]);
  });

  it('does nothing without a star', () => {
    const starArcsec = Float64Array.of(8, NaN, 8);
    expect([...guideAgain({ starArcsec, law, gapArcsec: 0, everyFrames: 1 })]).toEqual([8, NaN, 4]);
  });

  it('turns white noise into 2/(2 − k) of its variance (checks.json 11.7, derived)', () => {
    const starArcsec = noise(40000, 4);
    const error = guideAgain({
      starArcsec,
      law: { ...law, gain: 0.7 },
      gapArcsec: 0,
      everyFrames: 1,
    });
    const mean = error.reduce((sum, each) => sum + each * each, 0) / error.length;
    expect(Math.sqrt(mean) / 1.2403473458920844).toBeCloseTo(1, 1); // 1 % by the number of frames
  });
});
