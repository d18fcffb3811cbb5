import { FRAME_STATES, type LogFrames, PIER_SIDES } from '../series/log-frames';
import { at } from '../statistics/at';

/** How a log is written down: the project's own header names, in several ways of writing numbers and times. */
export interface CsvDialect {
  readonly delimiter: ',' | ';' | '\t';
  readonly decimal: '.' | ',';
  readonly time: 'seconds' | 'timestamp';
  /** Arcsec for one guide pixel to write errors in pixels; null for arcsec. */
  readonly guidePixelArcsec: number | null;
  /** Decimals of errors. */
  readonly decimals: number;
  readonly state: boolean;
  readonly targets: boolean;
  readonly sky: boolean;
}

export const PLAIN_DIALECT: CsvDialect = {
  delimiter: ',',
  decimal: '.',
  time: 'seconds',
  guidePixelArcsec: null,
  decimals: 3,
  state: true,
  targets: true,
  sky: true,
};

interface Column {
  readonly header: string;
  cell(n: number): string;
}

/**
 * A guide log as CSV text, one line a frame, under the header names that are recognised without a map. A frame
 * without a star has blank errors. O(frames).
 */
export function toCsv(frames: LogFrames, dialect: CsvDialect): string {
  const columns = columnsOf(frames, dialect);
  const lines = [columns.map((column) => column.header).join(dialect.delimiter)];
  for (let n = 0; n < frames.count; n++) {
    lines.push(columns.map((column) => column.cell(n)).join(dialect.delimiter));
  }
  return lines.join('\n') + '\n';
}

function columnsOf(frames: LogFrames, dialect: CsvDialect): Column[] {
  const number = (
    header: string,
    values: ArrayLike<number>,
    decimals: number,
    scale = 1,
  ): Column => ({
    header,
    cell: (n) => written(at(values, n) * scale, decimals, dialect.decimal),
  });
  const pixel = dialect.guidePixelArcsec;
  const unit = pixel === null ? 'arcsec' : 'px';
  const scale = pixel === null ? 1 : 1 / pixel;
  const columns = [
    timeColumn(frames, dialect),
    number(`ra error ${unit}`, frames.raError, dialect.decimals, scale),
    number(`dec error ${unit}`, frames.decError, dialect.decimals, scale),
  ];
  const places = frames.correctionUnit === 'ms' ? 0 : 3;
  for (const [axis, correction] of [
    ['ra', frames.raCorrection],
    ['dec', frames.decCorrection],
  ] as const) {
    const header = `${axis} correction ${frames.correctionUnit}`;
    if (correction) columns.push(number(header, correction, places));
  }
  const { state, target, targetNames, declinationDegrees, hourAngleHours, pierSide } = frames;
  if (dialect.state && state) {
    columns.push({ header: 'state', cell: (n) => FRAME_STATES[at(state, n)] ?? '' });
  }
  if (dialect.targets && target) {
    columns.push({ header: 'target', cell: (n) => targetNames[at(target, n)] ?? '' });
  }
  if (dialect.sky) {
    if (declinationDegrees) columns.push(number('declination', declinationDegrees, 3));
    if (hourAngleHours) columns.push(number('hour angle h', hourAngleHours, 4));
    if (pierSide)
      columns.push({ header: 'pier side', cell: (n) => PIER_SIDES[at(pierSide, n)] ?? '' });
  }
  return columns;
}

function timeColumn(frames: LogFrames, dialect: CsvDialect): Column {
  const start = frames.startEpochSeconds;
  if (dialect.time === 'seconds' || start === null) {
    const cell = (n: number) => written(at(frames.timeSeconds, n), 2, dialect.decimal);
    return { header: 'time s', cell };
  }
  const instant = (n: number) => new Date(Math.round((start + at(frames.timeSeconds, n)) * 1000));
  return { header: 'timestamp', cell: (n) => instant(n).toISOString() };
}

function written(value: number, decimals: number, decimal: '.' | ','): string {
  return Number.isNaN(value) ? '' : value.toFixed(decimals).replace('.', decimal);
}
