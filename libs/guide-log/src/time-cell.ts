const CLOCK = /^(\d{1,2}):(\d{2})(?::(\d{2})(?:[.,](\d+))?)?$/;
const ISO = /^(\d{4})[-/](\d{2})[-/](\d{2})[T ](\S+?)\s*(Z|[+-]\d{2}:?(?:\d{2})?)?$/i;

export interface IsoTime {
  /** Since 1970-01-01T00:00Z; without a zone, as if the time were in UTC. */
  readonly epochSeconds: number;
  readonly hasZone: boolean;
}

/**
 * A date and time as ISO 8601 writes them (blank or T between, `/` for `-` allowed, seconds and zone may be missing),
 * or null. Only real dates and times are taken: 31 February is not one.
 */
export function readIsoTime(cell: string): IsoTime | null {
  const match = ISO.exec(cell.trim());
  if (!match) return null;
  const [, year, month, day, clock, zone] = match;
  const secondsOfDay = readClock(clock ?? '');
  const midnight = Date.UTC(Number(year), Number(month) - 1, Number(day));
  const date = new Date(midnight);
  const isRealDate = date.getUTCMonth() + 1 === Number(month) && date.getUTCDate() === Number(day);
  const offsetSeconds = zone === undefined ? 0 : readZone(zone);
  if (!isRealDate || Number.isNaN(secondsOfDay) || Number.isNaN(offsetSeconds)) return null;
  return {
    epochSeconds: midnight / 1000 + secondsOfDay - offsetSeconds,
    hasZone: zone !== undefined,
  };
}

/** Seconds since midnight of `21:40:07.25`, or NaN; 60 in the seconds is a leap second. */
export function readClock(text: string): number {
  const match = CLOCK.exec(text);
  if (!match) return NaN;
  const [, hour, minute, second = '0', fraction = '0'] = match;
  if (Number(hour) > 23 || Number(minute) > 59 || Number(second) > 60) return NaN;
  const whole = Number(hour) * 3600 + Number(minute) * 60 + Number(second);
  return whole + Number(`0.${fraction}`);
}

/** Offset of a zone from UTC in seconds, east positive. */
function readZone(zone: string): number {
  if (zone.toUpperCase() === 'Z') return 0;
  const hours = Number(zone.slice(1, 3));
  const minutes = Number(zone.slice(3).replace(':', '') || '0');
  if (hours > 14 || minutes > 59) return NaN;
  return (zone.startsWith('-') ? -1 : 1) * (hours * 3600 + minutes * 60);
}
