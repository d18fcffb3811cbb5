import Papa from 'papaparse';

/** A quoted cell may run over this many lines; a stray quote must not swallow the rest of the file. */
const MOST_LINES_OF_A_ROW = 10;

/** What was made of the line or lines from `line` on. */
export interface SplitRow {
  readonly cells: string[];
  /** 1-based physical line. */
  readonly line: number;
  /** Physical lines that the row covers. */
  readonly span: number;
  /** A quote opens in this line and is not closed: the cells cannot be trusted. */
  readonly openQuote: boolean;
}

export interface RowRules {
  /** One character; a blank stands for runs of blanks. */
  readonly delimiter: string;
  readonly comment: string;
  /** Columns that a row over several lines must have to be taken for one; null: any number. */
  readonly expectedColumns: number | null;
}

/**
 * Whole lines to rows of cells, with exact physical line numbers. Papa Parse does the splitting, a block of lines at a
 * time; a block in which a row is not exactly one line (a quote over several lines, a stray quote) is split again line by
 * line, so that a fault stays in its own line. The rows do not depend on where the text was cut into blocks.
 */
export class RowSplitter {
  #nextLine = 1;
  /** Lines of a quoted cell whose end is in the next block. */
  #pending = '';

  constructor(
    private readonly rules: RowRules,
    private readonly onRow: (row: string[], line: number, span: number, openQuote: boolean) => void,
  ) {}

  /** @param block Lines, each ending in LF. */
  push(block: string): void {
    this.#split(this.#pending + block, false);
  }

  /** @param lastLine The rest of the text: one line without an end, or nothing. */
  finish(lastLine: string): void {
    this.#split(this.#pending + (lastLine === '' ? '' : `${lastLine}\n`), true);
  }

  #split(text: string, isLast: boolean): void {
    this.#pending = '';
    if (text === '') return;
    const body = this.rules.delimiter === ' ' ? blanksToTabs(text) : text;
    const rows = this.#parse(body.slice(0, -1));
    if (rows === null || (text.includes('"') && rows.length !== countLines(text))) {
      this.#splitLineByLine(body, isLast);
      return;
    }
    for (const row of rows) this.onRow(row, this.#nextLine++, 1, false);
  }

  /** Rows of a text without its last line end, or null where a quote is not as it should be. */
  #parse(text: string): string[][] | null {
    if (text === '') return [['']]; // Papa Parse makes no row of an empty line that stands alone
    const { data, errors } = Papa.parse<string[]>(text, {
      delimiter: this.rules.delimiter === ' ' ? '\t' : this.rules.delimiter,
      newline: '\n',
    });
    return errors.length === 0 ? data : null;
  }

  #splitLineByLine(body: string, isLast: boolean): void {
    const lines = body.slice(0, -1).split('\n');
    for (let at = 0; at < lines.length;) {
      const span = this.#rowAt(lines, at, isLast);
      if (span === null) {
        this.#pending = lines.slice(at).join('\n') + '\n';
        return;
      }
      at += span;
    }
  }

  /** Hands on the row that begins at a line and returns its span, or null when its end is still to come. */
  #rowAt(lines: string[], at: number, isLast: boolean): number | null {
    const first = lines[at] ?? '';
    const alone = this.#parse(first);
    if (alone?.length === 1 || first.trimStart().startsWith(this.rules.comment)) {
      this.#emit(alone?.[0] ?? [first], 1, false);
      return 1;
    }
    for (let span = 2; span <= MOST_LINES_OF_A_ROW; span++) {
      if (at + span > lines.length) {
        if (isLast) break;
        return null;
      }
      const rows = this.#parse(lines.slice(at, at + span).join('\n'));
      if (rows?.length !== 1) continue;
      const cells = rows[0] ?? [];
      if (cells.length !== (this.rules.expectedColumns ?? cells.length)) break;
      this.#emit(cells, span, false);
      return span;
    }
    this.#emit([first], 1, true);
    return 1;
  }

  #emit(cells: string[], span: number, openQuote: boolean): void {
    this.onRow(cells, this.#nextLine, span, openQuote);
    this.#nextLine += span;
  }
}

/** Runs of blanks become one tab, except inside quotes; blanks at either end of a line go. */
function blanksToTabs(text: string): string {
  return text
    .replace(/"[^"\n]*"|[ \t]+/g, (found) => (found.startsWith('"') ? found : '\t'))
    .replace(/^\t|\t$/gm, '');
}

function countLines(text: string): number {
  let count = 0;
  for (let at = text.indexOf('\n'); at !== -1; at = text.indexOf('\n', at + 1)) count++;
  return count;
}
