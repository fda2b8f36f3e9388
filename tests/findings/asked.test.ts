import { describe, expect, test } from 'vitest';
import { protectionAsked } from '@/lib/findings/protection/asked';
import type { AskedPlace } from '@/lib/findings/protection/ruling';

/** A room far from water, about which everything is told. */
const dry = { sinkFt: 'none', tubOrShowerFt: 'none', poolFt: 'none' } as const;
const gfci = (p: AskedPlace) => protectionAsked(p).gfci;

describe('a distance that matters and was not given', () => {
  test.each([
    ['sink', { place: 'bedroom', edition: 2014, ...dry, sinkFt: undefined }],
    ['tub', { place: 'bedroom', edition: 2014, ...dry, tubOrShowerFt: undefined }],
    ['kitchen sink at the counter', { place: 'kitchen-counter', edition: 1987 }],
    ['bar sink', { place: 'wet-bar', edition: 1993, ...dry, sinkFt: undefined }],
    ['laundry sink', { place: 'laundry-area', edition: 2005, ...dry, sinkFt: undefined }],
    ['pool', { place: 'pool-area', edition: 1984, ...dry, poolFt: undefined }],
    ['height outdoors', { place: 'outdoors', edition: 1987, ...dry, gradeAccess: true }],
    ['access outdoors', { place: 'outdoors', edition: 1981, ...dry }],
    ['finish of a basement', { place: 'basement', edition: 1999, ...dry }],
    ['use of an outbuilding', { place: 'accessory-building', edition: 1996, ...dry }],
    ['a distance that is no number', { place: 'bedroom', edition: 2014, ...dry, sinkFt: Number.NaN }],
  ] as [string, AskedPlace][])('depends: %s', (_, p) => {
    expect(gfci(p).asked).toBe('depends');
    expect(gfci(p).note).not.toBe('');
  });

  test('is no matter where it could change nothing', () => {
    expect(gfci({ place: 'bathroom', edition: 1984 }).asked).toBe('yes');
    expect(gfci({ place: 'bedroom', edition: 2002 }).asked).toBe('no');
    expect(gfci({ place: 'bedroom', edition: 2023, ...dry }).asked).toBe('no');
  });
});

describe('how far a sink is', () => {
  const near = (edition: number, sinkFt: number, measuredTo?: AskedPlace['measuredTo']) =>
    gfci({ place: 'other-room', edition, ...dry, sinkFt, ...(measuredTo ? { measuredTo } : {}) });

  test.each([
    [2014, 6, 'outside-edge', 'yes'],
    [2014, 6.1, 'outside-edge', 'no'],
    [2017, 6, 'inside-bowl-edge', 'yes'],
    [2020, 6.1, 'inside-bowl-edge', 'no'],
    // The other edge: the rim, at most a foot, decides nothing near the limit.
    [2014, 6, 'inside-bowl-edge', 'yes'],
    [2014, 6.5, 'inside-bowl-edge', 'depends'],
    [2014, 7.1, 'inside-bowl-edge', 'no'],
    [2017, 4.9, 'outside-edge', 'yes'],
    [2017, 5.5, 'outside-edge', 'depends'],
    [2017, 6.1, 'outside-edge', 'no'],
  ] as const)('in %s, %s ft to the %s: %s', (edition, sinkFt, measuredTo, asked) => {
    expect(near(edition, sinkFt, measuredTo).asked).toBe(asked);
  });

  test('the note says how that edition measures, and that it was measured otherwise', () => {
    expect(near(2014, 4).note).toContain('outside edge of the sink');
    expect(near(2017, 4).note).toContain('a door or doorway ends the path');
    expect(near(2020, 4).note).toContain('a cabinet door does not end the path');
    expect(near(2017, 4, 'outside-edge').note).toContain('measured to the other edge');
    expect(near(2017, 4, 'inside-bowl-edge').note).not.toContain('other edge');
  });

  test('a tub is measured to its outside edge, 6 ft, in any room', () => {
    expect(gfci({ place: 'bedroom', edition: 2014, ...dry, tubOrShowerFt: 6 }).rows).toContain('gf23');
    expect(gfci({ place: 'bedroom', edition: 2014, ...dry, tubOrShowerFt: 6.1 }).asked).toBe('no');
  });

  test('a pool that nobody measured to matters where one may be beside the point', () => {
    for (const place of ['pool-area', 'outdoors', 'sunroom', 'accessory-building', 'boathouse'] as const)
      expect(gfci({ place, edition: 1984, ...dry, poolFt: undefined, gradeAccess: false }).rows, place).toContain(
        'gf02',
      );
    expect(gfci({ place: 'closet', edition: 1984, ...dry, poolFt: undefined }).asked).toBe('no');
  });

  test('a pool reached 15 ft, then 20, and between them the lists differ', () => {
    const pool = (edition: number, poolFt: number) => gfci({ place: 'sunroom', edition, ...dry, poolFt }).asked;
    expect([pool(1971, 15), pool(1971, 15.1), pool(1971, 21)]).toEqual(['yes', 'depends', 'no']);
    expect([pool(1984, 20), pool(1984, 20.5)]).toEqual(['yes', 'no']);
  });
});

