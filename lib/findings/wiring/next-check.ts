import type { WiringDiagnosis, WiringEvidence } from '../facts';
import type { WiringCondition } from '../vocabulary';
import { LIVE_GROUND_CONDITIONS, NO_GROUND_CONDITIONS } from './hypotheses';
import { lampsOf, SENSOR_VOLTS, type Prediction } from './predict';

export type CheckKind =
  'sensor' | 'power' | 'unplug' | 'high-impedance' | 'low-impedance-ng' | 'load-test' | 'ground-ohms';
type Check = {
  kind: CheckKind;
  instruction: string;
  isDone: (evidence: WiringEvidence) => boolean;
  /** What would be seen; predictions with the same answer are not told apart. */
  outcome: (prediction: Prediction, all: Prediction[]) => string;
  /** Kept away while the ground slot may be open or live. */
  needsSoundGround?: boolean;
  needsThreeSlots?: boolean;
  /** Only after a high-impedance meter has shown what is there. */
  needsMeter?: boolean;
};

const hasMeter = ({ volts, moreVolts }: WiringEvidence, meter: string) =>
  [volts, ...(moreVolts ?? [])].some((trio) => trio?.meter === meter);

/** In the order of the inspector's own safety. */
const CHECKS: Check[] = [
  {
    kind: 'sensor',
    instruction:
      'Prove the contact sensor on a known live outlet. Hold it at the hot slot, the ground slot and the cover screw, and prove it again. Touch no metal until it is quiet.',
    isDone: ({ sensor }) => sensor?.groundSlot !== undefined || sensor?.coverScrew !== undefined,
    outcome: ({ slots }) => (slots.G.volts <= SENSOR_VOLTS ? 'quiet' : slots.G.driven ? 'answers' : 'may answer'),
    needsThreeSlots: true,
  },
  {
    kind: 'power',
    instruction: 'Look whether power is on: the breaker, a GFCI upstream, a wall switch. Then read the lamps again.',
    isDone: ({ powerChecked }) => powerChecked === true,
    outcome: ({ condition }) => (condition === 'no-power' ? 'power comes back' : 'no change'),
  },
  {
    kind: 'unplug',
    instruction:
      'Unplug everything on this circuit and switch off what is wired in, such as lights, alarms and a doorbell transformer. Hold plugs by their bodies. Read the lamps again.',
    isDone: ({ loadsUnplugged, hardWiredLoadsOff }) => loadsUnplugged === 'yes' && hardWiredLoadsOff === 'yes',
    outcome: (prediction, all) => lampKey(prediction.variant.needsLoad ? withoutLoad(prediction, all) : prediction),
  },
  {
    kind: 'high-impedance',
    instruction:
      'Measure hot to neutral, hot to ground and neutral to ground with a high-impedance meter, one pair at a time. Touch no metal.',
    isDone: (evidence) => hasMeter(evidence, 'high-impedance'),
    outcome: ({ highImpedance, phantom }) =>
      highImpedance.map((volts, i) => (phantom[i] ? 'drifting' : levelOf(volts))).join(' '),
  },
  {
    kind: 'low-impedance-ng',
    instruction: 'Measure neutral to ground with a low-impedance meter. Do not use it from hot to ground.',
    isDone: (evidence) => hasMeter(evidence, 'low-impedance'),
    outcome: ({ lowImpedance }) => levelOf(lowImpedance[2]),
    needsThreeSlots: true,
    needsMeter: true,
  },
  {
    kind: 'load-test',
    instruction:
      'Run a 12 to 15 ampere load and read hot to neutral and neutral to ground without it and with it. Not on a circuit marked do not trip, and not where there is heat or damage.',
    isDone: ({ loadTest }) => loadTest !== undefined,
    outcome: ({ loaded, condition }) =>
      `${loaded.hn < 105 ? 'drops' : 'holds'} ${condition === 'bootleg-ground' || loaded.ng < 0.5 ? 'flat' : loaded.ng > 8 ? 'rises far' : 'rises'}`,
    needsSoundGround: true,
    needsMeter: true,
  },
  {
    kind: 'ground-ohms',
    instruction:
      'Measure the ground path with a ground-impedance instrument. It trips GFCIs, and it has no place near patients.',
    isDone: ({ groundOhms }) => groundOhms !== undefined,
    outcome: ({ variant }) => variant.ground,
    needsSoundGround: true,
    needsMeter: true,
    needsThreeSlots: true,
  },
];

const OVER_VOLTS = 135;

function levelOf(volts: number): string {
  if (volts < 8) return 'none';
  if (volts < 90) return 'part';
  return volts < OVER_VOLTS ? 'line' : 'over';
}

const lampKey = ({ lampVolts }: Prediction) => {
  const { hn, hg, ng } = lampsOf(lampVolts);
  return `${hn} ${hg} ${ng}`;
};

