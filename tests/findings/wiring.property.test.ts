import fc from 'fast-check';
import { expect, test } from 'vitest';
import { diagnoseWiring, expectedReadings } from '@/lib/findings';
import type { ContactSensor, WiringEvidence } from '@/lib/findings/facts';
import {
  LAMPS,
  METERS,
  SUPPLIES,
  WIRING_CONDITIONS,
  WIRING_METHODS,
  YES_NO_UNKNOWN,
  type Meter,
  type WiringCondition,
} from '@/lib/findings/vocabulary';
import { conditionsOf } from '../support/wiring';

const lamp = fc.constantFrom(...LAMPS);
const volts = fc.oneof(
  fc.constantFrom(0, 0.2, 1.5, 40, 62, 79, 118, 120, 121.5, 160, 208, 240),
  fc.double({ min: 0, max: 250, noNaN: true }).map((value) => Math.round(value * 10) / 10),
);
const trio = fc.record({ hn: volts, hg: volts, ng: volts, meter: fc.constantFrom(...METERS) });
const sensor: fc.Arbitrary<ContactSensor> = fc.record(
  { hotSlot: fc.boolean(), neutralSlot: fc.boolean(), groundSlot: fc.boolean(), coverScrew: fc.boolean() },
  { requiredKeys: [] },
);
const loadTest = fc.record(
  {
    amps: fc.constantFrom(12, 15),
    noLoadHn: fc.double({ min: 100, max: 130, noNaN: true }),
    loadedHn: fc.double({ min: 60, max: 130, noNaN: true }),
    noLoadNg: fc.double({ min: 0, max: 1, noNaN: true }),
    loadedNg: fc.double({ min: 0, max: 6, noNaN: true }),
  },
  { requiredKeys: ['amps', 'noLoadHn', 'loadedHn'] },
);
const evidence: fc.Arbitrary<WiringEvidence> = fc.record(
  {
    slots: fc.constantFrom(2 as const, 3 as const),
    nominalVolts: fc.constantFrom(120 as const, 120 as const, 240 as const),
    lamps: fc.record({ hn: lamp, hg: lamp, ng: lamp }),
    volts: trio,
    moreVolts: fc.array(trio, { maxLength: 2 }),
    loadTest,
    sensor,
    loadsUnplugged: fc.constantFrom(...YES_NO_UNKNOWN),
    hardWiredLoadsOff: fc.constantFrom(...YES_NO_UNKNOWN),
    supply: fc.constantFrom(...SUPPLIES),
    wiringMethod: fc.constantFrom(...WIRING_METHODS),
    sharedNeutral: fc.constantFrom(...YES_NO_UNKNOWN),
    nearBondedPanel: fc.boolean(),
    groundOhms: fc.constantFrom(0.1, 0.4, 1.2, 5, 50),
    groundJumperSeen: fc.boolean(),
    powerChecked: fc.boolean(),
  },
  { requiredKeys: ['slots'] },
);

/** What is part of the receptacle itself, and no evidence that arrives. */
const FACE: readonly (keyof WiringEvidence)[] = ['slots', 'nominalVolts'];

function without(full: WiringEvidence, dropped: ReadonlySet<string>): WiringEvidence {
  const kept = Object.entries(full).filter(([key]) => FACE.includes(key as keyof WiringEvidence) || !dropped.has(key));
  return { slots: full.slots, ...Object.fromEntries(kept) };
}

const LIVE_GROUND: readonly WiringCondition[] = [
  'hot-ground-reversed',
  'hot-on-ground-hot-open',
  'neutral-on-hot-hot-on-ground-neutral-open',
  'reversed-bootleg-ground',
  'bootleg-ground-open-neutral',
  'open-ground-energized',
];
const OPEN_GROUND: readonly WiringCondition[] = [
  'open-ground',
  'open-ground-hot-neutral-reversed',
  'open-neutral-and-ground',
];
const RUNS = { numRuns: 1500 };

test('more evidence never adds a candidate', () => {
  const keys = ['lamps', 'volts', 'moreVolts', 'loadTest', 'sensor', 'loadsUnplugged', 'hardWiredLoadsOff', 'supply'];
  const more = ['wiringMethod', 'sharedNeutral', 'nearBondedPanel', 'groundOhms', 'groundJumperSeen', 'powerChecked'];
  fc.assert(
    fc.property(evidence, fc.subarray([...keys, ...more]), (full, dropped) => {
      const fewer = conditionsOf(diagnoseWiring(without(full, new Set(dropped))));
      expect(fewer).toEqual(expect.arrayContaining(conditionsOf(diagnoseWiring(full))));
    }),
    RUNS,
  );
});

test('one more answer of the live-wire sensor never adds a candidate', () => {
  const answers = fc.record({
    hotSlot: fc.boolean(),
    neutralSlot: fc.boolean(),
    groundSlot: fc.boolean(),
    coverScrew: fc.boolean(),
  });
  const names = ['hotSlot', 'neutralSlot', 'groundSlot', 'coverScrew'] as const;
  fc.assert(
    fc.property(
      answers,
      fc.subarray([...names]),
      fc.option(fc.record({ hn: lamp, hg: lamp, ng: lamp })),
      (all, kept, lamps) => {
        const base: WiringEvidence = { slots: 3, ...(lamps ? { lamps } : {}) };
        const part = Object.fromEntries(kept.map((name) => [name, all[name]]));
        const fewer = conditionsOf(diagnoseWiring({ ...base, sensor: part }));
        expect(fewer).toEqual(expect.arrayContaining(conditionsOf(diagnoseWiring({ ...base, sensor: all }))));
      },
    ),
    RUNS,
  );
});

