import { expect, type Page } from '@playwright/test';
import sharp from 'sharp';

export const PHONE = { width: 390, height: 844 };
export type LampName = 'hot to neutral' | 'hot to ground' | 'neutral to ground';

/** What is on the screen of a phone during a walk, step by step, by role and label. */
export async function openWalk(page: Page, inspectionId: string): Promise<void> {
  await page.goto(`/walk#${inspectionId}`);
  const ready = page.getByRole('button', { name: /^Ready\. Start the walk/ });
  await expect(ready.or(page.getByRole('heading', { name: /No area yet/ }))).toBeVisible();
  if (await ready.isVisible()) await ready.tap();
}

/** Adds an area of that kind and stands in it. */
export async function addArea(page: Page, kind: string): Promise<void> {
  const place = page.getByRole('button', { name: kind, exact: true });
  const add = page.getByRole('button', { name: 'Add an area' });
  await expect(place.or(add)).toBeVisible();
  if (await add.isVisible()) await add.tap();
  await place.tap();
  await expect(page.getByRole('heading', { level: 1, name: kind })).toBeVisible();
  await expectReceptacle(page, 1);
}

export async function expectReceptacle(page: Page, number: number): Promise<void> {
  await expect(page.getByRole('heading', { level: 2, name: `Receptacle ${number}`, exact: true })).toBeVisible();
}

export async function logCorrect(page: Page, number: number): Promise<void> {
  await expectReceptacle(page, number);
  await page.getByRole('button', { name: /^Lamps read correct/ }).tap();
  await expectLogged(page, `Receptacle ${number}, lamps correct`);
}

export async function expectLogged(page: Page, words: string): Promise<void> {
  await expect(page.getByRole('status').filter({ hasText: `Logged ${words}` })).toBeVisible();
}

/** Taps each lamp that is lit, then the large button, which says what it records. The result opens. */
export async function logLit(page: Page, lit: LampName[]): Promise<void> {
  for (const lamp of lit) await page.getByRole('button', { name: `Lamp ${lamp}:` }).tap();
  await page.getByRole('button', { name: /Not a correct pattern\.$/ }).tap();
  await expect(page.getByText('Not proven:')).toBeVisible();
}

export async function next(page: Page, number: number): Promise<void> {
  await page.getByRole('link', { name: 'Log as it stands, next' }).tap();
  await expectReceptacle(page, number);
}

/** Back to a receptacle of the area on screen. */
export async function goBackTo(page: Page, number: number): Promise<void> {
  await page.getByRole('link', { name: `Receptacle ${number},` }).tap();
  await expectReceptacle(page, number);
}

export async function backToAreas(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'Back to the areas' }).tap();
  await expect(page.getByRole('heading', { level: 1, name: 'Walk' })).toBeVisible();
}

/** Says what the receptacle on screen is, and comes back to its lamps. */
export async function setDevice(page: Page, choice: string): Promise<void> {
  await page.getByRole('link', { name: '5-15R' }).tap();
  const button = page.getByRole('button', { name: choice, exact: true });
  await button.tap();
  await expect(button).toHaveAttribute('aria-pressed', 'true');
  await page.getByRole('link', { name: 'Back to the lamps' }).tap();
}

export async function openTrial(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'Trip test' }).tap();
  const card = page.getByRole('button', { name: /^Asked and told/ });
  const question = page.getByRole('group', { name: 'Where is the GFCI?' });
  await expect(card.or(question)).toBeVisible();
  if (await card.isVisible()) await card.tap();
  await expect(question).toBeVisible();
}

export async function answer(page: Page, question: string | RegExp, words: string): Promise<void> {
  const button = page.getByRole('group', { name: question }).getByRole('button', { name: words, exact: true });
  await button.tap();
  await expect(button).toHaveAttribute('aria-pressed', 'true');
}

/** Leaves a trial for its area, by whatever its last link says. */
export async function leaveTrial(page: Page, number: number): Promise<void> {
  await page.getByRole('main').getByRole('link').last().tap();
  await expectReceptacle(page, number);
}

/** Writes down who was told of the dangerous point on screen. */
export async function tellOccupant(page: Page, name: string, leftOff: string): Promise<void> {
  await page.getByRole('link', { name: /^Stop using it now/ }).tap();
  await answer(page, 'Who was told?', 'Occupant');
  await page.getByLabel('Name', { exact: true }).fill(name);
  await page.getByLabel('What was left off').fill(leftOff);
  await page.getByRole('button', { name: /^Told/ }).tap();
}

export async function skipBecause(page: Page, number: number, reason: string): Promise<void> {
  await expectReceptacle(page, number);
  await page.getByRole('button', { name: 'Skip…' }).tap();
  await page.getByRole('button', { name: reason, exact: true }).tap();
  await expectLogged(page, `Receptacle ${number}, skipped`);
}

/** Takes a picture the way a thumb does: the button, then the camera. */
export async function takePhoto(page: Page, name = 'receptacle.jpg'): Promise<void> {
  const chooser = page.waitForEvent('filechooser');
  await page.getByText('Photo', { exact: true }).tap();
  await (await chooser).setFiles({ name, mimeType: 'image/jpeg', buffer: await picture(name) });
  await expect(page.getByText('Photo saved on this phone.')).toBeVisible();
}

/** Everything that the phone held has reached the office. */
export async function expectBackedUp(page: Page): Promise<void> {
  await expect(page.getByText('Everything is backed up.')).toBeAttached({ timeout: 45_000 });
}

/** A drawn JPEG: no two of different names are alike. */
export async function picture(name: string): Promise<Buffer> {
  const drawing = `<svg xmlns="http://www.w3.org/2000/svg" width="1200" height="900"><rect width="1200" height="900" fill="#b9c2bd"/>
    <rect x="450" y="200" width="300" height="500" rx="30" fill="#f4f1e8"/><text x="60" y="860" font-size="48">${name}</text></svg>`;
  return sharp(Buffer.from(drawing)).jpeg().toBuffer();
}
