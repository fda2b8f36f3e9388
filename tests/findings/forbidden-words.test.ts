import { expect, test } from 'vitest';
import { findForbiddenWords } from '@/lib/findings/wording/forbidden-words';

const words = (text: string, locale?: 'en' | 'es') => findForbiddenWords(text, locale).map(({ word }) => word);

test.each([
  ['This is a code violation.', 'code violation'],
  ['Two violations were seen.', 'violations'],
  ['It violates the rule.', 'violates'],
  ['The tap is illegal.', 'illegal'],
  ['It is not up to code.', 'up to code'],
  ['Bring it to code.', 'to code'],
  ['Bring it up\nto code.', 'up\nto code'],
  ['The old work is grandfathered.', 'grandfathered'],
  ['It passed.', 'passed'],
  ['The kitchen failed inspection.', 'failed inspection'],
  ['The outlet is wired correctly.', 'wired correctly'],
  ['It is correctly wired.', 'correctly wired'],
  ['It is properly grounded.', 'properly grounded'],
  ['It is safe.', 'safe'],
  ['The outlets are perfectly safe to use.', 'safe'],
  ['Outlet 3: OK', 'OK'],
  ['Everything is okay.', 'okay'],
  ['PASSED', 'PASSED'],
])('“%s” holds “%s”', (text, word) => {
  expect(words(text)).toEqual([word]);
});

test.each([
  'This is not a code-compliance inspection.',
  'It is not safe to touch.',
  'The outlet is unsafe.',
  'Keep a safe distance.',
  'The tester was passing current to ground.',
  'Tulsa, OK 74103',
  'Okra grows beside the outlet.',
  'Read the access code to the gate.',
  'The device failed to trip.',
  'Edition years are those of the national model code.',
])('“%s” may be printed', (text) => {
  expect(words(text)).toEqual([]);
});

test('each match says where it stands and why, in the order of the text', () => {
  const text = 'It passed, and it is up to code.';
  const found = findForbiddenWords(text);
  expect(found.map(({ word, at }) => text.slice(at, at + word.length) === word)).toEqual([true, true]);
  expect(found.map(({ at }) => at)).toEqual([3, 21]);
  for (const { why } of found) expect(why).not.toBe('');
});

test('a second search of the same text finds the same', () => {
  expect(words('It passed.')).toEqual(words('It passed.'));
});

test.each([
  ['Es una violación.', 'violación'],
  ['La toma es ilegal.', 'ilegal'],
  ['Cumple con el código.', 'Cumple con el código'],
  ['La toma fue aprobada.', 'aprobada'],
  ['Está correctamente conectada.', 'correctamente conectada'],
  ['La toma es segura.', 'es segura'],
])('in Spanish “%s” holds “%s”', (text, word) => {
  expect(words(text, 'es')).toEqual([word]);
});

test('each language has its own words', () => {
  expect(words('It passed.', 'es')).toEqual([]);
  expect(words('La toma no es segura.', 'es')).toEqual([]);
});
