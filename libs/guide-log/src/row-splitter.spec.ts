import { describe, expect, it } from 'vitest';
import { RowSplitter } from './row-splitter';

/** Rows of a text as [line, span, cells], or the cells replaced by 'open quote'. */
function rowsOf(text: string, expectedColumns: number | null = null, delimiter = ',') {
  const rows: [line: number, span: number, cells: string[] | 'open quote'][] = [];
  const splitter = new RowSplitter(
    { delimiter, comment: '#', expectedColumns },
    (cells, line, span, openQuote) => rows.push([line, span, openQuote ? 'open quote' : cells]),
  );
  const end = text.lastIndexOf('\n') + 1;
  splitter.push(text.slice(0, end));
  splitter.finish(text.slice(end));
  return rows;
}

// Quoting as RFC 4180 (Y. Shafranovich, Common Format and MIME Type for CSV Files, 2005) describes it.
describe('splitting lines into rows', () => {
  it('keeps delimiters inside quotes', () => {
    expect(rowsOf('a,"b, c",d\n')).toEqual([[1, 1, ['a', 'b, c', 'd']]]);
  });

  it('reads doubled quotes as one', () => {
    expect(rowsOf('"a ""b"" c",1\n')).toEqual([[1, 1, ['a "b" c', '1']]]);
  });

  it('keeps empty cells, quoted or not', () => {
    expect(rowsOf('1,"",""\n2,,\n')).toEqual([
      [1, 1, ['1', '', '']],
      [2, 1, ['2', '', '']],
    ]);
  });

  it('keeps a line end inside quotes and goes on with the right line number', () => {
    expect(rowsOf('a,b\n"1\n2",3\n4,5\n')).toEqual([
      [1, 1, ['a', 'b']],
      [2, 2, ['1\n2', '3']],
      [4, 1, ['4', '5']],
    ]);
  });

  it('keeps text of other scripts and of a data format of its own', () => {
    expect(rowsOf('1,"{""type"": ""Point""}",ʤ\n')).toEqual([
      [1, 1, ['1', '{"type": "Point"}', 'ʤ']],
    ]);
  });

  it('reads a last line without an end', () => {
    expect(rowsOf('a,b\n"1",2')).toEqual([
      [1, 1, ['a', 'b']],
      [2, 1, ['1', '2']],
    ]);
  });

  it('leaves a quote inside a cell alone', () => {
    expect(rowsOf('5" tube,1\n')).toEqual([[1, 1, ['5" tube', '1']]]);
  });

  it('keeps a quote that never closes to its own line', () => {
    expect(rowsOf('"a,1\nb,2\n"c",3\n')).toEqual([
      [1, 1, 'open quote'],
      [2, 1, ['b', '2']],
      [3, 1, ['c', '3']],
    ]);
  });

  it('does not join lines to a row with another number of columns', () => {
    expect(rowsOf('"a,1\nb,"\nc,3\n', 2)).toEqual([
      [1, 1, 'open quote'],
      [2, 1, 'open quote'],
      [3, 1, ['c', '3']],
    ]);
  });

  it('lets a comment hold any quote', () => {
    expect(rowsOf('#,"a\n1,"2"\n')).toEqual([
      [1, 1, ['#,"a']],
      [2, 1, ['1', '2']],
    ]);
  });

  it('gives an empty line one empty cell', () => {
    expect(rowsOf('\n\na\n')).toEqual([
      [1, 1, ['']],
      [2, 1, ['']],
      [3, 1, ['a']],
    ]);
  });

  it('splits at runs of blanks but not inside quotes', () => {
    expect(rowsOf('  1   "star lost" \t 2 \n', null, ' ')).toEqual([
      [1, 1, ['1', 'star lost', '2']],
    ]);
  });

  it('waits for the end of a quoted cell in the next block', () => {
    const rows: unknown[] = [];
    const splitter = new RowSplitter(
      { delimiter: ',', comment: '#', expectedColumns: 2 },
      (cells, line, span) => rows.push([line, span, cells]),
    );
    splitter.push('a,"1\n');
    expect(rows).toEqual([]);
    splitter.push('2"\nb,3\n');
    splitter.finish('');
    expect(rows).toEqual([
      [1, 2, ['a', '1\n2']],
      [3, 1, ['b', '3']],
    ]);
  });
});
