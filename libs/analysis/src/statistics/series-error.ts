export type SeriesFault = 'too-short' | 'length-mismatch' | 'not-finite' | 'no-spread';

/** What the numeric functions throw on input that they cannot use: `fault` for programs, the message for people. */
export class SeriesError extends Error {
  constructor(
    readonly fault: SeriesFault,
    message: string,
  ) {
    super(message);
    this.name = 'SeriesError';
  }
}

/**
 * Refuses a series that is too short or not finite. Missing frames are dropped by the caller, who says so in the
 * document; here a NaN is a mistake, never skipped.
 *
 * @throws {SeriesError} `too-short`, `not-finite`.
 */
export function requireSeries(name: string, values: ArrayLike<number>, atLeast: number): void {
  if (values.length < atLeast) {
    const got = String(values.length);
    throw new SeriesError(
      'too-short',
      `${name} needs at least ${String(atLeast)} samples, got ${got}`,
    );
  }
  for (let i = 0; i < values.length; i++) {
    if (!Number.isFinite(values[i])) {
      throw new SeriesError(
        'not-finite',
        `${name} got a value that is not a number at index ${String(i)}`,
      );
    }
  }
}

/** @throws {SeriesError} `length-mismatch`. */
export function requireSameLength(name: string, a: ArrayLike<number>, b: ArrayLike<number>): void {
  if (a.length !== b.length) {
    throw new SeriesError(
      'length-mismatch',
      `${name} needs two series of the same length, got ${String(a.length)} and ${String(b.length)}`,
    );
  }
}
