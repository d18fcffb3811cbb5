import { FRAME_STATES, type FrameState } from './column-map';
import { GrowingCodes } from './growing-arrays';
import { plainWords } from './known-headers';

/** Texts that a warning lists; more than these say that the column is no state column. */
const LISTED_TEXTS = 8;

/** The state column as codes: the map's words, and the project's own; anything else counts as guiding and is warned of. */
export class StateColumn {
  readonly #codes = new GrowingCodes();
  readonly #codeOf: Map<string, number>;
  readonly #unknown = new Map<string, number>();
  #lastCell = '';
  #lastCode = 0;
  #lastIsKnown = true;

  constructor(states: Readonly<Record<string, FrameState>>) {
    const own = FRAME_STATES.map((state): [string, FrameState] => [state, state]);
    this.#codeOf = new Map(
      [...own, ...Object.entries(states)].map(([text, state]) => [
        plainWords(text),
        FRAME_STATES.indexOf(state),
      ]),
    );
    this.#codeOf.set('', 0);
  }

  append(cell: string): void {
    if (cell !== this.#lastCell || !this.#lastIsKnown) this.#lookUp(cell);
    this.#codes.append(this.#lastCode);
  }

  finish(): Uint8Array {
    return Uint8Array.from(this.#codes.finish());
  }

  /** One sentence on the texts that no one explained, or none. */
  warnings(): string[] {
    if (this.#unknown.size === 0) return [];
    const texts = [...this.#unknown]
      .slice(0, LISTED_TEXTS)
      .map(([text, frames]) => `"${text}" (${frames} ${frames === 1 ? 'frame' : 'frames'})`);
    const more = this.#unknown.size > LISTED_TEXTS ? ' and others' : '';
    return [
      `The state column has texts that the map does not explain, taken as guiding: ${texts.join(', ')}${more}.`,
    ];
  }

  #lookUp(cell: string): void {
    const code = this.#codeOf.get(plainWords(cell));
    this.#lastCell = cell;
    this.#lastCode = code ?? 0;
    this.#lastIsKnown = code !== undefined;
    if (code !== undefined) return;
    const text = cell.trim().slice(0, 40);
    const isListed = this.#unknown.has(text) || this.#unknown.size <= LISTED_TEXTS;
    if (isListed) this.#unknown.set(text, (this.#unknown.get(text) ?? 0) + 1);
  }
}
