import { describe, expect, test } from 'vitest';
import { findTemplateProblem, renderTemplate } from '@/lib/findings/wording/template';

const VALUES = { place: 'Garage, bench left', count: 3, live_ground: false };

describe('a template', () => {
  test('prints the values that it names', () => {
    expect(renderTemplate('{{ place }}: {{ count }}', VALUES)).toBe('Garage, bench left: 3');
  });

  test.each([
    ['{% include "/etc/passwd" %}', 'include'],
    ['{% render "other" %}', 'render'],
    ['{% layout "page" %}', 'layout'],
    ['{{ "now" | date: "%Y" }}', 'Dates'],
    ['{{ "a,b" | split: "," | sample }}', 'random'],
  ])('%s is refused', (text, word) => {
    expect(findTemplateProblem(text, VALUES)?.message).toContain(word);
    expect(() => renderTemplate(text, VALUES)).toThrow();
  });

  test('a mistake is shown at its line and column', () => {
    expect(findTemplateProblem('One.\nTwo {{ plaice }}.', VALUES)).toEqual({
      line: 2,
      column: 8,
      message: 'There is no "plaice" to use here.',
    });
    expect(findTemplateProblem('One.\nTwo.\n{% if count > 1 %}', VALUES)).toMatchObject({ line: 3, column: 1 });
  });

  test('an unknown name is found in a branch that is not taken', () => {
    expect(findTemplateProblem('{% if live_ground %}{{ nobody }}{% endif %}', VALUES)?.message).toContain('nobody');
  });

  test('nothing that a value inherits is reached', () => {
    expect(findTemplateProblem('{{ place.constructor }}', VALUES)).not.toBeNull();
    expect(findTemplateProblem('{{ toString }}', VALUES)).not.toBeNull();
  });

  test('a template that would run for ever is stopped', () => {
    const loops = '{% for a in (1..90000) %}{% for b in (1..90000) %}{{ b }}{% endfor %}{% endfor %}';
    expect(findTemplateProblem(loops, VALUES)?.message).toContain('limit');
    expect(findTemplateProblem('x'.repeat(30_000), VALUES)?.message).toContain('limit');
  });
});
