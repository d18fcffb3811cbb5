export interface Scale {
  (value: number): number;
  readonly from: number;
  readonly to: number;
}

type Pair = readonly [number, number];

/** Straight map of a domain onto pixels. */
export function linearScale([from, to]: Pair, [start, end]: Pair): Scale {
  const perUnit = (end - start) / (to - from);
  return Object.assign((value: number) => start + (value - from) * perUnit, { from, to });
}

/** Equal ratios become equal steps in pixels. */
export function logScale([from, to]: Pair, range: Pair): Scale {
  const linear = linearScale([Math.log(from), Math.log(to)], range);
  return Object.assign((value: number) => linear(Math.log(value)), { from, to });
}

/** The smallest of 1, 2, 5 times a power of ten that divides the span into at most `most` steps. */
export function roundStep(span: number, most: number): number {
  const rough = span / most;
  const power = 10 ** Math.floor(Math.log10(rough));
  const factor = [1, 2, 5].find((f) => f * power >= rough * (1 - 1e-9)) ?? 10;
  return factor * power;
}

/** 1, 2, 5 times the powers of ten from one end to the other. */
export function logTicks(from: number, to: number): number[] {
  const ticks: number[] = [];
  for (let power = 10 ** Math.floor(Math.log10(from)); power <= to; power *= 10) {
    for (const factor of [1, 2, 5]) {
      const tick = factor * power;
      if (tick >= from && tick <= to) ticks.push(Number(tick.toPrecision(6)));
    }
  }
  return ticks;
}
