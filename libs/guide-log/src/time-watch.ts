/** Frames whose usual interval is looked at together. */
const BLOCK = 50;
/** An interval this much longer or shorter than the usual one is another cadence. */
const CHANGE = 1.25;
/** This many lines in a row before the last time: a clock that was set back, not lines out of place. */
const LINES_OF_A_CLOCK_SET_BACK = 10;
/** A log with more of a kind has another trouble than this one. */
const LISTED = 20;

/** Watches the times of a log as they come, for what a person should know of them. */
export class TimeWatch {
  readonly #warnings: string[] = [];
  #listed = 0;
  readonly #steps = new Float64Array(BLOCK);
  #stepCount = 0;
  #offCount = 0;
  /** Line of the first step of another length, with none of the usual length after it; 0: none. */
  #offSinceLine = 0;
  #usualStep = NaN;
  #lastSeconds = NaN;
  #lastLine = 0;
  #backLine = 0;
  #backCount = 0;
  #backSeconds = 0;

  /** @param isNewStretch The interval to the frame before says nothing: a new run, a clock that began anew. */
  took(seconds: number, line: number, isNewStretch: boolean): void {
    if (this.#backCount > 0) this.#endOfBack(line);
    const step = isNewStretch ? NaN : seconds - this.#lastSeconds;
    this.#lastSeconds = seconds;
    this.#lastLine = line;
    if (!(step > 0)) return;
    this.#steps[this.#stepCount++] = step;
    if (step > this.#usualStep * CHANGE || step * CHANGE < this.#usualStep) {
      this.#offCount++;
      if (this.#offSinceLine === 0) this.#offSinceLine = line;
    } else this.#offSinceLine = 0;
    if (this.#stepCount === BLOCK) this.#endOfBlock(line);
  }

  /** A line that was refused since its time lies before the last one. */
  refusedBack(secondsBack: number, line: number): void {
    if (this.#backCount++ > 0) return;
    this.#backLine = line;
    this.#backSeconds = secondsBack;
  }

  restarted(secondsBack: number, line: number): void {
    this.#say(
      `In line ${line} the time goes back by ${rounded(secondsBack)} s: a new run begins there.`,
    );
  }

  warnings(): string[] {
    if (this.#backCount > 0) this.#endOfBack(0);
    const more = this.#listed - this.#warnings.length;
    return more === 0
      ? this.#warnings
      : [...this.#warnings, `The times change their course ${more} more times.`];
  }

  #endOfBlock(line: number): void {
    const isFirst = Number.isNaN(this.#usualStep);
    if (isFirst || this.#offCount * 2 > BLOCK) {
      const step = Float64Array.from(this.#steps).sort()[BLOCK / 2] ?? NaN;
      const isOther = step > this.#usualStep * CHANGE || step * CHANGE < this.#usualStep;
      if (isOther) {
        this.#say(
          `From about line ${this.#offSinceLine || line} on the frames are ${rounded(step)} s apart instead of ${rounded(this.#usualStep)} s.`,
        );
      }
      if (isFirst || isOther) {
        this.#usualStep = step;
        this.#offSinceLine = 0;
      }
    }
    this.#stepCount = 0;
    this.#offCount = 0;
  }

  /** @param line The next frame; 0 at the end of the file. */
  #endOfBack(line: number): void {
    const count = this.#backCount;
    this.#backCount = 0;
    if (count < LINES_OF_A_CLOCK_SET_BACK) return;
    const until = line === 0 ? 'until the end of the file' : `until line ${line}`;
    this.#say(
      `In line ${this.#backLine} the clock goes back by ${rounded(this.#backSeconds)} s: ${count} lines are refused, ${until}, whose times lie before that of line ${this.#lastLine}.`,
    );
  }

  #say(warning: string): void {
    if (this.#listed++ < LISTED) this.#warnings.push(warning);
  }
}

function rounded(seconds: number): number {
  return Number(seconds.toFixed(3));
}
