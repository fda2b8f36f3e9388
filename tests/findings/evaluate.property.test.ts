import fc from 'fast-check';
import { expect, test } from 'vitest';
import { evaluateInspection } from '@/lib/findings';
import type { InspectionFacts, ReadingFacts } from '@/lib/findings/facts';
import { PHYSICAL_SIGNS, PLACES, STATE_PROFILES, WIRING_METHODS } from '@/lib/findings/vocabulary';
import { area, circuit, emptyHouse, lamps, readings, receptacle } from '../support/facts';
import { houseOf1962, houseOf1988 } from '../support/houses';

const IDS = ['a', 'b', 'c', 'd', 'e'];
const AREAS = ['north', 'south'];
const maybe = <Value>(arbitrary: fc.Arbitrary<Value>) => fc.option(arbitrary, { nil: undefined });
const bits = fc.constantFrom('000', '001', '010', '011', '100', '101', '110', '111', '1d0', 'd00');

const wiringDraft = fc.record({
  kind: fc.constant('wiring' as const),
  receptacleId: fc.constantFrom(...IDS),
  evidence: fc.record(
    {
      lamps: bits.map(lamps),
      loadsUnplugged: fc.constantFrom('yes' as const, 'no' as const, 'unknown' as const),
      sensor: fc.record(
        { hotSlot: maybe(fc.boolean()), groundSlot: maybe(fc.boolean()), coverScrew: maybe(fc.boolean()) },
        { requiredKeys: [] },
      ),
    },
    { requiredKeys: ['lamps'] },
  ),
});
const gfciDraft = fc.record({
  kind: fc.constant('gfci' as const),
  receptacleId: fc.constantFrom(...IDS),
  evidence: fc.record(
    {
      device: fc.constantFrom('receptacle' as const, 'downstream' as const, 'breaker' as const),
      lamps: bits.map(lamps),
      button: fc.constantFrom('trips' as const, 'no-trip' as const),
      tester: fc.constantFrom('trips' as const, 'no-trip' as const),
      faceDead: fc.boolean(),
      resets: fc.boolean(),
      deviceFound: fc.boolean(),
      wentDead: fc.subarray(IDS),
    },
    { requiredKeys: ['device'] },
  ),
});
const physicalDraft = fc.record({
  kind: fc.constant('physical' as const),
  receptacleId: fc.constantFrom(...IDS),
  evidence: fc.record({ signs: fc.subarray([...PHYSICAL_SIGNS], { minLength: 1, maxLength: 2 }) }),
});

const house: fc.Arbitrary<InspectionFacts> = fc
  .record({
    drafts: fc.array(fc.oneof(wiringDraft, gfciDraft, physicalDraft), { maxLength: 10 }),
    places: fc.tuple(fc.constantFrom(...PLACES), fc.constantFrom(...PLACES)),
    wiringMethod: fc.constantFrom(...WIRING_METHODS),
    stateProfile: fc.constantFrom(...STATE_PROFILES),
    yearBuilt: fc.integer({ min: 1900, max: 2026 }),
    devices: fc.array(fc.constantFrom('receptacle' as const, 'gfci-receptacle' as const), {
      minLength: 5,
      maxLength: 5,
    }),
  })
  .map(({ drafts, places, devices, ...inspection }) =>
    emptyHouse({
      inspection,
      areas: AREAS.map((id, index) => area({ id, name: id, place: places[index], order: index })),
      circuits: [circuit({ id: 'c1' })],
      receptacles: IDS.map((id, index) =>
        receptacle({
          id,
          areaId: index < 3 ? 'north' : 'south',
          order: index,
          device: devices[index],
          circuitId: 'c1',
        }),
      ),
      readings: readings(drafts as Parameters<typeof readings>[0]),
    }),
  );

function shuffled(facts: InspectionFacts, seed: number): InspectionFacts {
  const mix = <Row>(rows: Row[]): Row[] =>
    rows
      .map((row, index) => ({ row, key: Math.sin(seed + index * 7.3) }))
      .toSorted((a, b) => a.key - b.key)
      .map(({ row }) => row);
  return {
    ...facts,
    areas: mix(facts.areas),
    circuits: mix(facts.circuits),
    receptacles: mix(facts.receptacles),
    readings: mix(facts.readings),
    skips: mix(facts.skips),
    photos: mix(facts.photos),
    notices: mix(facts.notices),
  };
}

