import type { ColumnUnit, GuideLogPreview } from '@stillpier/guide-log';
import type { ColumnChoice } from './intake';

const SECONDS_OF_UNIT: Partial<Record<ColumnUnit, (cell: string) => number>> = {
  seconds: Number,
  milliseconds: (cell) => Number(cell) / 1000,
  'epoch seconds': Number,
  'epoch milliseconds': (cell) => Number(cell) / 1000,
  iso: (cell) => Date.parse(cell.trim().replace(' ', 'T')) / 1000,
  clock: (cell) => cell.split(':').reduce((seconds, part) => seconds * 60 + Number(part), 0),
};

/** The usual time from frame to frame in the first lines; null where they do not tell. */
export function cadenceSeconds(
  preview: GuideLogPreview,
  choices: readonly ColumnChoice[],
): number | null {
  const column = choices.findIndex(({ role }) => role === 'time');
  const unit = choices[column]?.unit;
  const read = unit && SECONDS_OF_UNIT[unit];
  if (!read) return null;
  const times = preview.rows.map(({ cells }) => read((cells[column] ?? '').replace(',', '.')));
  const steps = times
    .slice(1)
    .map((time, i) => time - (times[i] ?? NaN))
    .filter((step) => step > 0)
    .sort((a, b) => a - b);
  return steps[Math.floor(steps.length / 2)] ?? null;
}
