import { WIRING_CONDITIONS, type Supply, type WiringCondition } from '../vocabulary';
import { Variant } from './instruments';
import { FAMILIES_240 } from './hypotheses-240';
import { ohmsOf, type Wiring } from './wiring';

/**
 * A family runs along one thing that nobody knows at the receptacle: the size of a load, of a joint, of a leak, or how
 * the cable lies. Readings between two neighbours of a family fit it too.
 */
type Family = readonly Wiring[];

const STRAYS: readonly Wiring['stray'][] = [
  { toEarth: 6e-9 },
  { toEarth: 3e-9 },
  { toEarth: 1e-9 },
  undefined,
  { toLive: 1e-9 },
  { toLive: 4e-9 },
];
const SMALL_TO_LARGE_WATTS = [0.1, 0.25, 0.5, 1, 2, 4, 8, 16, 40, 100, 1500];
const JOINT_OHMS = [0.5, 1, 2, 5, 8, 12, 20, 50];
const LEAK_OHMS = [0.5, 500, 2000, 5000, 10_000, 20_000, 40_000, 60_000];
/** Part of the voltage between the legs that stays over this leg's loads. */
const SHARES = [0.02, 0.06, 0.12, 0.2, 0.27, 0.333, 0.4, 0.5, 0.6, 0.667, 0.74, 0.82, 0.9, 0.96];
const HEATER_OHMS = 9.6;

/** Any way the cable lies: for what floats. The nominal one stands first where a single one is wanted. */
function floating(wiring: Wiring): Family {
  return STRAYS.map((stray) => ({ ...wiring, ...(stray ? { stray } : {}) }));
}

function loaded(wiring: Wiring, a: 'H' | 'G', b: 'N' | 'H', ohms: readonly number[]): Family {
  return ohms.map((value) => ({ ...wiring, removable: true, loads: [{ a, b, ohms: value }] }));
}

const ALL_LOADS = SMALL_TO_LARGE_WATTS.map(ohmsOf);
const GOOD: Wiring = { ties: { H: 'L1', N: 'P', G: 'P' } };

/** Without a load the joint carries nothing and reads as wired; loads come and go between two readings. */
function highResistance(slot: 'H' | 'N'): Family {
  const joint = (ohms: number): Wiring => ({ ...GOOD, joints: { [slot]: ohms } });
  return [...JOINT_OHMS.map(joint), ...JOINT_OHMS.flatMap((ohms) => loaded(joint(ohms), 'H', 'N', [HEATER_OHMS]))];
}

function sharedNeutral(seriesOhms: number): Family {
  const at = (share: number): Wiring => ({
    ties: { H: 'L1', G: 'P' },
    removable: true,
    loads: [
      { a: 'H', b: 'N', ohms: share * seriesOhms },
      { a: 'L2', b: 'N', ohms: (1 - share) * seriesOhms },
    ],
  });
  const nothingHere: Wiring = { ties: { H: 'L1', G: 'P' }, loads: [{ a: 'L2', b: 'N', ohms: 0.04 * seriesOhms }] };
  // The other circuit's loads stay on whatever is unplugged here.
  return [...SHARES.map(at), nothingHere];
}

const LEG_WATTS: readonly (readonly [number, number])[] = [
  [100, 10_000],
  [300, 5000],
  [500, 3000],
  [1000, 3000],
  [1000, 2350],
  [1000, 1500],
  [1000, 1000],
  [1500, 1000],
  [2350, 1000],
  [3000, 1000],
  [3000, 500],
  [5000, 300],
  [10_000, 100],
];

const HOT_ON_NEUTRAL: Wiring = { ties: { N: 'L1', G: 'P' } };
const HOT_ON_GROUND: Wiring = { ties: { N: 'P', G: 'L1' } };
const NEUTRAL_ON_HOT: Wiring = { ties: { H: 'P', G: 'L1' } };
const DEAD: Wiring = { ties: { N: 'P', G: 'P' } };
const FEED_OFF: Wiring = { ...DEAD, loads: [{ a: 'H', b: 'N', ohms: ohmsOf(100) }], removable: true };
const ISLAND: Wiring = { ties: { H: 'L1' }, jumper: true };

