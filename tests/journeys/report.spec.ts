import { expect, test, type Browser, type Page } from '@playwright/test';
import { findForbiddenWords } from '@/lib/findings/wording/forbidden-words';
import { keysOf, mailTo } from '../support/mail-sink';
import { book, DESK, keepEveryFinding, release, signIn } from '../support/office-steps';
import { pdfPages } from '../support/pdf-text';
import * as walk from '../support/walk-steps';

const STREET = '27 Quarry Bend';

test.use({ hasTouch: true, viewport: DESK });

test('a two-wire house of 1962 is booked, walked, released, printed and read by its buyer', async ({
  page,
  browser,
}, info) => {
  test.setTimeout(420_000);
  const buyer = { name: 'Imani Castellanos', email: `imani.${Date.now()}@mail.example` };
  await signIn(page, 'Inspector');
  const inspectionId = await book(page, {
    street: STREET,
    yearBuilt: '1962',
    wiringMethod: 'Two-wire cable, no ground',
    buyer,
  });

  await page.setViewportSize(walk.PHONE);
  await walkTheHouse(page, inspectionId);
  await page.setViewportSize(DESK);
  expect(await keepEveryFinding(page, inspectionId)).toBeGreaterThan(5);
  await release(page, inspectionId);

  const href = await page.getByRole('link', { name: /^PDF of version 1/ }).getAttribute('href');
  const printed = await page.request.get(href ?? '');
  const pages = pdfPages(await printed.body(), info.outputPath('report.pdf'));
  await info.attach('report.txt', { body: pages.join('\f'), contentType: 'text/plain' });
  expectTruePages(pages);

  await page.goto(`/inspections/${inspectionId}/delivery`);
  await page.getByRole('button', { name: `Send version 1 to ${buyer.name}` }).click();
  await expect(page.getByText(/^Mailed /)).toBeVisible({ timeout: 60_000 });
  const keys = keysOf(await mailTo(buyer.email));
  await readByLink(browser, keys.link, await printed.body());
  await readByCode(browser, buyer.email, keys.code);
  await page.reload();
  await expect(page.getByText(/^Opened 2 times/)).toBeVisible();
});

/** Twelve receptacles: each fault of the house once, the rest correct, without a ground slot, or skipped. */
async function walkTheHouse(page: Page, inspectionId: string): Promise<void> {
  await walk.openWalk(page, inspectionId);
  await livingRoom(page);
  await kitchen(page);
  await bathroom(page);
  await garage(page);
  await walk.addArea(page, 'Bedroom');
  await walk.logCorrect(page, 1);
  await walk.logCorrect(page, 2);
  await walk.backToAreas(page);
  await expect(page.getByText('11 of 12 tested, 1 skipped')).toBeVisible();
  await walk.expectBackedUp(page);
  await page.getByRole('button', { name: /^Review the findings/ }).tap();
  await expect(page.getByRole('navigation', { name: 'Findings' })).toBeVisible();
}

async function livingRoom(page: Page): Promise<void> {
  await walk.addArea(page, 'Living room');
  await walk.logLit(page, ['hot to neutral']);
  await walk.takePhoto(page, 'open ground.jpg');
  await walk.next(page, 2);
  await walk.logCorrect(page, 2);
  await walk.logLit(page, ['hot to neutral', 'neutral to ground']);
  await walk.takePhoto(page, 'reversed.jpg');
  await walk.next(page, 4);
  await page.getByRole('button', { name: 'Add a receptacle' }).tap();
  await page.getByRole('link', { name: 'Receptacle 4, untested' }).tap();
  await walk.setDevice(page, '1-15R');
  await page.getByRole('button', { name: /^The lamp is lit H–N lit\. Then the next one/ }).tap();
  await walk.expectLogged(page, 'Receptacle 4, H–N lit');
  await walk.backToAreas(page);
}

/** Its own button works; the plug-in tester has no ground to send its current to. */
async function kitchen(page: Page): Promise<void> {
  await walk.addArea(page, 'Kitchen, counter');
  await walk.logLit(page, ['hot to neutral']);
  await walk.next(page, 2);
  await walk.goBackTo(page, 1);
  await walk.setDevice(page, 'GFCI receptacle');
  await walk.openTrial(page);
  await walk.answer(page, 'Press its own test button.', 'It trips');
  await walk.answer(page, /halves of the face/, 'Yes');
  await walk.answer(page, 'Does it reset?', 'Yes');
  await walk.answer(page, /pressed already/, 'It does not trip');
  await expect(page.getByRole('heading', { name: 'Protection shown' })).toBeVisible();
  await walk.leaveTrial(page, 2);
  await walk.logCorrect(page, 2);
  await walk.backToAreas(page);
}

/** It clicks, and its face stays live. */
async function bathroom(page: Page): Promise<void> {
  await walk.addArea(page, 'Bathroom');
  await walk.logCorrect(page, 1);
  await walk.goBackTo(page, 1);
  await walk.setDevice(page, 'GFCI receptacle');
  await walk.openTrial(page);
  await walk.answer(page, 'Press its own test button.', 'It trips');
  await walk.answer(page, /halves of the face/, 'No');
  await walk.answer(page, 'Does it reset?', 'Yes');
  await expect(page.getByRole('heading', { name: 'No protection shown' })).toBeVisible();
  await walk.tellOccupant(page, 'Dell Arden', 'Breaker 7 off and taped');
  await walk.backToAreas(page);
}

