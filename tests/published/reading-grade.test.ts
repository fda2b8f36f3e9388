import { expect, test } from 'vitest';
import {
  countText,
  gradeOf,
  readingGrade,
  sentencesOf,
  syllablesOf,
  wordsOf,
} from '@/lib/findings/wording/reading-grade';

const readingEase = (words: number, sentences: number, syllables: number) =>
  206.835 - (1.015 * words) / sentences - (84.6 * syllables) / words;

test('one-syllable words in one-word sentences are grade −3.40', () => {
  // Published: public unit test of a readability package, FKGL −3.40, FRE 121.22 [S47c].
  expect(readingGrade('The. Cat. And. The. Dog. Ate.')).toBeCloseTo(-3.4, 2);
  expect(readingEase(6, 6, 6)).toBeCloseTo(121.22, 2);
});

test('5.7 words a sentence and 1.02 syllables a word are grade −1.3', () => {
  // Published for a well-known children's book: −1.3 [S47b].
  expect(gradeOf({ words: 5.7, sentences: 1, syllables: 5.7 * 1.02 })).toBeCloseTo(-1.33, 2);
});

test('the sentence on the platypus is grade 11.3', () => {
  // Published 11.3 and reading ease 37.5, from memory; 24 syllables.
  const text = 'The Australian platypus is seemingly a hybrid of a mammal and reptilian creature.';
  expect(countText(text)).toEqual({ words: 13, sentences: 1, syllables: 24 });
  expect(readingGrade(text)).toBeCloseTo(11.3, 1);
  expect(readingEase(13, 1, 24)).toBeCloseTo(37.5, 1);
});

test('the cat on the mat is grade −1.45', () => {
  // Computed from the formula.
  expect(readingGrade('The cat sat on the mat.')).toBeCloseTo(-1.45, 2);
  expect(readingEase(6, 1, 6)).toBeCloseTo(116.15, 2);
});

test('a decimal point ends no sentence, and a line break does', () => {
  expect(countText('It read 119.8 volts. Call now.').sentences).toBe(2);
  expect(countText('Stop using it now\nCall an electrician').sentences).toBe(2);
});

test('a sentence that ends in a quotation mark ends there', () => {
  expect(sentencesOf('The mark says “No Equipment Ground.” Leave it on! Is it there?')).toHaveLength(3);
});

test('a text without words has grade zero', () => {
  expect(readingGrade(' … ')).toBe(0);
});

// Spoken syllables, common practice: one word for each habit of the spelling that a rule must not miscount.
test.each([
  ['plates', 1],
  ['moved', 1],
  ['needed', 2],
  ['handled', 2],
  ['installed', 2],
  ['tables', 2],
  ['switches', 2],
  ['safely', 2],
  ['basement', 2],
  ['baseboard', 2],
  ['appliances', 4],
  ['electrician', 4],
  ['immediately', 5],
  ['situation', 4],
  ['equipment', 3],
  ['special', 2],
  ['radio', 3],
  ['serious', 3],
  ['area', 3],
  ['dryer', 2],
  ['doing', 2],
  ['building', 2],
  ['wire', 1],
  ['isn’t', 2],
  ['don’t', 1],
  ['receptacle', 4],
])('“%s” has %s syllables', (word, syllables) => {
  expect(syllablesOf(word)).toBe(syllables);
});

test('short words in capitals are read letter by letter, and a number digit by digit', () => {
  expect(syllablesOf('GFCI')).toBe(4);
  expect(syllablesOf('120')).toBe(4);
  expect(syllablesOf('119.8')).toBe(4);
});

test('a hyphen parts two words, an apostrophe and a decimal point none', () => {
  expect(wordsOf('three-slot outlet’s 119.8 V')).toEqual(['three', 'slot', 'outlet’s', '119.8', 'V']);
});

test('longer sentences and longer words are graded harder', () => {
  expect(readingGrade('The ground is not there. Call an electrician.')).toBeLessThan(
    readingGrade('The ground is not there, and therefore an electrician should be called without undue delay.'),
  );
});
