import { describe, expect, test } from 'vitest';
import { CATALOGUE } from '@/lib/findings/wording/catalogue/all';
import { findForbiddenWords } from '@/lib/findings/wording/forbidden-words';
import { readingGrade } from '@/lib/findings/wording/reading-grade';
import { REPORT_LIMITS } from '@/lib/findings/wording/report-limits';
import { findTemplateProblem, renderTemplate } from '@/lib/findings/wording/template';
import { EMPTY_VALUES, SAMPLE_VALUES, TEMPLATE_VARIABLES } from '@/lib/findings/wording/variables';
import { RULES } from '@/lib/findings/rules/all';
import type { TemplateValues } from '@/lib/findings/facts';
import { WORDING_PARTS } from '@/lib/findings/wording/wording-set';

const HAZARD_PARTS = ['hazardType', 'consequence', 'avoid', 'plain'] as const;
/** Values that turn every branch of a template one way or another. */
const SITUATIONS: TemplateValues[] = [
  SAMPLE_VALUES,
  EMPTY_VALUES,
  { ...SAMPLE_VALUES, suspicion: 'seen', result: 'tester-only', mark_state: 'not-recorded', asked_when_built: 'yes' },
  { ...SAMPLE_VALUES, suspicion: 'load-test', result: 'load-side-fault', leg_state: 'low', opposite_leg: '' },
  { ...SAMPLE_VALUES, result: 'line-load-reversed', device_found: 'unknown', live_ground: false },
  { ...SAMPLE_VALUES, result: 'appliance', wiring: 'grounded-cable', tester: 'trips', power_checked: false },
  { ...SAMPLE_VALUES, result: 'stays-live' },
  { ...SAMPLE_VALUES, result: 'no-reset' },
  { ...SAMPLE_VALUES, result: 'upstream' },
];

function sentences(text: string): string[] {
  return text.split(/(?<=[.!?])\s+/).filter((part) => part.trim() !== '');
}

function words(text: string): number {
  return text.split(/\s+/).filter(Boolean).length;
}

describe.each(CATALOGUE.map((entry) => [entry.code, entry] as const))('%s', (_code, entry) => {
  const texts = SITUATIONS.flatMap((values) =>
    WORDING_PARTS.map((part) => ({ part, text: renderTemplate(entry.en[part], values).trim() })),
  );

  test('every part has text in every situation', () => {
    for (const { part, text } of texts) expect(text, part).not.toBe('');
  });

  test('its templates use only documented names', () => {
    for (const part of WORDING_PARTS) expect(findTemplateProblem(entry.en[part], SAMPLE_VALUES), part).toBeNull();
  });

  test('no word is used that is never said of a finding', () => {
    for (const { text } of texts) expect(findForbiddenWords(text), text).toEqual([]);
  });

  test('hazard sentences have 20 words at most, and the plain text reads at grade 8 or lower', () => {
    for (const { part, text } of texts.filter((row) => (HAZARD_PARTS as readonly string[]).includes(row.part)))
      for (const sentence of sentences(text)) expect(words(sentence), `${part}: ${sentence}`).toBeLessThanOrEqual(20);
    for (const { text } of texts.filter((row) => row.part === 'plain'))
      expect(readingGrade(text), text).toBeLessThanOrEqual(8);
  });

  test('what was observed and what it means reads at grade 10 or lower', () => {
    for (const values of SITUATIONS.filter((row) => row !== EMPTY_VALUES)) {
      const text = `${renderTemplate(entry.en.observed, values)} ${renderTemplate(entry.en.means, values)}`;
      expect(readingGrade(text), text).toBeLessThanOrEqual(10);
    }
  });

  test('it has only letters that fonts have', () => {
    for (const { text } of texts) expect(text).toMatch(/^[\x20-\x7e]*$/);
  });

  test('it names the evidence that it needs', () => {
    expect(entry.evidenceNeeded.length).toBeGreaterThan(0);
  });
});

test('codes are used once, and every rule has its rows', () => {
  const codes = CATALOGUE.map((entry) => entry.code);
  expect(new Set(codes).size).toBe(codes.length);
  for (const rule of RULES) for (const code of rule.codes) expect(codes).toContain(code);
});

test('the families of wiring, shock and arc protection are complete', () => {
  const codes = new Set(CATALOGUE.map((entry) => entry.code));
  const family = (letter: string, last: number) =>
    Array.from({ length: last }, (_, index) => `${letter}${String(index + 1).padStart(2, '0')}`);
  expect([...family('W', 23), ...family('G', 21), ...family('A', 4)].filter((code) => !codes.has(code))).toEqual([]);
});

test('DANGER stands only in rows whose evidence is a live part or case', () => {
  const danger = CATALOGUE.filter((entry) => entry.signal === 'DANGER');
  expect(danger.map((entry) => entry.code).toSorted()).toEqual(['W08', 'W16', 'W17', 'W18']);
  for (const entry of danger) expect(entry.urgency).toBe('U1');
});

test('signals follow urgency, but for the rows that say otherwise', () => {
  const expected = { U1: 'WARNING', U2: 'WARNING', U3: 'CAUTION', U4: 'NOTICE', note: 'NOTICE' };
  const others = CATALOGUE.filter((entry) => entry.signal !== 'DANGER' && entry.signal !== expected[entry.urgency]);
  expect(others.map((entry) => entry.code)).toEqual(['G21']);
});

test('template variables are named once and have a sample', () => {
  const names = TEMPLATE_VARIABLES.map(({ name }) => name);
  expect(new Set(names).size).toBe(names.length);
});

test('the limits of every report use no forbidden word', () => {
  for (const limit of REPORT_LIMITS) expect(findForbiddenWords(limit), limit).toEqual([]);
  expect(REPORT_LIMITS.join(' ')).toContain('Edition years show when the national model code first asked for this.');
});
