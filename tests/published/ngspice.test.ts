import { describe, expect, test } from 'vitest';
import { WIRING_CONDITIONS, type Supply, type WiringCondition } from '@/lib/findings/vocabulary';
import { variantFor, type ReadingOptions } from '@/lib/findings/wiring/predict';
import { runSpice, type SpicePart, type SpiceSource } from '../support/ngspice';

/**
 * Outside referee: ngspice, a published circuit simulator. The circuits are written out here by hand from the fact base
 * (section 3), not taken from the engine: 15 m of 12 AWG flat cable, a 120 V split phase, 200 kilohm lamps.
 */
const SPLIT: SpiceSource[] = [
  ['red', 120, 0],
  ['black', 120, 180],
];
const WYE: SpiceSource[] = [
  ['red', 120, 0],
  ['black', 120, -120],
];
/** 6.34 ohms per km (NEC chapter 9, table 8, 12 AWG solid), 15 m. */
const WIRE = 0.0951;

const CABLE: SpicePart[] = [
  ['C', 'hot', 'gnd', 900e-12],
  ['C', 'neu', 'gnd', 900e-12],
  ['C', 'hot', 'neu', 300e-12],
  ['C', 'hot', '0', 75e-12],
  ['C', 'neu', '0', 75e-12],
  ['C', 'gnd', '0', 75e-12],
];
const SERVICE: SpicePart[] = [['R', 'bar', '0', 0.01]];

type Slot = 'hot' | 'neu' | 'gnd';
const wire = (slot: Slot, to: string, joint = 0): SpicePart => ['R', to, slot, WIRE + joint];
const load = (watts: number, a: string = 'hot', b: string = 'neu'): SpicePart => ['R', a, b, 14_400 / watts];
const JUMPER: SpicePart = ['R', 'neu', 'gnd', 0.001];
const SOUND = [wire('hot', 'red'), wire('neu', 'bar'), wire('gnd', 'bar')];
const failing = (here: number, there: number): SpicePart[] => [
  ['R', 'bar', '0', 25],
  load(here, 'red', 'bar'),
  load(there, 'black', 'bar'),
];

type Case = { name: string; condition: WiringCondition; options?: ReadingOptions; parts: SpicePart[]; supply?: Supply };

function one(condition: WiringCondition, parts: SpicePart[], options?: ReadingOptions, service = SERVICE): Case {
  const name = options ? `${condition} ${JSON.stringify(options)}` : condition;
  return { name, condition, options, parts: [...service, ...CABLE, ...parts], supply: options?.supply };
}

