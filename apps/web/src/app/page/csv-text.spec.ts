import { csvText } from './csv-text';

describe('csvText', () => {
  it.each(['=1+1', '+1', '-1', '@x', '\tx', '\rx'])('lets no spreadsheet compute %j', (text) => {
    expect(csvText([[text]]).replace(/^"/, '')).toMatch(/^'/);
  });

  it('leaves numbers alone, negative ones too', () => {
    expect(csvText([[-1.5, null, 2]])).toBe('-1.5,,2\r\n');
  });

  it('quotes what would part cells or lines', () => {
    // RFC 4180, section 2, rules 5 to 7
    expect(csvText([['a,b', 'say "c"', 'd\ne']])).toBe('"a,b","say ""c""","d\ne"\r\n');
  });
});
