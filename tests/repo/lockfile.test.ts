import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';

type Lock = { packages: Record<string, { version?: string; resolved?: string }> };

const text = readFileSync(new URL('../../package-lock.json', import.meta.url), 'utf8');
const { packages } = JSON.parse(text) as Lock;

/** Below these, a published weakness is open; the advisories are named in DEVELOPERS.md. */
const FLOORS = {
  next: '16.2.11',
  'next-auth': '4.24.15',
  nodemailer: '10.0.5',
  multer: '2.2.0',
  sharp: '0.35.4',
  'drizzle-orm': '0.45.2',
};

test.each(Object.entries(FLOORS))('every copy of %s in the lock is at least %s', (name, floor) => {
  const copies = Object.entries(packages).filter(
    ([place]) => place === `node_modules/${name}` || place.endsWith(`/node_modules/${name}`),
  );
  expect(copies.length).toBeGreaterThan(0);
  for (const [place, { version = '0' }] of copies) expect(isAtLeast(version, floor), `${place} ${version}`).toBe(true);
});

test('the lock names no registry, so that it installs from any', () => {
  const named = Object.entries(packages).filter(([, entry]) => entry.resolved !== undefined);
  expect(named.map(([place]) => place)).toEqual([]);
  expect(text).not.toMatch(/https?:\/\/[^"]*\.tgz/);
});

test('versions compare by number and not by letter', () => {
  expect(isAtLeast('10.0.5', '9.9.9')).toBe(true);
  expect(isAtLeast('16.2.9', '16.2.11')).toBe(false);
  expect(isAtLeast('16.2.11-canary.1', '16.2.11')).toBe(false);
});

function isAtLeast(version: string, floor: string): boolean {
  const [release = '', before] = version.split('-');
  const [have, need] = [release, floor].map((one) => one.split('.').map(Number));
  const difference = need!.map((part, index) => (have![index] ?? 0) - part).find((step) => step !== 0) ?? 0;
  return difference > 0 || (difference === 0 && before === undefined);
}
