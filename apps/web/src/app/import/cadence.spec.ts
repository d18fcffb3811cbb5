import { previewGuideLog } from '@stillpier/guide-log';
import { cadenceSeconds } from './cadence';

const preview = (times: string[], delimiter = ',') =>
  previewGuideLog(
    new TextEncoder().encode(
      ['t', 'dRA', 'dDec'].join(delimiter) +
        '\n' +
        times.map((time) => [time, '1', '2'].join(delimiter)).join('\n') +
        '\n',
    ),
  );

describe('cadenceSeconds', () => {
  it.each([
    ['seconds', ['0', '2', '4', '14'], ',', 2],
    ['clock', ['18:42:15,0', '18:42:17,5', '18:42:20,0'], ';', 2.5],
    ['iso', ['2026-11-28 18:42:15', '2026-11-28 18:42:18'], ',', 3],
    ['milliseconds', ['0', '2000', '4000'], ',', 2],
  ] as const)('is the usual step of %s', (unit, times, delimiter, expected) => {
    expect(cadenceSeconds(preview([...times], delimiter), [{ role: 'time', unit }])).toBe(expected);
  });

  it('is not told without a time column', () => {
    expect(cadenceSeconds(preview(['0', '2']), [])).toBeNull();
  });
});
