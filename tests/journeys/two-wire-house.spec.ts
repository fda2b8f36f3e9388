import { execFileSync } from 'node:child_process';
import { writeFileSync } from 'node:fs';
import { expect, test, type Page } from '@playwright/test';
import { findForbiddenWords } from '@/lib/findings/wording/forbidden-words';
import {
  addPhoto,
  answer,
  backToAreas,
  enterArea,
  goToReceptacle,
  logCorrect,
  logLit,
  nextReceptacle,
  openTripTest,
  tellOccupant,
} from '../support/two-wire-walk';

const PHONE = { width: 390, height: 844 };
const DESK = { width: 1280, height: 900 };
const BUYER = 'imani.buyer@mail.example';

test('a two-wire house of 1962 is booked, walked, released, and read by its buyer', async ({ page, browser }, info) => {
  await signUp(page, `owner-${Date.now()}@firm.example`);
  const inspectionId = await book(page);
  await walk(page, inspectionId);
  await decideEverything(page, inspectionId);
  await release(page, inspectionId);
  const text = await pdfText(page, info.outputPath('report.pdf'));
  expectTrueReport(text);
  const link = await sendToBuyer(page, inspectionId);

  const buyer = await browser.newPage({ viewport: PHONE });
  await buyer.goto(link);
  await expect(buyer.getByRole('heading', { name: 'What to do first' })).toBeVisible();
  await expect(buyer.getByText('Stop using it now').first()).toBeVisible();
  const pdf = await buyer.request.get(
    (await buyer.getByRole('link', { name: 'Save the PDF' }).getAttribute('href')) ?? '',
  );
  expect(pdf.status()).toBe(200);
  expect((await pdf.body()).subarray(0, 5).toString()).toBe('%PDF-');
});

async function signUp(page: Page, email: string): Promise<void> {
  await page.setViewportSize(DESK);
  await page.goto('/sign-up');
  await page.getByLabel('Name of the firm').fill('Quarry Home Inspection');
  await page.getByLabel('State you work in').selectOption('NC');
  await page.getByLabel('Time zone').selectOption('America/New_York');
  await page.getByLabel('Your full name').fill('Wren Halloway');
  await page.getByLabel('E-mail').fill(email);
  await page.getByLabel('Password').fill('five copper lanterns 88');
  await page
    .getByRole('button', { name: /firm|sign up|start/i })
    .last()
    .click();
  await expect(page.getByRole('heading', { name: 'Inspections' })).toBeVisible();
  await page.goto('/people/me');
  await page.getByLabel('License number').fill('5550');
  await page.getByLabel('State of the license').fill('NC');
  await page.getByLabel('License expires').fill('2030-06-30');
  await page.getByLabel('Name as signed').fill('Wren Halloway');
  await page.getByRole('button', { name: /save/i }).first().click();
  await expect(page.getByText(/saved/i).first()).toBeVisible();
}

async function book(page: Page): Promise<string> {
  await page.goto('/inspections/new');
  await page.getByLabel('Street and number').fill('27 Quarry Bend');
  await page.getByLabel('City or town').fill('Alder Notch');
  await page.getByLabel('State', { exact: true }).selectOption('NC');
  await page.getByLabel('ZIP').fill('28199');
  await page.getByLabel('Year built').fill('1962');
  await page.getByLabel('Wiring method, if known').selectOption('two-wire');
  await page.getByLabel('Day and time').fill('2026-12-04T09:00');
  await page.getByLabel('Buyer’s name').fill('Imani Castellanos');
  await page.getByLabel('Buyer’s e-mail').fill(BUYER);
  await page.getByRole('button', { name: 'Book it' }).click();
  await expect(page.getByRole('heading', { level: 1, name: /27 Quarry Bend/ })).toBeVisible();
  return page.url().split('/').at(-1) ?? '';
}

