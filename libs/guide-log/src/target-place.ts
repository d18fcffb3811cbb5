/** Hours of hour angle that pass in one second: 1.00273790935 sidereal days a day (IAU 1982, Aoki et al.). */
const HOUR_ANGLE_HOURS_PER_SECOND = 1.002_737_909_35 / 3600;

/** The map's declination for every frame, or null when the map says nothing. */
export function declinationsOf(
  timeSeconds: Float64Array,
  degrees: number | undefined,
): Float64Array | null {
  return degrees === undefined ? null : timeSeconds.map(() => degrees);
}

/** Hour angles of frames from that of the first one, in [-12, 12) hours, or null when the map says nothing. */
export function hourAnglesOf(
  timeSeconds: Float64Array,
  hoursAtFirst: number | undefined,
): Float64Array | null {
  if (hoursAtFirst === undefined) return null;
  return timeSeconds.map((seconds) =>
    withinHalfTurn(hoursAtFirst + seconds * HOUR_ANGLE_HOURS_PER_SECOND),
  );
}

function withinHalfTurn(hours: number): number {
  return ((((hours + 12) % 24) + 24) % 24) - 12;
}
