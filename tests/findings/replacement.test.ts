import { describe, expect, test } from 'vitest';
import { replacementChoices } from '@/lib/findings/protection/replacement';
import { findForbiddenWords } from '@/lib/findings/wording/forbidden-words';
import { NEC_EDITIONS, PLACES } from '@/lib/findings/vocabulary';

// NEC 406.4(D), published [S37a–e]; 250.130(C) from memory.
const sections = (p: Parameters<typeof replacementChoices>[0]) => replacementChoices(p).map(({ section }) => section);
const choiceOf = (section: string, p: Parameters<typeof replacementChoices>[0]) => {
  const found = replacementChoices(p).find((choice) => choice.section === section);
  if (!found) throw new Error(`no choice under ${section}`);
  return found;
};
const TWO_SLOT = '406.4(D)(2)(a)';
const OWN_GFCI = '406.4(D)(2)(b)';
const FED = '406.4(D)(2)(c)';

describe('without a ground', () => {
  const bedroom = { groundPresent: false, place: 'bedroom', edition: 2020 } as const;
  const bathroom = { groundPresent: false, place: 'bathroom', edition: 2020 } as const;

  test('the better repair comes first, then the three permissions', () => {
    expect(sections(bedroom)).toEqual(['250.130(C)', TWO_SLOT, OWN_GFCI, FED]);
  });

  test('a GFCI says that there is no ground, and what it feeds says both', () => {
    expect(choiceOf(OWN_GFCI, bedroom).marks).toContain('No Equipment Ground');
    expect(choiceOf(OWN_GFCI, bedroom).marks).not.toContain('GFCI Protected');
    expect(choiceOf(FED, bedroom).marks).toEqual(expect.arrayContaining(['GFCI Protected', 'No Equipment Ground']));
  });

  test('no ground wire runs between such receptacles, and the circuit is not extended', () => {
    expect(choiceOf(FED, bedroom).choice).toContain('no ground wire between such receptacles');
    expect(choiceOf(FED, bedroom).choice).toContain('not extended');
  });

  test('where GFCI is asked a plain two-slot receptacle is not enough', () => {
    expect(choiceOf(TWO_SLOT, bathroom).choice).toContain('only with GFCI protection');
    expect(choiceOf(TWO_SLOT, { ...bathroom, edition: 1990 }).choice).not.toContain('GFCI');
  });

  test('a two-slot receptacle again needs no shutters', () => {
    expect(choiceOf(TWO_SLOT, bedroom).marks).toEqual([]);
    expect(choiceOf(FED, bedroom).marks).toContain('TR');
  });

  test('outdoors a two-slot receptacle again stands up to weather from 2011', () => {
    const outdoors = { groundPresent: false, place: 'outdoors', edition: 2011 } as const;
    expect(choiceOf(TWO_SLOT, outdoors).marks).toEqual(['WR']);
    expect(choiceOf(TWO_SLOT, { ...outdoors, edition: 2008 }).marks).toEqual([]);
  });

  test('before 1984 there was no GFCI in place of a ground', () => {
    expect(sections({ ...bedroom, edition: 1981 })).toEqual(['250.130(C)', TWO_SLOT]);
    expect(sections({ ...bedroom, edition: 1984 })).toContain(OWN_GFCI);
  });

  test('the marks may be on the cover plate since 2017', () => {
    expect(choiceOf(FED, { ...bedroom, edition: 2017 }).choice).toContain('or its cover plate');
    expect(choiceOf(FED, { ...bedroom, edition: 2014 }).choice).not.toContain('cover plate');
  });
});

describe('with a ground', () => {
  const outdoors = { groundPresent: true, place: 'outdoors', edition: 2023 } as const;

  test('there is one choice, joined to the ground', () => {
    const [choice, ...others] = replacementChoices(outdoors);
    expect(others).toEqual([]);
    expect(choice?.section).toBe('406.4(D)(1)');
    expect(choice?.choice).toContain('joined to the ground');
    expect(choice?.choice).toContain('with GFCI protection');
  });

  test('outdoors it is tamper- and weather-resistant from 2011, and neither before', () => {
    expect(replacementChoices(outdoors)[0]?.marks).toEqual(['TR', 'WR']);
    expect(replacementChoices({ ...outdoors, edition: 2008 })[0]?.marks).toEqual([]);
  });

  test('arc protection at a replacement starts with 2011, in force from 2014', () => {
    const bedroom = { groundPresent: true, place: 'bedroom' } as const;
    expect(replacementChoices({ ...bedroom, edition: 2011 })[0]?.choice).toContain('1 January 2014');
    expect(replacementChoices({ ...bedroom, edition: 2008 })[0]?.choice).not.toContain('AFCI');
    expect(replacementChoices({ ...outdoors, edition: 2023 })[0]?.choice).not.toContain('AFCI protection');
  });
});

test('the better repair is named at every place and in every edition, in words that may be printed', () => {
  for (const place of PLACES)
    for (const edition of NEC_EDITIONS) {
      const choices = replacementChoices({ groundPresent: false, place, edition });
      expect(choices[0]?.choice).toContain('Run an equipment ground');
      for (const { choice } of choices) expect(findForbiddenWords(choice), choice).toEqual([]);
    }
});
