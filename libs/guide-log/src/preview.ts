import { type ColumnMap, type ColumnRole, type ColumnUnit, type DateOrder } from './column-map';
import { columnNames, type ColumnPlan } from './column-plan';
import { DecodedText, type Encoding } from './decoded-text';
import { type Dialect } from './dialect';
import { HEAD_BYTES, decodeHead, understandHead, type UnderstoodHead } from './file-head';
import { GuideLogError } from './guide-log-error';
import { LineEnds } from './line-ends';
import { checkPlan } from './plan-check';
import { RowSplitter } from './row-splitter';

const PREVIEW_ROWS = 20;

export interface PreviewColumn {
  /** 1-based: the key of the column in a map where its header is blank or not the only one of its name. */
  readonly number: number;
  /** Text of the header; null for a file without one. */
  readonly header: string | null;
  /** null: not recognised, and not named by the map. */
  readonly role: ColumnRole | null;
  readonly unit: ColumnUnit | null;
}

/** The first lines of a log as the reader will take them. */
export interface GuideLogPreview {
  readonly encoding: Encoding;
  readonly delimiter: string;
  readonly decimal: '.' | ',';
  /** 1-based; null for a file without a header. */
  readonly headerLine: number | null;
  readonly columns: readonly PreviewColumn[];
  /** Of dates whose year stands last: told by the map, or the only one possible; null where there are none. */
  readonly dateOrder: DateOrder | null;
  /** Dates can be read with the day or with the month first: the map has to say which. */
  readonly asksDateOrder: boolean;
  /** The first lines below the header, as they are split. */
  readonly rows: readonly { readonly line: number; readonly cells: readonly string[] }[];
  /** What stands in the way of reading the log, as one sentence; null when it can be read. */
  readonly missing: string | null;
}

/**
 * What the reader makes of a log's first bytes. Give 64 KiB or more, or the whole file where it is shorter: preview
 * and reader look at the same 64 KiB and come to the same result.
 *
 * @throws {GuideLogError} `empty`, `binary`, `one-column`, or a fault of the map.
 */
export function previewGuideLog(firstBytes: Uint8Array, map: ColumnMap = {}): GuideLogPreview {
  const head = firstBytes.subarray(0, HEAD_BYTES);
  const isWholeFile = firstBytes.length < HEAD_BYTES;
  const decoded = new DecodedText(head);
  const lineEnds = new LineEnds();
  const text = decodeHead(head, isWholeFile, decoded, lineEnds);
  const understood = understandHead(text, isWholeFile, map);
  const { dialect, plan, dates } = understood;
  return {
    encoding: decoded.encoding,
    delimiter: dialect.delimiter,
    decimal: dialect.decimal,
    headerLine: dialect.headerLine,
    columns: previewColumns(dialect, plan, map),
    rows: previewRows(text, isWholeFile, dialect),
    dateOrder: dates.order,
    asksDateOrder: dates.openExample !== null,
    missing: whatIsMissing(understood, map),
  };
}

function previewColumns(dialect: Dialect, plan: ColumnPlan, map: ColumnMap): PreviewColumn[] {
  const ignored = Object.entries(map.columns ?? {})
    .filter(([, use]) => use.role === 'ignore')
    .map(([key]) => key.trim());
  return columnNames(dialect).map((name, index) => {
    const planned = plan.columns.find((column) => column.index === index);
    const isIgnored = ignored.includes(name) || ignored.includes(String(index + 1));
    return {
      number: index + 1,
      header: dialect.headerCells === null ? null : name,
      role: planned?.role ?? (isIgnored ? 'ignore' : null),
      unit: planned?.unit ?? null,
    };
  });
}

function previewRows(
  text: string,
  isWholeFile: boolean,
  dialect: Dialect,
): { line: number; cells: string[] }[] {
  const rows: { line: number; cells: string[] }[] = [];
  const splitter = new RowSplitter(dialect, (cells, line) => {
    const isData = line > (dialect.headerLine ?? 0) && cells.join('').trim() !== '';
    const isComment = cells[0]?.trimStart().startsWith(dialect.comment);
    if (isData && !isComment && rows.length < PREVIEW_ROWS) rows.push({ line, cells });
  });
  const end = text.lastIndexOf('\n') + 1;
  splitter.push(text.slice(0, end));
  splitter.finish(isWholeFile ? text.slice(end) : '');
  return rows;
}

function whatIsMissing({ plan, dialect, dates }: UnderstoodHead, map: ColumnMap): string | null {
  try {
    checkPlan(plan, dialect, dates, map);
    return null;
  } catch (error) {
    // The check speaks by throwing, since the reader cannot go on; here its sentence is the answer.
    if (error instanceof GuideLogError) return error.message;
    throw error;
  }
}
