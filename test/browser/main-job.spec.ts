import { execFile } from 'node:child_process';
import { readFileSync } from 'node:fs';
import { promisify } from 'node:util';
import { expect, test } from '@playwright/test';
import { analysisDocumentSchema, type Run } from '@stillpier/contract';
import { describeOrchardPier } from './orchard-rig';
import { newcomer, signUpAndIn } from './people';

/** The evening on which a sample was written, by its README. */
const NIGHTS = [
  { sample: 'worm-night', date: '2026-03-14' },
  { sample: 'three-targets', date: '2026-03-16' },
];

/** The document that the command line prints of a sample. */
async function documentOf(sample: string) {
  const file = `samples/ok/${sample}.csv`;
  const rig = 'samples/ok/worm-night.rig.json';
  const args = ['run', '--silent', 'analyse', '--', file, '--rig', rig];
  const { stdout } = await promisify(execFile)('npm', args, { maxBuffer: 64 * 1024 * 1024 });
  return analysisDocumentSchema.parse(JSON.parse(stdout));
}

const arcsec = (value: number | undefined) => `${value?.toFixed(2)}″`;

function rowOf(run: Run): RegExp {
  const cells = [run.ra?.rmsArcsec, run.dec?.rmsArcsec, run.total?.rmsArcsec].map(arcsec);
  const aspect = run.footprint?.aspect.toFixed(2);
  return new RegExp(
    [run.target, ...cells, aspect, `${run.subs?.within} of ${run.subs?.count}`].join('.*'),
    's',
  );
}

test('a newcomer signs up, describes a rig, drops logs and reads what the mount did', async ({
  page,
}) => {
  const otherHosts: string[] = [];
  page.on('request', (request) => {
    if (!/^(http:\/\/127\.0\.0\.1:|data:|blob:)/.test(request.url()))
      otherHosts.push(request.url());
  });
  const faults: string[] = [];
  page.on('console', (message) => {
    // The frame of a mail lets no script run: the test's own recorder tries, the product does not.
    const isMailFrame = message.text().includes('about:srcdoc');
    if (message.type() === 'error' && !isMailFrame) faults.push(message.text());
  });

  await signUpAndIn(page, newcomer('Ilse Varga'));
  const rigId = await describeOrchardPier(page, 'Orchard pier');

  await page.goto(`/rigs/${rigId}/import`);
  await page
    .locator('input[type=file]')
    .setInputFiles(NIGHTS.map(({ sample }) => `samples/ok/${sample}.csv`));
  await page.getByRole('button', { name: 'Add 2 files to Orchard pier' }).click();
  const nightLinks = page
    .getByRole('table')
    .first()
    .getByRole('link', { name: /^Night of/ });
  await expect(nightLinks).toHaveCount(2, { timeout: 60_000 });
  const addresses = await Promise.all(
    (await nightLinks.all()).map((link) => link.getAttribute('href')),
  );
  await nightLinks.first().click();
  await page.waitForURL('**/nights/2026-03-*');

  for (const { sample, date } of NIGHTS) {
    await page.goto(addresses.find((address) => address?.endsWith(`/nights/${date}`)) ?? '');
    const { runs } = await documentOf(sample);
    for (const run of runs)
      await expect(
        page
          .getByRole('row')
          .filter({ hasText: rowOf(run) })
          .first(),
      ).toBeVisible();
  }
  expect(otherHosts).toEqual([]);
  expect(faults).toEqual([]);
});

test('the document of a log is the one that the command line prints', async ({ page }) => {
  await signUpAndIn(page, newcomer('Tove Lindqvist'));
  const rigId = await describeOrchardPier(page, 'Ladder roof');
  await page.goto(`/rigs/${rigId}/import`);
  await page.locator('input[type=file]').setInputFiles('samples/ok/worm-night.csv');
  await page.getByRole('button', { name: 'Add 1 file to Ladder roof' }).click();
  await page
    .getByRole('link', { name: /^Night of/ })
    .first()
    .click({ timeout: 60_000 });
  const link = page.getByRole('link', { name: 'Document (JSON)' });
  const kept = await page.request.get((await link.getAttribute('href')) ?? '');
  expect(analysisDocumentSchema.parse(await kept.json())).toEqual(await documentOf('worm-night'));
  const original = page.getByRole('link', { name: 'Original file' }).first();
  const bytes = await page.request.get((await original.getAttribute('href')) ?? '');
  expect(Buffer.compare(await bytes.body(), readFileSync('samples/ok/worm-night.csv'))).toBe(0);
});
