import { type DateOrder } from './column-map';
import { readDateTime } from './time-cell';

/** `2026-03-14T`, `14/03/2026 ` */
const DATE_LENGTH = 11;
/** `2026-03-14T21:40:07` */
const SECONDS_END = 19;
const LONGEST_FRACTION = 9;

/**
 * A reader of dates with times in lines that follow each other: date and zone are read once and the rest of the time by
 * its characters, as long as they stay the same. It says the same as `readDateTime`, several times faster.
 *
 * @returns Cell to seconds since 1970-01-01T00:00Z, NaN where it is no time.
 */
export function isoTimeReader(order: DateOrder | null): (cell: string) => number {
  let date = '';
  let zone = '';
  let midnightSeconds = NaN;
  return (cell) => {
    if (cell.length >= SECONDS_END && date !== '' && cell.startsWith(date)) {
      const ofDay = secondsOfDay(cell, zone);
      if (ofDay >= 0) return midnightSeconds + ofDay;
    }
    const time = readDateTime(cell, order);
    if (time === null) return NaN;
    date = '';
    zone = /(?:Z|[+-][\d:]+)?$/i.exec(cell.slice(SECONDS_END))?.[0] ?? '';
    const ofDay = secondsOfDay(cell, zone);
    if (ofDay >= 0) {
      date = cell.slice(0, DATE_LENGTH);
      midnightSeconds = Math.round(time.epochSeconds - ofDay);
    }
    return time.epochSeconds;
  };
}

/** Seconds since midnight of `…T21:40:07.25` and the zone, by their places; -1 for anything else. */
function secondsOfDay(cell: string, zone: string): number {
  const hours = twoDigits(cell, DATE_LENGTH);
  const minutes = twoDigits(cell, DATE_LENGTH + 3);
  const seconds = twoDigits(cell, DATE_LENGTH + 6);
  const isClock =
    cell.charCodeAt(DATE_LENGTH + 2) === 58 && cell.charCodeAt(DATE_LENGTH + 5) === 58;
  if (!isClock || !(hours < 24 && minutes < 60 && seconds < 60)) return -1;
  let at = SECONDS_END;
  let fraction = 0;
  let parts = 1;
  if (cell.charCodeAt(at) === 46) {
    at++;
    for (let code = cell.charCodeAt(at); code >= 48 && code <= 57; code = cell.charCodeAt(++at)) {
      fraction = fraction * 10 + (code - 48);
      parts *= 10;
    }
    if (parts === 1 || at - SECONDS_END > LONGEST_FRACTION) return -1;
  }
  if (cell.length - at !== zone.length || !cell.endsWith(zone)) return -1;
  return hours * 3600 + minutes * 60 + seconds + fraction / parts;
}

/** NaN where there are no two digits. */
function twoDigits(cell: string, at: number): number {
  const tens = cell.charCodeAt(at) - 48;
  const ones = cell.charCodeAt(at + 1) - 48;
  return tens >= 0 && tens <= 9 && ones >= 0 && ones <= 9 ? tens * 10 + ones : NaN;
}
