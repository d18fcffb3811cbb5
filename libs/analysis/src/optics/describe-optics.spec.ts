import { describe, expect, it } from 'vitest';
import { describeOptics } from './describe-optics';
import { guideScaleLimit } from './guide-scale-limit';

describe('the optics of a rig', () => {
  it('are REPORT’s example', () => {
    const optics = describeOptics({
      imaging: { focalLengthMm: 530, apertureMm: 106, pixelUm: 3.76 },
      guiding: { focalLengthMm: 200, apertureMm: 50, pixelUm: 3.75, binning: 1 },
      seeingFwhmArcsec: 2,
    });
    // REPORT prints four or five digits (its ratio comes from rounded scales).
    expect(optics.imagingScaleArcsecPerPx).toBeCloseTo(1.4633, 4);
    expect(optics.guideScaleArcsecPerPx).toBeCloseTo(3.8675, 4);
    expect(optics.scaleRatio).toBeCloseTo(2.643, 3);
    expect(optics.focalLengthRatio).toBeCloseTo(0.3774, 4);
    expect(optics.dawesArcsec).toBeCloseTo(1.094, 3);
    // 1.22 λ/D is rounded up from 1.2197: 1.3053 against REPORT's 1.306 (checks.json 2.2b has the exact factor).
    expect(optics.rayleighArcsec).toBeCloseTo(1.3053, 4);
    expect(optics.seeingSamplingPx).toBeCloseTo(1.367, 3);
    expect(optics.whyMissing).toEqual({});
  });

  it('say what is missing for each figure that is not there', () => {
    const optics = describeOptics({ imaging: { focalLengthMm: 530 } });
    expect(optics.imagingScaleArcsecPerPx).toBeNull();
    expect(optics.whyMissing['imagingScaleArcsecPerPx']).toContain("imaging camera's pixel size");
    expect(Object.keys(optics.whyMissing)).toHaveLength(7);
  });
});

describe('the guide scale limit', () => {
  it('is a scale ratio of 3.33 for a tenth of a guide pixel (a third of an imaging pixel)', () => {
    const there = guideScaleLimit(2.64, 0.1);
    expect(there.largestScaleRatio).toBeCloseTo(10 / 3, 12);
    expect(there.seenErrorImagingPx).toBeCloseTo(0.264, 12);
    expect(there.staysUnder).toBe(true);
    expect(guideScaleLimit(4, 0.1).staysUnder).toBe(false);
  });
});