const CASES: Case[] = [
  one('correct', SOUND),
  one('open-ground', [wire('hot', 'red'), wire('neu', 'bar')]),
  one('open-neutral', [wire('hot', 'red'), wire('gnd', 'bar')]),
  one('open-neutral-with-load', [wire('hot', 'red'), wire('gnd', 'bar'), load(100)]),
  one('open-neutral-with-load', [wire('hot', 'red'), wire('gnd', 'bar'), load(0.25)], { loadWatts: 0.25 }),
  one('open-hot', [wire('neu', 'bar'), wire('gnd', 'bar')]),
  one('no-power', [wire('neu', 'bar'), wire('gnd', 'bar'), load(100)]),
  one('hot-neutral-reversed', [wire('hot', 'bar'), wire('neu', 'red'), wire('gnd', 'bar')]),
  one('hot-ground-reversed', [wire('hot', 'bar'), wire('neu', 'bar'), wire('gnd', 'red')]),
  one('hot-on-neutral-hot-open', [wire('neu', 'red'), wire('gnd', 'bar')]),
  one('hot-on-ground-hot-open', [wire('neu', 'bar'), wire('gnd', 'red')]),
  one('neutral-on-hot-hot-on-ground-neutral-open', [wire('hot', 'bar'), wire('gnd', 'red')]),
  one('neutral-ground-swapped', SOUND),
  one('bootleg-ground', [wire('hot', 'red'), wire('neu', 'bar'), JUMPER]),
  one('reversed-bootleg-ground', [wire('hot', 'bar'), wire('neu', 'red'), JUMPER]),
  one('open-ground-hot-neutral-reversed', [wire('hot', 'bar'), wire('neu', 'red')]),
  one('open-neutral-and-ground', [wire('hot', 'red')]),
  one('same-leg-on-both', [wire('hot', 'red'), wire('neu', 'red'), wire('gnd', 'bar')]),
  one('line-to-line-240', [wire('hot', 'red'), wire('neu', 'black'), wire('gnd', 'bar')]),
  one('line-to-line-240', [wire('hot', 'red'), wire('neu', 'black'), wire('gnd', 'bar')], { supply: '208Y/120' }),
  one('shared-neutral-open', [wire('hot', 'red'), wire('gnd', 'bar'), load(100), load(200, 'black', 'neu')]),
  one('shared-neutral-open', [wire('hot', 'red'), wire('gnd', 'bar'), load(60), load(1500, 'black', 'neu')], {
    loadWatts: 60,
    otherLegWatts: 1500,
  }),
  one('shared-neutral-open', [wire('hot', 'red'), wire('gnd', 'bar'), load(150), load(150, 'black', 'neu')], {
    supply: '208Y/120',
    loadWatts: 150,
    otherLegWatts: 150,
  }),
  one('service-neutral-open', SOUND, undefined, failing(1000, 2350)),
  one('service-neutral-open', SOUND, { legWatts: [2350, 1000] }, failing(2350, 1000)),
  one('high-resistance-ground', [wire('hot', 'red'), wire('neu', 'bar'), wire('gnd', 'bar', 25)]),
  one('high-resistance-neutral', [wire('hot', 'red'), wire('neu', 'bar', 5), wire('gnd', 'bar'), load(1500)]),
  one('high-resistance-hot', [wire('hot', 'red', 5), wire('neu', 'bar'), wire('gnd', 'bar'), load(1500)]),
  one('bootleg-ground-open-neutral', [wire('hot', 'red'), JUMPER, load(100)]),
  one('open-ground-energized', [wire('hot', 'red'), wire('neu', 'bar'), ['R', 'hot', 'gnd', 20_000]]),
];

const PROBES = [
  ['hot', 'neu'],
  ['hot', 'gnd'],
  ['neu', 'gnd'],
] as const;
const TO_EARTH = [
  ['hot', '0'],
  ['neu', '0'],
  ['gnd', '0'],
] as const;

function simulate({ parts, supply }: Case) {
  const lamps = PROBES.map(([a, b]): SpicePart => ['R', a, b, 200_000]);
  const meters = (ohms: number) =>
    PROBES.map(([a, b], index) => ({
      name: `${ohms} ${index}`,
      parts: [...parts, ['R', a, b, ohms] as SpicePart],
      probes: [[a, b] as const],
    }));
  const volts = runSpice(supply === '208Y/120' ? WYE : SPLIT, [
    { name: 'slots', parts, probes: TO_EARTH },
    { name: 'lamps', parts: [...parts, ...lamps], probes: PROBES },
    ...meters(10e6),
    ...meters(3000),
  ]);
  const trio = (ohms: number) => [0, 1, 2].flatMap((index) => volts[`${ohms} ${index}`] ?? []);
  return { slots: volts.slots ?? [], lamps: volts.lamps ?? [], high: trio(10e6), low: trio(3000) };
}

function expectClose(model: readonly number[], spice: readonly number[]): void {
  expect(spice).toHaveLength(3);
  for (const [index, volts] of spice.entries())
    expect(Math.abs((model[index] ?? NaN) - volts)).toBeLessThanOrEqual(Math.max(0.05, 0.01 * volts));
}

describe('node voltages agree with ngspice within 1 % or 0.05 V', () => {
  test.each(CASES)('$name', (row) => {
    const variant = variantFor(row.condition, row.options);
    const spice = simulate(row);
    const { H, N, G } = variant.slotPotentials;
    expectClose([H, N, G], spice.slots);
    expectClose(variant.lampVolts, spice.lamps);
    expectClose(variant.meterVolts('high-impedance'), spice.high);
    expectClose(variant.meterVolts('low-impedance'), spice.low);
  });

  test('every condition is among them', () => {
    expect(new Set(CASES.map((row) => row.condition))).toEqual(new Set(WIRING_CONDITIONS));
  });
});
