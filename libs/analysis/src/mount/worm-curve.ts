import { type PeriodicError } from '../analysis-document';
import { type FittedLine } from './motion-line';
import { type WormFit } from './periodic-error';

const CURVE_POINTS = 1440;

/** Phase of A·cos(2π f t + phase), degrees in [0, 360). */
export function phaseDegrees(line: FittedLine): number {
  return ((((Math.atan2(-line.sine, line.cosine) * 180) / Math.PI) % 360) + 360) % 360;
}

/**
 * Peak to peak and steepest slope of the fitted curve over one turn (by 1440 points, a quarter of a degree), and
 * its RMS sqrt(Σ A² / 2), in the unit of the harmonics.
 */
export function curveMeasures(harmonics: readonly FittedLine[]) {
  let [lowest, highest, steepest] = [Infinity, -Infinity, 0];
  const first = harmonics[0]?.frequency ?? 1;
  for (let point = 0; point < CURVE_POINTS; point++) {
    let [value, slope] = [0, 0];
    for (const { frequency, cosine, sine } of harmonics) {
      const angle = (2 * Math.PI * (frequency / first) * point) / CURVE_POINTS;
      value += cosine * Math.cos(angle) + sine * Math.sin(angle);
      slope += 2 * Math.PI * frequency * (sine * Math.cos(angle) - cosine * Math.sin(angle));
    }
    lowest = Math.min(lowest, value);
    highest = Math.max(highest, value);
    steepest = Math.max(steepest, Math.abs(slope));
  }
  const square = harmonics.reduce((sum, line) => sum + line.amplitude ** 2 / 2, 0);
  return { peakToPeak: highest - lowest, rms: Math.sqrt(square), steepest };
}

/**
 * REPORT's PeriodicError.
 *
 * @param skyPerAxisAngle cos(declination), by which all is divided to give axis angles; null where it is not known.
 */
export function describePeriodicError(
  worm: WormFit,
  curve: PeriodicError['curve'],
  skyPerAxisAngle: number | null,
): PeriodicError {
  const scale = 1 / (skyPerAxisAngle ?? 1);
  const { peakToPeak, rms, steepest } = curveMeasures(worm.harmonics);
  const scaled = (value: number | null) => (value === null ? null : scale * value);
  return {
    periodSeconds: worm.periodSeconds,
    periodFrom: worm.periodFrom,
    peakToPeakArcsec: scale * peakToPeak,
    rmsArcsec: scale * rms,
    steepestArcsecPerSecond: scale * steepest,
    turns: worm.turns,
    atAxis: skyPerAxisAngle !== null,
    harmonics: worm.harmonics.map((line, k) => ({
      order: k + 1,
      periodSeconds: worm.periodSeconds / (k + 1),
      amplitudeArcsec: scale * line.amplitude,
      phaseDegrees: phaseDegrees(line),
      standardError: scale * line.standardError,
    })),
    curve: curve.map(({ phase, medianArcsec, q1Arcsec, q3Arcsec }) => ({
      phase,
      medianArcsec: scaled(medianArcsec),
      q1Arcsec: scaled(q1Arcsec),
      q3Arcsec: scaled(q3Arcsec),
    })),
  };
}
