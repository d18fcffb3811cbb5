import type { SavedColumnMap } from '@stillpier/contract';
import { intakeOf, lacksUnit, withRole, type ColumnChoice } from './intake';

const bytes = (text: string) => new TextEncoder().encode(text);
const KNOWN = bytes(
  'timestamp,ra error arcsec,dec error arcsec\n' +
    '2026-11-28T18:42:15Z,0.45,-0.67\n2026-11-28T18:42:17Z,-0.01,0.09\n',
);
const OTHER = bytes('clock;dRA;dDec;temp\n18:42:15,0;0,45;-0,67;3,4\n18:42:17,5;-0,01;0,09;3,4\n');

const CHOICES: ColumnChoice[] = [
  { role: 'time', unit: 'clock' },
  { role: 'raError', unit: 'arcsec' },
  { role: 'decError', unit: 'arcsec' },
  { role: 'ignore', unit: null },
];
const MAP = {
  columns: {
    clock: { role: 'time', unit: 'clock' },
    dRA: { role: 'raError', unit: 'arcsec' },
    dDec: { role: 'decError', unit: 'arcsec' },
    temp: { role: 'ignore' },
  },
} as const;
const saved = (headerCells: string[]): SavedColumnMap => ({
  id: '33333333-3333-4333-8333-333333333333',
  rigId: '11111111-1111-4111-8111-111111111111',
  name: 'Observatory computer',
  createdAt: '2026-11-01T12:00:00Z',
  headerCells,
  map: MAP,
});

describe('intakeOf', () => {
  it('asks nothing about headers that are recognised', () => {
    const intake = intakeOf(KNOWN, [], null);
    expect(intake).toMatchObject({ fault: null, missing: null, needsStart: false, map: null });
    expect(intake.choices.map(({ role }) => role)).toEqual(['time', 'raError', 'decError']);
  });

  it('says what is missing from other headers', () => {
    const intake = intakeOf(OTHER, [], null);
    expect(intake.missing).toContain('the time, the RA error and the Dec error');
    expect(intake.preview).toMatchObject({ delimiter: ';', decimal: ',' });
  });

  it('makes a map of what is chosen, and asks for the date that a clock does not tell', () => {
    const intake = intakeOf(OTHER, [], CHOICES);
    expect(intake).toMatchObject({ missing: null, needsStart: true, map: MAP });
  });

  it('takes a saved map for the same header line by itself', () => {
    const intake = intakeOf(OTHER, [saved(['clock', 'dRA', 'dDec', 'temp'])], null);
    expect(intake.savedMap?.name).toBe('Observatory computer');
    expect(intake.missing).toBeNull();
    expect(intakeOf(OTHER, [saved(['clock', 'dRA'])], null).savedMap).toBeNull();
  });

  it('says when two columns have one role', () => {
    const twice = [...CHOICES.slice(0, 2), { role: 'raError', unit: 'arcsec' } as const];
    expect(intakeOf(OTHER, [], twice).missing).toContain('two columns the role');
  });

  it('says why a file cannot be read at all', () => {
    expect(intakeOf(bytes(''), [], null)).toMatchObject({
      preview: null,
      fault: 'The file is empty.',
    });
  });
});

describe('choices', () => {
  it('take the unit of a role that has one only', () => {
    expect(withRole('declination')).toEqual({ role: 'declination', unit: 'degrees' });
    expect(withRole('raError')).toEqual({ role: 'raError', unit: null });
    expect(lacksUnit(withRole('raError'))).toBe(true);
    expect(lacksUnit(withRole('snr'))).toBe(false);
  });
});
