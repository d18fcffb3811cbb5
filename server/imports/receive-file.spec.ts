import { expect, it } from 'vitest';
import { baseName } from './receive-file';

it.each([
  ['../../etc/night.csv', 'night.csv'],
  ['C:\\logs\\night.csv', 'night.csv'],
  ['a\u0000b\u001b.csv', 'ab.csv'],
  ['  Noć 夜.csv ', 'Noć 夜.csv'],
  ['logs/', 'log.csv'],
  ['..', 'log.csv'],
])('a file that is sent as %j is called %j', (sent, kept) => {
  expect(baseName(sent)).toBe(kept);
});

it('a very long name keeps its end, where the kind of file stands', () => {
  const kept = baseName(`${'x'.repeat(300)}.csv`);
  expect(kept).toHaveLength(200);
  expect(kept.endsWith('.csv')).toBe(true);
});
