const FIRST_CAPACITY = 4096;

/** A Float64Array that grows by doubling. */
export class GrowingNumbers {
  #values = new Float64Array(FIRST_CAPACITY);
  #count = 0;

  append(value: number): void {
    if (this.#count === this.#values.length) {
      const larger = new Float64Array(this.#count * 2);
      larger.set(this.#values);
      this.#values = larger;
    }
    this.#values[this.#count++] = value;
  }

  /** The values, without the spare room; the array cannot be appended to any more. */
  finish(): Float64Array {
    const values = this.#values.slice(0, this.#count);
    this.#values = new Float64Array(0);
    return values;
  }
}

/** Small whole numbers that grow by doubling: codes of names and states. */
export class GrowingCodes {
  #codes = new Int32Array(FIRST_CAPACITY);
  #count = 0;

  append(code: number): void {
    if (this.#count === this.#codes.length) {
      const larger = new Int32Array(this.#count * 2);
      larger.set(this.#codes);
      this.#codes = larger;
    }
    this.#codes[this.#count++] = code;
  }

  /** The codes, without the spare room; the array cannot be appended to any more. */
  finish(): Int32Array {
    const codes = this.#codes.slice(0, this.#count);
    this.#codes = new Int32Array(0);
    return codes;
  }
}
