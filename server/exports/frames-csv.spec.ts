import fc from 'fast-check';
import { expect, it } from 'vitest';
import { asWritten, csvHeader, csvLines, type CsvRun } from './frames-csv';

const run: CsvRun = {
  runIndex: 2,
  target: 'Lantern',
  startsAt: new Date('2026-03-15T01:40:00Z'),
  correctionUnit: 'ms',
};
const piece = {
  timeSeconds: Float64Array.of(0, 2.013),
  channels: {
    raError: Float32Array.of(0.8, NaN),
    decError: Float32Array.of(-0.25, NaN),
    raCorrection: Float32Array.of(-240, 0),
    decCorrection: Float32Array.of(0, NaN),
    setAside: Float32Array.of(4, 3),
  },
};

it('writes the words that the reader knows, and blanks for what is missing', () => {
  expect(csvHeader('ms') + csvLines(run, piece)).toBe(
    [
      'timestamp,ra error arcsec,dec error arcsec,ra correction ms,dec correction ms,state,run,target',
      '2026-03-15T01:40:00.000Z,0.8,-0.25,-240,0,ignore,2,Lantern',
      '2026-03-15T01:40:02.013Z,,,0,,star lost,2,Lantern',
      '',
    ].join('\n'),
  );
});

it('leaves out corrections that the log does not have', () => {
  const lines = csvHeader(null) + csvLines({ ...run, correctionUnit: null }, piece);
  expect(lines).not.toContain('correction');
  expect(lines).toContain(',0.8,-0.25,ignore,2,');
});

it.each(['=1+1', '+1', '-1', '@x', '\tx', '\rx'])(
  'keeps a spreadsheet from running %j',
  (target) => {
    const [line = ''] = csvLines({ ...run, target }, piece)
      .split(',2,')
      .slice(1);
    expect(line).toMatch(/^"'/);
  },
);

it('quotes a name with a comma', () => {
  expect(csvLines({ ...run, target: 'a, "b"' }, piece)).toContain('"a, ""b"""');
});

it('writes no more digits than the float needs, and none fewer', () => {
  fc.assert(
    fc.property(fc.float({ noNaN: true, noDefaultInfinity: true }), (sample) => {
      expect(Math.fround(asWritten(sample) ?? NaN)).toBe(sample);
    }),
  );
  expect(asWritten(Math.fround(0.1))).toBe(0.1);
});
