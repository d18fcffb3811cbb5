import { type ColumnMap } from './column-map';
import { type ColumnPlan } from './column-plan';
import { type Dialect, isRowOfFigures } from './dialect';
import { type FrameBuilder } from './frame-builder';
import { type LineCounts } from './guide-log';
import { GuideLogError } from './guide-log-error';
import { laterHeader } from './later-header';

const LISTED_REFUSALS = 200;
/** Warnings of headers further down. */
const LISTED_HEADERS = 20;

/** Decides for every row what it is, and counts its lines there: header, comment, frame, refused or blank. */
export class LineSorter {
  readonly refused: { line: number; reason: string }[] = [];
  #header = 0;
  #comment = 0;
  #refusedCount = 0;
  #blank = 0;
  #followsHeader = false;
  /** Of the header that stands above. */
  #expectedColumns: number;
  /** Why nothing can be read below the header that stands above; null: it can. */
  #closed: string | null = null;
  /** What a person should know of headers further down. */
  readonly warnings: string[] = [];

  /** @param mostLines A file with more of them is refused. */
  constructor(
    private readonly dialect: Dialect,
    private readonly plan: ColumnPlan,
    private readonly map: ColumnMap,
    private readonly builder: FrameBuilder,
    private readonly mostLines: number,
  ) {
    this.#expectedColumns = dialect.expectedColumns;
  }

  /** @param span Physical lines of the row; they all count where the row counts, but a frame is one line. */
  readonly take = (cells: string[], line: number, span: number, openQuote: boolean): void => {
    const { dialect } = this;
    if (line + span - 1 > this.mostLines) throw tooManyLines(this.mostLines);
    const first = cells[0] ?? '';
    if (line <= (dialect.headerLine ?? 0)) {
      if (line === dialect.headerLine) this.#header += span;
      else if (isBlank(cells)) this.#blank += span;
      else if (first.trimStart().startsWith(dialect.comment)) this.#comment += span;
      else if (isRowOfFigures(cells)) this.#refuse(line, span, 'the line stands above the header');
      else this.#header += span;
      return;
    }
    const fault = this.#frameFault(cells, line, openQuote);
    if (fault === null) {
      this.#followsHeader = false;
      this.#comment += span - 1;
    } else if (isBlank(cells)) this.#blank += span;
    else if (this.#isHeaderAgain(cells, line)) {
      this.#header += span;
      this.#followsHeader = true;
    } else if (first.trimStart().startsWith(dialect.comment)) this.#comment += span;
    else this.#refuse(line, span, fault);
  };

  counts(): LineCounts {
    const [header, comment, refused, blank] = [
      this.#header,
      this.#comment,
      this.#refusedCount,
      this.#blank,
    ];
    const frames = this.builder.count;
    const lines = header + comment + frames + refused + blank;
    return { lines, header, comment, frames, refused, blank };
  }

  /** Why a row is no frame, or null when it was taken as one. */
  #frameFault(cells: string[], line: number, openQuote: boolean): string | null {
    if (openQuote) return 'a quote opens and is not closed';
    if (this.#closed !== null) return this.#closed;
    const expected = this.#expectedColumns;
    if (cells.length !== expected) {
      return `the line has ${cells.length} ${cells.length === 1 ? 'column' : 'columns'} instead of ${expected}`;
    }
    if (cells[0]?.trimStart().startsWith(this.dialect.comment)) return 'comment';
    return this.builder.add(cells, line, this.#followsHeader);
  }

  /** Whether the row is a header; the rows below it are then read by it. */
  #isHeaderAgain(cells: string[], line: number): boolean {
    const { headerCells, comment, expectedColumns } = this.dialect;
    const isSame =
      headerCells?.length === cells.length &&
      headerCells.every((text, at) => text === cells[at]?.replace(comment, '').trim());
    const later = isSame
      ? { plan: this.plan, expectedColumns, notRead: [] }
      : laterHeader(cells, this.dialect, this.plan, this.map);
    if (later === null) return false;
    if (typeof later === 'string') {
      this.#closed = `the header above (line ${line}) ${later}`;
      this.#warn(`The lines below the header in line ${line} are not read: it ${later}.`);
      return true;
    }
    this.#closed = null;
    this.#expectedColumns = later.expectedColumns;
    this.builder.rearrange(later.plan);
    if (later.notRead.length > 0) {
      const names = later.notRead.map((name) => `"${name}"`).join(', ');
      this.#warn(
        `The header in line ${line} has columns that the first header does not have, and they are not read: ${names}.`,
      );
    }
    return true;
  }

  #warn(warning: string): void {
    if (this.warnings.length < LISTED_HEADERS) this.warnings.push(warning);
  }

  #refuse(line: number, span: number, reason: string): void {
    for (let part = 0; part < span; part++) {
      this.#refusedCount++;
      if (this.refused.length < LISTED_REFUSALS) this.refused.push({ line: line + part, reason });
    }
  }
}

function tooManyLines(most: number): GuideLogError {
  const grouped = String(most).replace(/\B(?=(\d{3})+$)/g, ',');
  return new GuideLogError(
    'too-many-lines',
    `The file has more than ${grouped} lines, the most that are read of one file: cut it into several.`,
  );
}

function isBlank(cells: string[]): boolean {
  return cells.length === 1 && cells[0]?.trim() === '';
}
