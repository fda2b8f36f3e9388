import { expect, test } from 'vitest';
import { mintLink, hashCode, hashToken } from '@/lib/auth/link-token';
import { nextPage } from '@/lib/auth/next-page';
import { hashPassword, isPasswordOf, refusePassword } from '@/lib/auth/password';
import { isSameOrigin } from '@/lib/auth/same-origin';
import { env } from '@/lib/env';
import { emailSchema } from '@/lib/schemas/email';

process.env.APP_URL ??= 'http://127.0.0.1:3000';

const ABOUT = ['tomas.brandt@harrow-lane.example', 'Tomas Brandt', 'Harrow Lane Home Inspection'];

test.each([
  ['eleven char', 'at least 12'],
  ['password1234', 'lists'],
  ['ＰＡＳＳＷＯＲＤ１２３４', 'lists'],
  ['Summer2026!!!', 'lists'],
  ['aaaaaaaaaaaaaa', 'lists'],
  ['abcabcabcabcabc', 'lists'],
  ['qwertyuiop[]', 'lists'],
  ['12345678901234', 'lists'],
  ['zyxwvutsrqponm', 'lists'],
  ['correct horse battery staple', 'lists'],
  ['inspection 2026', 'lists'],
  ['tomas-brandt-99', 'your own name'],
  ['harrow lane 2026', 'your own name'],
  ['x'.repeat(201), 'at most 200'],
])('the password "%s" is refused', (password, because) => {
  expect(refusePassword(password, ABOUT)).toContain(because);
});

test.each(['brass silver green 6', 'ledge tomato quilt', 'Vxk3-pelican-mop', 'náhoda dešťová 7'])(
  'the password "%s" is taken',
  (password) => expect(refusePassword(password, ABOUT)).toBeNull(),
);

test('a password is stored as argon2id of 64 MiB, and only it opens', async () => {
  const hash = await hashPassword('ledge tomato quilt');
  expect(hash).toMatch(/^\$argon2id\$v=19\$m=65536,t=\d+,p=1\$/);
  expect(await isPasswordOf(hash, 'ledge tomato quilt')).toBe(true);
  expect(await isPasswordOf(hash, 'ledge tomato quilts')).toBe(false);
  expect(await isPasswordOf(null, 'no account answers to this')).toBe(false);
});

test('a mailed token has 256 bits, and its code works only with its own address, however it is typed', () => {
  const link = mintLink('ines@quill-street.example');
  expect(Buffer.from(link.token, 'base64url')).toHaveLength(32);
  expect(hashToken(link.token).equals(link.tokenHash)).toBe(true);
  expect(hashCode('ines@quill-street.example', ` ${link.code.toLowerCase().replace('-', ' ')}`)).toEqual(link.codeHash);
  expect(hashCode('other@quill-street.example', link.code)).not.toEqual(link.codeHash);
});

test.each([
  'a@b@c.example',
  'a＠b.example,c@d.example',
  'a@b.example\r\nBcc: c@d.example',
  '"a b"@c.example',
  'a(comment)@b.example',
  'a@b.example,c@d.example',
  'a@b.example;c@d.example',
  'a b@c.example',
  'a@b',
  '@b.example',
  'a@-b.example',
  'a@[127.0.0.1]',
  'a@bücher.example',
  'Name <a@b.example>',
  `${'a'.repeat(250)}@b.example`,
  '.a@b.example',
  'a..b@c.example',
])('"%s" is not taken for one address', (text) => {
  expect(emailSchema.safeParse(text).success).toBe(false);
});

test('an address is kept in one form', () => {
  expect(emailSchema.parse('  Ｉnes.Farrow+x@Quill-Street.EXAMPLE ')).toBe('ines.farrow+x@quill-street.example');
});

test.each([
  '//elsewhere.example',
  '/\\elsewhere.example',
  'https://elsewhere.example',
  '/\t/elsewhere.example',
  'x',
  7,
])('sign-in does not go on to %j', (next) => expect(nextPage(next)).toBe('/inspections'));

test('sign-in goes on to the page that was asked for', () => {
  expect(nextPage('/people?x=1')).toBe('/people?x=1');
});

test('a writing request counts only from a page of ours', () => {
  const from = (headers: Record<string, string>) =>
    isSameOrigin(new Request('http://x.example/', { method: 'POST', headers }));
  const own = new URL(env.APP_URL).origin;
  expect(from({ origin: own })).toBe(true);
  expect(from({ origin: own, 'sec-fetch-site': 'same-origin' })).toBe(true);
  expect(from({ origin: 'null', 'sec-fetch-site': 'same-origin' })).toBe(true);
  expect(from({})).toBe(false);
  expect(from({ origin: 'null' })).toBe(false);
  expect(from({ origin: 'https://elsewhere.example' })).toBe(false);
  expect(from({ origin: own, 'sec-fetch-site': 'cross-site' })).toBe(false);
  expect(from({ 'sec-fetch-site': 'same-origin' })).toBe(false);
});
