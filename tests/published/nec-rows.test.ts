import { describe, expect, test } from 'vitest';
import { protectionAsked } from '@/lib/findings/protection/asked';
import { EDITION_ROWS } from '@/lib/findings/protection/editions';
import type { AskedPlace } from '@/lib/findings/protection/ruling';
import { NEC_EDITIONS } from '@/lib/findings/vocabulary';

/**
 * Edition of the NEC that first asked it, how sure, and where that was published (ids of the list of sources; "M" is from
 * memory). Histories of the code as published by its teachers and by towns; none of them is the code itself.
 */
const PUBLISHED: [id: string, edition: number | null, confidence: string, source: RegExp][] = [
  ['gf01', 1968, 'medium', /S27a.*S27b.*S27c/],
  ['gf02', 1971, 'medium', /S27a.*S27c/],
  ['gf03', 1971, 'high', /S27b.*S27a/],
  ['gf04', 1978, 'medium', /S27d/],
  ['gf05', 1996, 'high', /S27a.*S27d/],
  ['gf06', 1975, 'high', /S27/],
  ['gf07', 1978, 'high', /S27/],
  ['gf08', 2008, 'high', /S29/],
  ['gf09', 1996, 'medium', /S27a/],
  ['gf10', 1987, 'medium', /S27d/],
  ['gf11', 1990, 'medium', /S27d.*S29/],
  ['gf12', 2020, 'high', /S32.*S32b/],
  ['gf13', 1990, 'high', /S27a/],
  ['gf14', 2017, 'high', /S31c.*S31d/],
  ['gf15', 1987, 'high', /S27a/],
  ['gf16', 1987, 'high', /S27/],
  ['gf17', 1996, 'high', /S27a/],
  ['gf18', 2023, 'high', /S33a.*S33b/],
  ['gf19', 1993, 'high', /S27a/],
  ['gf20', 2005, 'high', /S28.*S28b/],
  ['gf21', 2011, 'medium', /S30e/],
  ['gf22', 2014, 'high', /S30c.*S30d/],
  ['gf23', 2014, 'high', /S30a.*S30b/],
  ['gf24', 2014, 'high', /S30c/],
  ['gf25', 2014, 'high', /S30.*S27e/],
  ['gf26', 2020, 'high', /S32.*S33a/],
  ['gf27', 2020, 'high', /S32/],
  ['gf28', 2020, 'high', /S34c.*S43/],
  ['gf29', 2026, 'medium', /S34b.*S34d/],
  ['gf30', 2023, 'high', /S33/],
  ['gf31', 2023, 'medium', /S33d.*M/],
  ['gf32', 2020, 'medium', /S51a.*S51c/],
  ['gf33', 1981, 'low', /S27c.*S27a/],
  ['gf34', 1987, 'low', /S27c.*S27f.*S27a/],
  ['gf35', 1984, 'medium', /S27a/],
  ['gf36', 1993, 'medium', /S27a/],
  ['gf37', 2011, 'medium', /M.*S30d/],
  ['gf38', 2026, 'high', /S34a/],
  ['gf39', 2005, 'low', /^M$/],
  ['gf40', 2020, 'low', /^M$/],
  ['af1', 1999, 'high', /S35a.*S35f/],
  ['af2', 2002, 'high', /S35a/],
  ['af3', 2005, 'medium', /S35c.*M/],
  ['af4', 2008, 'high', /S35b.*S35e/],
  ['af5', 2011, 'high', /S35b.*S37b/],
  ['af6', 2014, 'high', /S35d/],
  ['af7', 2017, 'medium', /S35g/],
  ['af8', 2023, 'high', /S35h/],
  ['af9', 2026, 'high', /S34e/],
  ['tr1', 2008, 'high', /S36a/],
  ['tr2', 2011, 'high', /S36b/],
  ['tr3', 2017, 'high', /S36c/],
  ['tr4', 2026, 'high', /S36d/],
  ['wr1', 2008, 'high', /S38e/],
  ['cv1', 1996, 'medium', /S38a.*S38b.*M/],
  ['cv2', 2002, 'medium', /S38c.*M/],
  ['cv3', 2014, 'medium', /S38f.*M/],
  ['gr1', 1947, 'high', /S54b/],
  ['gr2', 1956, 'medium', /S54a/],
  ['gr3', 1962, 'medium', /S54a/],
  ['gr4', 1975, 'low', /S54/],
  ['sp1', null, 'high', /S55/],
  ['sp2', 1996, 'high', /S55/],
  ['sp3', 2020, 'medium', /S55b.*S55c/],
  ['sp4', 2008, 'high', /S55d.*S55e/],
  ['mw1', 2008, 'medium', /S52b.*M/],
  ['dr1', 1996, 'medium', /S50.*M/],
  ['ev1', 2026, 'high', /S51b/],
];