describe('an exception of its time', () => {
  test.each([
    ['crawl space until 1999', { place: 'crawl-space', dedicatedAppliance: true }, 1996, 1999],
    ['unfinished basement until 2008', { place: 'basement', finished: false, dedicatedAppliance: true }, 2005, 2008],
    ['garage until 2008', { place: 'garage', dedicatedAppliance: true }, 2005, 2008],
    ['garage ceiling until 2008', { place: 'garage', heightFt: 9 }, 2005, 2008],
  ] as [string, Omit<AskedPlace, 'edition'>, number, number][])('%s depends: %#', (_, point, last, first) => {
    expect(gfci({ ...dry, ...point, edition: last }).asked).toBe('depends');
    expect(gfci({ ...dry, ...point, edition: first }).asked).toBe('yes');
  });

  test('stands outdoors for dedicated de-icing', () => {
    expect(gfci({ ...dry, place: 'outdoors', edition: 2020, dedicatedAppliance: true }).asked).toBe('depends');
  });

  test('spares an outbuilding whose floor is not at grade, until 2026', () => {
    const shed: AskedPlace = { ...dry, place: 'accessory-building', edition: 2017, finished: false };
    expect(gfci({ ...shed, gradeAccess: false })).toMatchObject({ asked: 'no', rows: ['gf09'] });
    expect(gfci(shed).asked).toBe('depends');
    expect(gfci({ ...shed, gradeAccess: false, edition: 2026 }).asked).toBe('yes');
  });
});

describe('an exposure that nobody told', () => {
  const told = { ...dry, finished: false, gradeAccess: false };

  test.each([
    ['a sunroom that may be damp', { place: 'sunroom' }, 2017, 2020, 'gf26'],
    ['an outbuilding that may be damp', { place: 'accessory-building' }, 2017, 2020, 'gf26'],
    ['an attic with equipment to be serviced', { place: 'attic' }, 2017, 2020, 'gf40'],
    ['a sink of some kind farther off', { place: 'dining-room', sinkFt: 9 }, 2020, 2023, 'gf30'],
  ] as [string, Omit<AskedPlace, 'edition'>, number, number, string][])('depends: %s', (_, point, last, first, row) => {
    expect(gfci({ ...told, ...point, edition: last }).asked).toBe('no');
    expect(gfci({ ...told, ...point, edition: first })).toMatchObject({ asked: 'depends', rows: [row], since: first });
  });

  test('of a sink’s kind depends near it, and is the kitchen’s own in a kitchen', () => {
    const in2005 = (sinkFt: number) => gfci({ ...told, place: 'other-room', edition: 2005, sinkFt }).asked;
    expect([in2005(3), in2005(9)]).toEqual(['depends', 'no']);
    for (const place of ['kitchen-wall', 'dishwasher'] as const)
      expect(gfci({ ...told, place, edition: 2011, sinkFt: 3 }).asked).toBe('no');
  });

  test('is no matter for a sink at which no food is made', () => {
    const near: AskedPlace = { ...told, place: 'dining-room', edition: 2023, sinkFt: 9 };
    for (const sinkKind of ['laundry', 'utility', 'other'] as const)
      expect(gfci({ ...near, sinkKind }).asked).toBe('no');
  });

  test('of a service outlet is from memory, and no surer than that', () => {
    expect(gfci({ ...told, place: 'attic', edition: 2020 }).confidence).toBe('low');
  });
});

describe('several places at once', () => {
  test('are a union', () => {
    const basement: AskedPlace = { place: 'basement', edition: 2017, finished: true, ...dry };
    expect(gfci(basement).asked).toBe('no');
    const both = gfci({ ...basement, place: ['basement', 'laundry-area'] });
    expect(both).toMatchObject({ asked: 'yes', rows: ['gf24'], since: 2014 });
  });

  test('ask what either asks, in either order', () => {
    const p: AskedPlace = { place: ['bedroom', 'bathroom'], edition: 2023, ...dry };
    const found = protectionAsked(p);
    expect(found.gfci.asked).toBe('yes');
    expect(found.afci.asked).toBe('yes');
    expect(protectionAsked({ ...p, place: ['bathroom', 'bedroom'] }).gfci.since).toBe(found.gfci.since);
  });
});