/** Twelve receptacles: seven as asked of this house, the others correct. */
async function walk(page: Page, inspectionId: string): Promise<void> {
  await page.setViewportSize(PHONE);
  await page.goto(`/walk#${inspectionId}`);
  await page.getByRole('button', { name: /^Ready/ }).click();

  await enterArea(page, 'Living room');
  await logCorrect(page, 1);
  await logLit(page, ['neutral']);
  await addPhoto(page);
  await nextReceptacle(page);
  await logLit(page, ['neutral', 'neutral to ground']);
  await nextReceptacle(page);
  await logCorrect(page, 4);
  await backToAreas(page);

  await enterArea(page, 'Garage');
  await logLit(page, ['ground', 'neutral to ground']);
  await addPhoto(page);
  await page.getByRole('link', { name: /^Stop using it now/ }).click();
  await tellOccupant(page, 'Breaker 9 off and taped');
  await expect(page.getByRole('heading', { name: 'Receptacle 2' })).toBeVisible();
  await logCorrect(page, 2);
  await logCorrect(page, 3);
  await backToAreas(page);

  await enterArea(page, 'Kitchen, counter');
  await logLit(page, ['neutral']);
  await nextReceptacle(page);
  await goToReceptacle(page, 1);
  await openTripTest(page);
  await answer(page, /own test button/, 'It trips');
  await answer(page, /halves of the face/, 'Yes');
  await answer(page, /pressed already/, 'It does not trip');
  await answer(page, /Does it reset/, 'Yes');
  await expect(page.getByRole('heading', { name: 'Protection shown' })).toBeVisible();
  await page.getByRole('link', { name: 'Done, next' }).click();
  await logCorrect(page, 2);
  await backToAreas(page);

  await enterArea(page, 'Bathroom');
  await logCorrect(page, 1);
  await goToReceptacle(page, 1);
  await openTripTest(page);
  await answer(page, /own test button/, 'It trips');
  await answer(page, /halves of the face/, 'No');
  await expect(page.getByRole('heading', { name: 'No protection shown' })).toBeVisible();
  await page.getByRole('link', { name: /^Stop using it now/ }).click();
  await tellOccupant(page, 'Breaker 7 off');
  await backToAreas(page);
  await enterArea(page, 'Bedroom');
  await logCorrect(page, 1);
  await logCorrect(page, 2);
  await backToAreas(page);
  await expect(page.getByText('Everything is backed up.')).toBeAttached();
  await page.getByRole('button', { name: /^Review the findings/ }).click();
}

async function decideEverything(page: Page, inspectionId: string): Promise<void> {
  await page.setViewportSize(DESK);
  await page.goto(`/inspections/${inspectionId}/findings`);
  for (;;) {
    const waiting = page
      .getByRole('navigation', { name: 'Findings' })
      .getByRole('link', { name: /to decide|changed since/ });
    if ((await waiting.count()) === 0) return;
    const before = await waiting.count();
    await waiting.first().click();
    await page.getByRole('button', { name: 'Keep', exact: true }).click();
    await expect(page.getByText('Recorded.', { exact: true })).toBeVisible();
    await expect(waiting).toHaveCount(before - 1);
  }
}

async function release(page: Page, inspectionId: string): Promise<void> {
  await page.goto(`/inspections/${inspectionId}/report`);
  await page.getByRole('button', { name: /Sign and release/ }).click();
  await expect(page.getByText(/^Version 1/).first()).toBeVisible();
  await expect(page.getByRole('link', { name: /PDF/ }).first()).toBeVisible({ timeout: 60_000 });
}

async function pdfText(page: Page, file: string): Promise<string> {
  const href = await page.getByRole('link', { name: /PDF/ }).first().getAttribute('href');
  const response = await page.request.get(href ?? '');
  expect(response.status()).toBe(200);
  writeFileSync(file, await response.body());
  execFileSync('qpdf', ['--check', file]);
  return execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' }).replaceAll(/\s+/g, ' ');
}

function expectTrueReport(text: string): void {
  expect(text).toContain('27 Quarry Bend');
  // The receptacles that read correct on two-wire cable are unproven, and the jumper is named.
  expect(text).toMatch(/reads correct, but the ground is unproven/i);
  expect(text).toMatch(/jumper/i);
  // The ungrounded GFCI works by its own button; nothing calls it bad.
  expect(text).toMatch(/Kitchen, counter, Receptacle 1: GFCI works, has no ground/i);
  expect(text).not.toMatch(/Kitchen, counter, Receptacle 1: GFCI (does not|trips but)/i);
  // The one that stays live after its button is not to be used.
  expect(text).toMatch(/GFCI trips but its face stays live/i);
  expect(text).toContain('Stop using it now');
  // Lamps cannot separate what lights two lamps only.
  expect(text).toMatch(/may be a broken neutral, or hot and ground swapped/i);
  expect(text).toMatch(/hot and neutral (read as )?swapped/i);
  expect(text).toMatch(/SHA-256/);
  expect(text).toMatch(/not a code-compliance inspection/);
  expect(findForbiddenWords(text)).toEqual([]);
}

async function sendToBuyer(page: Page, inspectionId: string): Promise<string> {
  await page.goto(`/inspections/${inspectionId}/delivery`);
  await page.getByRole('button', { name: /^Send/ }).click();
  const sink = process.env.MAIL_SINK_URL ?? 'http://127.0.0.1:8025';
  type Mail = { to: string[]; text: string };
  const find = async () => {
    const mails = (await (await page.request.get(`${sink}/messages.json`)).json()) as Mail[];
    return mails.find((mail) => mail.to.includes(BUYER))?.text.match(/http\S+\/open#\S+/)?.[0];
  };
  await expect.poll(find, { timeout: 30_000 }).toBeTruthy();
  return (await find()) ?? '';
}