test('there is a row for every line of the history, and no other', () => {
  expect(EDITION_ROWS.map(({ id }) => id)).toEqual(PUBLISHED.map(([id]) => id));
});

test.each(PUBLISHED)('%s: %s edition, %s', (id, edition, confidence, source) => {
  const row = EDITION_ROWS.find((entry) => entry.id === id);
  expect(row).toMatchObject({ edition, confidence });
  expect(row?.source).toMatch(source);
});

/** A point at which a row decides, everything else about it being told. */
const dry = { sinkFt: 'none', tubOrShowerFt: 'none', poolFt: 'none' } as const;
type What = keyof ReturnType<typeof protectionAsked>;
type Decides = [row: string, what: What, asked: 'yes' | 'depends', point: Omit<AskedPlace, 'edition'>];
const DECIDES: Decides[] = [
  ['gf02', 'gfci', 'yes', { ...dry, place: 'pool-area', poolFt: 10 }],
  ['gf03', 'gfci', 'yes', { ...dry, place: 'outdoors' }],
  ['gf06', 'gfci', 'yes', { ...dry, place: 'bathroom' }],
  ['gf07', 'gfci', 'yes', { ...dry, place: 'garage' }],
  ['gf08', 'gfci', 'yes', { ...dry, place: 'garage', dedicatedAppliance: true }],
  ['gf09', 'gfci', 'yes', { ...dry, place: 'accessory-building', gradeAccess: true, finished: false }],
  ['gf10', 'gfci', 'depends', { ...dry, place: 'basement', finished: false }],
  ['gf11', 'gfci', 'yes', { ...dry, place: 'basement', finished: false }],
  ['gf12', 'gfci', 'yes', { ...dry, place: 'basement', finished: true }],
  ['gf13', 'gfci', 'yes', { ...dry, place: 'crawl-space' }],
  ['gf15', 'gfci', 'yes', { ...dry, place: 'boathouse' }],
  ['gf16', 'gfci', 'yes', { ...dry, place: 'kitchen-counter', sinkFt: 5 }],
  ['gf17', 'gfci', 'yes', { ...dry, place: 'kitchen-counter', sinkFt: 9 }],
  ['gf18', 'gfci', 'yes', { ...dry, place: 'kitchen-wall', sinkFt: 9 }],
  ['gf19', 'gfci', 'yes', { ...dry, place: 'wet-bar', sinkFt: 3 }],
  ['gf20', 'gfci', 'yes', { ...dry, place: 'other-room', sinkFt: 3, sinkKind: 'laundry' }],
  ['gf20', 'gfci', 'yes', { ...dry, place: 'other-room', sinkFt: 3, sinkKind: 'utility' }],
  ['gf20', 'gfci', 'yes', { ...dry, place: 'kitchen-wall', sinkFt: 3, sinkKind: 'wet-bar' }],
  ['gf21', 'gfci', 'yes', { ...dry, place: 'other-room', sinkFt: 3, sinkKind: 'other' }],
  ['gf22', 'gfci', 'yes', { ...dry, place: 'kitchen-wall', sinkFt: 3, sinkKind: 'kitchen' }],
  ['gf23', 'gfci', 'yes', { ...dry, place: 'bedroom', tubOrShowerFt: 4 }],
  ['gf24', 'gfci', 'yes', { ...dry, place: 'laundry-area' }],
  ['gf25', 'gfci', 'yes', { ...dry, place: 'dishwasher' }],
  ['gf27', 'gfci', 'yes', { ...dry, place: 'garage', volts: 240, amps: 50 }],
  ['gf30', 'gfci', 'yes', { ...dry, place: 'wet-bar', sinkFt: 9 }],
  ['gf31', 'gfci', 'depends', { ...dry, place: 'closet', volts: 240, amps: 30 }],
  ['af1', 'afci', 'yes', { place: 'bedroom' }],
  ...(['family-room', 'dining-room', 'living-room', 'sunroom', 'recreation-room', 'closet', 'hallway'] as const).map(
    (place): Decides => ['af4', 'afci', 'yes', { place }],
  ),
  ...(['kitchen-counter', 'kitchen-wall', 'laundry-area'] as const).map((place): Decides => [
    'af6',
    'afci',
    'yes',
    { place },
  ]),
  ['af8', 'afci', 'yes', { place: 'bedroom', amps: 10 }],
  ['tr1', 'tamperResistant', 'yes', { place: 'living-room' }],
  ['tr3', 'tamperResistant', 'yes', { place: 'laundry-area', volts: 240, amps: 20 }],
  ['tr4', 'tamperResistant', 'yes', { place: 'accessory-building' }],
  ['wr1', 'weatherResistant', 'yes', { place: 'outdoors' }],
  ['cv1', 'inUseCover', 'depends', { place: 'outdoors' }],
  ['cv2', 'inUseCover', 'yes', { place: 'outdoors' }],
];

