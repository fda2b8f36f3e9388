import { describe, expect, test } from 'vitest';
import { editionInForce } from '@/lib/findings/protection/edition-in-force';

// Invented adoptions: every town is different, and the firm records its own (facts section 6).
const of2005 = { edition: 2002, from: '2005-03-01', source: 'town ordinance 12' };
const of2009 = { edition: 2008, from: '2009-07-01', source: 'state rule 4' };
const of2016 = { edition: 2014, from: '2016-01-01', source: 'state rule 9' };
const adoptions = [of2016, of2005, of2009];

test('the last adoption before the year of building stands, in whatever order they were recorded', () => {
  expect(editionInForce({ yearBuilt: 2012, adoptions })).toMatchObject({ edition: 2008, range: [2008, 2008] });
  expect(editionInForce({ yearBuilt: 2025, adoptions }).edition).toBe(2014);
});

test('an adoption on New Year’s Day stood the whole year', () => {
  expect(editionInForce({ yearBuilt: 2016, adoptions })).toMatchObject({ edition: 2014, range: [2014, 2014] });
});

test('the words name the day and the source', () => {
  const { says } = editionInForce({ yearBuilt: 2012, adoptions });
  expect(says).toContain('2009-07-01');
  expect(says).toContain('state rule 4');
});

test('a change in the year before leaves room for an earlier permit', () => {
  expect(editionInForce({ yearBuilt: 2010, adoptions }).says).toContain('permit');
  expect(editionInForce({ yearBuilt: 2011, adoptions }).says).not.toContain('permit');
});

describe('a change in the year of building', () => {
  test('decides nothing between the old and the new edition', () => {
    const found = editionInForce({ yearBuilt: 2009, adoptions });
    expect(found).not.toHaveProperty('edition');
    expect(found.range).toEqual([2002, 2008]);
    expect(found.says).toContain('town ordinance 12');
    expect(found.says).toContain('state rule 4');
  });

  test('without an earlier adoption is not called unrecorded', () => {
    const found = editionInForce({ yearBuilt: 2005, adoptions });
    expect(found).not.toHaveProperty('edition');
    expect(found.range).toEqual([1999, 2002]);
    expect(found.says).toContain('What stood until then is not recorded');
  });

  test('spans two changes in one year', () => {
    const twice = [of2005, of2009, { edition: 2011, from: '2009-12-01', source: 'state rule 5' }];
    expect(editionInForce({ yearBuilt: 2009, adoptions: twice }).range).toEqual([2002, 2011]);
  });
});

describe('without an adoption for the year', () => {
  test('there is a range of editions and no edition', () => {
    const found = editionInForce({ yearBuilt: 1988, adoptions: [] });
    expect(found).not.toHaveProperty('edition');
    expect(found.range).toEqual([1984, 1987]);
    expect(found.says).toContain('or none');
  });

  test('the range ends before the edition that was adopted first, later', () => {
    const found = editionInForce({ yearBuilt: 2015, adoptions: [of2016] });
    expect(found.range).toEqual([2011, 2011]);
    expect(found.says).toContain('2016-01-01');
  });

  test('a house older than every known row gets the oldest edition alone', () => {
    expect(editionInForce({ yearBuilt: 1921, adoptions: [] }).range).toEqual([1959, 1959]);
  });

  test('the range never holds an edition that was not printed yet', () => {
    for (let yearBuilt = 1959; yearBuilt <= 2027; yearBuilt += 1) {
      const [oldest, newest] = editionInForce({ yearBuilt, adoptions: [] }).range;
      expect(oldest).toBeLessThanOrEqual(newest);
      expect(newest).toBeLessThanOrEqual(yearBuilt);
    }
  });
});
