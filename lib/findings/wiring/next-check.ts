import type { WiringDiagnosis, WiringEvidence } from '../facts';
import type { WiringCondition } from '../vocabulary';
import { CHECK_KINDS, isOpen, outcomeOf, type CheckKind, type Danger, type Outcome } from './checks';
import { hasMeter, lampsFit, loadsAreOff, sensorFits, trioFitsVariant, triosOf } from './fit';
import type { Hypothesis } from './hypotheses';
import { instructionFor } from './instructions';
import type { Variant } from './instruments';
import { hypothesesOf } from './pieces';

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
  const danger = dangerOf(fitting, evidence);
  const rated = CHECK_KINDS.filter((kind) => isOpen(kind, evidence) && isSafe(kind, danger, evidence)).map((kind) => ({
    kind,
    ...worthOf(kind, fitting, evidence),
  }));
  // Whoever goes on to touch the device or an appliance has to know first whether its metal is live.
  const isDangerous = danger.liveGround || danger.openGround;
  const sensor = isDangerous ? rated.find((check) => check.kind === 'sensor' && check.separates.length > 0) : undefined;
  const useful = rated.filter((check) => check.gain > LEAST_GAIN_BITS);
  const best = sensor ?? useful.toSorted((a, b) => rankOf(b.gain) - rankOf(a.gain))[0];
  return best && { instruction: instructionFor(best.kind, evidence, danger), separates: best.separates };
}

/** Gains that differ by less than this are equal, and then the safer check goes first. */
function rankOf(gain: number): number {
  return Math.round(gain / EQUAL_GAIN_BITS);
}

/** What the candidates that still stand can do to the person who goes on testing. From the model, not from a list. */
export function dangerOf(fitting: readonly WiringCondition[], evidence: WiringEvidence): Danger {
  if (evidence.slots === 2) return { liveGround: false, openGround: false };
  const left = hypothesesOf(evidence)
    .filter((hypothesis) => fitting.includes(hypothesis.condition))
    .flatMap((hypothesis) => variantsLeft(hypothesis, evidence));
  return {
    liveGround: left.some((variant) => variant.slotPotentials.G >= LIVE_VOLTS),
    openGround: left.some((variant) => variant.groundOhms >= OPEN_OHMS),
  };
}

/** Variants that agree with the readings; all of a condition's where a reading lies between two of them. */
function variantsLeft({ families }: Hypothesis, evidence: WiringEvidence): readonly Variant[] {
  const { lamps, sensor, slots } = evidence;
  const off = loadsAreOff(evidence);
  const all = families.flat().filter((variant) => !(off && variant.wiring.removable));
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

/** Mutual information in bits between the answer and the condition, every candidate taken as equally likely. */
function worthOf(kind: CheckKind, fitting: readonly WiringCondition[], evidence: WiringEvidence): Worth {
  const tables = outcomeTable(kind, evidence);
  const rows = fitting.map((condition) => ({ condition, shares: tables.get(condition) ?? new Map<Outcome, number>() }));
  const overall: Shares = new Map();
  for (const { shares } of rows)
    for (const [outcome, share] of shares) overall.set(outcome, (overall.get(outcome) ?? 0) + share / rows.length);
  const within = rows.reduce((sum, { shares }) => sum + entropy(shares) / rows.length, 0);
  return { gain: entropy(overall) - within, separates: separatedBy(rows) };
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

const tables = new Map<string, Map<WiringCondition, Shares>>();

/** How often each answer comes among the variants of each condition. Worked out once per kind of receptacle. */
function outcomeTable(kind: CheckKind, evidence: WiringEvidence): Map<WiringCondition, Shares> {
  const key = tableKey(kind, evidence);
  const known = tables.get(key);
  if (known) return known;
  const hypotheses = hypothesesOf(evidence).filter(({ families }) => families.length > 0);
  const off = loadsAreOff(evidence);
  const table = new Map(
    hypotheses.map(({ condition, families }) => {
      const standing = families.flat().filter((variant) => !(off && variant.wiring.removable));
      const shares: Shares = new Map();
      for (const variant of standing) {
        const outcome = outcomeOf(kind, variant, condition, evidence);
        shares.set(outcome, (shares.get(outcome) ?? 0) + 1 / standing.length);
      }
      return [condition, shares];
    }),
  );
  tables.set(key, table);
  return table;
}

function tableKey(kind: CheckKind, evidence: WiringEvidence): string {
  const { slots, nominalVolts = 120, supply, nearBondedPanel, sharedNeutral } = evidence;
  const context = kind === 'load-test' ? `${nearBondedPanel} ${sharedNeutral}` : '';
  return `${kind} ${slots} ${nominalVolts} ${supply} ${loadsAreOff(evidence)} ${context}`;
}