/** The same condition with nothing on: an open neutral without its load, a poor joint at rest. */
function withoutLoad(prediction: Prediction, all: Prediction[]): Prediction {
  const wanted: WiringCondition =
    prediction.condition === 'open-neutral-with-load' ? 'open-neutral' : prediction.condition;
  return all.find((other) => other.condition === wanted && !other.variant.needsLoad) ?? prediction;
}

/**
 * The check that splits what remains best, by how surely its outcome is foreseen to differ; prior weights count. While a
 * live ground slot is possible the sensor comes before anything that is held to metal, and no load test or ground
 * instrument is named while a ground may be open or live. Null where no allowed check tells anything apart.
 */
export function chooseNextCheck(
  evidence: WiringEvidence,
  remaining: Prediction[],
  all: Prediction[],
  weightOf: (condition: WiringCondition) => number,
): (NonNullable<WiringDiagnosis['nextCheck']> & { kind: CheckKind }) | undefined {
  const conditions = [...new Set(remaining.map((prediction) => prediction.condition))];
  if (conditions.length < 2) return undefined;
  const allowed = CHECKS.filter((check) => isAllowed(check, evidence, remaining));
  const rated = allowed.map((check) => ({ check, ...rate(check, remaining, all, weightOf) }));
  const telling = rated.filter(({ gain }) => gain > 1e-6);
  const liveGround = conditions.some((condition) => LIVE_GROUND_CONDITIONS.includes(condition));
  const sensorFirst = liveGround ? telling.find(({ check }) => check.kind === 'sensor') : undefined;
  const best = sensorFirst ?? telling.toSorted((a, b) => b.gain - a.gain)[0];
  const meter = rated.find(({ check }) => check.kind === 'high-impedance');
  const chosen = best?.check.needsMeter && meter ? meter : best;
  return chosen && { kind: chosen.check.kind, instruction: chosen.check.instruction, separates: chosen.separates };
}

function isAllowed(check: Check, evidence: WiringEvidence, remaining: Prediction[]): boolean {
  if (check.isDone(evidence) || (check.needsThreeSlots && evidence.slots === 2)) return false;
  if (!check.needsSoundGround) return true;
  const isUnsound = ({ condition }: Prediction) =>
    LIVE_GROUND_CONDITIONS.includes(condition) || NO_GROUND_CONDITIONS.includes(condition);
  const isOver = ({ highImpedance }: Prediction) => highImpedance[0] > OVER_VOLTS;
  // A shared neutral that reads over 135 V only with other loads is left to the meter that comes first.
  const metered = hasMeter(evidence, 'high-impedance');
  return !remaining.some(isUnsound) && !(metered && remaining.some(isOver)) && evidence.nominalVolts !== 240;
}

type Rated = { gain: number; separates: WiringCondition[] };

/** Mutual information between the condition and the outcome, in bits: the entropy that the outcome is expected to take away. */
function rate(
  check: Check,
  remaining: Prediction[],
  all: Prediction[],
  weightOf: (condition: WiringCondition) => number,
): Rated {
  const perCondition = new Map<WiringCondition, Map<string, number>>();
  for (const prediction of remaining) {
    const seen = perCondition.get(prediction.condition) ?? new Map<string, number>();
    const key = outcomeOf(check, prediction, all);
    seen.set(key, (seen.get(key) ?? 0) + 1);
    perCondition.set(prediction.condition, seen);
  }
  const total = [...perCondition.keys()].reduce((sum, condition) => sum + weightOf(condition), 0);
  const overall = new Map<string, number>();
  let within = 0;
  for (const [condition, seen] of perCondition) {
    const share = weightOf(condition) / total;
    const shares = sharesOf(seen);
    within += share * entropy([...shares.values()]);
    for (const [key, part] of shares) overall.set(key, (overall.get(key) ?? 0) + share * part);
  }
  return { gain: entropy([...overall.values()]) - within, separates: told(perCondition) };
}

const answers = new WeakMap<Prediction, Map<CheckKind, string>>();

/** Worked out once for each prediction; neither ever changes. */
function outcomeOf({ kind, outcome }: Check, prediction: Prediction, all: Prediction[]): string {
  const known = answers.get(prediction) ?? new Map<CheckKind, string>();
  answers.set(prediction, known);
  const answer = known.get(kind) ?? outcome(prediction, all);
  known.set(kind, answer);
  return answer;
}

function sharesOf(seen: Map<string, number>): Map<string, number> {
  const count = [...seen.values()].reduce((sum, one) => sum + one, 0);
  return new Map([...seen].map(([key, one]) => [key, one / count]));
}

function entropy(shares: number[]): number {
  return shares.reduce((sum, share) => (share > 0 ? sum - share * Math.log2(share) : sum), 0);
}

/** Conditions that the check tells from the first one, and the first one. */
function told(perCondition: Map<WiringCondition, Map<string, number>>): WiringCondition[] {
  const keys = [...perCondition].map(([condition, seen]) => ({
    condition,
    key: [...seen.keys()].toSorted().join('|'),
  }));
  const first = keys[0];
  if (!first) return [];
  return [first, ...keys.slice(1).filter(({ key }) => key !== first.key)].map(({ condition }) => condition);
}
