import { type DateOrder, type TimeUnit } from './column-map';
import { timeReader } from './time-reader';

const SECONDS_PER_DAY = 86_400;
/** Further back than this inside a run is a clock that passed midnight or was set, not a line out of place. */
const HALF_DAY_SECONDS = 43_200;

/** How a time stands to the one before it. */
export type TimeStep = 'forward' | 'midnight' | 'restart' | 'backward';

/** Times of one log on one axis, in seconds; the zero is the unit's own until the log is finished. */
export class TimeAxis {
  readonly read: (cell: string) => number;
  #offsetSeconds = 0;
  #last = -Infinity;
  #lastRaw = NaN;

  constructor(
    private readonly unit: TimeUnit,
    decimalCode: number,
    order: DateOrder | null,
  ) {
    this.read = timeReader(unit, decimalCode, order);
  }

  /** Seconds by which a time lies before the last one; negative or -Infinity when it does not. */
  secondsBack(rawSeconds: number): number {
    return this.#last - (rawSeconds + this.#offsetSeconds);
  }

  /**
   * What a time that was read means after the last one.
   *
   * @param isNewRun A new run, a new target or a repeated header allow any step.
   */
  step(rawSeconds: number, isNewRun: boolean): TimeStep {
    const back = this.secondsBack(rawSeconds);
    if (back <= 0) return 'forward';
    if (
      back >= HALF_DAY_SECONDS
        ? this.#tellsTimeOfDay(rawSeconds)
        : isNewRun && this.unit === 'clock'
    ) {
      return 'midnight';
    }
    return isNewRun || back >= HALF_DAY_SECONDS ? 'restart' : 'backward';
  }

  /** Takes a time as the next one and returns its place on the axis. */
  take(rawSeconds: number, step: TimeStep): number {
    if (step === 'midnight') this.#offsetSeconds += SECONDS_PER_DAY;
    this.#lastRaw = rawSeconds;
    this.#last = rawSeconds + this.#offsetSeconds;
    return this.#last;
  }

  #tellsTimeOfDay(rawSeconds: number): boolean {
    if (this.unit === 'clock') return true;
    const isCount = this.unit === 'seconds' || this.unit === 'milliseconds';
    return isCount && rawSeconds >= 0 && this.#lastRaw < SECONDS_PER_DAY;
  }
}
