import { clockText } from '../clock';
import { rect, text, type Shape } from '../drawing/shapes';
import type { Scale } from '../scale';

/** A stretch of one of four flat skies: 0 the sun is up, 1 dusk or dawn, 2 nearly dark, 3 dark. */
export interface RibbonSky {
  readonly level: 0 | 1 | 2 | 3;
  readonly fromMs: number;
  readonly toMs: number;
}

interface Band {
  readonly startPx: number;
  readonly sizePx: number;
}

const CHARACTER_PX = 7.3;
const GAP_PX = 14;

/** The skies behind a band, each as one flat step; `across` turns them for a ribbon whose time runs down. */
export function skyShapes(
  skies: readonly RibbonSky[],
  time: Scale,
  band: Band,
  across: boolean,
): Shape[] {
  return skies.flatMap(({ level, fromMs, toMs }) => {
    const from = time(Math.max(fromMs, time.from));
    const length = time(Math.min(toMs, time.to)) - from;
    if (length <= 0) return [];
    const look = `sky-${level}`;
    return across
      ? [rect(band.startPx, from, band.sizePx, length, look)]
      : [rect(from, band.startPx, length, band.sizePx, look)];
  });
}

/** Sunset, dark from, to and sunrise over the band, at their places; the dark is left out where there is no room. */
export function skyNames(
  skies: readonly RibbonSky[],
  x: Scale,
  y: number,
  timeZone: string,
): Shape[] {
  const time = (ms: number): string => clockText(ms, timeZone);
  const changes = skies.slice(1).map((sky, i) => ({ before: skies[i]?.level, sky }));
  const at = (before: number, after: number): number | undefined =>
    changes.find((change) => change.before === before && change.sky.level === after)?.sky.fromMs;
  const [sunset, darkFrom, darkTo, sunrise] = [at(0, 1), at(2, 3), at(3, 2), at(1, 0)];
  const taken: { left: number; right: number }[] = [];
  return [
    { ms: sunset, words: 'sunset', anchor: 'start' as const },
    { ms: sunrise, words: 'sunrise', anchor: 'end' as const },
    { ms: darkFrom, words: 'dark from', anchor: 'start' as const },
    { ms: darkTo, words: 'to', anchor: 'end' as const },
  ].flatMap(({ ms, words, anchor }) => {
    if (ms === undefined || ms < x.from || ms > x.to) return [];
    const label = `${words} ${time(ms)}`;
    const width = CHARACTER_PX * label.length;
    const left = anchor === 'start' ? x(ms) : x(ms) - width;
    const right = left + width;
    if (taken.some((other) => left < other.right + GAP_PX && other.left < right + GAP_PX))
      return [];
    taken.push({ left, right });
    return [text(x(ms), y, label, 'axis', anchor)];
  });
}
