import { type PolarAlignment } from '../analysis-document';
import {
  LARGEST_POLAR_DRIFT_PER_ARCMIN,
  RADIANS_PER_ARCMIN,
  RADIANS_PER_DEGREE,
  RADIANS_PER_HOUR,
} from '../sky/earth-rotation';
import { refractionDrift } from './refraction';

/** What one run tells of the polar axis. */
export interface RunDrift {
  /** Of the uncorrected Dec motion, refraction still in it. */
  readonly decDriftArcsecPerMinute: number;
  readonly standardError: number;
  /** One a frame, west positive; NaN where a frame tells none. Null when the log tells none. */
  readonly hourAngleHours: Float64Array | null;
  readonly declinationDegrees: number | null;
}

export interface SolvedPolarAlignment {
  /** One a run. */
  readonly runs: readonly PolarAlignment[];
  /** By keys below `polarAlignment`, the same for all runs. */
  readonly whyMissing: Readonly<Record<string, string>>;
}

/** With runs closer together in hour angle than this the two parts of the error drift the star alike. */
const SMALLEST_SPREAD_HOURS = 1;
/** A solution is shown when its standard error stays below half an arcminute, or a quarter of the total. */
const LARGEST_ERROR_ARCMIN = 0.5;
const LARGEST_ERROR_PART = 0.25;
/** Frames at which refraction is evaluated: it changes slowly. */
const REFRACTION_SAMPLES = 25;

/** Mean Dec drift that an arcminute of each part causes over a run, and the drift that is left for them. */
interface Equation {
  readonly perAzimuth: number;
  readonly perAltitude: number;
  readonly drift: number;
  readonly standardError: number;
  readonly meanHourAngle: number;
}

/**
 * Polar alignment from the Dec drift. For an axis off by az on the sky (east positive) and alt (up positive), in arcmin,
 *
 *     drift = −0.2625 ″/min · (alt · sin H + az · cos H),
 *
 * south of the equator with the other sign. One run gives 'at least' = |drift| / 0.2625; two or more runs at different
 * hour angles give both parts by weighted least squares. Refraction, for an axis that should stand on the true
 * pole, is taken off where latitude, declination and hour angle are known.
 *
 * @param latitudeDegrees null: the north is assumed for the signs of the solution, and the knob cannot be told.
 * @see checks.json 4.3, 4.7, 5.3 (derived).
 */
export function polarAlignment(
  runs: readonly RunDrift[],
  latitudeDegrees: number | null,
): SolvedPolarAlignment {
  const drifts = runs.map(
    (run) => run.decDriftArcsecPerMinute - (meanRefraction(run, latitudeDegrees) ?? 0),
  );
  const equations = runs.flatMap(
    (run, i) => equationOf(run, drifts[i] ?? 0, latitudeDegrees) ?? [],
  );
  const solved = solve(equations, latitudeDegrees);
  const reason = 'why' in solved ? { solved: solved.why } : knobReason(latitudeDegrees);
  return {
    runs: drifts.map((drift) => ({
      atLeastArcmin: Math.abs(drift) / LARGEST_POLAR_DRIFT_PER_ARCMIN,
      solved: 'why' in solved ? null : solved,
    })),
    whyMissing: reason,
  };
}

function knobReason(latitudeDegrees: number | null): Record<string, string> {
  if (latitudeDegrees !== null) return {};
  return {
    'solved.azimuthKnobArcmin':
      'The rig tells no latitude; the signs hold for a site north of the equator.',
  };
}

/** Mean Dec drift by refraction over a run; null where place or target are not known or the star stands too low. */
function meanRefraction(run: RunDrift, latitudeDegrees: number | null): number | null {
  const { declinationDegrees, hourAngleHours } = run;
  if (latitudeDegrees === null || declinationDegrees === null || hourAngleHours === null)
    return null;
  const step = Math.max(1, Math.floor(hourAngleHours.length / REFRACTION_SAMPLES));
  const drifts = hourAngleHours
    .filter((hours, n) => n % step === 0 && Number.isFinite(hours))
    .map((hours) => {
      const place = { latitudeDegrees, declinationDegrees, hourAngleHours: hours };
      return refractionDrift(place, 'true pole')?.northArcsecPerMinute ?? NaN;
    })
    .filter(Number.isFinite);
  return drifts.length === 0 ? null : meanOf(drifts);
}