describe('the edition of a row asks it, and the edition before does not', () => {
  test.each(DECIDES)('%s %s: %s', (id, what, asked, point) => {
    const edition = EDITION_ROWS.find((row) => row.id === id)?.edition ?? 0;
    const before = NEC_EDITIONS.findLast((printed) => printed < edition) ?? 0;
    const now = protectionAsked({ ...point, edition })[what];
    expect(now).toMatchObject({ asked, rows: expect.arrayContaining([id]) });
    expect(protectionAsked({ ...point, edition: before })[what].asked).not.toBe(asked);
    expect(protectionAsked({ ...point, edition: before })[what].rows).not.toContain(id);
  });
});

test('a kitchen counter names the whole kitchen from 2023, high [S33a, S33b]', () => {
  const rows = (edition: number) => protectionAsked({ ...dry, place: 'kitchen-counter', edition }).gfci.rows;
  expect(rows(2020)).not.toContain('gf18');
  expect(rows(2023)).toEqual(expect.arrayContaining(['gf17', 'gf18']));
});

test('a large outlet outdoors or in a garage names the vehicles’ interim amendment of 2017, medium [S51a, S51c]', () => {
  const at = (place: 'outdoors' | 'garage' | 'closet', edition: number) =>
    protectionAsked({ ...dry, place, edition, volts: 240, amps: 50 }).gfci.rows;
  for (const place of ['outdoors', 'garage'] as const) {
    expect(at(place, 2014), place).toEqual([]);
    expect(at(place, 2017), place).toEqual(['gf32']);
  }
  expect(at('closet', 2017)).toEqual([]);
});

test('the list before 2020 takes in 20 A and nothing larger; named appliances from 2023 take in 60 A', () => {
  // High [S32]; the 60 A medium [S33d].
  const garage = (amps: number) => protectionAsked({ ...dry, place: 'garage', edition: 2017, amps }).gfci.asked;
  expect([15, 20, 25].map(garage)).toEqual(['yes', 'yes', 'no']);
  const closet = (amps: number) => protectionAsked({ ...dry, place: 'closet', edition: 2023, amps }).gfci.asked;
  expect([20, 60, 61].map(closet)).toEqual(['no', 'depends', 'no']);
});

test('a garage outlet out of reach was excepted until 2008; 8 ft up is out of reach by common practice', () => {
  const garage = (heightFt: number) => protectionAsked({ ...dry, place: 'garage', edition: 2005, heightFt }).gfci.asked;
  expect([7.9, 8].map(garage)).toEqual(['yes', 'depends']);
});

