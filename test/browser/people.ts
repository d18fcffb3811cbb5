import { expect, type Page } from '@playwright/test';

const PASSWORD = 'lanterns and ladders';

export interface Person {
  readonly name: string;
  readonly email: string;
}

/** A person who has not been here before. */
export function newcomer(name: string): Person {
  const unique = `${Date.now()}-${Math.floor(Math.random() * 1e6)}`;
  return { name, email: `${name.split(' ')[0]?.toLowerCase()}-${unique}@example.org` };
}

/** Makes an account, follows the link of the mail, and signs in: what a person does on the first visit. */
export async function signUpAndIn(page: Page, person: Person): Promise<void> {
  await page.goto('/sign-up');
  await page.getByLabel('Name').fill(person.name);
  await page.getByLabel('Email').fill(person.email);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Make the account' }).click();
  await expect(page.getByRole('heading', { name: 'Now look at your mail' })).toBeVisible();
  const told = await page.getByRole('main').innerText();
  const mailPage = /http:\/\/127\.0\.0\.1:\d+/.exec(told)?.[0];
  if (mailPage === undefined) throw new Error('The page does not say where the mails are shown');

  await page.goto(await confirmationLink(page, mailPage, person));
  await page.getByRole('button', { name: 'Confirm the address' }).click();
  await expect(page.getByRole('heading', { name: 'Your address is confirmed' })).toBeVisible();
  await page.getByRole('main').getByRole('link', { name: 'Sign in' }).click();
  await signIn(page, person);
}

/** @param leadsTo The page that a person who signs in comes to. */
export async function signIn(page: Page, person: Person, leadsTo = '**/rigs'): Promise<void> {
  await page.getByLabel('Email').fill(person.email);
  await page.getByLabel('Password').fill(PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  await page.waitForURL(leadsTo);
}

/** Reads the mail page as a person would, until the mail is there. */
async function confirmationLink(page: Page, mailPage: string, person: Person): Promise<string> {
  const entry = page.getByRole('row').filter({ hasText: person.email });
  await expect(async () => {
    await page.goto(mailPage);
    await expect(entry).toHaveCount(1, { timeout: 500 });
  }).toPass({ timeout: 30_000 });
  await entry.getByRole('link').click();
  const link = page.getByRole('link', { name: '/confirm#token=' }).first();
  const href = await link.getAttribute('href');
  if (href === null) throw new Error('The mail holds no link');
  return href;
}
