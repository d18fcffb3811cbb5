import {
  arcsecText,
  bytesText,
  countText,
  countedText,
  percentText,
  ratioText,
  secondsText,
  signedArcsecText,
} from './measure-text';

// Expected texts: DESIGN, Units and Words.
describe('measure text', () => {
  it('keeps two or three significant digits of an arcsecond', () => {
    expect([0.4612, 9.996, 20.93, 123.4].map(arcsecText)).toEqual([
      '0.46″',
      '10.0″',
      '20.9″',
      '123″',
    ]);
  });

  it('writes a true minus, and none before a zero', () => {
    expect(arcsecText(-0.5)).toBe('\u22120.50″');
    expect(arcsecText(-0.001)).toBe('0.00″');
    expect(signedArcsecText(0.42)).toBe('+0.42″');
    expect(signedArcsecText(-0.42)).toBe('\u22120.42″');
    expect(signedArcsecText(0.001)).toBe('0.00″');
  });

  it('shows a dash for what is missing, never a zero', () => {
    expect([arcsecText(null), ratioText(null), percentText(null)]).toEqual(['–', '–', '–']);
  });

  it('sets thousands apart with a no-break space', () => {
    expect([7, 1234, 14961, 1234567].map(countText)).toEqual([
      '7',
      '1\u00a0234',
      '14\u00a0961',
      '1\u00a0234\u00a0567',
    ]);
  });

  it('names one and many', () => {
    expect(countedText(1, 'run', 'runs')).toBe('1 run');
    expect(countedText(0, 'run', 'runs')).toBe('0 runs');
  });

  it('says a share under one percent with a decimal', () => {
    expect([0.76, 0.004, 0, 1].map(percentText)).toEqual([
      '76\u00a0%',
      '0.4\u00a0%',
      '0\u00a0%',
      '100\u00a0%',
    ]);
  });

  it('says seconds and sizes of files', () => {
    expect([34.32, 480, 2].map(secondsText)).toEqual(['34.3\u00a0s', '480\u00a0s', '2\u00a0s']);
    expect([512, 12_300, 1_400_000].map(bytesText)).toEqual([
      '512\u00a0B',
      '12.3\u00a0kB',
      '1.4\u00a0MB',
    ]);
  });
});
