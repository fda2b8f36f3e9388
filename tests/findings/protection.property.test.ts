import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { AfciTrial, GfciTrial } from '@/lib/findings/facts';
import { assessAfci } from '@/lib/findings/protection/afci';
import { protectionAsked } from '@/lib/findings/protection/asked';
import { editionRow, type EditionRowId } from '@/lib/findings/protection/editions';
import { assessGfci } from '@/lib/findings/protection/gfci';
import type { AskedPlace } from '@/lib/findings/protection/ruling';
import {
  BREAKER_MARKINGS,
  DISTANCE_ENDS,
  GFCI_DEVICES,
  LAMPS,
  NEC_EDITIONS,
  PLACES,
  RETRIPS,
  SINK_KINDS,
  TRIP_RESULTS,
} from '@/lib/findings/vocabulary';
import { findForbiddenWords } from '@/lib/findings/wording/forbidden-words';
import { lamps } from '../support/facts';

const RUNS = { numRuns: 2000 };
const lamp = fc.constantFrom(...LAMPS);
const tripResult = fc.constantFrom(...TRIP_RESULTS);

const gfciTrial: fc.Arbitrary<GfciTrial> = fc.record(
  {
    device: fc.constantFrom(...GFCI_DEVICES),
    lamps: fc.record({ hn: lamp, hg: lamp, ng: lamp }),
    deadBefore: fc.boolean(),
    button: tripResult,
    faceDead: fc.boolean(),
    tester: tripResult,
    resets: fc.boolean(),
    downstreamDead: fc.boolean(),
    endOfLife: fc.boolean(),
    retrips: fc.constantFrom(...RETRIPS),
    upstreamTrippedFirst: fc.boolean(),
    deviceFound: fc.boolean(),
    measured: fc.record({ milliamps: fc.double({ min: 1, max: 400 }), seconds: fc.double({ min: 0, max: 8 }) }),
    notTestedReason: fc.constantFrom('', '  ', 'freezer'),
    breakerMarking: fc.constantFrom(...BREAKER_MARKINGS),
  },
  { requiredKeys: ['device'] },
);
const always = (holds: (trial: GfciTrial) => void) => fc.assert(fc.property(gfciTrial, holds), RUNS);

const PROTECTS_YES = ['D12', 'D14', 'D15', 'D19', 'D20', 'D22', 'D23', 'D24', 'D26'];
const PROTECTS_NO = ['D05', 'D06', 'D07', 'D21'];

describe('a GFCI trial, whatever was recorded', () => {
  test('never reads as working where it does not reset', () => {
    always((trial) => {
      const { verdict, protects } = assessGfci({ ...trial, resets: false });
      expect(verdict).not.toMatch(/works|protects/);
      expect(protects).not.toBe('yes');
    });
  });

  test('never reads as working where the face of the device stays live', () => {
    always((trial) => {
      const { verdict, protects } = assessGfci({ ...trial, faceDead: false });
      expect(verdict).not.toContain('works');
      if (trial.device !== 'downstream') expect(protects).not.toBe('yes');
    });
  });

  test('never yields “failed” from the tester alone, with a ground or without', () => {
    always((trial) => {
      expect(assessGfci({ ...trial, button: undefined, tester: 'no-trip' }).verdict).not.toBe('failed');
    });
  });

  test('never protects where the lamps read 001, 010, 011 or 111, and is unproven at 101', () => {
    for (const bits of ['001', '010', '011', '111', '101'])
      always((trial) => {
        expect(assessGfci({ ...trial, lamps: lamps(bits) }).protects).toBe('unproven');
      });
  });

  test('protects only under the rows that say so', () => {
    always((trial) => {
      const { row, protects } = assessGfci(trial);
      if (protects === 'yes') expect(PROTECTS_YES).toContain(row);
      if (protects === 'no') expect(PROTECTS_NO).toContain(row);
      const sound = trial.lamps === undefined || !Object.values(trial.lamps).includes('dim');
      if (sound && trial.lamps?.ng !== 'lit') {
        if (PROTECTS_YES.includes(row)) expect(protects).toBe('yes');
        if (PROTECTS_NO.includes(row)) expect(protects).toBe('no');
      }
    });
  });

  test('is not tested only with a reason', () => {
    always((trial) => {
      if (assessGfci(trial).verdict === 'not-tested') expect(trial.notTestedReason?.trim()).toBeTruthy();
    });
  });

  test('makes nothing of the tester where the lamps read 101 or 000, but for what it left off', () => {
    for (const bits of ['101', '000'])
      always((trial) => {
        const found = assessGfci({ ...trial, lamps: lamps(bits) });
        if (['D09', 'D18'].includes(found.row)) return;
        const without = assessGfci({ ...trial, lamps: lamps(bits), tester: undefined, measured: undefined });
        expect(found.row).toBe(without.row);
      });
  });

  test('is replaced at its end of life', () => {
    always((trial) => {
      expect(assessGfci({ ...trial, endOfLife: true }).verdict).toBe('replace');
    });
  });

  test('is told in words that may be printed', () => {
    always((trial) => {
      const { says } = assessGfci(trial);
      expect(says).not.toBe('');
      expect(findForbiddenWords(says), says).toEqual([]);
    });
  });
});

