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
  ['An up-to-code kitchen.', 'up-to-code'],
  ['The wiring meets code.', 'meets code'],
  ['It met the code of its day.', 'met the code'],
  ['A grandfather clause covers it.', 'grandfather clause'],
  ['This circuit will pass inspection.', 'pass inspection'],
  ['The house fails an inspection.', 'fails an inspection'],
  ['It is properly wired.', 'properly wired'],
  ['It complies with the code.', 'complies with the code'],
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
  'The tester’s current passes to ground.',
  'Cut power with the fail-safe switch.',
  'It is never safe to touch.',
  'The grandfather clock hides an outlet.',
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
  ['Es una infracción.', 'infracción'],
  ['La conexión infringe la norma.', 'infringe'],
  ['Es ilícito.', 'ilícito'],
  ['La cocina incumple el código.', 'incumple el código'],
  ['La casa falló la inspección.', 'falló la inspección'],
  ['Está debidamente conectada a tierra.', 'debidamente conectada'],
  ['Fue puesta a tierra correctamente.', 'puesta a tierra correctamente'],
  ['Toma 3: OK', 'OK'],
])('in Spanish “%s” holds “%s”', (text, word) => {
  expect(words(text, 'es')).toEqual([word]);
});

test('each language has its own words', () => {
  expect(words('It passed.', 'es')).toEqual([]);
});

test.each([
  'La toma no es segura.',
  'Nunca es segura si el piso está mojado.',
  'No está conectada a tierra.',
  'El seguro de la casa.',
  'El código de la puerta.',
])('in Spanish “%s” may be printed', (text) => {
  expect(words(text, 'es')).toEqual([]);
});
