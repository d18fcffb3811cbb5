import {
  lag1,
  leastSquares,
  linearTrend,
  mean,
  medianAbsoluteDeviation,
  MAD_TO_SIGMA,
  robustSigma,
  sampleDeviation,
  whiteLagLimit,
} from '@stillpier/analysis';
import { describe, expect, it } from 'vitest';
import { allowed, check, columns, type Entry } from './checks';

const within = (got: number, expected: number, tolerance: { rel?: number; abs?: number }) => {
  expect(Math.abs(got - expected)).toBeLessThanOrEqual(allowed(tolerance, expected));
};

describe('NIST StRD univariate', () => {
  // Relative tolerances: 1e-12, and what the rounding of the data to doubles allows for the last two (their spread is
  // 1e-7 and 1e-8 of their size): 1e-9 and 1e-8.
  const sets: [string, number][] = [
    ['michelso', 1e-12],
    ['mavro', 1e-12],
    ['lew', 1e-12],
    ['lottery', 1e-12],
    ['numacc1', 1e-12],
    ['numacc2', 1e-12],
    ['numacc3', 1e-9],
    ['numacc4', 1e-8],
  ];
  it.each(sets)('mean, deviation and lag-1 of %s are as certified within %d', (set, rel) => {
    const { inputs, expected, title } = check(`9.1.${set}`) as Entry<
      { data: string },
      { mean: number; sd: number; r1: number; n: number }
    >;
    const y = columns(inputs.data)['y']!;
    expect(y.length, title).toBe(expected.n);
    within(mean(y), expected.mean, { rel: 1e-12 });
    within(sampleDeviation(y), expected.sd, { rel });
    within(lag1(y), expected.r1, { rel });
  });

  it('a naive sum of squares misses NumAcc4: the tolerance is one that it can fail', () => {
    const y = columns('nist_numacc4.csv')['y']!;
    const sum = y.reduce((total, value) => total + value, 0);
    const squares = y.reduce((total, value) => total + value * value, 0);
    const naiveVariance = (squares - (sum * sum) / y.length) / (y.length - 1);
    expect(Math.abs(naiveVariance / 0.01 - 1)).toBeGreaterThan(2e-8);
  });
});

describe('NIST StRD Norris', () => {
  const { expected, tolerance, title } = check('9.2') as Entry<
    unknown,
    { b0: number; b1: number; sd_b0: number; sd_b1: number; resid_sd: number }
  >;
  const { x, y } = columns('nist_norris.csv') as { x: Float64Array; y: Float64Array };

  it(`the trend is as certified (${title})`, () => {
    const trend = linearTrend(x, y);
    within(trend.slope, expected.b1, tolerance);
    within(trend.intercept, expected.b0, tolerance);
    within(trend.slopeError!, expected.sd_b1, tolerance);
  });

  it(`least squares with a constant and a slope is as certified (${title})`, () => {
    const fit = leastSquares([new Float64Array(x.length).fill(1), x], y);
    within(fit.coefficients[0]!, expected.b0, tolerance);
    within(fit.coefficients[1]!, expected.b1, tolerance);
    within(Math.sqrt(fit.covariance[0]!), expected.sd_b0, tolerance);
    within(Math.sqrt(fit.covariance[3]!), expected.sd_b1, tolerance);
    within(Math.sqrt(fit.residualSquares / fit.freedom), expected.resid_sd, tolerance);
  });
});

describe('robust scale', () => {
  it('the factor and two worked series are as published', () => {
    const factor = check('9.4c') as Entry<unknown, { mad: number }>;
    within(MAD_TO_SIGMA, factor.expected.mad, factor.tolerance);
    const nine = check('9.4a') as Entry<{ x: number[] }, number>;
    // The published number uses the rounded factor 1.4826: 1.6e-6 from the exact one.
    expect(Math.abs(robustSigma(nine.inputs.x) - nine.expected), nine.title).toBeLessThan(5e-6);
    const six = check('9.4b') as Entry<{ x: number[] }, number>;
    within(medianAbsoluteDeviation(six.inputs.x), six.expected, six.tolerance);
  });
});

it('the limit of a white autocorrelation is 1.96 / √n', () => {
  const { inputs, expected, tolerance } = check('9.11') as Entry<{ N: number }, number>;
  within(whiteLagLimit(inputs.N), expected, tolerance);
});