test('every condition is either a candidate or ruled out with a reason, never both', () => {
  fc.assert(
    fc.property(evidence, (given) => {
      const { candidates, ruledOut } = diagnoseWiring(given);
      const all = [...candidates, ...ruledOut];
      expect(new Set(all.map((row) => row.condition)).size).toBe(25);
      expect(all).toHaveLength(25);
      expect(all.every((row) => row.because.length > 10)).toBe(true);
    }),
    RUNS,
  );
});

test('what is not proven is never empty, and no candidate at all is a conflict', () => {
  fc.assert(
    fc.property(evidence, (given) => {
      const { candidates, notProven, conflict } = diagnoseWiring(given);
      expect(notProven.length).toBeGreaterThan(0);
      if (candidates.length === 0) expect(conflict).toBeTruthy();
      else expect(candidates[0]?.standing).toBe('leading');
    }),
    RUNS,
  );
});

test('lamps alone never leave correct as the only candidate', () => {
  fc.assert(
    fc.property(
      fc.record({ hn: lamp, hg: lamp, ng: lamp }),
      fc.constantFrom(2 as const, 3 as const),
      (lamps, slots) => {
        expect(conditionsOf(diagnoseWiring({ slots, lamps }))).not.toEqual(['correct']);
      },
    ),
  );
});

test('the same evidence gives the same diagnosis whatever the order of its keys', () => {
  fc.assert(
    fc.property(evidence, (given) => {
      const reversed = { slots: given.slots, ...Object.fromEntries(Object.entries(given).reverse()) };
      expect(diagnoseWiring(reversed)).toEqual(diagnoseWiring(given));
    }),
    RUNS,
  );
});

function expectSafe(given: WiringEvidence): void {
  const diagnosis = diagnoseWiring(given);
  const { nextCheck } = diagnosis;
  if (!nextCheck) return;
  const candidates = conditionsOf(diagnosis);
  const { instruction } = nextCheck;
  expect(candidates).toEqual(expect.arrayContaining(nextCheck.separates));
  expect(nextCheck.separates.length).toBeGreaterThan(1);
  expect(instruction).not.toMatch(/button/i);

  const loads = /load test|12 to 15 ampere/i.test(instruction);
  const lowImpedance = /low impedance/i.test(instruction);
  const groundInstrument = /ground-impedance/i.test(instruction);
  const trios = [given.volts, ...(given.moreVolts ?? [])];
  if (loads || lowImpedance || groundInstrument)
    expect(trios.some((read) => read?.meter === 'high-impedance')).toBe(true);
  if (given.slots === 2) return;
  const live = candidates.some((condition) => LIVE_GROUND.includes(condition));
  const open = candidates.some((condition) => OPEN_GROUND.includes(condition));
  if (live && !given.sensor) expect(instruction).toMatch(/non-contact sensor/);
  if (!live && !open) return;
  expect(loads || groundInstrument).toBe(false);
  expect(lowImpedance && /hot to ground/i.test(instruction)).toBe(false);
}

test('the next check obeys the order of the inspector’s own safety', () => {
  fc.assert(fc.property(evidence, expectSafe), { numRuns: 4000 });
});

/** What a careful inspector would have read so far on a receptacle that has this condition. */
const walk: fc.Arbitrary<WiringEvidence> = fc
  .record({
    condition: fc.constantFrom(...WIRING_CONDITIONS),
    kept: fc.subarray(['lamps', 'high', 'low', 'supply', 'loads'] as const),
    sensor: fc.option(sensor),
    sharedNeutral: fc.constantFrom(...YES_NO_UNKNOWN),
  })
  .map(({ condition, kept, sensor: felt, sharedNeutral }) => {
    const { lamps, highImpedance, lowImpedance } = expectedReadings(condition);
    const read = ([hn, hg, ng]: [number, number, number], meter: Meter) => ({ hn, hg, ng, meter });
    return {
      slots: 3,
      sharedNeutral,
      ...(kept.includes('lamps') ? { lamps } : {}),
      ...(kept.includes('high') ? { volts: read(highImpedance, 'high-impedance') } : {}),
      ...(kept.includes('low') ? { moreVolts: [read(lowImpedance, 'low-impedance')] } : {}),
      ...(kept.includes('supply') ? { supply: '120/240' } : {}),
      ...(kept.includes('loads') ? { loadsUnplugged: 'yes', hardWiredLoadsOff: 'yes' } : {}),
      ...(felt ? { sensor: felt } : {}),
    };
  });

test('on readings that belong together the next check obeys that order too', () => {
  fc.assert(fc.property(walk, expectSafe), { numRuns: 4000 });
});

test.each(WIRING_CONDITIONS)('the readings of %s leave it among the candidates', (condition) => {
  const { lamps, highImpedance, lowImpedance } = expectedReadings(condition);
  const read = ([hn, hg, ng]: [number, number, number], meter: Meter, scale: number) => ({
    hn: hn * scale,
    hg: hg * scale,
    ng: ng * scale,
    meter,
  });
  for (const scale of [0.88, 1, 1.08]) {
    const volts = read(highImpedance, 'high-impedance', scale);
    const moreVolts = [read(lowImpedance, 'low-impedance', scale)];
    expect(conditionsOf(diagnoseWiring({ slots: 3, lamps, volts, moreVolts }))).toContain(condition);
  }
});
