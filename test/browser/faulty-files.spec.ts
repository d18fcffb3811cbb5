import { expect, test } from '@playwright/test';
import { describeOrchardPier } from './orchard-rig';
import { newcomer, signUpAndIn } from './people';

const folder = 'samples/not-ok';
/** What the browser can tell before anything is sent. `samples/README.md` says what is in each file. */
const TOLD_AT_ONCE = [
  ['empty.csv', 'The file is empty.'],
  ['picture.csv', 'The file is not text: it holds binary data.'],
  ['unknown-headers.csv', 'has no column that is known as the time, the RA error and the Dec'],
  ['no-dec-error.csv', 'has no column that is known as the Dec error'],
  ['two-units.csv', 'RA error and Dec error have different units'],
] as const;
const TOLD_AFTER_READING = [
  ['header-only.csv', 'The file has a header, but no line with figures.'],
  ['every-line-refused.csv', 'Every one of the 300 lines with figures was refused; line 2:'],
] as const;

test('each faulty file gets its one sentence, and leaves nothing behind', async ({ page }) => {
  await signUpAndIn(page, newcomer('Ilse Varga'));
  const rigId = await describeOrchardPier(page, 'Faulty pier');
  await page.goto(`/rigs/${rigId}/import`);
  const rowOf = (name: string) =>
    page.locator('app-file-list').getByRole('row').filter({ hasText: name });

  const files = [...TOLD_AT_ONCE, ...TOLD_AFTER_READING].map(([name]) => `${folder}/${name}`);
  await page.locator('input[type=file]').setInputFiles(files);
  for (const [name, sentence] of TOLD_AT_ONCE) await expect(rowOf(name)).toContainText(sentence);

  for (const [name] of TOLD_AFTER_READING) {
    await rowOf(name).getByRole('button', { name, exact: true }).click();
    const start = page.locator('input[type=datetime-local]');
    await start.fill('2026-03-14T22:00:00');
    await start.blur();
  }
  await page.getByRole('button', { name: 'Add 2 files to Faulty pier' }).click();
  for (const [name, sentence] of TOLD_AFTER_READING)
    await expect(rowOf(name)).toContainText(sentence, { timeout: 30_000 });

  await page.reload();
  await expect(page.getByRole('row').filter({ hasText: 'Failed' })).toHaveCount(2);
  await page.goto(`/rigs/${rigId}/nights`);
  await expect(page.getByRole('heading', { level: 1 })).toContainText('No nights yet');
});
