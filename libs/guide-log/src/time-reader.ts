import { type DateOrder, type TimeUnit } from './column-map';
import { isoTimeReader } from './iso-time-reader';
import { readNumber } from './number-cell';
import { readClock } from './time-cell';

/** A time cell as seconds on the axis of its unit, or NaN: `seconds` and `epoch seconds` are as written. */
export function timeReader(
  unit: TimeUnit,
  decimalCode: number,
  order: DateOrder | null,
): (cell: string) => number {
  switch (unit) {
    case 'seconds':
    case 'epoch seconds':
      return (cell) => readNumber(cell, decimalCode);
    case 'milliseconds':
    case 'epoch milliseconds':
      return (cell) => readNumber(cell, decimalCode) / 1000;
    case 'iso':
      return isoTimeReader(order);
    case 'clock':
      return (cell) => readClock(cell.trim());
  }
}