describe('since when', () => {
  test.each([
    ['garage', { place: 'garage', edition: 2023 }, 1978, ['gf08', 'gf07']],
    ['opener in a garage', { place: 'garage', edition: 2023, dedicatedAppliance: true }, 2008, ['gf08']],
    ['counter near the sink', { place: 'kitchen-counter', edition: 2020, sinkFt: 3 }, 1987, ['gf17', 'gf16']],
    ['counter', { place: 'kitchen-counter', edition: 2020 }, 1996, ['gf17']],
    ['unfinished basement', { place: 'basement', edition: 2020, finished: false }, 1990, ['gf12', 'gf11']],
    ['finished basement', { place: 'basement', edition: 2020, finished: true }, 2020, ['gf12']],
    ['outdoors, height not told', { place: 'outdoors', edition: 2020 }, 1996, ['gf05']],
    ['outdoors at grade', { place: 'outdoors', edition: 2020, gradeAccess: true, heightFt: 2 }, 1971, ['gf05', 'gf03']],
    ['240 V in the laundry', { place: 'laundry-area', edition: 2020, volts: 240, amps: 30 }, 2020, ['gf24', 'gf27']],
  ] as [string, AskedPlace, number, string[]][])('%s: %#', (_, p, since, rows) => {
    const found = gfci({ ...dry, ...p });
    expect(found.since).toBe(since);
    expect(found.rows).toEqual(expect.arrayContaining(rows));
  });

  test('bedrooms have been asked for arc protection since 1999', () => {
    expect(protectionAsked({ place: 'bedroom', edition: 2023 }).afci).toMatchObject({
      since: 1999,
      rows: ['af2', 'af1'],
    });
  });

  test('what is not asked has no year', () => {
    expect(gfci({ place: 'bedroom', edition: 1984 })).not.toHaveProperty('since');
  });

  test('an edition between two printed ones is the earlier', () => {
    expect(gfci({ place: 'bathroom', edition: 1977 })).toMatchObject({ asked: 'yes', since: 1975 });
    expect(gfci({ place: 'bathroom', edition: 1974 }).asked).toBe('no');
  });
});

describe('how sure it is', () => {
  test.each([
    ['bathroom', { place: 'bathroom', edition: 1975 }, 'high'],
    ['unfinished basement', { place: 'basement', edition: 1990, finished: false }, 'medium'],
    ['outdoors without access from grade', { place: 'outdoors', edition: 1984, gradeAccess: false, ...dry }, 'medium'],
    ['any sink in 2011', { place: 'other-room', edition: 2011, ...dry, sinkFt: 3 }, 'medium'],
    ['laundry sink in 2011', { place: 'other-room', edition: 2011, ...dry, sinkFt: 3, sinkKind: 'laundry' }, 'high'],
    ['pool', { place: 'pool-area', edition: 2020, ...dry, poolFt: 9 }, 'medium'],
  ] as [string, AskedPlace, string][])('%s: %#', (_, p, confidence) => {
    expect(gfci(p).confidence).toBe(confidence);
  });

  test('of the 2026 list no more than medium, and the note says so', () => {
    for (const place of ['bathroom', 'bedroom'] as const) {
      const found = gfci({ place, edition: 2026, ...dry });
      expect(found.confidence).toBe('medium');
      expect(found.note).toContain('not seen in full');
    }
  });

  test('where published histories differ the note says so', () => {
    expect(gfci({ place: 'outdoors', edition: 1971 }).note).toContain('1973');
    expect(gfci({ place: 'outdoors', edition: 1984, gradeAccess: true }).note).toContain('differ');
    expect(gfci({ place: 'basement', edition: 1990, finished: false }).note).toContain('1993');
    expect(gfci({ place: 'kitchen-counter', edition: 1996 }).note).toContain('1990');
    expect(protectionAsked({ place: 'outdoors', edition: 2005 }).inUseCover.note).toContain('1999');
  });
});