const FAMILIES_120: Record<WiringCondition, readonly Family[]> = {
  correct: [[GOOD, ...longAndLoaded()]],
  'open-ground': [floating({ ties: { H: 'L1', N: 'P' } })],
  'open-neutral': [floating({ ties: { H: 'L1', G: 'P' } })],
  'open-neutral-with-load': [loaded({ ties: { H: 'L1', G: 'P' } }, 'H', 'N', ALL_LOADS)],
  'open-hot': [floating(DEAD)],
  'no-power': [[FEED_OFF], floating(DEAD)],
  'hot-neutral-reversed': [[{ ties: { H: 'P', N: 'L1', G: 'P' } }]],
  'hot-ground-reversed': [[{ ties: { H: 'P', N: 'P', G: 'L1' } }]],
  'hot-on-neutral-hot-open': [floating(HOT_ON_NEUTRAL), loaded(HOT_ON_NEUTRAL, 'H', 'N', ALL_LOADS)],
  'hot-on-ground-hot-open': [floating(HOT_ON_GROUND), loaded(HOT_ON_GROUND, 'H', 'N', ALL_LOADS)],
  'neutral-on-hot-hot-on-ground-neutral-open': [floating(NEUTRAL_ON_HOT), loaded(NEUTRAL_ON_HOT, 'H', 'N', ALL_LOADS)],
  // Bonded at the panel, so either conductor serves either slot; only a load's current goes the wrong way.
  'neutral-ground-swapped': [[GOOD, ...longAndLoaded()]],
  'bootleg-ground': [[{ ties: { H: 'L1', N: 'P' }, jumper: true }]],
  'reversed-bootleg-ground': [[{ ties: { H: 'P', N: 'L1' }, jumper: true }]],
  'open-ground-hot-neutral-reversed': [floating({ ties: { H: 'P', N: 'L1' } })],
  'open-neutral-and-ground': [floating({ ties: { H: 'L1' } }), loaded({ ties: { H: 'L1' } }, 'H', 'N', ALL_LOADS)],
  'same-leg-on-both': [[{ ties: { H: 'L1', N: 'L1', G: 'P' } }]],
  'line-to-line-240': [[{ ties: { H: 'L1', N: 'L2', G: 'P' } }]],
  'shared-neutral-open': [sharedNeutral(216), sharedNeutral(5000)],
  'service-neutral-open': [LEG_WATTS.map((legWatts) => ({ ...GOOD, legWatts }))],
  'high-resistance-ground': [[2, 5, 25, 250, 1000, 2500, 5000, 15_000, 50_000].map(groundJoint)],
  'high-resistance-neutral': [highResistance('N')],
  'high-resistance-hot': [highResistance('H')],
  'bootleg-ground-open-neutral': [loaded(ISLAND, 'H', 'N', ALL_LOADS), floating(ISLAND)],
  'open-ground-energized': [
    LEAK_OHMS.map((ohms) => ({ ties: { H: 'L1', N: 'P' }, loads: [{ a: 'H', b: 'G', ohms }] })),
  ],
};

/** A neutral carries current of other loads on the circuit: up to about 3 V between neutral and ground is no fault. */
function longAndLoaded(): Family {
  return [0.05, 0.15].map((ohms) => ({
    ...GOOD,
    joints: { H: ohms, N: ohms },
    removable: true,
    loads: [{ a: 'H' as const, b: 'N' as const, ohms: 10 }],
  }));
}

function groundJoint(ohms: number): Wiring {
  return { ...GOOD, joints: { G: ohms } };
}

/** One family of one condition on one supply. What explains several readings together explains them within one. */
export type Hypothesis = { condition: WiringCondition; family: readonly Variant[] };

const built = new Map<string, readonly Hypothesis[]>();

/**
 * The hypotheses of every condition, in the vocabulary's order. Where nobody said what the supply is, both kinds are in
 * it. A condition that a receptacle of that voltage cannot have comes with an empty family.
 */
export function hypothesesFor(nominal: 120 | 240, supply?: Supply): readonly Hypothesis[] {
  const key = `${nominal} ${supply ?? 'any'}`;
  const known = built.get(key);
  if (known) return known;
  const families = nominal === 240 ? FAMILIES_240 : FAMILIES_120;
  const made = WIRING_CONDITIONS.flatMap((condition) =>
    (families[condition] ?? [[]]).flatMap((family) =>
      suppliesOf(family, supply).map((of) => ({ condition, family: family.map((wiring) => variantOf(wiring, of)) })),
    ),
  );
  built.set(key, made);
  return made;
}

function suppliesOf(family: Family, supply: Supply | undefined): Supply[] {
  if (supply) return [supply];
  return family.some(usesSecondLeg) ? ['120/240', '208Y/120'] : ['120/240'];
}

function usesSecondLeg({ ties, loads = [], legWatts }: Wiring): boolean {
  return !!legWatts || Object.values(ties).includes('L2') || loads.some((load) => load.a === 'L2' || load.b === 'L2');
}

const variants = new Map<Wiring, Map<Supply, Variant>>();

function variantOf(wiring: Wiring, supply: Supply): Variant {
  const bySupply = variants.get(wiring) ?? new Map<Supply, Variant>();
  variants.set(wiring, bySupply);
  const known = bySupply.get(supply) ?? new Variant(wiring, supply);
  bySupply.set(supply, known);
  return known;
}
