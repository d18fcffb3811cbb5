import { type ColumnMap } from './column-map';
import { GuideLogError } from './guide-log-error';
import { knownHeader, plainWords } from './known-headers';
import { RowSplitter } from './row-splitter';

/** In the order of preference where two explain a file equally well; the blank stands for runs of blanks. */
const DELIMITERS = [',', ';', '\t', '|', ' '];
/** Two known names in one line are a header; one may be a word in a sentence. */
export const KNOWN_NAMES_OF_A_HEADER = 2;

/** How a file is written, found from its first lines or said by the map. */
export interface Dialect {
  readonly delimiter: string;
  readonly decimal: '.' | ',';
  readonly comment: string;
  /** 1-based; null where the file has no header. */
  readonly headerLine: number | null;
  /** The header's cells, without the comment sign that may stand before them. */
  readonly headerCells: readonly string[] | null;
  readonly expectedColumns: number;
}

interface HeadRow {
  readonly cells: readonly string[];
  readonly line: number;
  readonly isComment: boolean;
  /** Cells that the map or the project's own words name. */
  readonly knownNames: number;
  /** Part of the cells with something in them that are a number or a time. */
  readonly figures: number;
}

interface Candidate {
  readonly delimiter: string;
  readonly rows: readonly HeadRow[];
  readonly mostKnownNames: number;
  /** The commonest number of columns, two at least; 0 where no line has two. */
  readonly usualColumns: number;
  readonly score: number;
}

/**
 * Delimiter, decimal sign and header line of a log.
 *
 * A delimiter under which a line has two known names wins; else the one under which most lines have the same number of
 * columns and most of their cells are figures. The header is the line with the most known names above the first figures
 * that have a known header (a later run may have a header of its own), else the last line of text above the first figures.
 *
 * @param head The first lines of the file, whole ones.
 * @throws {GuideLogError} `one-column`, `header-line-missing`.
 */
export function sniffDialect(head: string, map: ColumnMap): Dialect {
  const comment = map.comment ?? '#';
  const delimiters = map.delimiter === undefined ? DELIMITERS : [map.delimiter];
  const best = delimiters
    .map((delimiter) => examine(head, delimiter, comment, map))
    .reduce((a, b) => (isBetter(b, a) ? b : a));
  if (best.usualColumns === 0) {
    throw new GuideLogError(
      'one-column',
      'The file has only one column: a guide log needs a time, a RA error and a Dec error in each line.',
    );
  }
  const header = findHeader(best, map);
  return {
    delimiter: best.delimiter,
    decimal: map.decimal ?? usualDecimal(best),
    comment,
    headerLine: header?.line ?? null,
    headerCells: header?.cells ?? null,
    expectedColumns: expectedColumns(best, header),
  };
}

function examine(head: string, delimiter: string, comment: string, map: ColumnMap): Candidate {
  const rows: HeadRow[] = [];
  const splitter = new RowSplitter({ delimiter, comment, expectedColumns: null }, (row, line) => {
    const isComment = row[0]?.trimStart().startsWith(comment) ?? false;
    const cells = row.map((cell) => cell.trim());
    if (isComment) cells[0] = cells[0]?.slice(comment.length).trim() ?? '';
    if (isComment && delimiter === ' ' && cells[0] === '') cells.shift();
    const filled = cells.filter((cell) => cell !== '');
    const figures = filled.filter(isFigure).length / Math.max(1, filled.length);
    rows.push({ cells, line, isComment, knownNames: knownNames(cells, map), figures });
  });
  splitter.finish(head.endsWith('\n') ? head.slice(0, -1) : head);

  const body = rows.filter((row) => !row.isComment && row.cells.join('') !== '');
  const counts = body.map((row) => row.cells.length).filter((columns) => columns > 1);
  const usualColumns = commonest(counts) ?? 0;
  const usual = body.filter((row) => row.cells.length === usualColumns);
  // Any sentence has blanks: they are a delimiter only where they make a table of most lines.
  const isTable = delimiter !== ' ' || usual.length * 2 > body.length;
  return {
    delimiter,
    rows,
    mostKnownNames: rows.reduce((most, row) => Math.max(most, row.knownNames), 0),
    usualColumns: isTable ? usualColumns : 0,
    score: isTable ? usual.reduce((sum, row) => sum + row.figures, 0) : 0,
  };
}

