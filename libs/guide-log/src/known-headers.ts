import { type ColumnRole, type ColumnUnit } from './column-map';

interface KnownUse {
  readonly role: ColumnRole;
  readonly unit: ColumnUnit | undefined;
}

/** The project's own plain words. `timestamp` is an ISO time and nothing else: a number in it is refused. */
const KNOWN_HEADERS: ReadonlyMap<string, KnownUse> = new Map<string, KnownUse>([
  ['time s', { role: 'time', unit: 'seconds' }],
  ['time ms', { role: 'time', unit: 'milliseconds' }],
  ['timestamp', { role: 'time', unit: 'iso' }],
  ['ra error arcsec', { role: 'raError', unit: 'arcsec' }],
  ['ra error px', { role: 'raError', unit: 'guide px' }],
  ['dec error arcsec', { role: 'decError', unit: 'arcsec' }],
  ['dec error px', { role: 'decError', unit: 'guide px' }],
  ['ra correction ms', { role: 'raCorrection', unit: 'ms' }],
  ['dec correction ms', { role: 'decCorrection', unit: 'ms' }],
  ['ra correction arcsec', { role: 'raCorrection', unit: 'arcsec' }],
  ['dec correction arcsec', { role: 'decCorrection', unit: 'arcsec' }],
  ['snr', { role: 'snr', unit: undefined }],
  ['brightness', { role: 'brightness', unit: undefined }],
  ['state', { role: 'state', unit: undefined }],
  ['run', { role: 'run', unit: undefined }],
  ['target', { role: 'target', unit: undefined }],
  ['declination', { role: 'declination', unit: 'degrees' }],
  ['declination degrees', { role: 'declination', unit: 'degrees' }],
  ['hour angle h', { role: 'hourAngle', unit: 'hours' }],
  ['pier side', { role: 'pierSide', unit: undefined }],
]);

/** Text in which case, and blanks, dashes and underscores, make no difference. */
export function plainWords(text: string): string {
  return text
    .toLowerCase()
    .replace(/[\s_-]+/g, ' ')
    .trim();
}

/** Ways of writing a unit in brackets or after a slash, to the unit in the project's own words. */
const WRITTEN_UNITS: ReadonlyMap<string, string> = new Map(
  Object.entries({
    s: ['s', 'sec', 'second', 'seconds'],
    ms: ['ms', 'msec', 'millisecond', 'milliseconds'],
    arcsec: ['arcsec', 'arcsecs', 'arcsecond', 'arcseconds', '"', '″', "''"],
    px: ['px', 'pixel', 'pixels', 'guide px'],
    degrees: ['deg', 'degree', 'degrees', '°'],
    h: ['h', 'hour', 'hours'],
  }).flatMap(([unit, ways]) => ways.map((way): [string, string] => [way, unit])),
);
/** `RA error (arcsec)`, `RA error [arcsec]`, `RA error / arcsec` */
const WORDS_AND_UNIT = /^([^([/]+)(?:\(([^()]+)\)|\[([^[\]]+)\]|\/([^/]+))$/;

/** Role and unit of a recognised header, or undefined: nothing else is guessed. */
export function knownHeader(header: string): KnownUse | undefined {
  const known = KNOWN_HEADERS.get(plainWords(header));
  if (known) return known;
  const [, words = '', round, square, slashed] = WORDS_AND_UNIT.exec(header.trim()) ?? [];
  const unit = WRITTEN_UNITS.get(plainWords(round ?? square ?? slashed ?? ''));
  return unit === undefined ? undefined : KNOWN_HEADERS.get(`${plainWords(words)} ${unit}`);
}
