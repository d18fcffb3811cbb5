import { SET_ASIDE_CODES } from '@stillpier/analysis';
import type { SeriesChannel } from '@stillpier/contract';
import Papa from 'papaparse';
import type { RunModel } from '../nights/run-model';

export const CSV_CHANNELS = [
  'raError',
  'decError',
  'raCorrection',
  'decCorrection',
  'setAside',
] as const satisfies readonly SeriesChannel[];

/** A piece of a run's frames, a value a frame in each. */
export interface FramesPiece {
  /** Since the first frame of the run. */
  readonly timeSeconds: Float64Array;
  readonly channels: Readonly<Record<(typeof CSV_CHANNELS)[number], Float32Array>>;
}

export type CsvRun = Pick<RunModel, 'runIndex' | 'target' | 'startsAt' | 'correctionUnit'>;

/** In the words of the reader's state column. What was set aside by hand the reader keeps aside as `ignore`. */
const STATE_WORDS: Record<(typeof SET_ASIDE_CODES)[number], string> = {
  kept: 'guiding',
  dither: 'dither',
  settling: 'settling',
  'star lost': 'star lost',
  'by hand': 'ignore',
};

/** The header line: words that the reader knows, so that the file can be read in again. */
export function csvHeader(correctionUnit: CsvRun['correctionUnit']): string {
  const corrections =
    correctionUnit === null
      ? []
      : [`ra correction ${correctionUnit}`, `dec correction ${correctionUnit}`];
  return toCsv([
    ['timestamp', 'ra error arcsec', 'dec error arcsec', ...corrections, 'state', 'run', 'target'],
  ]);
}

/** The lines of a piece. A value that is not there is a blank cell. */
export function csvLines(run: CsvRun, { timeSeconds, channels }: FramesPiece): string {
  const startMs = run.startsAt.getTime();
  const corrections =
    run.correctionUnit === null ? [] : [channels.raCorrection, channels.decCorrection];
  const rows = Array.from(timeSeconds, (seconds, i) => [
    new Date(startMs + Math.round(seconds * 1000)).toISOString(),
    asWritten(channels.raError[i]),
    asWritten(channels.decError[i]),
    ...corrections.map((samples) => asWritten(samples[i])),
    STATE_WORDS[SET_ASIDE_CODES[channels.setAside[i] ?? 0] ?? 'kept'],
    run.runIndex,
    run.target ?? '',
  ]);
  return rows.length === 0 ? '' : toCsv(rows);
}

/** A text that a spreadsheet would take for a formula gets an apostrophe; numbers stay numbers. */
function toCsv(rows: (string | number | null)[][]): string {
  return `${Papa.unparse(rows, { newline: '\n', escapeFormulae: true })}\n`;
}

/** The shortest decimal number that is the same single-precision float: 0.8 and not 0.800000011920929. */
export function asWritten(sample: number | undefined): number | null {
  if (sample === undefined || Number.isNaN(sample)) return null;
  for (let digits = 6; digits < 9; digits++) {
    const short = Number(sample.toPrecision(digits));
    if (Math.fround(short) === sample) return short;
  }
  return Number(sample.toPrecision(9));
}
