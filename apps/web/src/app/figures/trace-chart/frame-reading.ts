import { clockSecondsText } from '../clock';
import { signedArcsecText } from '../measure-text';
import type { SecondsRange, TraceStretch } from './trace-stretch';

export interface SetAsideStretch extends SecondsRange {
  readonly reason: string;
}

/** What the run says of its frames. */
export interface RunOfFrames {
  readonly setAside: readonly SetAsideStretch[];
  /** null: the log tells no time of day, and the reading counts from the start of the run. */
  readonly startMs: number | null;
  readonly timeZone: string;
}

/** A frame, or a step of several, in words. */
export interface FrameReading {
  readonly seconds: number;
  readonly time: string;
  readonly ra: string;
  readonly dec: string;
  readonly state: string;
}

export function frameReading(
  stretch: TraceStretch,
  index: number,
  { setAside, startMs, timeZone }: RunOfFrames,
): FrameReading {
  const seconds = stretch.timeSeconds[index] ?? 0;
  const aside = setAside.find(
    (range) => seconds >= range.fromSeconds && seconds <= range.toSeconds,
  );
  return {
    seconds,
    time: clockSecondsText((startMs ?? 0) + seconds * 1000, startMs === null ? 'UTC' : timeZone),
    ra: extentText(stretch.ra.leastArcsec[index], stretch.ra.greatestArcsec[index]),
    dec: extentText(stretch.dec.leastArcsec[index], stretch.dec.greatestArcsec[index]),
    state: stretch.setAside[index] ? `set aside${aside ? `, ${aside.reason}` : ''}` : 'kept',
  };
}

function extentText(least = NaN, greatest = NaN): string {
  if (Number.isNaN(least)) return 'no star';
  return least === greatest
    ? signedArcsecText(least)
    : `${signedArcsecText(least)} to ${signedArcsecText(greatest)}`;
}
