import { at } from '../statistics/at';

/** What the spectrum figure draws: the highest amplitude of each axis in log-spaced steps of the period. */
export interface AmplitudeCurve {
  /** Ascending. */
  readonly periodsSeconds: Float64Array;
  readonly raAmplitudeArcsec: Float64Array;
  readonly decAmplitudeArcsec: Float64Array;
}

/**
 * Thins two amplitude spectra to a curve of at most `maxPoints` periods, evenly spaced in log period, each point the
 * highest amplitude between its borders, so that a peak keeps its height however few points are asked for. Steps that
 * hold no bin (long periods lie far apart) are left out. O(bins).
 *
 * @param stepHz Bin k is k · stepHz.
 * @param resolutionHz 1 / duration: the longest period drawn.
 * @param raSquared Squared amplitudes of RA, a value a bin.
 * @param decSquared The same of Dec.
 */
export function amplitudeCurve(
  stepHz: number,
  resolutionHz: number,
  raSquared: Float64Array,
  decSquared: Float64Array,
  maxPoints: number,
): AmplitudeCurve {
  const first = Math.max(1, Math.ceil(resolutionHz / stepHz));
  const last = raSquared.length - 1;
  const width = Math.log(last / first) / maxPoints || 1;
  const points: { period: number; ra: number; dec: number }[] = [];
  let from = last;
  while (from >= first) {
    // From high frequencies to low, so that periods ascend.
    const step = Math.floor(Math.log(last / from) / width);
    let ra = 0;
    let dec = 0;
    let k = from;
    while (k >= first && Math.floor(Math.log(last / k) / width) === step) {
      ra = Math.max(ra, at(raSquared, k));
      dec = Math.max(dec, at(decSquared, k));
      k--;
    }
    points.push({ period: 2 / ((from + k + 1) * stepHz), ra, dec });
    from = k;
  }
  return {
    periodsSeconds: Float64Array.from(points, ({ period }) => period),
    raAmplitudeArcsec: Float64Array.from(points, ({ ra }) => Math.sqrt(ra)),
    decAmplitudeArcsec: Float64Array.from(points, ({ dec }) => Math.sqrt(dec)),
  };
}
