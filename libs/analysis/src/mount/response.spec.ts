import { describe, expect, it } from 'vitest';
import { type MotionFit } from './motion-fit';
import {
  chooseResponse,
  describeResponse,
  type EstimatedResponse,
  expectedPerUnit,
} from './response';

const estimate = (
  perUnit: number,
  standardError: number,
  halfDifference = 0,
): EstimatedResponse => ({
  perUnit,
  standardError,
  halfDifference,
  halfDifferenceError: 0.00005,
  directionError: standardError,
  fit: {} as MotionFit, // not read here
});
const RIG = { perUnit: 0.0075, isUpperLimit: false };
/** Guiders that answer 1 ″ with 100 ms. */
const ANSWER = 100;

describe('the expected response', () => {
  it('is that of the guide rate, by the declination', () => {
    // checks.json 3.6, derived: rate 0.5, declination 40°: 0.00576106 and 0.00752053 ″/ms.
    const cosine = Math.cos((40 * Math.PI) / 180);
    expect(expectedPerUnit('ms', 0.5, cosine)).toBeCloseTo(0.00576106, 8);
    expect(expectedPerUnit('ms', 0.5, 1)).toBeCloseTo(0.00752053, 8);
  });

  it('is one for corrections in arcsec, and unknown without rate or declination', () => {
    expect(expectedPerUnit('arcsec', undefined, null)).toBe(1);
    expect(expectedPerUnit('ms', undefined, 1)).toBeNull();
    expect(expectedPerUnit('ms', 0.5, null)).toBeNull();
  });
});

describe('the response that is used', () => {
  it("is the rig's while the log does not contradict it", () => {
    const used = chooseResponse(RIG, estimate(0.0079, 0.0002), ANSWER);
    expect(used).toMatchObject({ positivePerUnit: 0.0075, negativePerUnit: 0.0075, from: 'rig' });
  });

  it("is the log's when it lies beyond three standard errors", () => {
    expect(chooseResponse(RIG, estimate(0.0085, 0.0002), ANSWER)?.from).toBe('log');
    expect(chooseResponse(RIG, estimate(0.0042, 0.0002), ANSWER)?.from).toBe('log');
  });

  it("stays the rig's where correlated seeing would make the log read so low", () => {
    // Guiders that answer 1 ″ with 100 ms have a gain of 0.75 here: a quarter below 0.0075 is 0.0057.
    expect(chooseResponse(RIG, estimate(0.0058, 0.0002), ANSWER)?.from).toBe('rig');
    expect(chooseResponse(RIG, estimate(0.0052, 0.0002), ANSWER)?.from).toBe('log');
    // At a gain of 1.5 the same seeing takes 0.18/1.5 of it.
    expect(chooseResponse(RIG, estimate(0.0062, 0.0002), 2 * ANSWER)?.from).toBe('log');
  });

  it("is the log's where it reads below an upper limit, since the declination explains it", () => {
    const limit = { ...RIG, isUpperLimit: true };
    expect(chooseResponse(limit, estimate(0.006, 0.0002), ANSWER)?.from).toBe('log');
    expect(chooseResponse(limit, estimate(0.0073, 0.0002), ANSWER)?.from).toBe('rig');
  });

  it('keeps a clear difference between the directions', () => {
    const used = chooseResponse(RIG, estimate(0.0076, 0.0002, 0.00038), ANSWER);
    expect(used!.positivePerUnit).toBeCloseTo(0.0075 * 1.05, 9);
    expect(used!.negativePerUnit).toBeCloseTo(0.0075 * 0.95, 9);
  });

  it('is nothing when neither tells', () => {
    expect(chooseResponse(null, null, null)).toBeNull();
  });
});

describe("the document's response", () => {
  it('has no seconds for corrections in arcsec, but an asymmetry', () => {
    const told = describeResponse('arcsec', 1, estimate(1, 0.03, 0.05), null);
    expect(told).toMatchObject({ positiveArcsecPerSecond: null, standardError: null });
    expect(told.asymmetry).toBeCloseTo(0.1, 12);
  });
});
