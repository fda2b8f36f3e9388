import type { WiringEvidence } from '../facts';
import type { WiringCondition } from '../vocabulary';
import { assessLoadTest, type GroundAnswer } from '../supply/load-test';

/** How often a condition is met in houses, as an order of magnitude. It orders candidates and is never shown (common practice). */
const USUAL: Record<WiringCondition, number> = {
  correct: 100,
  'open-ground': 30,
  'open-neutral': 8,
  'open-neutral-with-load': 9,
  'open-hot': 10,
  'no-power': 20,
  'hot-neutral-reversed': 15,
  'hot-ground-reversed': 0.5,
  'hot-on-neutral-hot-open': 1,
  'hot-on-ground-hot-open': 0.4,
  'neutral-on-hot-hot-on-ground-neutral-open': 0.2,
  'neutral-ground-swapped': 2,
  'bootleg-ground': 6,
  'reversed-bootleg-ground': 1.5,
  'open-ground-hot-neutral-reversed': 4,
  'open-neutral-and-ground': 2,
  'same-leg-on-both': 0.3,
  'line-to-line-240': 1,
  'shared-neutral-open': 2,
  'service-neutral-open': 1,
  'high-resistance-ground': 4,
  'high-resistance-neutral': 3,
  'high-resistance-hot': 3,
  'bootleg-ground-open-neutral': 0.8,
  'open-ground-energized': 1,
};

const FALSE_GROUND: readonly WiringCondition[] = [
  'bootleg-ground',
  'reversed-bootleg-ground',
  'bootleg-ground-open-neutral',
];
const CUT_GROUND: readonly WiringCondition[] = [
  'open-ground',
  'open-ground-hot-neutral-reversed',
  'open-neutral-and-ground',
  'open-ground-energized',
];

/** Weight of a condition with what is known of the house and of a load test. */
export function weigh(evidence: WiringEvidence): (condition: WiringCondition) => number {
  const ground = groundAnswer(evidence);
  const drops = (evidence.loadTest && dropOf(evidence)) ?? 0;
  return (condition) => {
    let weight = USUAL[condition];
    if (evidence.slots === 3 && evidence.wiringMethod === 'two-wire') weight *= twoWireFactor(condition);
    if (FALSE_GROUND.includes(condition) && ground === 'suspected') weight *= 200;
    if (condition === 'bootleg-ground' && ground === 'no-joint-here') weight *= 0.2;
    if (condition === 'high-resistance-neutral' && ground === 'neutral-doubtful') weight *= 100;
    if (condition.startsWith('high-resistance') && condition !== 'high-resistance-ground' && drops > 8) weight *= 100;
    if (condition === 'shared-neutral-open' && evidence.sharedNeutral === 'yes') weight *= 5;
    if (condition === 'line-to-line-240' && evidence.nominalVolts === 240) weight = 0;
    return weight;
  };
}

/** Two-wire cable brings no ground: a reading of one is most often a jumper. */
function twoWireFactor(condition: WiringCondition): number {
  if (FALSE_GROUND.includes(condition)) return 30;
  if (CUT_GROUND.includes(condition)) return 3;
  return condition === 'correct' || condition === 'neutral-ground-swapped' || condition === 'high-resistance-ground'
    ? 0.5
    : 1;
}

function groundAnswer({ loadTest, nearBondedPanel, sharedNeutral }: WiringEvidence): GroundAnswer {
  if (!loadTest || !(loadTest.amps > 0) || !(loadTest.noLoadHn > 0)) return 'not-assessed';
  return assessLoadTest(loadTest, { nearBondedPanel, sharedNeutral }).ground;
}

function dropOf({ loadTest }: WiringEvidence): number {
  return loadTest && loadTest.noLoadHn > 0 ? (100 * (loadTest.noLoadHn - loadTest.loadedHn)) / loadTest.noLoadHn : 0;
}
