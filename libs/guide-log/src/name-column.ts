import { GrowingCodes } from './growing-arrays';

/** A column of names (runs, targets) as codes: equal names have equal codes, a blank is -1. */
export class NameColumn {
  readonly names: string[] = [];
  readonly #codes = new GrowingCodes();
  readonly #codeOf = new Map<string, number>();
  #lastCell = '';
  #lastCode = -1;

  append(cell: string): void {
    if (cell !== this.#lastCell) this.#lookUp(cell);
    this.#codes.append(this.#lastCode);
  }

  finish(): Int32Array {
    return this.#codes.finish();
  }

  #lookUp(cell: string): void {
    const name = cell.trim();
    let code = name === '' ? -1 : this.#codeOf.get(name);
    if (code === undefined) {
      code = this.names.push(name) - 1;
      this.#codeOf.set(name, code);
    }
    this.#lastCell = cell;
    this.#lastCode = code;
  }
}
