import { expect, type Page } from '@playwright/test';

/** What a person types of samples/ok/worm-night.rig.json. */
export async function describeOrchardPier(page: Page, name: string): Promise<string> {
  await page.goto('/rigs/new');
  await page.getByLabel('Name of the rig').fill(name);
  await page.getByLabel('Worm teeth').fill('180');
  await page.getByLabel('Guide rate, × sidereal').fill('0.5');
  await page.getByRole('button', { name: 'Add a gear stage' }).click();
  await page.getByLabel('Name', { exact: true }).fill('transfer gear');
  await page.getByLabel('Period, s', { exact: true }).fill('132.6');
  await page.getByLabel('Time zone').fill('America/Toronto');
  await page.getByRole('option', { name: 'America/Toronto' }).click();
  await page.getByLabel('Latitude, °').fill('45');
  await page.getByLabel('Longitude, °').fill('-75');
  await page.getByRole('button', { name: 'Make the rig' }).click();
  await page.waitForURL('**/setups/new');

  await page.getByLabel('Name of the setup').fill('Refractor and finder');
  await describeOptics(page, 0, { focalLength: 530, aperture: 106, pixel: 3.76 });
  await describeOptics(page, 1, { focalLength: 200, aperture: 50, pixel: 3.75 });
  await page.getByLabel('Seeing, ″ FWHM').fill('2.2');
  await page.getByLabel('Sub length, s').fill('300');
  await page.getByLabel('Keep limit, aspect ratio').fill('1.15');
  // worked out while typing: 206.265 · 3.76 / 530 and 206.265 · 3.75 / 200
  await expect(page.getByText('1.46″ per px').first()).toBeVisible();
  await expect(page.getByText('3.87″ per px').first()).toBeVisible();
  await page.getByRole('button', { name: 'Make the setup' }).click();
  await page.waitForURL('**/settings');
  const rigId = /rigs\/([0-9a-f-]+)\/settings/.exec(page.url())?.[1];
  if (rigId === undefined) throw new Error(`No rig in ${page.url()}`);
  return rigId;
}

interface Optics {
  readonly focalLength: number;
  readonly aperture: number;
  readonly pixel: number;
}

/** @param place 0 for the imaging side of the page, 1 for the guiding side. */
async function describeOptics(page: Page, place: number, optics: Optics): Promise<void> {
  await page.getByLabel('Focal length, mm').nth(place).fill(String(optics.focalLength));
  await page.getByLabel('Aperture, mm').nth(place).fill(String(optics.aperture));
  await page.getByLabel('Pixel size, µm').nth(place).fill(String(optics.pixel));
  await page.getByLabel('Binning').nth(place).fill('1');
}
