import type { Locale } from '../vocabulary';

export type ForbiddenWord = { word: string; at: number; why: string };

const LAW = 'A report says what was seen; whether a code is broken is for the authority to say.';
const PROMISE = 'No reading proves that. Say what was read.';

const ENGLISH: { pattern: RegExp; why: string }[] = [
  { pattern: /\b(?:code )?violations?\b/giu, why: LAW },
  { pattern: /\bviolat(?:e|es|ed|ing)\b/giu, why: LAW },
  { pattern: /\billegal(?:ly)?\b/giu, why: LAW },
  { pattern: /\b(?:up )?to code\b/giu, why: LAW },
  { pattern: /\bcode[- ]compliant\b/giu, why: LAW },
  { pattern: /\bgrandfathered\b/giu, why: LAW },
  { pattern: /\bpassed\b/giu, why: PROMISE },
  { pattern: /\bfailed inspection\b/giu, why: LAW },
  { pattern: /\bwired correctly\b|\bcorrectly wired\b/giu, why: PROMISE },
  { pattern: /\bproperly grounded\b/giu, why: PROMISE },
  { pattern: /\b(?:is|are|was|were|now|be) (?:perfectly |completely |entirely )?safe\b/giu, why: PROMISE },
  { pattern: /\bok(?:ay)?\b/giu, why: PROMISE },
];

const SPANISH: { pattern: RegExp; why: string }[] = [
  { pattern: /(?<!\p{L})viola(?:ción|ciones)(?!\p{L})/giu, why: LAW },
  { pattern: /(?<!\p{L})ilegal(?:es|mente)?(?!\p{L})/giu, why: LAW },
  { pattern: /(?<!\p{L})cumple con el código(?!\p{L})/giu, why: LAW },
  { pattern: /(?<!\p{L})aprobad[oa]s?(?!\p{L})/giu, why: PROMISE },
  { pattern: /(?<!\p{L})bien (?:conectad|aterrizad)[oa]s?(?!\p{L})/giu, why: PROMISE },
  { pattern: /(?<!\p{L})es segur[oa](?!\p{L})/giu, why: PROMISE },
];

/** Words that the program never prints of a finding, each with its place in the text (0 is the first character) and why. */
export function findForbiddenWords(text: string, locale: Locale = 'en'): ForbiddenWord[] {
  const rules = locale === 'es' ? SPANISH : ENGLISH;
  return rules
    .flatMap(({ pattern, why }) =>
      Array.from(text.matchAll(pattern), (match) => ({ word: match[0], at: match.index, why })),
    )
    .toSorted((a, b) => a.at - b.at);
}
