import { type Peak, type Spectrum } from '../analysis-document';
import { type UsedFrames } from '../series/used-frames';
import { populationDeviation } from '../statistics/deviation';
import { amplitudeCurve, type AmplitudeCurve } from './amplitude-curve';
import { findLines } from './find-lines';
import { labelPeriod, type NamedPeriod } from './label-period';
import { type Periodogram, periodogram } from './periodogram';

export interface RunSpectrum {
  readonly spectrum: { readonly ra: Spectrum; readonly dec: Spectrum };
  readonly curve: AmplitudeCurve;
}

/** More points than a wide screen has columns tell nothing more. */
const CURVE_POINTS = 1200;

/**
 * Spectra of a run's two axes with their named peaks, and the curve to draw. O(n log n).
 *
 * @param used At least 30 frames.
 * @param cadenceSeconds Usual spacing of the run's frames.
 * @param named The periods that the rig names.
 */
export function runSpectrum(
  used: UsedFrames,
  cadenceSeconds: number,
  named: readonly NamedPeriod[],
): RunSpectrum {
  const { timeSeconds, raErrorArcsec, decErrorArcsec } = used;
  const shared = periodogram(timeSeconds, cadenceSeconds);
  const ra = shared.squaredAmplitudes(raErrorArcsec);
  const dec = shared.squaredAmplitudes(decErrorArcsec);
  const axis = (errors: Float64Array, power: Float64Array): Spectrum => ({
    peaks: namedPeaks(shared, timeSeconds, errors, power, named),
    method: shared.method,
  });
  return {
    spectrum: { ra: axis(raErrorArcsec, ra), dec: axis(decErrorArcsec, dec) },
    curve: amplitudeCurve(shared.stepHz, shared.resolutionHz, ra, dec, CURVE_POINTS),
  };
}

/**
 * Peaks of any series on a run's times: its guided error, or the motion that the mount made.
 *
 * @param timeSeconds n ascending times, n ≥ 30.
 * @param values n values in arcseconds, not all alike.
 */
export function seriesPeaks(
  timeSeconds: Float64Array,
  values: Float64Array,
  cadenceSeconds: number,
  named: readonly NamedPeriod[],
): Peak[] {
  const own = periodogram(timeSeconds, cadenceSeconds);
  return namedPeaks(own, timeSeconds, values, own.squaredAmplitudes(values), named);
}

function namedPeaks(
  spectrum: Periodogram,
  timeSeconds: Float64Array,
  values: Float64Array,
  power: Float64Array,
  named: readonly NamedPeriod[],
): Peak[] {
  const variance = populationDeviation(values) ** 2;
  if (variance === 0) return [];
  return findLines(spectrum, timeSeconds, values, power).map((line) => ({
    periodSeconds: line.periodSeconds,
    amplitudeArcsec: line.amplitude,
    share: Math.min(1, line.amplitude ** 2 / 2 / variance),
    falseAlarmProbability: line.falseAlarmProbability,
    label: labelPeriod(line.periodSeconds, spectrum.resolutionHz, named),
  }));
}
