import { clockSecondsText } from '../figures/clock';
import type { SecondsRange } from '../figures/trace-chart/trace-stretch';

const DAY_SECONDS = 86_400;

/** What the clock shows at a second of a run; a run without a time of day counts from its start. */
export interface RunClock {
  readonly startMs: number | null;
  readonly timeZone: string;
}

/** `21:43:05` at the site. */
export function clockAt({ startMs, timeZone }: RunClock, seconds: number): string {
  return clockSecondsText((startMs ?? 0) + seconds * 1000, startMs === null ? 'UTC' : timeZone);
}

export function stretchText(clock: RunClock, { fromSeconds, toSeconds }: SecondsRange): string {
  return `${clockAt(clock, fromSeconds)} to ${clockAt(clock, toSeconds)}`;
}

/** The second of the run at which the clock first shows a time; null for text that is no time. */
export function secondsAt(clock: RunClock, time: string): number | null {
  const wanted = secondOfDay(time);
  const start = secondOfDay(clockAt(clock, 0));
  if (wanted === null || start === null) return null;
  const whole = (wanted - start + DAY_SECONDS) % DAY_SECONDS;
  const intoSecond = (((clock.startMs ?? 0) % 1000) + 1000) % 1000;
  return Math.max(0, whole - intoSecond / 1000);
}

/** A time field leaves the seconds out where they are zero. */
function secondOfDay(time: string): number | null {
  const [, hour, minute, second = '0'] = /^(\d\d):(\d\d)(?::(\d\d))?/.exec(time) ?? [];
  return hour === undefined || minute === undefined
    ? null
    : (Number(hour) * 60 + Number(minute)) * 60 + Number(second);
}
