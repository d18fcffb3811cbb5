import { type ColumnRole, type ColumnUnit } from './column-map';

interface KnownUse {
  readonly role: ColumnRole;
  readonly unit: ColumnUnit | undefined;
}

/** The project's own plain words. `timestamp` is an ISO time and nothing else: a number in it is refused. */
const KNOWN_HEADERS: ReadonlyMap<string, KnownUse> = new Map<string, KnownUse>([
  ['time s', { role: 'time', unit: 'seconds' }],
  ['timestamp', { role: 'time', unit: 'iso' }],
  ['ra error arcsec', { role: 'raError', unit: 'arcsec' }],
  ['ra error px', { role: 'raError', unit: 'guide px' }],
  ['dec error arcsec', { role: 'decError', unit: 'arcsec' }],
  ['dec error px', { role: 'decError', unit: 'guide px' }],
  ['ra correction ms', { role: 'raCorrection', unit: 'ms' }],
  ['dec correction ms', { role: 'decCorrection', unit: 'ms' }],
  ['snr', { role: 'snr', unit: undefined }],
  ['brightness', { role: 'brightness', unit: undefined }],
  ['state', { role: 'state', unit: undefined }],
  ['run', { role: 'run', unit: undefined }],
  ['target', { role: 'target', unit: undefined }],
  ['declination', { role: 'declination', unit: 'degrees' }],
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

/** Role and unit of a recognised header, or undefined: nothing else is guessed. */
export function knownHeader(header: string): KnownUse | undefined {
  return KNOWN_HEADERS.get(plainWords(header));
}