/** How many cells are header texts that the map or the project's own words name. */
export function knownNames(cells: readonly string[], map: ColumnMap): number {
  const mapped = Object.keys(map.columns ?? {}).map(plainWords);
  const isKnown = (cell: string) =>
    knownHeader(cell) !== undefined || (cell !== '' && mapped.includes(plainWords(cell)));
  return cells.filter((cell) => !isFigure(cell) && isKnown(cell)).length;
}

function isBetter(a: Candidate, b: Candidate): boolean {
  const names = (candidate: Candidate) =>
    candidate.mostKnownNames >= KNOWN_NAMES_OF_A_HEADER ? candidate.mostKnownNames : 0;
  if (names(a) !== names(b)) return names(a) > names(b);
  if (a.score !== b.score) return a.score > b.score;
  return a.usualColumns > 0 && b.usualColumns === 0;
}

function findHeader(candidate: Candidate, map: ColumnMap): HeadRow | undefined {
  const { rows, usualColumns } = candidate;
  if (map.headerLine === 0) return undefined;
  if (map.headerLine !== undefined) {
    const told = rows.find((row) => row.line === map.headerLine);
    if (told) return told;
    throw new GuideLogError(
      'header-line-missing',
      `The map says that the header is line ${map.headerLine}, but no row begins there.`,
    );
  }
  if (candidate.mostKnownNames >= KNOWN_NAMES_OF_A_HEADER) {
    return firstKnownHeader(candidate);
  }
  const isTable = (row: HeadRow) => !row.isComment && row.cells.length === usualColumns;
  const firstFigures = rows.findIndex((row) => isTable(row) && row.figures >= 0.5);
  const above = firstFigures === -1 ? rows : rows.slice(0, firstFigures);
  return above.filter((row) => isTable(row) && row.figures === 0).at(-1);
}

function firstKnownHeader({ rows }: Candidate): HeadRow | undefined {
  let best: HeadRow | undefined;
  for (const row of rows) {
    const isHeader = row.knownNames >= KNOWN_NAMES_OF_A_HEADER;
    if (isHeader && row.knownNames > (best?.knownNames ?? 0)) best = row;
    if (best && isRowOfFigures(row.cells)) break;
  }
  return best;
}

/** Three cells or more, and half of them figures: a line of a table, above the header or below it. */
export function isRowOfFigures(cells: readonly string[]): boolean {
  const filled = cells.map((cell) => cell.trim()).filter((cell) => cell !== '');
  return filled.length >= 3 && filled.filter(isFigure).length * 2 >= filled.length;
}

/** The header's columns; one more or less where a delimiter ends every line, but not the header, or the reverse. */
function expectedColumns(candidate: Candidate, header: HeadRow | undefined): number {
  const { rows, usualColumns } = candidate;
  if (!header) return usualColumns;
  const columns = header.cells.length;
  const endsBlank = (row: HeadRow) => row.cells.at(-1) === '';
  const usual = rows.filter((row) => !row.isComment && row.cells.length === usualColumns);
  const rowsEndBlank = usualColumns === columns + 1 && usual.every(endsBlank);
  const headerEndsBlank = usualColumns === columns - 1 && endsBlank(header);
  return rowsEndBlank || headerEndsBlank ? usualColumns : columns;
}

function usualDecimal({ rows, delimiter }: Candidate): '.' | ',' {
  if (delimiter === ',') return '.';
  const cells = rows.flatMap((row) => (row.isComment ? [] : row.cells));
  const count = (pattern: RegExp) => cells.filter((cell) => pattern.test(cell)).length;
  return count(/^[+\-−]?\d*,\d+$/) > count(/^[+\-−]?\d*\.\d+$/) ? ',' : '.';
}

const NUMBER = /^[+\-−]?(\d+[.,]?\d*|[.,]\d+)(e[+-]?\d+)?$/i;
const DATE = /^(\d{4}[-/]\d{2}[-/]\d{2}|\d{1,2}([-/.])\d{1,2}\2\d{4})$/;
const CLOCK = /^(\d[\d/.-]{5,9}[T ])?\d{1,2}:\d{2}[\d:.,]*( ?[ap]m)?\s*(Z|[+-][\d:]+)?$/i;

/** Number (with either decimal sign), clock, date, date with time, or NaN. */
export function isFigure(cell: string): boolean {
  return NUMBER.test(cell) || CLOCK.test(cell) || DATE.test(cell) || /^nan$/i.test(cell);
}

function commonest(values: readonly number[]): number | undefined {
  const counts = new Map<number, number>();
  for (const value of values) counts.set(value, (counts.get(value) ?? 0) + 1);
  return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0];
}
