import { clockSecondsText, clockText, clockTicks } from '../clock';
import type { SecondsRange } from './trace-stretch';

const PX_PER_TICK = 72;

export interface TraceTick {
  readonly seconds: number;
  readonly text: string;
}

/** Round times of the site's clock in sight; without a time of day they count from the start of the run. */
export function traceTicks(
  { fromSeconds, toSeconds }: SecondsRange,
  startMs: number | null,
  timeZone: string,
  plotPx: number,
): TraceTick[] {
  const most = Math.max(3, Math.floor(plotPx / PX_PER_TICK));
  const zeroMs = startMs ?? 0;
  const zone = startMs === null ? 'UTC' : timeZone;
  const text = toSeconds - fromSeconds < 60 * most ? clockSecondsText : clockText;
  return clockTicks(zeroMs + fromSeconds * 1000, zeroMs + toSeconds * 1000, most, zone).map(
    (ms) => ({ seconds: (ms - zeroMs) / 1000, text: text(ms, zone) }),
  );
}
