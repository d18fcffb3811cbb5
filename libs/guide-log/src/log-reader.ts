import { type ColumnMap } from './column-map';
import { DecodedText } from './decoded-text';
import { HEAD_BYTES, decodeHead, understandHead, type UnderstoodHead } from './file-head';
import { FrameBuilder, type InstantOfLocalTime } from './frame-builder';
import { type GuideLog, type LineCounts } from './guide-log';
import { GuideLogError } from './guide-log-error';
import { LineEnds } from './line-ends';
import { LineSorter } from './line-sorter';
import { checkPlan } from './plan-check';
import { RowSplitter } from './row-splitter';

/** Reads go in pieces of this size: larger ones are slower, since their rows outlive the young generation. */
const PIECE_BYTES = 65_536;
/** A longer line is not one of a table; it would have to be kept in memory whole. */
const LONGEST_LINE = 1_048_576;
/** Seven weeks of a frame every two seconds. */
export const MOST_LINES = 2_000_000;

export interface LogReaderOptions {
  readonly map?: ColumnMap | undefined;
  /** For logs whose times carry no zone: the clock that they were written by. Without it their start is not known. */
  readonly instantOfLocalTime?: InstantOfLocalTime | undefined;
  /** A file with more lines is refused as soon as that is seen; without it `MOST_LINES`. */
  readonly mostLines?: number | undefined;
}

/** Takes the bytes of one log in pieces of any size; what comes out does not depend on where they were cut. */
export interface LogReader {
  /** @throws {GuideLogError} As soon as it is clear that the log cannot be read. */
  push(chunk: Uint8Array): void;
  /** @throws {GuideLogError} When there is nothing to analyse in the log. */
  finish(): GuideLog;
}

/** What is known once the first bytes are understood. */
interface Opened extends UnderstoodHead {
  readonly builder: FrameBuilder;
  readonly sorter: LineSorter;
  readonly splitter: RowSplitter;
}

export function createLogReader(options: LogReaderOptions): LogReader {
  return new StreamedLogReader(
    options.map ?? {},
    options.instantOfLocalTime ?? null,
    options.mostLines ?? MOST_LINES,
  );
}

/**
 * Reads a whole log: its bytes, or pieces of them in order.
 *
 * @throws {GuideLogError}
 */
export function readGuideLog(
  bytes: Uint8Array | Iterable<Uint8Array>,
  options: LogReaderOptions = {},
): GuideLog {
  const reader = createLogReader(options);
  for (const chunk of bytes instanceof Uint8Array ? [bytes] : bytes) reader.push(chunk);
  return reader.finish();
}

class StreamedLogReader implements LogReader {
  readonly #head = new Uint8Array(HEAD_BYTES);
  #headLength = 0;
  #decoded: DecodedText | null = null;
  readonly #lineEnds = new LineEnds();
  #opened: Opened | null = null;
  /** The line that is not ended yet. */
  #rest = '';

  constructor(
    private readonly map: ColumnMap,
    private readonly instantOfLocalTime: InstantOfLocalTime | null,
    private readonly mostLines: number,
  ) {}

  push(chunk: Uint8Array): void {
    let at = 0;
    if (!this.#opened) {
      at = Math.min(chunk.length, HEAD_BYTES - this.#headLength);
      this.#head.set(chunk.subarray(0, at), this.#headLength);
      this.#headLength += at;
      if (this.#headLength < HEAD_BYTES) return;
      this.#open(false);
    }
    for (; at < chunk.length; at += PIECE_BYTES) {
      const text = this.#decoded?.push(chunk.subarray(at, at + PIECE_BYTES)) ?? '';
      this.#feed(this.#lineEnds.push(text));
    }
  }

  finish(): GuideLog {
    const opened = this.#opened ?? this.#open(true);
    this.#feed(this.#lineEnds.push(this.#decoded?.finish() ?? '') + this.#lineEnds.finish());
    opened.splitter.finish(this.#rest);
    const counts = opened.sorter.counts();
    checkHasFrames(counts, opened.sorter);
    return {
      frames: opened.builder.finish(),
      reading: {
        lines: counts.lines,
        frames: counts.frames,
        refusedCount: counts.refused,
        refused: opened.sorter.refused,
        delimiter: opened.dialect.delimiter,
        decimal: opened.dialect.decimal,
        encoding: this.#decoded?.encoding ?? 'utf-8',
        headerLine: opened.dialect.headerLine,
        columns: Object.fromEntries(opened.plan.columns.map(({ role, name }) => [role, name])),
        warnings: this.#warnings(opened),
      },
      lineCounts: counts,
    };
  }

  #open(isWholeFile: boolean): Opened {
    const head = this.#head.subarray(0, this.#headLength);
    this.#decoded = new DecodedText(head);
    const text = decodeHead(head, isWholeFile, this.#decoded, this.#lineEnds);
    const understood = understandHead(text, isWholeFile, this.map);
    const { dialect, plan, dates } = understood;
    checkPlan(plan, dialect, dates, this.map);
    const builder = new FrameBuilder(
      plan,
      this.map,
      dialect.decimal,
      dates.order,
      this.instantOfLocalTime,
    );
    const sorter = new LineSorter(dialect, plan, this.map, builder, this.mostLines);
    const splitter = new RowSplitter(dialect, sorter.take);
    this.#opened = { ...understood, builder, sorter, splitter };
    this.#feed(text);
    return this.#opened;
  }

  #feed(text: string): void {
    const end = text.lastIndexOf('\n') + 1;
    if (end > 0) {
      checkLineLength(this.#rest.length + text.indexOf('\n'));
      this.#opened?.splitter.push(this.#rest + text.slice(0, end));
      this.#rest = text.slice(end);
    } else {
      this.#rest += text;
    }
    checkLineLength(this.#rest.length);
  }

  #warnings({ builder, plan, sorter }: Opened): string[] {
    const encoding =
      this.#decoded?.encoding === 'windows-1252'
        ? ['The file is not UTF-8: it was read as Windows-1252.']
        : [];
    return [...encoding, ...plan.warnings, ...sorter.warnings, ...builder.warnings()];
  }
}

function checkLineLength(length: number): void {
  if (length <= LONGEST_LINE) return;
  throw new GuideLogError(
    'line-too-long',
    'The file has a line of more than a million characters: it is no guide log.',
  );
}

function checkHasFrames(counts: LineCounts, { refused }: LineSorter): void {
  if (counts.frames > 0) return;
  const [first] = refused;
  if (!first) {
    throw new GuideLogError('no-figures', 'The file has a header, but no line with figures.');
  }
  const all = counts.refused === 1 ? 'The only line' : `Every one of the ${counts.refused} lines`;
  throw new GuideLogError(
    'every-line-refused',
    `${all} with figures was refused; line ${first.line}: ${first.reason}.`,
  );
}
