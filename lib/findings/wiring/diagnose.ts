import type { WiringCandidate, WiringDiagnosis, WiringEvidence } from '../facts';
import type { WiringCondition } from '../vocabulary';
import { findConflict } from './conflict';
import { MECHANISMS } from './mechanisms';
import { chooseNextCheck } from './next-check';
import { listNotProven } from './not-proven';
import { hypothesesOf, piecesOf, standingUnder, type Piece } from './pieces';
import { rankCandidates } from './standing';

export { expectedReadings, type ExpectedReadings, type ReadingOptions } from './predict';

/**
 * Which wiring conditions the evidence of one receptacle can mean. Every condition is a circuit that is solved for the
 * instruments used; whatever fits is listed and experience only orders the list. Volts are V rms, ground path in ohms.
 * Candidates are empty where no single condition explains everything; `conflict` then says which readings disagree.
 * Tolerances, lamp strike and phantom voltages: facts.md section 3.
 */
export function diagnoseWiring(evidence: WiringEvidence): WiringDiagnosis {
  const pieces = piecesOf(evidence);
  const fitting: WiringCondition[] = [];
  const ruledOut: WiringDiagnosis['ruledOut'] = [];
  const standing = new Map(pieces.map((piece) => [piece, standingUnder(piece, evidence)]));
  for (const hypothesis of hypothesesOf(evidence)) {
    const against = pieces.find((piece) => !standing.get(piece)?.has(hypothesis.condition));
    if (against) ruledOut.push({ condition: hypothesis.condition, because: against.excludes(hypothesis) });
    else fitting.push(hypothesis.condition);
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

function explain({ condition, standing }: Omit<WiringCandidate, 'because'>): WiringCandidate {
  const lead = standing === 'leading' ? 'Most often' : 'Also possible';
  return { condition, standing, because: `${lead}: ${MECHANISMS[condition]}.` };
}

const READ: readonly Piece['kind'][] = ['lamps', 'volts', 'load-test', 'sensor', 'ground-ohms', 'jumper'];

function wasRead(pieces: readonly Piece[]): boolean {
  return pieces.some((piece) => READ.includes(piece.kind));
}
