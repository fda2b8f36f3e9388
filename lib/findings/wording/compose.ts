import type { ComposedFinding, Finding } from '../facts';
import type { Locale } from '../vocabulary';
import { catalogueEntry } from './catalogue/all';
import { findTemplateProblem, renderTemplate, type TemplateProblem } from './template';
import { SAMPLE_VALUES } from './variables';
import { WORDING_PARTS, type WordingPart, type WordingSet } from './wording-set';

/** `wording` overrides single parts per code; what is not named, or does not render, keeps the original. */
export type ComposeOptions = { locale: Locale; wording?: WordingSet };

/**
 * The text of a finding in its parts. A template of the firm that does not render never reaches a report: its part
 * falls back to the original. Throws only for a code that the catalogue does not have.
 */
export function composeFinding(finding: Finding, options: ComposeOptions): ComposedFinding {
  const part = (name: WordingPart) => composePart(finding, name, options.wording);
  return {
    title: part('title'),
    observed: part('observed'),
    means: part('means'),
    hazard: {
      signal: finding.signal,
      type: part('hazardType'),
      consequence: part('consequence'),
      avoid: part('avoid'),
    },
    plain: part('plain'),
    doNext: part('doNext'),
    who: part('who'),
    caution: part('caution'),
    evidence: finding.evidence.map(evidenceText),
    unproven: [...new Set([part('unproven'), ...finding.unproven])].filter((text) => text !== ''),
  };
}

function composePart(finding: Finding, part: WordingPart, wording: WordingSet | undefined): string {
  const original = catalogueEntry(finding.code).en[part];
  const override = wording?.[finding.code]?.[part];
  if (override !== undefined && override.trim() !== '' && !findTemplateProblem(override, finding.values)) {
    const text = tidy(renderTemplate(override, finding.values));
    if (text !== '') return text;
  }
  return tidy(renderTemplate(original, finding.values));
}

/** Templates are written over several lines; a report has one space between words. */
function tidy(text: string): string {
  return text
    .replace(/\s+/g, ' ')
    .replace(/ ([.,;:])/g, '$1')
    .trim();
}

function evidenceText({ instrument, showed }: Finding['evidence'][number]): string {
  return `${instrument}: ${showed}`;
}

/**
 * What is wrong with a template of a finding's wording, at its line and column; null where nothing is.
 * It is tried with the values of a real finding where one is given, and with the samples otherwise.
 */
export function checkTemplate(text: string, finding?: Finding): TemplateProblem | null {
  return findTemplateProblem(text, SAMPLE_VALUES) ?? (finding ? findTemplateProblem(text, finding.values) : null);
}

/** The original template of a part, to show beside the firm's own and to return to. Null for an unknown code. */
export function originalTemplate(code: string, part: WordingPart): string | null {
  return WORDING_PARTS.includes(part) ? (catalogueEntry(code).en[part] ?? null) : null;
}
