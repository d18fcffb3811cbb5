import { logScale } from '../scale';

/** Amplitudes of both axes on one grid of periods, shortest first. */
export interface AmplitudeCurve {
  readonly periodSeconds: readonly number[];
  readonly raAmplitudeArcsec: readonly number[];
  readonly decAmplitudeArcsec: readonly number[];
}

const PX_PER_STEP = 1.5;

/** The greatest amplitude of each axis in every 1.5 px of a logarithmic axis, so that no narrow peak is lost. */
export function peakHeld(curve: AmplitudeCurve, widthPx: number): AmplitudeCurve {
  const order = [...curve.periodSeconds.keys()].sort(
    (a, b) => (curve.periodSeconds[a] ?? 0) - (curve.periodSeconds[b] ?? 0),
  );
  const shortest = curve.periodSeconds[order[0] ?? -1];
  const longest = curve.periodSeconds[order.at(-1) ?? -1];
  if (shortest === undefined || longest === undefined || shortest === longest) return curve;
  const scale = logScale([shortest, longest], [0, widthPx]);
  const periodSeconds: number[] = [];
  const raAmplitudeArcsec: number[] = [];
  const decAmplitudeArcsec: number[] = [];
  let lastStep = NaN;
  for (const index of order) {
    const period = curve.periodSeconds[index] ?? NaN;
    const ra = curve.raAmplitudeArcsec[index] ?? 0;
    const dec = curve.decAmplitudeArcsec[index] ?? 0;
    const step = Math.floor(scale(period) / PX_PER_STEP);
    const at = periodSeconds.length - 1;
    if (step === lastStep) {
      // The held point sits at the period of its stronger axis, so that a peak keeps its place.
      const heldRa = raAmplitudeArcsec[at] ?? 0;
      const heldDec = decAmplitudeArcsec[at] ?? 0;
      if (Math.max(ra, dec) > Math.max(heldRa, heldDec)) periodSeconds[at] = period;
      raAmplitudeArcsec[at] = Math.max(heldRa, ra);
      decAmplitudeArcsec[at] = Math.max(heldDec, dec);
    } else {
      periodSeconds.push(period);
      raAmplitudeArcsec.push(ra);
      decAmplitudeArcsec.push(dec);
      lastStep = step;
    }
  }
  return { periodSeconds, raAmplitudeArcsec, decAmplitudeArcsec };
}
