import type { Locale } from '../vocabulary';

export type ForbiddenWord = { word: string; at: number; why: string };
type Rule = { pattern: RegExp; why: string };

const LAW = 'A report says what was seen; whether a code is broken is for the authority to say.';
const PROMISE = 'No reading proves that. Say what was read.';

/** Said in both languages. Oklahoma before a ZIP code is no verdict. */
const OKAY: Rule = { pattern: /\b(?:ok|okay|o\.k\.)(?![\p{L}\p{N}])(?!\s+\d{5})/giu, why: PROMISE };

const ENGLISH: Rule[] = [
  { pattern: /\b(?:code\s+)?violations?\b/giu, why: LAW },
  { pattern: /\bviolat(?:e|es|ed|ing)\b/giu, why: LAW },
  { pattern: /\b(?:illegal|unlawful)(?:ly)?\b/giu, why: LAW },
  { pattern: /\b(?:up[-\s]+)?to[-\s]+code\b/giu, why: LAW },
  {
    pattern: /\b(?:code[-\s]+compliant|me(?:ets?|t)\s+(?:the\s+)?code|compl(?:y|ies)\s+with\s+(?:the\s+)?code)\b/giu,
    why: LAW,
  },
  { pattern: /\bgrandfather(?:ed|ing|\s+clause)\b/giu, why: LAW },
  { pattern: /\bpassed\b/giu, why: PROMISE },
  { pattern: /\b(?:fail(?:s|ed)?|pass(?:es)?)\s+(?:the\s+|an?\s+)?inspection\b/giu, why: LAW },
  {
    pattern: /\b(?:(?:wired|grounded)\s+(?:correctly|properly)|(?:correctly|properly)\s+(?:wired|grounded))\b/giu,
    why: PROMISE,
  },
  // "Not safe" and "a safe distance" promise nothing.
  { pattern: /(?<!\b(?:not|never|nor)\s+)(?<!-)\bsafe\b(?!\s+distance)/giu, why: PROMISE },
  OKAY,
];

const SPANISH: Rule[] = [
  { pattern: /(?<!\p{L})viola(?:ción|ciones|n)?(?!\p{L})/giu, why: LAW },
  { pattern: /(?<!\p{L})(?:infracci(?:ón|ones)|infringen?)(?!\p{L})/giu, why: LAW },
  { pattern: /(?<!\p{L})(?:ilegal(?:es|mente)?|ilícit[oa]s?)(?!\p{L})/giu, why: LAW },
  { pattern: /(?<!\p{L})(?:(?:in)?cumplen?(?:\s+con)?\s+el|conforme\s+al|según\s+el)\s+código(?!\p{L})/giu, why: LAW },
  { pattern: /(?<!\p{L})(?:pasó|aprobó|reprobó|falló)\s+la\s+inspección(?!\p{L})/giu, why: LAW },
  { pattern: /(?<!\p{L})aprobad[oa]s?(?!\p{L})/giu, why: PROMISE },
  {
    pattern:
      /(?<!\p{L})(?:bien|correctamente|debidamente)\s+(?:conectad|cablead|aterrizad|puest)[oa]s?(?!\p{L})|(?<!\p{L})(?:conectad|cablead|aterrizad|puest)[oa]s?(?:\s+a\s+tierra)?\s+(?:correcta|debida)mente(?!\p{L})/giu,
    why: PROMISE,
  },
  { pattern: /(?<!(?:no|nunca)\s)(?<!\p{L})(?:es|son|está|están)\s+segur[oa]s?(?!\p{L})/giu, why: PROMISE },
  OKAY,
];

/**
 * Words that the program never prints of a finding, each with its place in the text (0 is the first character) and why,
 * in the order of the text. Whole words only; a line break inside a phrase hides nothing. Never throws.
 */
export function findForbiddenWords(text: string, locale: Locale = 'en'): ForbiddenWord[] {
  const rules = locale === 'es' ? SPANISH : ENGLISH;
  return rules
    .flatMap(({ pattern, why }) =>
      Array.from(text.matchAll(pattern), (match) => ({ word: match[0], at: match.index, why })),
    )
    .toSorted((a, b) => a.at - b.at);
}