describe('the receptacle itself', () => {
  const at = (p: AskedPlace) => protectionAsked(p);

  test('is tamper-resistant from 2008; above 5 1/2 ft excepted from 2011; 240 V from 2017', () => {
    expect(at({ place: 'bedroom', edition: 2005 }).tamperResistant.asked).toBe('no');
    expect(at({ place: 'bedroom', edition: 2008, heightFt: 6 }).tamperResistant.asked).toBe('yes');
    expect(at({ place: 'bedroom', edition: 2011, heightFt: 6 }).tamperResistant).toMatchObject({
      asked: 'no',
      rows: ['tr2'],
    });
    expect(at({ place: 'laundry-area', edition: 2014, volts: 240 }).tamperResistant.asked).toBe('no');
    expect(at({ place: 'laundry-area', edition: 2017, volts: 240 }).tamperResistant.rows).toEqual(['tr3']);
    expect(at({ place: 'garage', edition: 2020, dedicatedAppliance: true }).tamperResistant.asked).toBe('depends');
    expect(at({ place: 'laundry-area', edition: 2020, volts: 240, amps: 30 }).tamperResistant.asked).toBe('no');
  });

  test('is weather-resistant outdoors from 2008; a place that may be damp depends', () => {
    expect(at({ place: 'outdoors', edition: 2005 }).weatherResistant.asked).toBe('no');
    expect(at({ place: 'outdoors', edition: 2008 }).weatherResistant.asked).toBe('yes');
    expect(at({ place: 'basement', edition: 2008 }).weatherResistant.asked).toBe('depends');
    expect(at({ place: 'bedroom', edition: 2023 }).weatherResistant.asked).toBe('no');
  });

  test('has a cover that keeps rain out in two stages', () => {
    expect(at({ place: 'outdoors', edition: 1993 }).inUseCover.asked).toBe('no');
    expect(at({ place: 'outdoors', edition: 1996 }).inUseCover).toMatchObject({ asked: 'depends', rows: ['cv1'] });
    expect(at({ place: 'outdoors', edition: 2002 }).inUseCover).toMatchObject({ asked: 'yes', rows: ['cv2'] });
    expect(at({ place: 'outdoors', edition: 2014 }).inUseCover.rows).toContain('cv3');
  });
});

describe('circuits beyond 15 and 20 A at 120 V', () => {
  test('are outside the GFCI list before 2020', () => {
    for (const size of [{ volts: 240 }, { amps: 30 }] as const) {
      expect(gfci({ place: 'garage', edition: 2017, ...dry, ...size }).asked).toBe('no');
      expect(gfci({ place: 'garage', edition: 2020, ...dry, ...size }).rows).toContain('gf27');
    }
  });

  test('have no upper limit in a dwelling since then', () => {
    expect(gfci({ place: 'garage', edition: 2020, ...dry, volts: 240, amps: 100 }).asked).toBe('yes');
  });

  test('name the interim amendment for electric vehicles', () => {
    expect(gfci({ place: 'garage', edition: 2017, ...dry, volts: 240 })).toMatchObject({ asked: 'no', rows: ['gf32'] });
    expect(gfci({ place: 'garage', edition: 2014, ...dry, volts: 240 }).rows).toEqual([]);
  });

  test('outdoors, hard-wired, are a row of their own from 2020', () => {
    const unit: Omit<AskedPlace, 'edition'> = {
      ...dry,
      place: 'outdoors',
      volts: 240,
      amps: 40,
      dedicatedAppliance: true,
    };
    expect(gfci({ ...unit, edition: 2020 }).rows).toContain('gf28');
    expect(gfci({ ...unit, edition: 2026 }).rows).toContain('gf29');
  });

  test('and named appliances depend from 2023 anywhere, to 60 A', () => {
    const range: AskedPlace = { place: 'closet', edition: 2023, ...dry, volts: 240, amps: 30 };
    expect(gfci(range)).toMatchObject({ asked: 'depends', rows: ['gf31'] });
    expect(gfci({ ...range, edition: 2020 }).asked).toBe('no');
    expect(gfci({ ...range, amps: 70 }).asked).toBe('no');
  });

  test('have no AFCI; 10 A circuits have from 2023', () => {
    const afci = (p: Partial<AskedPlace>) => protectionAsked({ place: 'bedroom', edition: 2023, ...p }).afci;
    expect(afci({ volts: 240 }).asked).toBe('no');
    expect(afci({ amps: 30 }).asked).toBe('no');
    expect(afci({ amps: 10 })).toMatchObject({ asked: 'yes', since: 2023, rows: ['af2', 'af8'] });
    expect(afci({ amps: 10, edition: 2020 }).asked).toBe('no');
  });
});

test('food made with a sink in the room may be asked at any distance from 2023', () => {
  const bar: AskedPlace = { place: 'recreation-room', edition: 2023, ...dry, sinkFt: 12, sinkKind: 'wet-bar' };
  expect(gfci(bar)).toMatchObject({ asked: 'depends', rows: ['gf30'] });
  expect(gfci({ ...bar, edition: 2020 }).asked).toBe('no');
});
