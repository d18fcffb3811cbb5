import { readNumber } from './number-cell';

/** The cells of a column that mean "no value", as its map names them: numbers in any way of writing, texts as they are. */
export class SentinelCells {
  readonly #texts: ReadonlySet<string>;
  readonly #numbers: ReadonlySet<number>;

  /** Numbers in a map have a decimal point, or the decimal sign of the file. */
  constructor(sentinels: readonly string[], decimalCode: number) {
    this.#texts = new Set(sentinels.map((text) => text.trim().toLowerCase()));
    this.#numbers = new Set(
      sentinels
        .flatMap((text) => [readNumber(text, 46), readNumber(text, decimalCode)])
        .filter((number) => !Number.isNaN(number)),
    );
  }

  /** @param number What the cell was read as. */
  has(cell: string, number: number): boolean {
    if (!Number.isNaN(number)) return this.#numbers.has(number);
    return this.#texts.has(cell.trim().toLowerCase());
  }
}
