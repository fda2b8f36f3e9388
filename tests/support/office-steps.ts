import { expect, type Page } from '@playwright/test';
import { DEMO_SIGN_INS } from '@/lib/demo';

export const DESK = { width: 1280, height: 900 };
export type House = {
  street: string;
  yearBuilt: string;
  wiringMethod: string;
  buyer: { name: string; email: string };
};

/** Signs in as one of the demo firm's people and stands at the list. */
export async function signIn(page: Page, who: (typeof DEMO_SIGN_INS)[number]['label']): Promise<void> {
  const person = DEMO_SIGN_INS.find(({ label }) => label === who);
  if (!person) throw new Error(`the demo has no ${who}`);
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(person.email);
  await page.getByLabel('Password').fill(person.password);
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'Inspections' })).toBeVisible();
}

/** Books a house in North Carolina from the list on. Returns the inspection's id. */
export async function book(page: Page, house: House): Promise<string> {
  await page.goto('/inspections');
  await page.getByRole('link', { name: 'Book an inspection' }).first().click();
  await page.getByLabel('Street and number').fill(house.street);
  await page.getByLabel('City or town').fill('Alder Notch');
  await page.getByLabel('State', { exact: true }).selectOption('NC');
  await page.getByLabel('ZIP').fill('28199');
  await page.getByLabel('Year built').fill(house.yearBuilt);
  await page.getByLabel('Wiring method, if known').selectOption({ label: house.wiringMethod });
  await page.getByLabel('Day and time').fill('2027-03-04T09:00');
  await page.getByLabel('Buyer’s name').fill(house.buyer.name);
  await page.getByLabel('Buyer’s e-mail').fill(house.buyer.email);
  await page.getByRole('button', { name: 'Book it' }).click();
  await expect(page.getByRole('heading', { level: 1, name: house.street })).toBeVisible();
  return new URL(page.url()).pathname.split('/').at(-1) ?? '';
}

/** Keeps every finding that waits, each after it was shown. Returns how many there were. */
export async function keepEveryFinding(page: Page, inspectionId: string): Promise<number> {
  await page.goto(`/inspections/${inspectionId}/findings`);
  const waiting = page.getByRole('navigation', { name: 'Findings' }).getByRole('link', { name: 'to decide' });
  await expect(waiting.first()).toBeVisible();
  const count = await waiting.count();
  for (let left = count; left > 0; left -= 1) {
    await waiting.first().click();
    await expect(waiting.first()).toHaveAttribute('aria-current', 'true');
    await page.getByRole('button', { name: 'Keep', exact: true }).click();
    await expect(page.getByRole('status').filter({ hasText: 'Recorded.' })).toBeVisible();
    await expect(waiting).toHaveCount(left - 1);
  }
  return count;
}

/** Signs and releases, and waits until the worker has made the PDF. */
export async function release(page: Page, inspectionId: string): Promise<void> {
  await page.goto(`/inspections/${inspectionId}/report`);
  await expect(page.getByRole('heading', { name: 'Nothing holds the release' })).toBeVisible();
  await page.getByRole('button', { name: 'Sign and release' }).click();
  await expect(page.getByRole('heading', { name: /^Version 1, released/ })).toBeVisible();
  await expect(page.getByRole('link', { name: /^PDF of version 1/ })).toBeVisible({ timeout: 90_000 });
}
