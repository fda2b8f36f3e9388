import { expect, type Page } from '@playwright/test';
import sharp from 'sharp';

type Lamp = 'neutral' | 'ground' | 'neutral to ground';
const LAMP_NAMES: Record<Lamp, RegExp> = {
  neutral: /^Lamp hot to neutral/,
  ground: /^Lamp hot to ground/,
  'neutral to ground': /^Lamp neutral to ground/,
};

/** A picture in place of a photo, made when it is needed. */
export async function picture(): Promise<{ name: string; mimeType: string; buffer: Buffer }> {
  const buffer = await sharp({ create: { width: 900, height: 700, channels: 3, background: '#b9c2bd' } })
    .jpeg()
    .toBuffer();
  return { name: 'receptacle.jpg', mimeType: 'image/jpeg', buffer };
}

/** Adds an area of that kind and goes into it. */
export async function enterArea(page: Page, kind: string): Promise<void> {
  const add = page.getByRole('button', { name: 'Add an area' });
  if (await add.isVisible()) await add.click();
  await page.getByRole('button', { name: kind, exact: true }).click();
  await expect(page.getByRole('heading', { name: 'Receptacle 1' })).toBeVisible();
}

export async function backToAreas(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'Back to the areas' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Walk' })).toBeVisible();
}

/** One tap. */
export async function logCorrect(page: Page, number: number): Promise<void> {
  await page.getByRole('button', { name: /^Lamps read correct/ }).click();
  await expect(page.getByRole('status').filter({ hasText: `Receptacle ${number}, lamps correct` })).toBeVisible();
}

/** Taps the lamps that are lit; the large button then names the pattern. */
export async function logLit(page: Page, lit: Lamp[]): Promise<void> {
  for (const lamp of lit) await page.getByRole('button', { name: LAMP_NAMES[lamp] }).click();
  await page
    .getByRole('button', { name: /^Records|lit/ })
    .filter({ hasText: 'Records' })
    .click();
  await expect(page.getByText('Not proven:')).toBeVisible();
}

export async function addPhoto(page: Page): Promise<void> {
  await page.getByLabel('Photo', { exact: true }).setInputFiles(await picture());
  await expect(page.getByText('Photo saved on this phone.')).toBeVisible();
}

export async function nextReceptacle(page: Page): Promise<void> {
  await page.getByRole('link', { name: 'Log as it stands, next' }).click();
  await expect(page.getByRole('heading', { name: /^Receptacle \d+$/ })).toBeVisible();
}

/** Goes to a receptacle of the area on screen by its number. */
export async function goToReceptacle(page: Page, number: number): Promise<void> {
  await page.getByRole('link', { name: new RegExp(`^Receptacle ${number},`) }).click();
  await expect(page.getByRole('heading', { name: `Receptacle ${number}` })).toBeVisible();
}

/** Makes the receptacle on screen a GFCI and opens its trip test. */
export async function openTripTest(page: Page): Promise<void> {
  await page.getByRole('link', { name: '5-15R' }).click();
  await page.getByRole('button', { name: 'GFCI receptacle', exact: true }).click();
  await page.getByRole('link', { name: 'Back to the lamps' }).click();
  await page.getByRole('link', { name: 'Trip test' }).click();
  const card = page.getByRole('button', { name: /^Asked and told/ });
  await expect(card.or(page.getByText('Where is the GFCI?'))).toBeVisible();
  if (await card.isVisible()) await card.click();
  await expect(page.getByText('Where is the GFCI?')).toBeVisible();
}

export async function answer(page: Page, question: RegExp, words: string): Promise<void> {
  const group = page.getByRole('group', { name: question });
  await group.getByRole('button', { name: words, exact: true }).click();
  await expect(group.getByRole('button', { name: words, exact: true })).toHaveAttribute('aria-pressed', 'true');
}

/** Records that the occupant was told of the dangerous receptacle on screen. */
export async function tellOccupant(page: Page, left: string): Promise<void> {
  await page.getByRole('button', { name: 'Occupant', exact: true }).click();
  await page.getByLabel('Name', { exact: true }).fill('Dell Arden');
  await page.getByLabel('What was left off').fill(left);
  await page.getByRole('button', { name: /^Told/ }).click();
}
