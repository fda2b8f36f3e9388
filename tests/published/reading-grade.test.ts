import { expect, test } from 'vitest';
import { countText, gradeOf, readingGrade } from '@/lib/findings/wording/reading-grade';

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

test('a text without words has grade zero', () => {
  expect(readingGrade(' … ')).toBe(0);
});
