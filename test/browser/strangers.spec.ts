import { type Browser, expect, type Page, test } from '@playwright/test';
import { describeOrchardPier } from './orchard-rig';
import { newcomer, signIn, signUpAndIn } from './people';

const NOT_THERE = 'There is no page at this address, or it is not shared with you.';

/** A browser of somebody else: with no session. */
async function otherPerson(browser: Browser): Promise<Page> {
  return (await browser.newContext()).newPage();
}

function pagesOf(rigId: string): string[] {
  const pages = ['settings', 'setups/new', 'nights', 'nights/2026-03-14', 'import'];
  return pages.map((page) => `/rigs/${rigId}/${page}`);
}

test('a rig is there for its owner, not for a stranger and not for a signed-out person', async ({
  page,
  browser,
}) => {
  const owner = newcomer('Ilse Varga');
  await signUpAndIn(page, owner);
  const rigId = await describeOrchardPier(page, 'Hidden pier');

  const stranger = await otherPerson(browser);
  await signUpAndIn(stranger, newcomer('Tove Lindqvist'));
  await expect(stranger.getByRole('main')).toContainText('Three steps');
  for (const address of pagesOf(rigId)) {
    await stranger.goto(address);
    await expect(stranger.getByRole('main'), address).toContainText(/not shared with you/);
    await expect(stranger.locator('body'), address).not.toContainText('Hidden pier');
  }
  await stranger.goto(`/rigs/${rigId}/nowhere`);
  await expect(stranger.getByRole('heading', { level: 1 })).toHaveText(NOT_THERE);

  const nobody = await otherPerson(browser);
  for (const address of ['/', '/rigs', '/account', ...pagesOf(rigId)]) {
    await nobody.goto(address);
    await expect(nobody.getByRole('heading', { level: 1 }), address).toHaveText('Sign in');
  }
  // Whoever signs in on the way stands where they wanted to go.
  await signIn(nobody, owner, `**/rigs/${rigId}/import`);

  await page.getByRole('button', { name: `Account of ${owner.name}` }).click();
  await page.getByRole('menuitem', { name: 'Sign out' }).click();
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Sign in');
  await page.goBack();
  await expect(page.getByRole('heading', { level: 1 })).toHaveText('Sign in');
  await expect(page.locator('body')).not.toContainText('Hidden pier');
});
