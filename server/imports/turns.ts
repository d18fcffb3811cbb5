/** Lets a few do something at once; the others wait for their turn. */
export class Turns {
  readonly #waiting: (() => void)[] = [];
  #free: number;

  constructor(atOnce: number) {
    this.#free = atOnce;
  }

  async take<Result>(work: () => Promise<Result>): Promise<Result> {
    if (this.#free > 0) this.#free -= 1;
    else await new Promise<void>((resolve) => this.#waiting.push(resolve));
    try {
      return await work();
    } finally {
      const next = this.#waiting.shift();
      if (next) next();
      else this.#free += 1;
    }
  }
}
