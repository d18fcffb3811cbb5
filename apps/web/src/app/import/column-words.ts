import { type ColumnRole, type ColumnUnit } from '@stillpier/guide-log';

/** What a column can be, in the order of the picker. */
export const ROLE_WORDS: Record<ColumnRole, string> = {
  time: 'Time',
  date: 'Date, beside a time of day',
  raError: 'RA error',
  decError: 'Dec error',
  xError: 'Error along x of the camera',
  yError: 'Error along y of the camera',
  raCorrection: 'RA correction',
  decCorrection: 'Dec correction',
  raDirection: 'RA direction',
  decDirection: 'Dec direction',
  snr: 'SNR',
  brightness: 'Brightness',
  state: 'State',
  run: 'Run',
  target: 'Target',
  declination: 'Declination',
  hourAngle: 'Hour angle',
  pierSide: 'Side of the pier',
  ignore: 'Ignore',
};

export const UNIT_WORDS: Record<ColumnUnit, string> = {
  seconds: 'seconds',
  milliseconds: 'milliseconds',
  iso: 'date and time',
  'epoch seconds': 'seconds since 1970',
  'epoch milliseconds': 'milliseconds since 1970',
  clock: 'hh:mm:ss',
  arcsec: 'arcsec',
  'guide px': 'guide px',
  ms: 'ms',
  degrees: 'degrees',
  hours: 'hours',
  'E/W': 'E or W',
  'N/S': 'N or S',
  '+/-': '+ or −',
};

const DELIMITER_WORDS: Record<string, string> = {
  ',': 'comma',
  ';': 'semicolon',
  '\t': 'tab',
  '|': 'bar',
  ' ': 'blanks',
};

export const DELIMITER_CHOICES = Object.entries(DELIMITER_WORDS).map(([value, words]) => ({
  value,
  words,
}));
