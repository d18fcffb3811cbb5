import AxeBuilder from '@axe-core/playwright';
import { expect, type Page, test } from '@playwright/test';
import { describeOrchardPier } from './orchard-rig';
import { newcomer, signUpAndIn } from './people';

const THEMES = ['Day', 'Night', 'Red light'] as const;
const BLACK = 'rgb(0, 0, 0)'; // the paper of red light, and of no other theme
const WIDE = { width: 1440, height: 900 };
const NARROW = { width: 390, height: 844 };

/** In each theme: nothing that axe calls serious. On a phone: nothing that sticks out at the side. */
async function checkPage(page: Page, address: string): Promise<void> {
  await page.goto(address);
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible();
  await expect(page.locator('app-waiting')).toHaveCount(0);
  for (const theme of THEMES) {
    await page.getByRole('group', { name: 'Theme' }).getByRole('button', { name: theme }).click();
    // The pages hold no frames, so axe needs no second page to sum them up.
    const axe = new AxeBuilder({ page }).setLegacyMode();
    // A theme is colours alone: what else there is to find is found in the first one.
    if (theme !== 'Day') axe.withRules(['color-contrast']);
    const { violations } = await axe.analyze();
    const grave = violations
      .filter(({ impact }) => impact === 'serious' || impact === 'critical')
      .map(({ id, nodes }) => ({ id, at: nodes.map(({ target }) => target.join(' ')) }));
    expect(grave, `${address}, ${theme}`).toEqual([]);
  }
  await page.setViewportSize(NARROW);
  const width = () => page.evaluate(() => document.documentElement.scrollWidth);
  await expect.poll(width, { message: address }).toBe(NARROW.width);
  await page.setViewportSize(WIDE);
}

test('the pages before signing in can be read in each theme and on a phone', async ({ page }) => {
  for (const address of ['/sign-in', '/sign-up', '/forgot-password', '/confirm', '/reset-password'])
    await checkPage(page, address);
});

test('the pages of a member can be read in each theme and on a phone', async ({ page }) => {
  test.slow(); // ten pages, each looked through three times
  await signUpAndIn(page, newcomer('Ilse Varga'));
  for (const address of ['/rigs', '/nowhere']) await checkPage(page, address);

  const rigId = await describeOrchardPier(page, 'Orchard pier');
  const rig = `/rigs/${rigId}`;
  await page.goto(`${rig}/import`);
  await page.locator('input[type=file]').setInputFiles('samples/ok/three-targets.csv');
  await page.getByRole('button', { name: 'Add 1 file to Orchard pier' }).click();
  await expect(page.getByRole('link', { name: /^Night of/ }).first()).toBeVisible({
    timeout: 60_000,
  });
  const pages = ['settings', 'setups/new', 'import', 'nights', 'nights/2026-03-14'];
  for (const address of ['/rigs', ...pages.map((name) => `${rig}/${name}`), '/account'])
    await checkPage(page, address);
});

test('the chosen theme is kept on the device, and no other one is seen while a page loads', async ({
  page,
}) => {
  await page.goto('/sign-in');
  await page.getByRole('button', { name: 'Red light' }).click();
  await page.addInitScript(() => {
    const seen: string[] = [];
    Object.assign(globalThis, { seenGrounds: seen });
    const look = () => {
      seen.push(getComputedStyle(document.documentElement).backgroundColor);
      requestAnimationFrame(look);
    };
    requestAnimationFrame(look);
  });
  await page.goto('/sign-up');
  await expect(page.getByRole('heading', { name: 'Make an account' })).toBeVisible();
  const seen = await page.evaluate(() => (globalThis as { seenGrounds?: string[] }).seenGrounds);
  expect(seen?.length).toBeGreaterThan(0);
  expect(new Set(seen)).toEqual(new Set([BLACK]));
});
