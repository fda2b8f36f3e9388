/**
 * Takes the pictures of README.md from a running demo, in Debian's Chromium, and writes them to docs/pictures.
 *   npm start                                             in another window, with its demo as it was loaded
 *   node scripts/pictures.mjs [address] [mail sink]       default http://127.0.0.1:3000 and http://127.0.0.1:8025
 */
import { mkdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { chromium } from '@playwright/test';
import sharp from 'sharp';
import { explain, say, step, Stop } from './say.mjs';

const root = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '');
const folder = path.join(root, 'docs/pictures');
const [address = 'http://127.0.0.1:3000', mailSink = 'http://127.0.0.1:8025'] = process.argv.slice(2);
const MOST_BYTES = 150_000;
const DESK = { width: 1280, height: 860 };
const PHONE = { width: 390, height: 844 };
const RELEASED = '1408 Saddler Court';
const IN_WALK = '27 Quarry Bend';

async function main() {
  mkdirSync(folder, { recursive: true });
  const browser = await chromium.launch({
    executablePath: '/usr/bin/chromium',
    args: ['--no-sandbox', '--disable-gpu'],
  });
  try {
    await atDesk(browser);
    await onPhone(browser);
    await asBuyer(browser);
  } finally {
    await browser.close();
  }
}

async function atDesk(browser) {
  const page = await signedIn(browser, DESK);
  await page.getByRole('link', { name: RELEASED }).first().waitFor();
  await take(page, 'inspections');
  await page.goto(`${await inspectionAt(page, RELEASED)}/findings`);
  await page.getByRole('navigation', { name: 'Findings' }).waitFor();
  await take(page, 'findings');
  await page.context().close();
}

/** A receptacle of the demo's two-wire house on which only the two lamps to ground are lit. */
async function onPhone(browser) {
  const page = await signedIn(browser, PHONE);
  const id = (await inspectionAt(page, IN_WALK)).split('/').at(-1);
  const { state } = await page.request.get(`${address}/api/inspections/${id}/walk`).then((answer) => answer.json());
  const reading = state.readings.find(({ evidence }) => evidence.lamps?.hn === 'off' && evidence.lamps?.ng === 'lit');
  await page.goto(`${address}/walk#${id}/result/${reading.receptacleId}`);
  await page.getByText('Not proven:').waitFor();
  await take(page, 'walk');
  await page.context().close();
}

/** By the link in the demo's mail, as somebody without an account. */
async function asBuyer(browser) {
  const messages = await fetch(`${mailSink}/messages.json`).then((answer) => answer.json());
  const letter = messages.find(({ subject }) => subject.includes(RELEASED));
  const link = /http\S+\/open#\S+/.exec(letter?.text ?? '')?.[0];
  if (!link) throw new Stop(`No mail about ${RELEASED} at ${mailSink}: start the demo anew.`);
  const page = await (await browser.newContext({ viewport: PHONE, colorScheme: 'light' })).newPage();
  await page.goto(link);
  await page.getByRole('heading', { level: 1, name: 'What to do first' }).waitFor();
  await take(page, 'buyer');
  await page.context().close();
}

async function signedIn(browser, viewport) {
  const page = await (await browser.newContext({ viewport, colorScheme: 'light' })).newPage();
  const demo = readFileSync(path.join(root, 'lib/demo.ts'), 'utf8');
  await page.goto(`${address}/sign-in`);
  await page.getByLabel('E-mail').fill(/label: 'Inspector'.*?email: '([^']+)'/.exec(demo)?.[1] ?? '');
  await page.getByLabel('Password').fill(/DEMO_PASSWORD = '([^']+)'/.exec(demo)?.[1] ?? '');
  await page.getByRole('button', { name: 'Sign in', exact: true }).click();
  await page.getByRole('heading', { level: 1, name: 'Inspections' }).waitFor();
  return page;
}

async function inspectionAt(page, street) {
  const link = page.getByRole('link', { name: street }).first();
  return new URL(await link.getAttribute('href'), address).href;
}

/** What the window shows, in at most 256 colors: a page of this look has few. */
async function take(page, name) {
  await page.evaluate(() => document.fonts.ready);
  await page.waitForLoadState('networkidle');
  const file = path.join(folder, `${name}.png`);
  const { size } = await sharp(await page.screenshot({ animations: 'disabled' }))
    .png({ palette: true, effort: 10 })
    .toFile(file);
  if (size > MOST_BYTES) throw new Stop(`${file} has ${size} bytes, which is over ${MOST_BYTES}.`);
  say(`${path.relative(root, file)}  ${Math.round(size / 1000)} kB`);
}

step('Taking pictures', main).catch((error) => {
  say(explain(error));
  process.exitCode = 1;
});
