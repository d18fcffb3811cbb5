import { expect, it } from 'vitest';
import { axisMeasures, lag1OfNeighbours, totalMeasures } from './axis-measures';
import { lag1 } from '../statistics/autocorrelation';

const used = (ra: number[], dec: number[]) => ({
  frame: Int32Array.from(ra.keys()),
  timeSeconds: Float64Array.from(ra.keys(), (i) => 2 * i),
  raErrorArcsec: Float64Array.from(ra),
  decErrorArcsec: Float64Array.from(dec),
});

it('an axis has the measures of its definition', () => {
  // 0, 1, 2, … 100: mean 50, variance (101² − 1)/12, 95th percentile 95, half an arcsec a second.
  const ramp = Array.from({ length: 101 }, (_, i) => i);
  const frames = used(ramp, ramp);
  const axis = axisMeasures(frames, frames.raErrorArcsec);
  expect(axis.meanArcsec).toBe(50);
  expect(axis.rmsArcsec).toBeCloseTo(Math.sqrt((101 ** 2 - 1) / 12), 12);
  expect(axis.rmsAboutLockArcsec).toBeCloseTo(Math.hypot(axis.rmsArcsec, 50), 12);
  expect(axis.peakToPeakArcsec).toBe(100);
  expect(axis.p95Arcsec).toBe(95);
  expect(axis.driftArcsecPerMinute).toBeCloseTo(30, 10);
  expect(axis.driftStandardError).toBeCloseTo(0, 10);
});

it('the total adds the axes in squares and takes its radius from the lock position', () => {
  const frames = used(
    Array.from({ length: 40 }, (_, i) => (i % 2 ? 3 : -3)),
    Array.from({ length: 40 }, (_, i) => (i % 4 < 2 ? 4 : -4)),
  );
  const ra = axisMeasures(frames, frames.raErrorArcsec);
  const dec = axisMeasures(frames, frames.decErrorArcsec);
  const total = totalMeasures(frames, ra, dec, 2);
  expect(total).toEqual({ rmsArcsec: 5, rmsImagingPx: 2.5, p95Arcsec: 5, peakArcsec: 5 });
  expect(totalMeasures(frames, ra, dec, null).rmsImagingPx).toBeNull();
});

it('lag-1 is the definition of NIST StRD where no frame is missing', () => {
  const errors = Float64Array.of(1, 2, -1, 0.5, 3, -2);
  const frame = Int32Array.from(errors.keys());
  expect(lag1OfNeighbours(frame, errors)).toBeCloseTo(lag1(errors), 14);
});

it('lag-1 does not join the frames before and after a dither', () => {
  const errors = Float64Array.of(1, -1, 1, -1);
  expect(lag1OfNeighbours(Int32Array.of(0, 1, 10, 11), errors)).toBeLessThan(-0.6);
  expect(lag1OfNeighbours(Int32Array.of(0, 2, 4, 6), errors)).toBeNull();
  expect(lag1OfNeighbours(Int32Array.of(0, 1), Float64Array.of(2, 2))).toBeNull();
});
