/**
 * Takes out what is left of correlation from frame to frame: the prediction-error filter of an autoregressive process,
 *
 *     out[n] = x[n] − Σ_j a_j x[n − j],
 *
 * with the coefficients fitted to a residual by Levinson's recursion on its autocovariance.
 *
 * @see G. E. P. Box, G. M. Jenkins, Time Series Analysis (1970), A3.2.
 */
export class ColourFilter {
  private constructor(private readonly coefficients: Float64Array) {}

  /** Passes everything through. */
  static none(): ColourFilter {
    return new ColourFilter(new Float64Array(0));
  }

  /** @param residual Mean 0, evenly spaced; 0 where a frame is missing. */
  static fittedTo(residual: Float64Array, order: number): ColourFilter {
    const covariance = new Float64Array(order + 1);
    for (let lag = 0; lag <= order; lag++) {
      let sum = 0;
      for (let n = lag; n < residual.length; n++)
        sum += (residual[n] ?? NaN) * (residual[n - lag] ?? NaN);
      covariance[lag] = sum;
    }
    return new ColourFilter(levinson(covariance));
  }

  /** In place, from the end: what a frame needs of the frames before it is still there. */
  apply(series: Float64Array): Float64Array {
    const { coefficients } = this;
    if (coefficients.length === 0) return series;
    for (let n = series.length - 1; n >= 0; n--) {
      let value = series[n] ?? NaN;
      const reach = Math.min(n, coefficients.length);
      for (let j = 1; j <= reach; j++)
        value -= (coefficients[j - 1] ?? NaN) * (series[n - j] ?? NaN);
      series[n] = value;
    }
    return series;
  }
}

function levinson(covariance: Float64Array): Float64Array {
  const order = covariance.length - 1;
  const coefficients = new Float64Array(order);
  let error = covariance[0] ?? NaN;
  for (let k = 0; k < order && error > 0; k++) {
    let reflection = covariance[k + 1] ?? NaN;
    for (let j = 0; j < k; j++) reflection -= (coefficients[j] ?? NaN) * (covariance[k - j] ?? NaN);
    reflection /= error;
    const before = coefficients.slice(0, k);
    coefficients[k] = reflection;
    for (let j = 0; j < k; j++) {
      coefficients[j] = (before[j] ?? NaN) - reflection * (before[k - 1 - j] ?? NaN);
    }
    error *= 1 - reflection * reflection;
  }
  return coefficients;
}
