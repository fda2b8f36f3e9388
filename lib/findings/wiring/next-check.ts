import type { WiringDiagnosis, WiringEvidence } from '../facts';
import type { WiringCondition } from '../vocabulary';
import { CHECK_KINDS, isOpen, outcomeOf, type CheckKind, type Danger, type Outcome } from './checks';
import { hasMeter, lampsFit, loadsAreOff, sensorFits, trioFitsVariant, triosOf } from './fit';
import { instructionFor } from './instructions';
import type { Variant } from './instruments';
import { hypothesesOf } from './pieces';
import { ranksFor } from './standing';

/** A slot above this against earth is live for whoever touches it. */
const LIVE_VOLTS = 50;
/** Above this a ground path is none: a person who touches the metal is the path. */
const OPEN_OHMS = 100_000;
const MOST_LOADED_VOLTS = 132;
/** A check that is expected to tell less is not worth a step. */
const LEAST_GAIN_BITS = 0.1;
const EQUAL_GAIN_BITS = 0.01;

/**
 * The check that is expected to tell the remaining candidates apart best: each open check is worked out on the circuit
 * of each candidate, and the one with the most information about which it is wins. Only checks that are safe while
 * these candidates stand take part. Undefined where nothing is left to tell apart.
 */
export function chooseNextCheck(
  fitting: readonly WiringCondition[],
  evidence: WiringEvidence,
): WiringDiagnosis['nextCheck'] {
  if (fitting.length < 2) return undefined;
  const left = fitting.map((condition) => ({ condition, variants: variantsLeft(condition, evidence) }));
  const danger = dangerOf(left, evidence);
  const rated = CHECK_KINDS.filter((kind) => isOpen(kind, evidence) && isSafe(kind, danger, evidence)).map((kind) => ({
    kind,
    ...worthOf(kind, left, evidence),
  }));
  const best = pickCheck(rated, danger, evidence);
  if (!best) return undefined;
  const separates = best.separates.length > 1 ? best.separates : [...fitting];
  return { kind: best.kind, instruction: instructionFor(best.kind, evidence, danger), separates };
}

type Rated = Worth & { kind: CheckKind };

function pickCheck(rated: readonly Rated[], danger: Danger, { sensor }: WiringEvidence): Rated | undefined {
  // Whoever goes on to touch the device or an appliance has to know first whether its metal is live.
  const first = rated.find((check) => check.kind === 'sensor');
  if (first && (danger.liveGround || danger.openGround) && (first.separates.length > 1 || !sensor)) return first;
  const useful = rated.filter((check) => check.gain > LEAST_GAIN_BITS && check.separates.length > 1);
  return useful.toSorted((a, b) => rankOf(b.gain) - rankOf(a.gain))[0];
}

/** Gains that differ by less than this are equal, and then the safer check goes first. */
function rankOf(gain: number): number {
  return Math.round(gain / EQUAL_GAIN_BITS);
}

type Left = { condition: WiringCondition; variants: readonly Variant[] };

/** What the candidates that still stand can do to the person who goes on testing. From the model, not from a list. */
function dangerOf(left: readonly Left[], { slots }: WiringEvidence): Danger {
  if (slots === 2) return { liveGround: false, openGround: false };
  return {
    liveGround: left.some(({ variants }) => variants.some((variant) => variant.slotPotentials.G >= LIVE_VOLTS)),
    openGround: left.some(({ variants }) => variants.some((variant) => variant.groundOhms >= OPEN_OHMS)),
  };
}

/** Variants that agree with the readings; all of a condition's where a reading lies between two of them. */
function variantsLeft(condition: WiringCondition, evidence: WiringEvidence): readonly Variant[] {
  const { lamps, sensor, slots } = evidence;
  const off = loadsAreOff(evidence);
  const all = hypothesesOf(evidence)
    .filter((hypothesis) => hypothesis.condition === condition)
    .flatMap(({ family }) => family.filter((variant) => !(off && variant.wiring.removable)));
  const agreeing = all.filter(
    (variant) =>
      (!lamps || lampsFit(variant, lamps, slots)) &&
      (!sensor || sensorFits(variant, sensor, slots)) &&
      triosOf(evidence).every((trio) => trioFitsVariant(variant, trio, slots)),
  );
  return agreeing.length > 0 ? agreeing : all;
}

