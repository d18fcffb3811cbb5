/** Numbers as sentences show them: 2 or 3 significant digits, prime without a space, true minus. */

/** RMS and other lengths on the sky, two decimals: 0.46″. */
export function arcsec(value: number): string {
  return `${signed(value.toFixed(2))}″`;
}

/** Peak to peak and gaps, one decimal: 12.1″. */
export function roundArcsec(value: number): string {
  return `${signed(value.toFixed(1))}″`;
}

/** One decimal: 3.4′. */
export function arcmin(value: number): string {
  return `${signed(value.toFixed(1))}′`;
}

/** Whole: 47 %. */
export function percent(part: number): string {
  return `${signed((100 * part).toFixed(0))} %`;
}

/** 480 s, 37.3 s. */
export function seconds(value: number): string {
  return `${value.toFixed(value < 100 ? 1 : 0)} s`;
}

/** Two decimals: 0.70. */
export function ratio(value: number): string {
  return signed(value.toFixed(2));
}

export const AXIS_NAMES = { ra: 'RA', dec: 'Dec' } as const;

function signed(text: string): string {
  return text.replace('-', '−');
}
