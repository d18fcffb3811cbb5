import { type RunSeries } from '../series/run-series';
import { fitBacklash, type PlayFit } from './backlash';
import { type CorrectionSign } from './correction-sign';
import { type UsedResponse } from './mount-motion';

export interface DecPlayInput {
  readonly sign: CorrectionSign | null;
  /** What RA rests on. */
  readonly ra: UsedResponse | null;
  readonly cosDeclination: number | null;
  /** What a unit of Dec correction should do by the rig. */
  readonly expected: number | null;
}

export interface DecPlay {
  readonly fit: PlayFit | { readonly why: string };
  /** The gap in units of the correction. */
  readonly widthUnits: number;
}

/** Rates of the two axes agree this well when the rig tells them (parts of the rate), */
const RIG_PRIOR = 0.05;
/** and when only the other axis does. */
const OTHER_AXIS_PRIOR = 0.1;
/** Without a declination the RA rate on the sky is but a guess of the Dec rate. */
const GUESS_PRIOR = 0.4;

/**
 * The Dec gap. What the log alone tells of the Dec response leans on the gap (little comes through a wide one), so the
 * response is held near what is known of it: the rig's rate, unless RA has contradicted that; else the RA response
 * by the declination, both axes being driven at one rate.
 */
export function findDecPlay(
  run: RunSeries,
  decCorrection: Float64Array | null,
  input: DecPlayInput,
): DecPlay {
  if (decCorrection === null) {
    return { fit: { why: 'The log has no Dec corrections.' }, widthUnits: 0 };
  }
  const rate = knownRate(input, run.correctionUnit);
  if (input.sign === null || rate === null) {
    const why = 'The direction or the response of the Dec corrections is not known.';
    return { fit: { why }, widthUnits: 0 };
  }
  const { perUnit, prior } = rate;
  const sign = input.sign.sign;
  const fit = fitBacklash({
    timeSeconds: run.timeSeconds,
    cadenceSeconds: run.cadenceSeconds,
    errorArcsec: run.decErrorArcsec,
    commandArcsec: decCorrection.map((given) => given * sign * perUnit),
    ditherFrames: run.ditherFrames,
    commandArcsecPerMs: run.correctionUnit === 'ms' ? perUnit : null,
    responsePrior: prior,
  });
  return { fit, widthUnits: 'why' in fit ? 0 : fit.commandWidthArcsec / perUnit };
}

function knownRate(
  { ra, cosDeclination, expected }: DecPlayInput,
  unit: 'ms' | 'arcsec',
): { readonly perUnit: number; readonly prior: number } | null {
  // without a declination RA reads lower than the rate by right
  const raContradicts = unit === 'ms' && cosDeclination !== null && ra?.from === 'log';
  if (expected !== null && !raContradicts) return { perUnit: expected, prior: RIG_PRIOR };
  if (ra === null) return expected === null ? null : { perUnit: expected, prior: GUESS_PRIOR };
  const perUnit = (ra.positivePerUnit + ra.negativePerUnit) / 2 / (cosDeclination ?? 1);
  const least = cosDeclination === null ? GUESS_PRIOR : OTHER_AXIS_PRIOR;
  return { perUnit, prior: Math.hypot(least, ra.relativeStandardError) };
}
