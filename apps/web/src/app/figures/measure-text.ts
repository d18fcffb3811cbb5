const MINUS = '\u2212';
const NO_BREAK_SPACE = '\u00a0';

/** Stands where a value is missing; the reason stands beside it. */
export const NO_VALUE = '–';

function fixed(value: number, decimals: number): string {
  const text = Math.abs(value).toFixed(decimals);
  return value < 0 && Number(text) !== 0 ? MINUS + text : text;
}

/** Two decimals below 10, one below 100, none above: two or three significant digits. */
function decimalsFor(value: number): number {
  const size = Math.abs(value);
  return size < 9.995 ? 2 : size < 99.95 ? 1 : 0;
}

export function arcsecText(arcsec: number | null): string {
  return arcsec === null ? NO_VALUE : `${fixed(arcsec, decimalsFor(arcsec))}″`;
}

/** One decimal, as far as a drift can tell an angle of the mount. */
export function arcminText(arcmin: number): string {
  return `${fixed(arcmin, 1)}′`;
}

/** Two significant digits, down to 0.0001: for rates and standard errors, which are often small. */
export function smallText(value: number | null): string {
  if (value === null) return NO_VALUE;
  const size = Math.abs(value);
  if (size > 0 && size < 0.00005) return '<0.0001';
  const digits = size === 0 ? 2 : Math.max(0, 1 - Math.floor(Math.log10(size)));
  return size >= 9.95 ? ratioText(value) : fixed(value, Math.min(4, digits));
}

/** With its sign, for a reading on an axis that goes both ways. */
export function signedArcsecText(arcsec: number): string {
  const text = arcsecText(arcsec);
  return text.startsWith(MINUS) || Number(arcsec.toFixed(2)) === 0 ? text : `+${text}`;
}

/** Ratio without a unit, as an aspect ratio. */
export function ratioText(ratio: number | null): string {
  return ratio === null ? NO_VALUE : fixed(ratio, decimalsFor(ratio));
}

export function percentText(share: number | null): string {
  if (share === null) return NO_VALUE;
  const percent = share * 100;
  const text = percent > 0 && percent < 0.95 ? fixed(percent, 1) : fixed(percent, 0);
  return `${text}${NO_BREAK_SPACE}%`;
}

/** Whole number with its thousands set apart. */
export function countText(count: number): string {
  return fixed(count, 0).replace(/\B(?=(\d{3})+$)/g, NO_BREAK_SPACE);
}

export function secondsText(seconds: number): string {
  return `${fixed(seconds, Math.abs(seconds) < 99.95 && seconds % 1 !== 0 ? 1 : 0)}${NO_BREAK_SPACE}s`;
}

export function hoursText(hours: number): string {
  return `${fixed(hours, 1)}${NO_BREAK_SPACE}h`;
}

export function degreesText(degrees: number): string {
  return `${fixed(degrees, 0)}°`;
}

export function bytesText(bytes: number): string {
  if (bytes < 1000) return `${countText(bytes)}${NO_BREAK_SPACE}B`;
  if (bytes < 100_000) return `${fixed(bytes / 1000, 1)}${NO_BREAK_SPACE}kB`;
  return `${fixed(bytes / 1_000_000, 1)}${NO_BREAK_SPACE}MB`;
}

/** `1 run`, `3 runs`. */
export function countedText(count: number, one: string, many: string): string {
  return `${countText(count)} ${count === 1 ? one : many}`;
}
