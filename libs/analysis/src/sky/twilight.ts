import { altitudeDegrees } from './altitude';
import { hourAngleHours } from './hour-angle';
import { greenwichSiderealHours, julianDay } from './sidereal-time';
import { sunPosition } from './sun-position';

/** From the brightest: the sun is up; civil, nautical and astronomical twilight; the sky is dark. */
export const SKIES = ['day', 'civil', 'nautical', 'astronomical', 'dark'] as const;
export type Sky = (typeof SKIES)[number];

/**
 * Altitude of the sun's centre at which each of the first four skies ends. Its upper limb sets at −0°50′: 34′ of refraction
 * and 16′ of its own radius (Meeus, Astronomical Algorithms, 2nd ed., ch. 15). The twilights end at 6°, 12° and 18° below
 * the horizon (by definition).
 */
const LOWEST_ALTITUDES_DEGREES = [-50 / 60, -6, -12, -18] as const;

const STEP_SECONDS = 600;
/** The low-precision sun is good to 2 s in time; closer than this makes no sense. */
const CLOSE_SECONDS = 0.5;

export interface Place {
  /** North positive. */
  readonly latitudeDegrees: number;
  /** East of Greenwich positive. */
  readonly longitudeDegrees: number;
}

/** A stretch of one sky. */
export interface SkySpell {
  readonly sky: Sky;
  /** Seconds since 1970-01-01T00:00Z. */
  readonly fromEpochSeconds: number;
  readonly toEpochSeconds: number;
}

/**
 * Geometric altitude of the sun's centre, without refraction. O(1).
 *
 * @param epochSeconds Since 1970-01-01T00:00Z.
 * @returns Degrees above the horizon.
 */
export function sunAltitudeDegrees(epochSeconds: number, place: Place): number {
  const day = julianDay(epochSeconds);
  const { rightAscensionHours, declinationDegrees } = sunPosition(day);
  const hourAngle = hourAngleHours(
    greenwichSiderealHours(day),
    place.longitudeDegrees,
    rightAscensionHours,
  );
  return altitudeDegrees(place.latitudeDegrees, declinationDegrees, hourAngle);
}

/**
 * The skies of a place one after the other, from one instant to another; the whole stretch is covered without gap or overlap.
 * A sky that lasts less than ten minutes may be missed. O(length).
 *
 * @returns Empty when the stretch has no length.
 */
export function skySpells(
  place: Place,
  fromEpochSeconds: number,
  toEpochSeconds: number,
): SkySpell[] {
  const spells: SkySpell[] = [];
  let from = fromEpochSeconds;
  for (let at = fromEpochSeconds; at < toEpochSeconds;) {
    const next = Math.min(at + STEP_SECONDS, toEpochSeconds);
    // Several skies may end within a step where the sun is steep: each end is sought in what is left of it.
    let sky = skyAt(at, place);
    while (sky !== skyAt(next, place)) {
      const end = endOf(sky, at, next, place);
      spells.push({ sky, fromEpochSeconds: from, toEpochSeconds: end });
      [from, at] = [end, end];
      sky = skyAt(at, place);
    }
    at = next;
  }
  if (from < toEpochSeconds) {
    spells.push({ sky: skyAt(from, place), fromEpochSeconds: from, toEpochSeconds });
  }
  return spells;
}

function skyAt(epochSeconds: number, place: Place): Sky {
  const altitude = sunAltitudeDegrees(epochSeconds, place);
  const level = LOWEST_ALTITUDES_DEGREES.findIndex((lowest) => altitude >= lowest);
  return SKIES[level] ?? 'dark';
}

/** The first instant found at which a sky has ended, between one at which it lasts and one at which it does not. */
function endOf(sky: Sky, lastsAt: number, goneAt: number, place: Place): number {
  let [before, after] = [lastsAt, goneAt];
  while (after - before > CLOSE_SECONDS) {
    const middle = (before + after) / 2;
    if (skyAt(middle, place) === sky) before = middle;
    else after = middle;
  }
  return after;
}