function isSafe(kind: CheckKind, { liveGround, openGround }: Danger, evidence: WiringEvidence): boolean {
  const metered = hasMeter(evidence, 'high-impedance');
  switch (kind) {
    case 'sensor':
    case 'power':
    case 'unplug':
    case 'high-impedance':
      return true;
    case 'low-impedance-neutral':
      return metered && (liveGround || openGround);
    case 'load-test':
      return metered && !liveGround && !openGround && takesLoad(evidence);
    case 'low-impedance-all':
    case 'ground-ohms':
      return metered && !liveGround && !openGround;
  }
}

/** A 120 V load has no place on more than that. */
function takesLoad(evidence: WiringEvidence): boolean {
  return evidence.nominalVolts !== 240 && triosOf(evidence).every((trio) => trio.hn <= MOST_LOADED_VOLTS);
}

type Worth = { gain: number; separates: WiringCondition[] };
type Shares = Map<Outcome, number>;

/** Mutual information in bits between the answer and the condition; what is met more often weighs more. */
function worthOf(kind: CheckKind, left: readonly Left[], evidence: WiringEvidence): Worth {
  const rows = left.map(({ condition, variants }) => ({
    condition,
    shares: sharesOf(kind, condition, variants, evidence),
  }));
  const weights = weightsOf(left, evidence);
  const overall: Shares = new Map();
  let within = 0;
  for (const { condition, shares } of rows) {
    const weight = weights.get(condition) ?? 0;
    within += weight * entropy(shares);
    for (const [outcome, share] of shares) overall.set(outcome, (overall.get(outcome) ?? 0) + weight * share);
  }
  return { gain: entropy(overall) - within, separates: separatedBy(rows) };
}

/** Each rank of experience weighs half of the one before; a weight never leaves this file. */
function weightsOf(left: readonly Left[], evidence: WiringEvidence): Map<WiringCondition, number> {
  const ranks = ranksFor(evidence);
  const raw = left.map(({ condition }) => [condition, 2 ** -ranks[condition]] as const);
  const sum = raw.reduce((total, [, weight]) => total + weight, 0);
  return new Map(raw.map(([condition, weight]) => [condition, weight / sum]));
}

function entropy(shares: Shares): number {
  let bits = 0;
  for (const share of shares.values()) if (share > 0) bits -= share * Math.log2(share);
  return bits;
}

/** Conditions that some other candidate can never answer like; where none is that clear, those that answer otherwise. */
function separatedBy(rows: readonly { condition: WiringCondition; shares: Shares }[]): WiringCondition[] {
  const pick = (apart: (a: Shares, b: Shares) => boolean) =>
    rows.filter(({ shares }) => rows.some((other) => apart(shares, other.shares))).map(({ condition }) => condition);
  const surely = pick((a, b) => [...a.keys()].every((outcome) => !b.has(outcome)));
  if (surely.length > 0) return surely;
  return pick((a, b) => a.size !== b.size || [...a.keys()].some((outcome) => !b.has(outcome)));
}

/** How often each answer comes among the variants that are left of a condition. */
function sharesOf(
  kind: CheckKind,
  condition: WiringCondition,
  variants: readonly Variant[],
  evidence: WiringEvidence,
): Shares {
  const key = `${condition} ${contextOf(kind, evidence)}`;
  const shares: Shares = new Map();
  for (const variant of variants) {
    const known = outcomes.get(variant) ?? new Map<string, Outcome>();
    outcomes.set(variant, known);
    const outcome = known.get(key) ?? outcomeOf(kind, variant, condition, evidence);
    known.set(key, outcome);
    shares.set(outcome, (shares.get(outcome) ?? 0) + 1 / variants.length);
  }
  return shares;
}

/** Worked out once for each variant and kind of receptacle; neither ever changes. */
const outcomes = new WeakMap<Variant, Map<string, Outcome>>();

function contextOf(kind: CheckKind, evidence: WiringEvidence): string {
  const { slots, nominalVolts = 120, supply, nearBondedPanel, sharedNeutral } = evidence;
  const circuit = kind === 'load-test' ? `${nearBondedPanel} ${sharedNeutral}` : '';
  return `${kind} ${slots} ${nominalVolts} ${supply} ${loadsAreOff(evidence)} ${circuit}`;
}
