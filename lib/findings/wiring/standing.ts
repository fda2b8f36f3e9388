import type { WiringEvidence } from '../facts';
import { assessLoadTest, type LoadAssessment } from '../supply/load-test';
import { WIRING_CONDITIONS, type WiringCondition } from '../vocabulary';
import { lampsFit, loadsAreOff, SOUND_GROUND_OHMS, sensorSays, someVariant, triosOf } from './fit';
import { hypothesesOf, vocabularyOrder } from './pieces';

/**
 * How often a condition is met among those that read alike, 1 the most often. Trade experience (common practice): it
 * only orders what fits, and no figure is made of it.
 */
const USUAL_RANK: Record<WiringCondition, number> = {
  correct: 1,
  'open-ground': 1,
  'open-neutral': 1,
  'open-neutral-with-load': 1,
  // Beside power that is off, which is met oftener.
  'open-hot': 1.05,
  'no-power': 1,
  'hot-neutral-reversed': 1.5,
  'line-to-line-240': 2,
  'bootleg-ground': 2,
  'shared-neutral-open': 2,
  'service-neutral-open': 2,
  'high-resistance-ground': 2,
  'high-resistance-neutral': 2,
  'high-resistance-hot': 2,
  'open-ground-energized': 2,
  'hot-ground-reversed': 3,
  'hot-on-neutral-hot-open': 3,
  'hot-on-ground-hot-open': 3,
  'neutral-ground-swapped': 3,
  'reversed-bootleg-ground': 3,
  'open-ground-hot-neutral-reversed': 3,
  'open-neutral-and-ground': 3,
  'bootleg-ground-open-neutral': 3,
  'same-leg-on-both': 4,
  'neutral-on-hot-hot-on-ground-neutral-open': 4,
};

const MOVED_VOLTS = 8;
const SAME_RANK = 0.1;
/** Volts over a lamp that glows without lighting in full. */
const DIM_VOLTS = [40, 100] as const;

/** Candidates that are met most often lead; the rest stay possible. Never empties a list that had one. */
export function rankCandidates(
  fitting: readonly WiringCondition[],
  evidence: WiringEvidence,
): { condition: WiringCondition; standing: 'leading' | 'possible' }[] {
  const ranks = ranksFor(evidence);
  const best = Math.min(...fitting.map((condition) => ranks[condition]));
  return fitting
    .toSorted((a, b) => ranks[a] - ranks[b] || vocabularyOrder(a, b))
    .map((condition) => ({ condition, standing: ranks[condition] - best < SAME_RANK ? 'leading' : 'possible' }));
}

/** The rank of every condition with what is known of the house, the circuit and the tests; the least is met most. */
export function ranksFor(evidence: WiringEvidence): Record<WiringCondition, number> {
  const ranks = { ...USUAL_RANK };
  const raise = (...conditions: WiringCondition[]) => {
    for (const condition of conditions) ranks[condition] = 1;
  };
  const { slots, wiringMethod, groundOhms, groundJumperSeen, sharedNeutral, sensor } = evidence;
  if (slots === 3 && wiringMethod === 'two-wire') {
    // Two-wire cable brings no ground: a ground slot that reads was joined to something else.
    raise('bootleg-ground');
    ranks['open-ground-energized'] = ranks['hot-neutral-reversed'];
    ranks.correct = 2;
    ranks['neutral-ground-swapped'] = 4;
  }
  if (groundOhms !== undefined && groundOhms > SOUND_GROUND_OHMS) raise('high-resistance-ground');
  if (groundJumperSeen) raise('bootleg-ground', 'bootleg-ground-open-neutral');
  if (sharedNeutral === 'yes') ranks['shared-neutral-open'] = 1.5;
  if (sensor && sensorSays(sensor).groundLive) raise('reversed-bootleg-ground', 'bootleg-ground-open-neutral');
  rankByLoadTest(ranks, assessGround(evidence), raise);
  if (readingsMove(evidence)) raise('shared-neutral-open');
  rankByDimLamps(ranks, evidence);
  return ranks;
}

/** Full voltage lights a lamp in full: whatever puts part of it over the dim one is likelier. */
function rankByDimLamps(ranks: Record<WiringCondition, number>, evidence: WiringEvidence): void {
  const { lamps, slots } = evidence;
  if (!lamps) return;
  const dim = [lamps.hn, lamps.hg, lamps.ng].map((lamp) => lamp === 'dim').slice(0, slots === 2 ? 1 : 3);
  if (!dim.includes(true)) return;
  const glows = (volts: number) => volts > DIM_VOLTS[0] && volts < DIM_VOLTS[1];
  const off = loadsAreOff(evidence);
  const explaining = new Set(
    hypothesesOf(evidence)
      .filter((hypothesis) =>
        someVariant(
          hypothesis,
          off,
          (variant) =>
            lampsFit(variant, lamps, slots) && variant.lampVolts.every((volts, index) => !dim[index] || glows(volts)),
        ),
      )
      .map(({ condition }) => condition),
  );
  for (const condition of WIRING_CONDITIONS)
    if (!explaining.has(condition)) ranks[condition] += condition === 'correct' ? 3 : 2;
}

function rankByLoadTest(
  ranks: Record<WiringCondition, number>,
  load: LoadAssessment | undefined,
  raise: (...conditions: WiringCondition[]) => void,
): void {
  if (!load) return;
  if (load.ground === 'suspected') {
    raise('bootleg-ground');
    ranks.correct = 2;
  }
  if (load.ground === 'neutral-doubtful') raise('high-resistance-neutral', 'shared-neutral-open');
  if (load.band === 'above-8') raise('high-resistance-neutral', 'high-resistance-hot');
}

/** The load test read with what is known of the circuit; undefined where it was not made. */
export function assessGround({ loadTest, nearBondedPanel, sharedNeutral }: WiringEvidence): LoadAssessment | undefined {
  if (!loadTest || !(loadTest.amps > 0) || !(loadTest.noLoadHn > 0)) return undefined;
  return assessLoadTest(loadTest, { nearBondedPanel, sharedNeutral });
}

/** Hot to neutral that differs from one reading to the next is the mark of a neutral that lets go. */
function readingsMove(evidence: WiringEvidence): boolean {
  const trios = triosOf(evidence);
  return trios.some((one) =>
    trios.some((other) => one.meter === other.meter && Math.abs(one.hn - other.hn) > MOVED_VOLTS),
  );
}
