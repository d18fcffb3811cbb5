import { describe, expect, it } from 'vitest';
import { HEADER, utf8 } from '../../../test/support/small-guide-log';
import { HEAD_BYTES } from './file-head';
import { readGuideLog } from './log-reader';
import { previewGuideLog } from './preview';

describe('the preview of a guide log', () => {
  it('shows how the file is written, its columns and its first lines', () => {
    const preview = previewGuideLog(
      utf8('# pier\ntime s;ra error px;dec error px;flux\n\n0;1,5;2;7\n2;x;3;8'),
    );
    expect(preview).toEqual({
      encoding: 'utf-8',
      delimiter: ';',
      decimal: ',',
      headerLine: 2,
      columns: [
        { number: 1, header: 'time s', role: 'time', unit: 'seconds' },
        { number: 2, header: 'ra error px', role: 'raError', unit: 'guide px' },
        { number: 3, header: 'dec error px', role: 'decError', unit: 'guide px' },
        { number: 4, header: 'flux', role: null, unit: null },
      ],
      rows: [
        { line: 4, cells: ['0', '1,5', '2', '7'] },
        { line: 5, cells: ['2', 'x', '3', '8'] },
      ],
      dateOrder: null,
      asksDateOrder: false,
      missing: null,
    });
  });

  it('says what is missing where headers are not known', () => {
    const preview = previewGuideLog(utf8('time s,x,y\n0,1,2\n'));
    expect(preview.missing).toBe(
      'The header (line 1) has no column that is known as the RA error and the Dec error: a column map must say which it is.',
    );
    expect(preview.columns.map((column) => column.role)).toEqual(['time', null, null]);
  });

  it('follows a map, also in what it ignores', () => {
    const { columns, missing } = previewGuideLog(utf8('0,1,2,3\n'), {
      columns: {
        '1': { role: 'time', unit: 'seconds' },
        '2': { role: 'raError', unit: 'arcsec' },
        '3': { role: 'decError', unit: 'arcsec' },
        '4': { role: 'ignore' },
      },
    });
    expect(missing).toBeNull();
    expect(columns.map((column) => column.role)).toEqual(['time', 'raError', 'decError', 'ignore']);
    expect(columns.map((column) => column.header)).toEqual([null, null, null, null]);
  });

  it('finds what the reader finds, from the first bytes of a long file', () => {
    const lines = Array.from({ length: 9000 }, (_, n) => `${n},0.1,0.2`).join('\r\n');
    const bytes = utf8(`Pier: north\r\n${HEADER}\r\n${lines}\r\n`);
    const preview = previewGuideLog(bytes.subarray(0, HEAD_BYTES));
    const { reading } = readGuideLog(bytes);
    expect(preview).toMatchObject({
      delimiter: reading.delimiter,
      decimal: reading.decimal,
      headerLine: reading.headerLine,
      encoding: reading.encoding,
    });
    expect(preview.rows).toHaveLength(20);
  });

  it('refuses what is no table with the sentence of the reader', () => {
    expect(() => previewGuideLog(utf8(''))).toThrow(expect.objectContaining({ fault: 'empty' }));
    expect(() => previewGuideLog(utf8('1\n2\n'))).toThrow(
      expect.objectContaining({ fault: 'one-column' }),
    );
  });
});
