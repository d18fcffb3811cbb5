import { type Dialect } from './dialect';
import { type FrameBuilder } from './frame-builder';
import { type LineCounts } from './guide-log';

const LISTED_REFUSALS = 200;

/** Decides for every row what it is, and counts its lines there: header, comment, frame, refused or blank. */
export class LineSorter {
  readonly refused: { line: number; reason: string }[] = [];
  #header = 0;
  #comment = 0;
  #refusedCount = 0;
  #blank = 0;
  #followsHeader = false;

  constructor(
    private readonly dialect: Dialect,
    private readonly builder: FrameBuilder,
  ) {}

  /** @param span Physical lines of the row; they all count where the row counts, but a frame is one line. */
  readonly take = (cells: string[], line: number, span: number, openQuote: boolean): void => {
    const { dialect } = this;
    const first = cells[0] ?? '';
    if (line <= (dialect.headerLine ?? 0)) {
      if (line === dialect.headerLine) this.#header += span;
      else if (isBlank(cells)) this.#blank += span;
      else if (first.trimStart().startsWith(dialect.comment)) this.#comment += span;
      else this.#header += span;
      return;
    }
    const fault = this.#frameFault(cells, line, openQuote);
    if (fault === null) {
      this.#followsHeader = false;
      this.#comment += span - 1;
    } else if (isBlank(cells)) this.#blank += span;
    else if (this.#isHeaderAgain(cells)) {
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
    const expected = this.dialect.expectedColumns;
    if (cells.length !== expected) {
      return `the line has ${cells.length} ${cells.length === 1 ? 'column' : 'columns'} instead of ${expected}`;
    }
    if (cells[0]?.trimStart().startsWith(this.dialect.comment)) return 'comment';
    return this.builder.add(cells, line, this.#followsHeader);
  }

  #isHeaderAgain(cells: string[]): boolean {
    const header = this.dialect.headerCells;
    return (
      header?.length === cells.length &&
      header.every((text, at) => text === cells[at]?.replace(this.dialect.comment, '').trim())
    );
  }

  #refuse(line: number, span: number, reason: string): void {
    for (let part = 0; part < span; part++) {
      this.#refusedCount++;
      if (this.refused.length < LISTED_REFUSALS) this.refused.push({ line: line + part, reason });
    }
  }
}

function isBlank(cells: string[]): boolean {
  return cells.length === 1 && cells[0]?.trim() === '';
}
