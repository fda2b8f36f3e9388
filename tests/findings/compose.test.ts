import { describe, expect, test } from 'vitest';
import { checkTemplate, composeFinding, evaluateInspection, originalTemplate, whatToDoFirst } from '@/lib/findings';
import type { Finding } from '@/lib/findings/facts';
import { findForbiddenWords } from '@/lib/findings/wording/forbidden-words';
import { readingGrade } from '@/lib/findings/wording/reading-grade';
import { houseOf2021 } from '../support/house-of-2021';
import { houseOf1962, houseOf1988 } from '../support/houses';

const ALL = [houseOf1962(), houseOf1988(), houseOf2021()].flatMap((facts) => evaluateInspection(facts).findings);

function openGround(): Finding {
  const finding = ALL.find((row) => row.code === 'W01');
  if (!finding) throw new Error('the house of 1962 has no open ground');
  return finding;
}

describe('the text of a finding', () => {
  test.each(ALL.map((finding) => [finding.id, finding] as const))('%s is whole', (_id, finding) => {
    const composed = composeFinding(finding, { locale: 'en' });
    const { evidence, unproven, hazard, ...parts } = composed;
    for (const text of [...Object.values(parts), ...Object.values(hazard)]) expect(text).not.toBe('');
    expect(evidence.length).toBeGreaterThan(0);
    expect(unproven.length).toBeGreaterThan(0);
    expect(hazard.signal).toBe(finding.signal);
    expect(readingGrade(composed.plain)).toBeLessThanOrEqual(8);
    expect(readingGrade(`${composed.observed} ${composed.means}`)).toBeLessThanOrEqual(10);
    for (const text of [...Object.values(parts), ...Object.values(hazard), ...unproven]) {
      expect(findForbiddenWords(text), text).toEqual([]);
      expect(text).not.toMatch(/\{\{|\{%| {2}| \./);
    }
  });
});

describe('the wording of a firm', () => {
  test('replaces one part and keeps the rest', () => {
    const original = composeFinding(openGround(), { locale: 'en' });
    const own = composeFinding(openGround(), {
      locale: 'en',
      wording: { W01: { title: 'No ground, {{ count }} times' } },
    });
    expect(own).toEqual({ ...original, title: 'No ground, 3 times' });
  });

  test('a template that does not render never reaches a report', () => {
    const original = composeFinding(openGround(), { locale: 'en' });
    for (const broken of [
      '{{ plaice }}',
      '{% if count %}',
      '{% include "x" %}',
      '   ',
      '{% if count > 99 %}x{% endif %}',
    ])
      expect(composeFinding(openGround(), { locale: 'en', wording: { W01: { title: broken } } })).toEqual(original);
  });

  test('is checked at its line, with the values of a real finding', () => {
    expect(checkTemplate('One.\n{{ plaice }}')).toMatchObject({ line: 2, column: 4 });
    expect(checkTemplate('{{ place }} and {{ year_built }}', openGround())).toBeNull();
  });

  test('can return to the original', () => {
    expect(originalTemplate('W01', 'title')).toBe('Three-slot receptacle shows no ground');
  });
});

test('what to do first is grouped by urgency, most urgent first, and leaves nothing out', () => {
  const groups = whatToDoFirst(ALL);
  expect(groups.map((group) => group.sentence)).toEqual([
    'Stop using it now',
    'Have it repaired within days',
    'Plan a repair',
    'Consider an upgrade',
  ]);
  expect(groups.flatMap((group) => group.findings)).toHaveLength(ALL.length);
});
