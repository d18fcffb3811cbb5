import { type ColumnMap, type GuideLog } from '@stillpier/guide-log';

// Small guide logs for the specs of the reader.

export const utf8 = (text: string) => new TextEncoder().encode(text);
export const utf16 = (text: string, littleEndian: boolean) => {
  const bytes = new DataView(new ArrayBuffer(text.length * 2));
  for (let at = 0; at < text.length; at++)
    bytes.setUint16(at * 2, text.charCodeAt(at), littleEndian);
  return new Uint8Array(bytes.buffer);
};
export const latin = (text: string) => Uint8Array.from(text, (letter) => letter.charCodeAt(0));

export const THREE_COLUMNS: ColumnMap = {
  columns: {
    '1': { role: 'time', unit: 'seconds' },
    '2': { role: 'raError', unit: 'arcsec' },
    '3': { role: 'decError', unit: 'arcsec' },
  },
};
export const timeIn = (unit: NonNullable<ColumnMap['columns']>[string]['unit']): ColumnMap => ({
  columns: { ...THREE_COLUMNS.columns, '1': { role: 'time', unit } },
});
export const withDirections: ColumnMap = {
  columns: {
    ...THREE_COLUMNS.columns,
    '4': { role: 'raCorrection', unit: 'ms' },
    '5': { role: 'raDirection' },
  },
};
export const HEADER = 'time s,ra error arcsec,dec error arcsec';

export interface Expected {
  time?: number[];
  ra?: number[];
  dec?: number[];
  refused?: [number, string][];
  warnings?: string[];
  delimiter?: string;
  decimal?: string;
  headerLine?: number | null;
  encoding?: string;
  unit?: string;
  start?: string | null;
  raCorrection?: number[] | null;
  state?: number[];
  runs?: string[];
  run?: number[];
}

export function seen(log: GuideLog): Required<Expected> {
  const { frames, reading } = log;
  const start = frames.startEpochSeconds;
  return {
    time: [...frames.timeSeconds],
    ra: [...frames.raError],
    dec: [...frames.decError],
    refused: reading.refused.map(({ line, reason }) => [line, reason]),
    warnings: reading.warnings,
    delimiter: reading.delimiter,
    decimal: reading.decimal,
    headerLine: reading.headerLine,
    encoding: reading.encoding,
    unit: frames.errorUnit,
    start: start === null ? null : new Date(start * 1000).toISOString(),
    raCorrection: frames.raCorrection && [...frames.raCorrection],
    state: [...(frames.state ?? [])],
    runs: [...frames.runNames],
    run: [...(frames.run ?? [])],
  };
}