test('the same facts in any order of rows give the same findings, ids and gaps', () => {
  for (const facts of [houseOf1962(), houseOf1988()])
    for (let seed = 1; seed < 6; seed += 1)
      expect(evaluateInspection(shuffled(facts, seed))).toEqual(evaluateInspection(facts));
  fc.assert(
    fc.property(house, fc.integer({ min: 1, max: 1000 }), (facts, seed) => {
      expect(evaluateInspection(shuffled(facts, seed))).toEqual(evaluateInspection(facts));
    }),
    { numRuns: 60 },
  );
});

test('a receptacle without a reading never reads as clean', () => {
  fc.assert(
    fc.property(house, (facts) => {
      const { gaps, coverage } = evaluateInspection(facts);
      for (const row of facts.receptacles) {
        const isRead = facts.readings.some((reading) => reading.kind === 'wiring' && reading.receptacleId === row.id);
        if (isRead) continue;
        expect(gaps.some((gap) => gap.kind === 'not-tested' && gap.receptacleId === row.id)).toBe(true);
        expect(coverage.complete).toBe(false);
      }
    }),
    { numRuns: 60 },
  );
});

test('one more open ground in the same house keeps the id of the finding', () => {
  fc.assert(
    fc.property(fc.subarray(IDS, { minLength: 1 }), (open) => {
      const facts = emptyHouse({
        receptacles: IDS.map((id, order) => receptacle({ id, order })),
        readings: readings(
          open.map((id) => ({ kind: 'wiring' as const, receptacleId: id, evidence: { lamps: lamps('100') } })),
        ),
      });
      const found = evaluateInspection(facts).findings.filter((finding) => finding.code === 'W01');
      expect(found.map((finding) => finding.id)).toEqual(['W01:house']);
      expect(found[0]?.subject).toMatchObject({ receptacleIds: open });
    }),
  );
});

test('a reading that was corrected changes nothing', () => {
  fc.assert(
    fc.property(house, fc.oneof(wiringDraft, gfciDraft, physicalDraft), (facts, draft) => {
      const wrong = { ...draft, id: 'wrong', order: 0, by: 'x', recordedAt: '2026-12-01T15:00:00Z' } as ReadingFacts;
      const target = facts.readings.find(
        (row) => row.kind === draft.kind && row.receptacleId === draft.receptacleId && !row.supersedes,
      );
      if (!target) return;
      const corrected = facts.readings.map((row) => (row.id === target.id ? { ...row, supersedes: 'wrong' } : row));
      expect(evaluateInspection({ ...facts, readings: [wrong, ...corrected] })).toEqual(evaluateInspection(facts));
    }),
    { numRuns: 60 },
  );
});

/** Codes that say a GFCI is missing or bad. */
const BAD = /^(G0[12378]|G09|G1[0-38])$/;

test('a plug-in tester alone, without a ground, never makes a GFCI bad', () => {
  fc.assert(
    fc.property(
      fc.constantFrom(...PLACES),
      fc.constantFrom('receptacle' as const, 'downstream' as const),
      (place, device) => {
        const facts = emptyHouse({
          areas: [area({ id: 'living', place })],
          receptacles: [receptacle({ id: 'a', device: device === 'receptacle' ? 'gfci-receptacle' : 'receptacle' })],
          readings: readings([
            { kind: 'wiring', receptacleId: 'a', evidence: { lamps: lamps('100') } },
            { kind: 'gfci', receptacleId: 'a', evidence: { device, lamps: lamps('100'), tester: 'no-trip' } },
          ]),
        });
        const { findings, gaps } = evaluateInspection(facts);
        expect(findings.filter((finding) => BAD.test(finding.code))).toEqual([]);
        expect(gaps.some((gap) => gap.id.endsWith(':gfci:a'))).toBe(true);
      },
    ),
  );
});

test('no reset, or a face that stays live, never answers the need for protection', () => {
  fc.assert(
    fc.property(
      fc.constantFrom({ faceDead: false, resets: true }, { faceDead: true, resets: false }),
      fc.constantFrom('trips' as const, 'no-trip' as const, undefined),
      (outcome, tester) => {
        const facts = emptyHouse({
          areas: [area({ id: 'living', place: 'bathroom' })],
          receptacles: [receptacle({ id: 'a', device: 'gfci-receptacle' })],
          readings: readings([
            { kind: 'wiring', receptacleId: 'a', evidence: { lamps: lamps('110') } },
            {
              kind: 'gfci',
              receptacleId: 'a',
              evidence: { device: 'receptacle', lamps: lamps('110'), button: 'trips', tester, ...outcome },
            },
          ]),
        });
        const codes = evaluateInspection(facts).findings.map((finding) => finding.code);
        expect(codes.some((code) => code === 'G02' || code === 'G03')).toBe(true);
      },
    ),
  );
});
