import { UnusableLogError } from './unusable-log-error';

const BYTES_PER_MIB = 1024 * 1024;
const LINE_FEED = 0x0a;
const CARRIAGE_RETURN = 0x0d;

/** The most that is read of one file. */
export interface ReadingLimits {
  readonly unpackedMib: number;
  readonly lines: number;
}

/** Stops the reading of a file that is too much, before it fills the memory. */
export class LimitedReading {
  #bytes = 0;
  #lineFeeds = 0;
  #carriageReturns = 0;

  constructor(private readonly limits: ReadingLimits) {}

  /** @throws {UnusableLogError} */
  take(piece: Uint8Array): void {
    this.#bytes += piece.length;
    if (this.#bytes > this.limits.unpackedMib * BYTES_PER_MIB) {
      throw new UnusableLogError(
        `The file unpacks to more than ${this.limits.unpackedMib} MiB, which is the most that is read.`,
      );
    }
    for (const byte of piece) {
      if (byte === LINE_FEED) this.#lineFeeds += 1;
      else if (byte === CARRIAGE_RETURN) this.#carriageReturns += 1;
    }
    // Of the pair that ends a line only one counts. The last line may go without an end.
    this.checkLines(Math.max(this.#lineFeeds, this.#carriageReturns));
  }

  /** @throws {UnusableLogError} */
  checkLines(lines: number): void {
    const most = this.limits.lines;
    if (lines <= most) return;
    throw new UnusableLogError(
      `The file has more than ${most.toLocaleString('en')} lines, which is the most that is read: send it in parts.`,
    );
  }
}
