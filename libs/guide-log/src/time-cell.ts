import { type DateOrder } from './column-map';

const CLOCK = /^(\d{1,2}):(\d{2})(?::(\d{2})(?:[.,](\d+))?)?(?: ?([ap])m)?$/i;
const CLOCK_AND_ZONE = '(\\S+?(?: ?[ap]m)?)\\s*(Z|[+-]\\d{2}:?(?:\\d{2})?)?$';
const YEAR_FIRST = new RegExp(`^(\\d{4})[-/](\\d{2})[-/](\\d{2})[T ]${CLOCK_AND_ZONE}`, 'i');
const YEAR_LAST = new RegExp(`^(\\d{1,2})([-/.])(\\d{1,2})\\2(\\d{4})[T ]${CLOCK_AND_ZONE}`, 'i');

export interface DateTime {
  /** Since 1970-01-01T00:00Z; without a zone, as if the time were in UTC. */
  readonly epochSeconds: number;
  readonly hasZone: boolean;
}

/**
 * A date and time, or null: as ISO 8601 writes them (blank or T between, `/` for `-` allowed, seconds and zone may be
 * missing), or with the year last (`14/03/2026`, `14.3.2026`) where the order of day and month is known. The clock may
 * be one of twelve hours with AM or PM. Only real dates and times are taken: 31 February is not one.
 */
export function readDateTime(cell: string, order: DateOrder | null): DateTime | null {
  const text = cell.trim();
  const yearFirst = YEAR_FIRST.exec(text);
  if (yearFirst) {
    const [, year, month, day, clock, zone] = yearFirst;
    return dateTime(Number(year), Number(month), Number(day), clock, zone);
  }
  const yearLast = order === null ? null : YEAR_LAST.exec(text);
  if (!yearLast) return null;
  const [, first, , second, year, clock, zone] = yearLast;
  const [day, month] = order === 'day-month-year' ? [first, second] : [second, first];
  return dateTime(Number(year), Number(month), Number(day), clock, zone);
}

function dateTime(
  year: number,
  month: number,
  day: number,
  clock = '',
  zone: string | undefined,
): DateTime | null {
  const secondsOfDay = readClock(clock);
  const midnight = Date.UTC(year, month - 1, day);
  const date = new Date(midnight);
  const isRealDate = date.getUTCMonth() + 1 === month && date.getUTCDate() === day;
  const offsetSeconds = zone === undefined ? 0 : readZone(zone);
  if (!isRealDate || Number.isNaN(secondsOfDay) || Number.isNaN(offsetSeconds)) return null;
  return {
    epochSeconds: midnight / 1000 + secondsOfDay - offsetSeconds,
    hasZone: zone !== undefined,
  };
}

/** Seconds since midnight of `21:40:07.25` or `9:40:07 PM`, or NaN; 60 in the seconds is a leap second. */
export function readClock(text: string): number {
  const match = CLOCK.exec(text);
  if (!match) return NaN;
  const [, hour, minute, second = '0', fraction = '0', half] = match;
  const hours = half === undefined ? Number(hour) : hoursOfHalfDay(Number(hour), half);
  if (!(hours < 24) || Number(minute) > 59 || Number(second) > 60) return NaN;
  const whole = hours * 3600 + Number(minute) * 60 + Number(second);
  return whole + Number(`0.${fraction}`);
}

/** 12 AM is midnight, 12 PM noon. */
function hoursOfHalfDay(hour: number, half: string): number {
  if (hour < 1 || hour > 12) return NaN;
  return (hour % 12) + (half.toLowerCase() === 'p' ? 12 : 0);
}

/** Offset of a zone from UTC in seconds, east positive. */
function readZone(zone: string): number {
  if (zone.toUpperCase() === 'Z') return 0;
  const hours = Number(zone.slice(1, 3));
  const minutes = Number(zone.slice(3).replace(':', '') || '0');
  if (hours > 14 || minutes > 59) return NaN;
  return (zone.startsWith('-') ? -1 : 1) * (hours * 3600 + minutes * 60);
}