test('a pool area that may be outdoors follows the outdoor rows', () => {
  const rows = (edition: number) => protectionAsked({ ...dry, place: 'pool-area', edition }).gfci.rows[0];
  expect([1968, 1971, 1975, 1978, 1993, 1996].map(rows)).toEqual([undefined, 'gf03', 'gf03', 'gf04', 'gf04', 'gf05']);
});

test('what nobody told of an outdoor pool, a hard-wired unit or an outbuilding makes no “yes”', () => {
  const asked = (p: AskedPlace) => protectionAsked({ ...dry, ...p }).gfci.asked;
  for (const edition of [1971, 1978, 1996, 2020]) expect(asked({ place: 'pool-area', edition })).toBe('depends');
  for (const edition of [2020, 2026])
    expect(asked({ place: 'outdoors', edition, dedicatedAppliance: true })).toBe('depends');
  for (const edition of [1996, 2023, 2026]) expect(asked({ place: 'accessory-building', edition })).toBe('depends');
});

test('a pool area indoors may be damp, which counts from 2020', () => {
  const rows = (edition: number) => protectionAsked({ ...dry, place: 'pool-area', edition }).gfci.rows;
  expect(rows(2017)).not.toContain('gf26');
  expect(rows(2020)).toContain('gf26');
});

test('outdoors was narrowed from 1978 to 1996 and was never narrowed again', () => {
  // Access from grade from 1978, medium [S27d]; the height of 6 ft 6 in as worded in 1987; all outlets from 1996 [S27a, S27d].
  const at = (heightFt: number) => (edition: number) =>
    protectionAsked({ ...dry, place: 'outdoors', gradeAccess: true, heightFt, edition }).gfci.asked;
  const high = at(6.6);
  const low = at(6.5);
  const upstairs = (edition: number) =>
    protectionAsked({ ...dry, place: 'outdoors', gradeAccess: false, edition }).gfci.asked;
  // Histories put the height at 1978, 1981 and 1987.
  expect([1975, 1978, 1984, 1987, 1993, 1996].map(high)).toEqual(['yes', 'depends', 'depends', 'no', 'no', 'yes']);
  expect([1975, 1978, 1984, 1987, 1993, 1996].map(low)).toEqual(['yes', 'yes', 'yes', 'yes', 'yes', 'yes']);
  expect([1975, 1978, 1987, 1993, 1996].map(upstairs)).toEqual(['yes', 'no', 'no', 'no', 'yes']);
});

test('arc protection was never listed for a bathroom, garage, outdoors, unfinished basement, attic or crawl space', () => {
  // Published in part [S35d], the rest from memory.
  for (const place of ['bathroom', 'garage', 'outdoors', 'basement', 'attic', 'crawl-space'] as const)
    for (const edition of NEC_EDITIONS)
      expect(protectionAsked({ place, edition, finished: false }).afci.asked, `${place} ${edition}`).toBe('no');
});

test('a use or a damp that nobody told makes “depends” of arc protection, shutters and weather resistance', () => {
  const at = (p: AskedPlace) => protectionAsked(p);
  // af4, high [S35b, S35e]: a finished basement that is lived in counts, and so does an office that is a den.
  for (const finished of [undefined, true])
    expect(at({ place: 'basement', edition: 2008, ...(finished ? { finished } : {}) }).afci.asked).toBe('depends');
  for (const place of ['office', 'other-room', 'wet-bar'] as const) {
    expect(at({ place, edition: 2008 }).afci.asked, place).toBe('depends');
    expect(at({ place, edition: 2005 }).afci.asked, place).toBe('no');
  }
  // tr1, high [S36a].
  for (const place of ['accessory-building', 'boathouse', 'pool-area', 'closet'] as const)
    expect(at({ place, edition: 2008 }).tamperResistant.asked, place).toBe('depends');
  for (const place of ['attic', 'crawl-space'] as const)
    expect(at({ place, edition: 2023 }).tamperResistant.asked, place).toBe('no');
  // wr1, high [S38e].
  for (const place of ['pool-area', 'boathouse', 'crawl-space', 'accessory-building', 'sunroom'] as const) {
    expect(at({ place, edition: 2008 }).weatherResistant.asked, place).toBe('depends');
    expect(at({ place, edition: 2005 }).weatherResistant.asked, place).toBe('no');
  }
});