function equationOf(run: RunDrift, drift: number, latitudeDegrees: number | null): Equation | null {
  const angles = run.hourAngleHours
    ?.filter(Number.isFinite)
    .map((hours) => hours * RADIANS_PER_HOUR);
  if (angles === undefined || angles.length === 0 || !(run.standardError > 0)) return null;
  const sine = meanOf(angles.map(Math.sin));
  const cosine = meanOf(angles.map(Math.cos));
  const largest = LARGEST_POLAR_DRIFT_PER_ARCMIN * ((latitudeDegrees ?? 0) < 0 ? -1 : 1);
  return {
    perAzimuth: -largest * cosine,
    perAltitude: -largest * sine,
    drift,
    standardError: run.standardError,
    meanHourAngle: Math.atan2(sine, cosine) / RADIANS_PER_HOUR,
  };
}

function solve(
  equations: readonly Equation[],
  latitudeDegrees: number | null,
): NonNullable<PolarAlignment['solved']> | { readonly why: string } {
  if (equations.length < 2) {
    return { why: 'Both parts of the polar error need two or more runs with known hour angles.' };
  }
  const hours = equations.map(({ meanHourAngle }) => meanHourAngle);
  const spread = Math.max(...hours.flatMap((a) => hours.map((b) => hoursApart(a, b))));
  if (spread < SMALLEST_SPREAD_HOURS) {
    return {
      why: `The runs lie within ${spread.toFixed(1)} h of hour angle: both parts of the polar error need ${SMALLEST_SPREAD_HOURS} h or more.`,
    };
  }
  const { azimuth, altitude, covariance } = leastSquaresParts(equations);
  const total = Math.hypot(azimuth, altitude);
  // First order in the misalignment is wrong by the misalignment itself, as a part of it (REFERENCE 4).
  const firstOrder = total * total * RADIANS_PER_ARCMIN;
  const standardError = Math.hypot(errorOfLength(azimuth, altitude, covariance), firstOrder);
  if (standardError > Math.max(LARGEST_ERROR_ARCMIN, LARGEST_ERROR_PART * total)) {
    return {
      why: `The drifts of these runs tell the polar error only within ${standardError.toFixed(1)} arcmin.`,
    };
  }
  return {
    azimuthArcmin: azimuth,
    altitudeArcmin: altitude,
    totalArcmin: total,
    standardErrorArcmin: standardError,
    azimuthKnobArcmin:
      latitudeDegrees === null ? null : azimuth / Math.cos(latitudeDegrees * RADIANS_PER_DEGREE),
  };
}

interface Covariance {
  readonly azimuth: number;
  readonly altitude: number;
  readonly both: number;
}

/** Weighted normal equations of two unknowns; three or more runs that disagree widen the errors. */
function leastSquaresParts(equations: readonly Equation[]) {
  let [aa, ah, hh, ad, hd] = [0, 0, 0, 0, 0];
  for (const { perAzimuth, perAltitude, drift, standardError } of equations) {
    const weight = 1 / standardError ** 2;
    aa += weight * perAzimuth ** 2;
    ah += weight * perAzimuth * perAltitude;
    hh += weight * perAltitude ** 2;
    ad += weight * perAzimuth * drift;
    hd += weight * perAltitude * drift;
  }
  const determinant = aa * hh - ah * ah;
  const azimuth = (hh * ad - ah * hd) / determinant;
  const altitude = (aa * hd - ah * ad) / determinant;
  const squares = equations.reduce((sum, { perAzimuth, perAltitude, drift, standardError }) => {
    const rest = drift - perAzimuth * azimuth - perAltitude * altitude;
    return sum + (rest / standardError) ** 2;
  }, 0);
  const freedom = equations.length - 2;
  const widened = freedom > 0 ? Math.max(1, squares / freedom) : 1;
  const covariance: Covariance = {
    azimuth: (widened * hh) / determinant,
    altitude: (widened * aa) / determinant,
    both: (-widened * ah) / determinant,
  };
  return { azimuth, altitude, covariance };
}

/** Standard error of hypot(azimuth, altitude) along its own direction. */
function errorOfLength(azimuth: number, altitude: number, covariance: Covariance): number {
  const angle = Math.atan2(altitude, azimuth);
  const [cosine, sine] = [Math.cos(angle), Math.sin(angle)];
  return Math.sqrt(
    cosine ** 2 * covariance.azimuth +
      sine ** 2 * covariance.altitude +
      2 * cosine * sine * covariance.both,
  );
}

function hoursApart(a: number, b: number): number {
  const apart = Math.abs(a - b) % 24;
  return Math.min(apart, 24 - apart);
}

function meanOf(values: Float64Array): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}
