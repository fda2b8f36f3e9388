import { expect, test, type Page } from '@playwright/test';
import { book, signIn } from '../support/office-steps';
import * as walk from '../support/walk-steps';

test.use({ hasTouch: true });

/** Answers of the server wait until they are let go, so that a save is under way for as long as the test looks. */
async function holdSync(page: Page): Promise<() => void> {
  let letGo = () => {};
  const held = new Promise<void>((resolve) => (letGo = resolve));
  await page.route('**/api/sync', async (route) => {
    await held;
    await route.continue();
  });
  return letGo;
}

test('nothing moves under the thumb while a reading is on its way', async ({ page }) => {
  await signIn(page, 'Inspector');
  const buyer = { name: 'Odell Marsh', email: `odell.${Date.now()}@mail.example` };
  const inspectionId = await book(page, {
    street: '5 Steady Lane',
    yearBuilt: '1990',
    wiringMethod: 'Not known',
    buyer,
  });
  await page.setViewportSize(walk.PHONE);
  await walk.openWalk(page, inspectionId);
  await walk.addArea(page, 'Garage');
  await expect(page.getByText('Everything is backed up.')).toBeAttached();
  const back = page.getByRole('link', { name: 'Back to the areas' });
  const before = await back.boundingBox();

  const letGo = await holdSync(page);
  await walk.logCorrect(page, 1);
  await expect(page.getByText(/on this phone only/)).toBeVisible();
  expect(await back.boundingBox()).toEqual(before);
  letGo();
  await expect(page.getByText('Everything is backed up.')).toBeAttached();
  expect(await back.boundingBox()).toEqual(before);
});
