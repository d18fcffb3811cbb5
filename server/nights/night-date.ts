const HALF_DAY_MS = 12 * 3600 * 1000;

/**
 * Date of the evening that an instant belongs to: a night lasts from noon to noon of the clock at the site, so that
 * half past one in the morning is still yesterday's night.
 */
export function nightDateOf(instant: Date, timeZone: string): string {
  return new Date(wallClockMs(instant, timeZone) - HALF_DAY_MS).toISOString().slice(0, 10);
}

/**
 * The instant at which the clock of a zone shows a time. `localMs` is that clock read as if it were UTC. In the hour
 * that autumn shows twice the first of the two is taken, and of the hour that spring leaves out the one after it.
 */
export function instantOfWallClock(localMs: number, timeZone: string): Date {
  const offsetMs = (at: number) => wallClockMs(new Date(at), timeZone) - at;
  const before = localMs - offsetMs(localMs - 2 * HALF_DAY_MS);
  const after = localMs - offsetMs(localMs + 2 * HALF_DAY_MS);
  const fitting = [before, after].filter((at) => at + offsetMs(at) === localMs);
  return new Date(fitting.length > 0 ? Math.min(...fitting) : before);
}

/** What the clock of a zone shows, read as if it were UTC. */
function wallClockMs(instant: Date, timeZone: string): number {
  const parts = new Intl.DateTimeFormat('en-u-ca-iso8601', {
    timeZone,
    hourCycle: 'h23',
    year: 'numeric',
    month: 'numeric',
    day: 'numeric',
    hour: 'numeric',
    minute: 'numeric',
    second: 'numeric',
  }).formatToParts(instant);
  const part = (type: Intl.DateTimeFormatPartTypes) =>
    Number(parts.find((each) => each.type === type)?.value);
  const toTheSecond = Date.UTC(
    part('year'),
    part('month') - 1,
    part('day'),
    part('hour'),
    part('minute'),
    part('second'),
  );
  return toTheSecond + (((instant.getTime() % 1000) + 1000) % 1000);
}
