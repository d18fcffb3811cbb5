import type { SavedColumnMap } from '@stillpier/contract';
import {
  intakeOf,
  lacksUnit,
  NOTHING_BY_HAND,
  withRole,
  type ColumnChoice,
  type HandChoice,
} from './intake';

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
const saved = (headerCells: string[] | null): SavedColumnMap => ({
  id: '33333333-3333-4333-8333-333333333333',
  rigId: '11111111-1111-4111-8111-111111111111',
  name: 'Observatory computer',
  createdAt: '2026-11-01T12:00:00Z',
  headerCells,
  map: MAP,
});

const byHand = (part: Partial<HandChoice>): HandChoice => ({ ...NOTHING_BY_HAND, ...part });

describe('intakeOf', () => {
  it('asks nothing about headers that are recognised', () => {
    const intake = intakeOf(KNOWN, [], NOTHING_BY_HAND);
    expect(intake).toMatchObject({ fault: null, missing: null, needsStart: false, map: null });
    expect(intake.choices.map(({ role }) => role)).toEqual(['time', 'raError', 'decError']);
  });

  it('says what is missing from other headers', () => {
    const intake = intakeOf(OTHER, [], NOTHING_BY_HAND);
    expect(intake.missing).toContain('the time, the RA error and the Dec error');
    expect(intake.preview).toMatchObject({ delimiter: ';', decimal: ',' });
  });

  it('makes a map of what is chosen, and asks for the date that a clock does not tell', () => {
    const intake = intakeOf(OTHER, [], byHand({ columns: CHOICES }));
    expect(intake).toMatchObject({ missing: null, needsStart: true, map: MAP });
  });

  it('takes a saved map for the same header line by itself', () => {
    const intake = intakeOf(OTHER, [saved(['clock', 'dRA', 'dDec', 'temp'])], NOTHING_BY_HAND);
    expect(intake.savedMap?.name).toBe('Observatory computer');
    expect(intake.missing).toBeNull();
    expect(intakeOf(OTHER, [saved(['clock', 'dRA'])], NOTHING_BY_HAND).savedMap).toBeNull();
  });

  it('takes a map that came as a file for every header line with its columns', () => {
    expect(intakeOf(OTHER, [saved(null)], NOTHING_BY_HAND).savedMap).not.toBeNull();
    expect(intakeOf(KNOWN, [saved(null)], NOTHING_BY_HAND).savedMap).toBeNull();
  });

  it('puts what is changed by hand over the saved map that fits', () => {
    const map = { ...MAP, correctionSign: 'opposite' } as const;
    const sent = { ...saved(['clock', 'dRA', 'dDec', 'temp']), map };
    const intake = intakeOf(OTHER, [sent], byHand({ settings: { decimal: ',' } }));
    expect(intake.map).toEqual({ ...map, decimal: ',' });
    expect(intake.savedMap).toBeNull(); // it can be saved under a name of its own
  });

  it('shows the columns of another delimiter, and the first ones again when it parts nothing', () => {
    const tabs = bytes('a,1\tb\n1,5\t2\n');
    const changed = intakeOf(tabs, [], byHand({ settings: { delimiter: '\t' } }));
    expect(changed.headerCells).toEqual(['a,1', 'b']);
    const none = intakeOf(tabs, [], byHand({ settings: { delimiter: '|' } }));
    expect(none.preview?.columns.length).toBeGreaterThan(1);
    expect(none.missing).not.toBeNull();
  });

  it('keeps the cells that mean no value when a column of the saved map is changed', () => {
    const columns = { ...MAP.columns, dRA: { ...MAP.columns.dRA, sentinels: ['-1'] } };
    const sent = { ...saved(['clock', 'dRA', 'dDec', 'temp']), map: { columns } };
    const intake = intakeOf(OTHER, [sent], byHand({ columns: CHOICES }));
    expect(intake.map?.columns?.['dRA']?.sentinels).toEqual(['-1']);
  });

  it('names the columns whose unit is open, in the order of the file', () => {
    const open = CHOICES.map((choice) => ({ ...choice, unit: null }));
    const intake = intakeOf(OTHER, [], byHand({ columns: open }));
    expect(intake.missing).toBe('Pick a unit: clock, dRA, dDec.');
    expect(intake.choices).toEqual(open);
  });

  it('says when two columns have one role', () => {
    const twice = [...CHOICES.slice(0, 2), { role: 'raError', unit: 'arcsec' } as const];
    expect(intakeOf(OTHER, [], byHand({ columns: twice })).missing).toContain(
      'two columns the role',
    );
  });

  it('says why a file cannot be read at all', () => {
    expect(intakeOf(bytes(''), [], NOTHING_BY_HAND)).toMatchObject({
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
