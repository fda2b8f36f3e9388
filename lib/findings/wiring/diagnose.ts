import type { WiringCandidate, WiringDiagnosis, WiringEvidence } from '../facts';
import type { WiringCondition } from '../vocabulary';
import { piecesOf, type Piece } from './fits';
import { TWO_SLOT_CONDITIONS } from './hypotheses';
import { chooseNextCheck, type CheckKind } from './next-check';
import { predictions, type Prediction } from './predict';
import { weigh } from './priors';
import { BECAUSE, notProvenWords, ruledOutWords } from './words';

export { expectedReadings } from './predict';

/** A candidate leads where it is at least this share as usual as the first one. */
const LEADING_SHARE = 0.6;

export type Diagnosis = Omit<WiringDiagnosis, 'nextCheck'> & {
  nextCheck?: NonNullable<WiringDiagnosis['nextCheck']> & { kind: CheckKind };
};

/**
 * Which wiring conditions the evidence can mean, which it excludes, what it does not prove, and the check that would tell
 * most. Volts are V rms, ohms ohms, amperes A. Each condition is solved in the circuit model for the instrument that was
 * used; a condition stays while one of its examples agrees with every piece of evidence at once, so more evidence never
 * adds a candidate. Where nothing agrees, `conflict` names the pieces and no candidate is given. Never throws.
 * Sources: nodal model of this folder; lamp strike voltage, cable coupling and order of checks of the fact base, section 3.
 */
export function diagnoseWiring(evidence: WiringEvidence): Diagnosis {
  const all = predictions(evidence.nominalVolts ?? 120);
  const considered =
    evidence.slots === 2 && evidence.nominalVolts !== 240
      ? all.filter(({ condition }) => TWO_SLOT_CONDITIONS.includes(condition))
      : all;
  const pieces = piecesOf(evidence);
  const remaining = considered.filter((prediction) => pieces.every((piece) => piece.agrees(prediction)));
  const weightOf = weigh(evidence);
  const candidates = rank([...new Set(remaining.map(({ condition }) => condition))], weightOf);
  const order = candidates.map(({ condition }) => condition);
  const sorted = remaining.toSorted((a, b) => order.indexOf(a.condition) - order.indexOf(b.condition));
  const nextCheck = chooseNextCheck(evidence, sorted, all, weightOf);
  const conflict = conflictOf(evidence, considered, pieces, remaining);
  return {
    candidates,
    ruledOut: ruleOut(considered, pieces, order, evidence.slots === 2),
    notProven: notProvenWords(evidence, order),
    ...(nextCheck ? { nextCheck } : {}),
    ...(conflict ? { conflict } : {}),
  };
}

function rank(conditions: WiringCondition[], weightOf: (condition: WiringCondition) => number): WiringCandidate[] {
  const sorted = conditions.toSorted((a, b) => weightOf(b) - weightOf(a) || (a < b ? -1 : 1));
  const [first] = sorted;
  const most = first ? weightOf(first) : 0;
  return sorted.map((condition) => ({
    condition,
    standing: weightOf(condition) >= LEADING_SHARE * most ? 'leading' : 'possible',
    because: BECAUSE[condition],
  }));
}

/** The first piece that no example of a condition agrees with, or else the first that its first example does not. */
function ruleOut(
  considered: Prediction[],
  pieces: Piece[],
  order: WiringCondition[],
  two: boolean,
): WiringDiagnosis['ruledOut'] {
  const conditions = [...new Set(considered.map(({ condition }) => condition))].filter(
    (condition) => !order.includes(condition),
  );
  return conditions.flatMap((condition) => {
    const examples = considered.filter((prediction) => prediction.condition === condition);
    const [first] = examples;
    if (!first) return [];
    const piece = pieces.find(({ agrees }) => !examples.some(agrees)) ?? pieces.find(({ agrees }) => !agrees(first));
    return [{ condition, because: ruledOutWords(first, piece?.name ?? 'the readings', two) }];
  });
}

/** Names the pieces that exclude each other: a pair where there is one, else all of them. */
function conflictOf(
  evidence: WiringEvidence,
  considered: Prediction[],
  pieces: Piece[],
  remaining: Prediction[],
): string | undefined {
  const trapped = groundTrap(evidence);
  if (remaining.length > 0) return trapped;
  for (const [i, one] of pieces.entries()) {
    const other = pieces
      .slice(i + 1)
      .find(({ agrees }) => !considered.some((prediction) => one.agrees(prediction) && agrees(prediction)));
    if (other)
      return sentence(
        `${one.name} and ${other.name} cannot both be right. Read both again, and treat the receptacle as live.`,
      );
  }
  const alone = pieces.find(({ agrees }) => !considered.some(agrees));
  if (alone)
    return sentence(
      `no wiring that is known here gives what ${alone.name} showed. Read it again, and treat the receptacle as live.`,
    );
  return 'These readings cannot all be right. Read them again, and treat the receptacle as live.';
}

/** Lamps without a ground, and an instrument that found one. */
function groundTrap({ lamps, groundOhms, slots }: WiringEvidence): string | undefined {
  const noGround = slots === 3 && lamps?.hn === 'lit' && lamps.hg === 'off' && lamps.ng === 'off';
  return noGround && groundOhms !== undefined && groundOhms <= 1
    ? 'The lamps showed no ground, and the ground path read low. Read both again.'
    : undefined;
}

function sentence(words: string): string {
  return words.charAt(0).toUpperCase() + words.slice(1);
}