test('an AFCI protects only by its own button, a dead circuit and a reset', () => {
  const trial: fc.Arbitrary<AfciTrial> = fc.record(
    { button: tripResult, circuitDead: fc.boolean(), resets: fc.boolean(), indicator: tripResult },
    { requiredKeys: [] },
  );
  fc.assert(
    fc.property(trial, (tried) => {
      const { protects, says } = assessAfci(tried);
      const shown = tried.button === 'trips' && tried.circuitDead === true && tried.resets === true;
      expect(protects === 'yes').toBe(shown);
      expect(findForbiddenWords(says), says).toEqual([]);
    }),
  );
});

const feet = fc.oneof(fc.constant('none' as const), fc.double({ min: 0, max: 25, noNaN: true }));
const askedPlace: fc.Arbitrary<AskedPlace & { place: (typeof PLACES)[number] }> = fc.record(
  {
    place: fc.constantFrom(...PLACES),
    edition: fc.constantFrom(...NEC_EDITIONS),
    volts: fc.constantFrom(120 as const, 240 as const),
    amps: fc.constantFrom(10, 15, 20, 30, 50),
    finished: fc.boolean(),
    heightFt: fc.double({ min: 0, max: 10, noNaN: true }),
    gradeAccess: fc.boolean(),
    dedicatedAppliance: fc.boolean(),
    sinkFt: feet,
    sinkKind: fc.constantFrom(...SINK_KINDS),
    tubOrShowerFt: feet,
    poolFt: feet,
    measuredTo: fc.constantFrom(...DISTANCE_ENDS),
  },
  { requiredKeys: ['place', 'edition'] },
);
const KINDS = ['gfci', 'afci', 'tamperResistant', 'weatherResistant', 'inUseCover'] as const;
const DISTANCES = ['sinkFt', 'tubOrShowerFt', 'heightFt', 'gradeAccess', 'finished'] as const;
const RANK = { no: 0, depends: 1, yes: 2 };

