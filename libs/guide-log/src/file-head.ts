import { type ColumnMap } from './column-map';
import { type ColumnPlan, planColumns } from './column-plan';
import { type DecodedText } from './decoded-text';
import { type DateReading, findDateOrder } from './date-order';
import { type Dialect, sniffDialect } from './dialect';
import { GuideLogError } from './guide-log-error';
import { type LineEnds } from './line-ends';
import { RowSplitter } from './row-splitter';

/** The dialect is found from this many bytes, in the preview and in the whole file alike. */
export const HEAD_BYTES = 65_536;

/** More control characters than one in this many: the file holds something else than text. */
const CHARACTERS_PER_CONTROL = 200;

/**
 * Text of the first bytes.
 *
 * @throws {GuideLogError} `empty`, `binary`.
 */
export function decodeHead(
  head: Uint8Array,
  isWholeFile: boolean,
  decoded: DecodedText,
  lineEnds: LineEnds,
): string {
  if (head.length === 0) throw new GuideLogError('empty', 'The file is empty.');
  const text = lineEnds.push(decoded.push(head));
  // eslint flags control characters in a pattern: here they are what is looked for, so they are counted by code.
  let controls = 0;
  const end = lengthWithoutZeros(text);
  for (let at = 0; at < end; at++) if (isControl(text.charCodeAt(at))) controls++;
  if ((end === 0 && text !== '') || controls * CHARACTERS_PER_CONTROL > end) {
    throw new GuideLogError('binary', 'The file is not text: it holds binary data.');
  }
  if (isWholeFile && text.trim() === '') {
    throw new GuideLogError('empty', 'The file has nothing but blank lines.');
  }
  return text;
}

/** Zeros at the end are what a computer leaves of a file that it was writing when its power failed. */
function lengthWithoutZeros(text: string): number {
  let end = text.length;
  while (end > 0 && text.charCodeAt(end - 1) === 0) end--;
  return end;
}

/** What the first lines of a file tell. */
export interface UnderstoodHead {
  readonly dialect: Dialect;
  readonly plan: ColumnPlan;
  readonly dates: DateReading;
}

/** How the file is written and which column is what, from its first whole lines. */
export function understandHead(
  headText: string,
  isWholeFile: boolean,
  map: ColumnMap,
): UnderstoodHead {
  const lastEnd = headText.lastIndexOf('\n');
  const lines = isWholeFile || lastEnd === -1 ? headText : headText.slice(0, lastEnd + 1);
  const dialect = sniffDialect(lines, map);
  const plan = planColumns(dialect, map);
  return { dialect, plan, dates: findDateOrder(dateCells(lines, dialect, plan), map.dateOrder) };
}

/** The cells of the first lines in which a date can stand. */
function dateCells(lines: string, dialect: Dialect, plan: ColumnPlan): string[] {
  const dated = [...plan.columns, ...(plan.startColumn ? [plan.startColumn] : [])].filter(
    ({ role, unit }) => role === 'date' || unit === 'iso',
  );
  if (dated.length === 0) return [];
  const found: string[] = [];
  const splitter = new RowSplitter(dialect, (cells) => {
    if (cells.length === dialect.expectedColumns) {
      found.push(...dated.map(({ index }) => cells[index] ?? ''));
    }
  });
  splitter.finish(lines.endsWith('\n') ? lines.slice(0, -1) : lines);
  return found;
}

/** Controls that no text has: tab, line ends, form feed and the old end-of-file sign are allowed. */
function isControl(code: number): boolean {
  return code < 32 && code !== 9 && code !== 10 && code !== 12 && code !== 13 && code !== 26;
}
