import { expect, it } from 'vitest';
import { Turns } from './turns';

it('lets so many in at once and the others in their order, also past one that fails', async () => {
  const turns = new Turns(2);
  const began: number[] = [];
  const ends: (() => void)[] = [];
  const works = [0, 1, 2, 3].map((i) =>
    turns.take(async () => {
      began.push(i);
      await new Promise<void>((resolve) => ends.push(resolve));
      if (i === 0) throw new Error('the first fails');
    }),
  );
  const settled = Promise.allSettled(works);
  expect(began).toEqual([0, 1]);
  ends[0]?.();
  await expect.poll(() => began).toEqual([0, 1, 2]);
  ends[1]?.();
  await expect.poll(() => began).toEqual([0, 1, 2, 3]);
  ends.slice(2).forEach((end) => {
    end();
  });
  expect((await settled).map(({ status }) => status)).toEqual([
    ...['rejected', 'fulfilled', 'fulfilled', 'fulfilled'],
  ]);
});