describe('what an edition asks, whatever is known of the point', () => {
  test('is never “no” for want of a distance or an exposure', () => {
    fc.assert(
      fc.property(askedPlace, fc.constantFrom(...DISTANCES), (p, distance) => {
        const told = protectionAsked(p);
        const untold = protectionAsked({ ...p, [distance]: undefined });
        for (const kind of KINDS) if (told[kind].asked === 'yes') expect(untold[kind].asked).not.toBe('no');
      }),
      RUNS,
    );
  });

  test('is never “no” for want of the kind of a sink, but in a kitchen, whose sink is taken for its own', () => {
    fc.assert(
      fc.property(askedPlace, (p) => {
        fc.pre(p.place !== 'kitchen-wall' && p.place !== 'dishwasher');
        if (protectionAsked(p).gfci.asked === 'no') return;
        expect(protectionAsked({ ...p, sinkKind: undefined }).gfci.asked).not.toBe('no');
      }),
      RUNS,
    );
  });

  test('is decided by a sink that was measured to the other edge only where a rim of up to a foot changes nothing', () => {
    const foot = fc.double({ min: 0, max: 1, noNaN: true });
    const far = fc.double({ min: 1, max: 9, noNaN: true });
    const edition = fc.constantFrom(...NEC_EDITIONS.filter((printed) => printed >= 2005 && printed < 2023));
    fc.assert(
      fc.property(edition, far, foot, (printed, sinkFt, rim) => {
        const isNew = printed >= 2017;
        const point = { place: 'bedroom', sinkKind: 'laundry', tubOrShowerFt: 'none', edition: printed } as const;
        const [other, right] = isNew
          ? (['outside-edge', 'inside-bowl-edge'] as const)
          : (['inside-bowl-edge', 'outside-edge'] as const);
        const truly = (width: number) =>
          protectionAsked({ ...point, sinkFt: isNew ? sinkFt + width : sinkFt - width, measuredTo: right }).gfci.asked;
        const { asked } = protectionAsked({ ...point, sinkFt, measuredTo: other }).gfci;
        if (asked === 'depends') expect(truly(0)).not.toBe(truly(1));
        else expect(truly(rim)).toBe(asked);
      }),
      RUNS,
    );
  });

  test('is never “no” for want of the distance to a pool beside it', () => {
    for (const place of ['pool-area', 'outdoors', 'sunroom', 'accessory-building', 'boathouse'] as const)
      for (const edition of NEC_EDITIONS.filter((printed) => printed >= 1971))
        expect(protectionAsked({ place, edition, gradeAccess: false }).gfci.asked, `${place} ${edition}`).not.toBe(
          'no',
        );
  });

  test('is not taken back by a later edition, but outdoors from 1978 to 1996 and above 5 1/2 ft from 2011', () => {
    fc.assert(
      fc.property(askedPlace, (p) => {
        const now = protectionAsked(p);
        for (const edition of NEC_EDITIONS.filter((printed) => printed > p.edition)) {
          const later = protectionAsked({ ...p, edition });
          for (const kind of KINDS) {
            const narrowed =
              (kind === 'gfci' && p.place === 'outdoors' && edition < 1996) ||
              (kind === 'tamperResistant' && edition >= 2011 && (p.heightFt ?? 0) > 5.5);
            if (now[kind].asked === 'yes' && !narrowed)
              expect(later[kind].asked, `${kind} ${p.edition} then ${edition}`).not.toBe('no');
          }
        }
      }),
      { numRuns: 300 },
    );
  });

  test('of two places is what either asks', () => {
    fc.assert(
      fc.property(askedPlace, fc.constantFrom(...PLACES), (p, other) => {
        const both = protectionAsked({ ...p, place: [p.place, other] });
        const one = protectionAsked(p);
        const two = protectionAsked({ ...p, place: other });
        for (const kind of KINDS)
          expect(RANK[both[kind].asked]).toBe(Math.max(RANK[one[kind].asked], RANK[two[kind].asked]));
      }),
      { numRuns: 1000 },
    );
  });

  test('stands on rows that were printed by then, and since a year no later than the edition', () => {
    fc.assert(
      fc.property(askedPlace, (p) => {
        const found = protectionAsked(p);
        for (const kind of KINDS) {
          const { asked, rows, since, note } = found[kind];
          expect(findForbiddenWords(note), note).toEqual([]);
          if (asked === 'no') expect(since).toBeUndefined();
          else {
            for (const id of rows) expect(editionRow(id as EditionRowId).edition).toBeLessThanOrEqual(p.edition);
            expect(rows.length).toBeGreaterThan(0);
            expect(since).toBeLessThanOrEqual(p.edition);
          }
        }
      }),
      { numRuns: 1000 },
    );
  });
});
