import type { WiringCondition } from '../vocabulary';
import type { Wiring } from './wiring';

/** A 240 V receptacle: the hot slot and the slot beside it are two legs. "Neutral" reads as the second leg. */
const TWO_LEGS: Wiring = { ties: { H: 'L1', N: 'L2', G: 'P' } };
const JOINT_OHMS = [0.5, 1, 2, 5, 12, 50];

function underLoad(slot: 'H' | 'N'): Wiring[] {
  return JOINT_OHMS.map((ohms) => ({
    ...TWO_LEGS,
    joints: { [slot]: ohms },
    removable: true,
    loads: [{ a: 'H', b: 'N', ohms: 19.2 }],
  }));
}

const STRAYS: readonly Wiring['stray'][] = [{ toEarth: 4e-9 }, {}, { toLive: 4e-9 }];

function floating(ties: Wiring['ties']): Wiring[] {
  return STRAYS.map((stray) => ({ ties, stray }));
}

function legLost(ties: Wiring['ties']): (readonly Wiring[])[] {
  return [floating(ties), [{ ties, removable: true, loads: [{ a: 'H', b: 'N', ohms: 19.2 }] }]];
}

/** Conditions that are about a neutral have no meaning there and no family. */
export const FAMILIES_240: Partial<Record<WiringCondition, readonly (readonly Wiring[])[]>> = {
  correct: [[TWO_LEGS]],
  'open-ground': [floating({ H: 'L1', N: 'L2' })],
  'open-hot': [...legLost({ N: 'L2', G: 'P' }), ...legLost({ H: 'L1', G: 'P' })],
  'no-power': [floating({ G: 'P' }), [{ ties: { G: 'P' }, removable: true, loads: [{ a: 'H', b: 'N', ohms: 19.2 }] }]],
  'hot-ground-reversed': [[{ ties: { H: 'P', N: 'L2', G: 'L1' } }]],
  'same-leg-on-both': [[{ ties: { H: 'L1', N: 'L1', G: 'P' } }]],
  'service-neutral-open': [
    [
      [300, 5000],
      [1000, 2350],
      [1000, 1000],
      [2350, 1000],
      [5000, 300],
    ].map(([one = 0, two = 0]) => ({ ...TWO_LEGS, legWatts: [one, two] as const })),
  ],
  'high-resistance-ground': [[2, 25, 1000, 5000, 50_000].map((ohms) => ({ ...TWO_LEGS, joints: { G: ohms } }))],
  'high-resistance-hot': [[{ ...TWO_LEGS, joints: { H: 1 } }], underLoad('H'), underLoad('N')],
  'open-ground-energized': [
    [0.5, 5000, 20_000, 60_000].map((ohms) => ({ ties: { H: 'L1', N: 'L2' }, loads: [{ a: 'H', b: 'G', ohms }] })),
  ],
};
