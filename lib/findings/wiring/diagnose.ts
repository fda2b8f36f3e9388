import type { WiringCandidate, WiringDiagnosis, WiringEvidence } from '../facts';
import { WIRING_CONDITIONS, type WiringCondition } from '../vocabulary';
import { findConflict } from './conflict';
import type { Hypothesis } from './hypotheses';
import { MECHANISMS } from './mechanisms';
import { chooseNextCheck } from './next-check';
import { listNotProven } from './not-proven';
import { hypothesesOf, piecesOf, standingUnder, type Piece } from './pieces';
import { rankCandidates } from './standing';

export { expectedReadings } from './predict';

/**
 * Which wiring conditions the evidence of one receptacle can mean. Every condition is a circuit that is solved for the
 * instruments used; whatever fits is listed and experience only orders the list. Volts are V rms, ground path in ohms.
 * Candidates are empty where no single condition explains everything; `conflict` then says which readings disagree.
 * Tolerances, lamp strike and phantom voltages: facts.md section 3.
 */
export function diagnoseWiring(evidence: WiringEvidence): WiringDiagnosis {
  const pieces = piecesOf(evidence);
  const standing = pieces.map((piece) => ({ piece, left: standingUnder(piece, evidence) }));
  const fitting: WiringCondition[] = [];
  const ruledOut: WiringDiagnosis['ruledOut'] = [];
  for (const condition of WIRING_CONDITIONS) {
    const own = hypothesesOf(evidence).filter((hypothesis) => hypothesis.condition === condition);
    const left = own.filter((hypothesis) => standing.every((row) => row.left.has(hypothesis)));
    if (left.length > 0) fitting.push(condition);
    else ruledOut.push({ condition, because: reasonAgainst(own, standing) });
  }

  const candidates = rankCandidates(fitting, evidence).map(explain);
  const nextCheck = chooseNextCheck(fitting, evidence);
  const conflict = findConflict(fitting, pieces, evidence);
  return {
    candidates,
    ruledOut,
    notProven: listNotProven(fitting, evidence, wasRead(pieces)),
    ...(nextCheck ? { nextCheck } : {}),
    ...(conflict ? { conflict } : {}),
  };
}

/** The first piece that no form of the condition can explain; or that no form explains all of them. */
function reasonAgainst(
  own: readonly Hypothesis[],
  standing: readonly { piece: Piece; left: ReadonlySet<Hypothesis> }[],
): string {
  const against = standing.find(({ left }) => !own.some((hypothesis) => left.has(hypothesis)));
  const [first] = own;
  return against && first
    ? against.piece.excludes(first)
    : 'It could explain the readings one by one, and not all of them together.';
}

function explain({ condition, standing }: Omit<WiringCandidate, 'because'>): WiringCandidate {
  const lead = standing === 'leading' ? 'Most often' : 'Also possible';
  return { condition, standing, because: `${lead}: ${MECHANISMS[condition]}.` };
}

const READ: readonly Piece['kind'][] = ['lamps', 'volts', 'load-test', 'sensor', 'ground-ohms', 'jumper'];

function wasRead(pieces: readonly Piece[]): boolean {
  return pieces.some((piece) => READ.includes(piece.kind));
}
