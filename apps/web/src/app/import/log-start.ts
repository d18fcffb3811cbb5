import type { GuideLogPreview } from '@stillpier/guide-log';
import { dayText, instantOfLocalTime, localDateTimeText } from '../figures/clock';
import type { ColumnChoice } from './intake';

const HALF_DAY_MS = 12 * 3_600_000;

/** What is known of the time of a log's first frame; a person looks over it before it counts. */
export interface StartGuess {
  /** As a date and time field takes it; empty where the time of day is not known. */
  readonly local: string;
  /** Where it comes from, or what may help to fill it in. */
  readonly hint: string;
}

/** What may tell the date of a log. */
export interface LogOrigin {
  readonly name: string;
  /** When it was written, or came. */
  readonly lastModified: number;
  /** The evening that it was read to before. */
  readonly night?: string | undefined;
}

/**
 * The time of day from a clock column, in the night that it was read to before, on the date in the file's name, else on the
 * evening before it was written.
 */
export function guessStart(
  file: LogOrigin,
  preview: GuideLogPreview,
  choices: readonly ColumnChoice[],
  timeZone: string,
): StartGuess {
  const written = localDateTimeText(file.lastModified, timeZone);
  const clock = clockOfFirstFrame(preview, choices);
  if (clock === null) {
    return {
      local: '',
      hint: `The file was last written on ${dayText(written.slice(0, 10))} at ${written.slice(11, 16)}.`,
    };
  }
  if (file.night !== undefined) {
    const day = clock < '12' ? dayAfter(file.night) : file.night; // a night lasts from noon to noon
    return { local: `${day}T${clock}`, hint: 'The date is that of the night it was read to.' };
  }
  const named = /(20\d\d)[-_.]?(0[1-9]|1[0-2])[-_.]?(0[1-9]|[12]\d|3[01])/.exec(file.name);
  const evening = localDateTimeText(file.lastModified - HALF_DAY_MS, timeZone).slice(0, 10);
  return {
    local: `${named ? named.slice(1).join('-') : evening}T${clock}`,
    hint: named
      ? 'The date is taken from the name of the file: check it.'
      : 'The date is taken from when the file was last written: check it.',
  };
}

function dayAfter(date: string): string {
  return new Date(Date.parse(`${date}T00:00:00Z`) + 2 * HALF_DAY_MS).toISOString().slice(0, 10);
}

function clockOfFirstFrame(
  preview: GuideLogPreview,
  choices: readonly ColumnChoice[],
): string | null {
  const at = choices.findIndex(({ role, unit }) => role === 'time' && unit === 'clock');
  const cell = preview.rows[0]?.cells[at] ?? '';
  const [, hour, minute, second] = /^\s*(\d{1,2}):(\d{2}):(\d{2})/.exec(cell) ?? [];
  return hour && minute && second ? `${hour.padStart(2, '0')}:${minute}:${second}` : null;
}

/** The instant of a local date and time, as a column map has it; null for an empty or half-filled field. */
export function startTimeOf(local: string, timeZone: string): string | null {
  const instant = instantOfLocalTime(local, timeZone);
  return instant === null ? null : new Date(instant).toISOString();
}
