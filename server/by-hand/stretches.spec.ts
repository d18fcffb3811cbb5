import fc from 'fast-check';
import { expect, it } from 'vitest';
import { stretchesAfter } from './stretches';

const aside = (fromSeconds: number, toSeconds: number) =>
  ({ action: 'set aside', fromSeconds, toSeconds }) as const;
const back = (fromSeconds: number, toSeconds: number) =>
  ({ action: 'take back', fromSeconds, toSeconds }) as const;

it.each([
  ['stretches that touch are one', [aside(0, 10), aside(20, 30), aside(10, 20)], [[0, 30]]],
  [
    'the middle of one can be taken back',
    [aside(0, 30), back(10, 20)],
    [
      [0, 10],
      [20, 30],
    ],
  ],
  ['taking back more than was set aside leaves nothing', [aside(5, 10), back(0, 20)], []],
  ['what was taken back can be set aside again', [aside(0, 9), back(0, 9), aside(3, 6)], [[3, 6]]],
  ['taking back elsewhere changes nothing', [aside(0, 10), back(10, 20)], [[0, 10]]],
])('%s', (_what, entries, expected) => {
  const stretches = stretchesAfter(entries);
  expect(stretches.map(({ fromSeconds, toSeconds }) => [fromSeconds, toSeconds])).toEqual(expected);
});

it('a second is set aside if and only if the last entry on it says so', () => {
  const entry = fc
    .tuple(fc.boolean(), fc.nat(20), fc.integer({ min: 1, max: 9 }))
    .map(([isAside, from, length]) => (isAside ? aside : back)(from, from + length));
  const seconds = Array.from({ length: 30 }, (_, second) => second);
  fc.assert(
    fc.property(fc.array(entry, { maxLength: 12 }), (entries) => {
      const stretches = stretchesAfter(entries);
      const holds = (second: number) => (stretch: { fromSeconds: number; toSeconds: number }) =>
        stretch.fromSeconds <= second && second < stretch.toSeconds;
      expect(seconds.filter((second) => stretches.some(holds(second)))).toEqual(
        seconds.filter((second) => entries.findLast(holds(second))?.action === 'set aside'),
      );
    }),
  );
});