async function garage(page: Page): Promise<void> {
  await walk.addArea(page, 'Garage');
  await walk.logLit(page, ['hot to ground', 'neutral to ground']);
  await walk.takePhoto(page, 'two lamps.jpg');
  await walk.tellOccupant(page, 'Dell Arden', 'Breaker 9 off and taped');
  await walk.logCorrect(page, 2);
  await walk.skipBecause(page, 3, 'Blocked by furniture or stored things');
  await walk.backToAreas(page);
}

/** What an electrician would sign, and nothing beyond it. */
function expectTruePages(pages: string[]): void {
  const text = pages.join(' ').replaceAll(/\s+/g, ' ');
  expect(text).toContain(STREET);

  // Three slots that read correct on two-wire cable prove no ground.
  const correct = findingOf(text, 'reads correct, but the ground is unproven');
  expect(correct).toMatch(/6 receptacles/);
  expect(correct).toMatch(/a jumper ties the ground slot to the neutral\. The ground is unproven/);

  const kitchen = findingOf(text, 'Kitchen, counter, receptacle 1: GFCI works, has no ground');
  expect(kitchen).toMatch(/the GFCI trips by its own button/);
  expect(kitchen).toMatch(/a plug-in tester needs one to trip it/);
  expect(kitchen).toMatch(/not shown to be bad/);
  expect(kitchen).not.toMatch(/replac|worn|does not protect|stop using|within days/i);
  expect(text).not.toMatch(/GFCI (does not trip|is at its end|signals)|GFCI did not trip/i);

  const bathroom = findingOf(text, 'Bathroom, receptacle 1: GFCI trips but its face stays live');
  expect(bathroom).toMatch(/Occupant, Dell Arden\. Breaker 7 off/);
  expect(pages[1]).toMatch(/Bathroom, receptacle 1\s+page \d+\s+Stop using it now/);

  const twoLamps = findingOf(text, 'Garage, receptacle 1: may be a broken neutral, or hot and ground swapped');
  expect(twoLamps).toMatch(/The lamps cannot tell these apart/);
  expect(pages[1]).toMatch(/Garage, receptacle 1\s+page \d+\s+Stop using it now/);

  findingOf(text, 'Living room, receptacle 1: three-slot receptacle shows no ground');
  findingOf(text, 'Living room, receptacle 3: hot and neutral read as swapped');

  expect(text).toMatch(/receptacle 3 Not tested: blocked by furniture/);
  expect(text).toMatch(/Limits of these tests/i);
  expect(text).toMatch(/not a code-compliance inspection/i);
  expect(text.replaceAll(' ', '')).toMatch(/SHA-256oftherecord[0-9a-f]{64}/i);
  expect(findForbiddenWords(text)).toEqual([]);
  expectPageNumbers(pages);
}

/** The part of the report that holds the finding of that title. */
function findingOf(text: string, title: string): string {
  const parts = text.split(/(?=\bFinding \d+ )/).slice(1);
  const part = parts.find((one) => one.slice(0, 200).includes(title));
  expect(part, title).toBeDefined();
  return part ?? '';
}

function expectPageNumbers(pages: string[]): void {
  for (const [index, page] of pages.entries())
    expect(page, `page ${index + 1}`).toMatch(new RegExp(`\\b${index + 1} of ${pages.length}\\b`));
}

/** From the link in the mail, on a phone that belongs to nobody in the firm. */
async function readByLink(browser: Browser, link: string, printed: Buffer): Promise<void> {
  const context = await browser.newContext({ viewport: walk.PHONE });
  const page = await context.newPage();
  await page.goto(link);
  await expect(page.getByRole('heading', { level: 1, name: 'What to do first' })).toBeVisible();
  expect(new URL(page.url()).pathname).toMatch(/^\/shared\//);
  expect(page.url()).not.toContain('#');
  const first = page.getByRole('list').first().getByRole('listitem');
  await expect(first.first()).toContainText('Stop using it now');
  await expect(first.filter({ hasText: 'Stop using it now' })).toHaveCount(2);
  await expect(page.getByText('What this does not tell you')).toBeVisible();
  expect(findForbiddenWords(await page.getByRole('main').innerText())).toEqual([]);

  const href = await page.getByRole('link', { name: 'Save the PDF' }).getAttribute('href');
  const saved = await page.request.get(href ?? '');
  expect(saved.headers()['content-type']).toBe('application/pdf');
  expect((await saved.body()).equals(printed)).toBe(true);
  const stranger = await browser.newContext();
  const own = new URL(href ?? '', page.url());
  const unknown = new URL(own);
  unknown.searchParams.set('grant', '00000000-0000-7000-8000-000000000000');
  const [refused, never] = [await stranger.request.get(own.href), await stranger.request.get(unknown.href)];
  // Without the link's cookie a grant that is there answers as one that is not.
  expect(refused.status()).toBe(401);
  expect(never.status()).toBe(401);
  expect(await refused.text()).toBe(await never.text());
  await stranger.close();
  await context.close();
}

/** Without script the same page opens by the short code of the mail. */
async function readByCode(browser: Browser, email: string, code: string): Promise<void> {
  const context = await browser.newContext({ viewport: walk.PHONE, javaScriptEnabled: false });
  const page = await context.newPage();
  await page.goto('/open');
  await page.getByLabel('E-mail the mail was sent to').fill(email);
  await page.getByLabel('Short code').fill(code);
  await page.getByRole('button', { name: 'Open by code' }).click();
  await expect(page.getByRole('heading', { level: 1, name: 'What to do first' })).toBeVisible();
  await expect(page.getByText('Stop using it now').first()).toBeVisible();
  await context.close();
}
