import type { VoltTrio, WiringEvidence } from '../facts';
import type { WiringCondition } from '../vocabulary';
import { lampsFit, loadsAreOff, trioFits, triosOf } from './fit';
import type { Hypothesis } from './hypotheses';
import { hypothesesOf, standingUnder, type Piece } from './pieces';

/**
 * In words, where the evidence holds two things that cannot both be right, or that only a circuit that changed between
 * two readings explains; undefined where all of it agrees.
 */
export function findConflict(
  fitting: readonly WiringCondition[],
  pieces: readonly Piece[],
  evidence: WiringEvidence,
): string | undefined {
  if (fitting.length === 0) return disagreement(pieces, evidence);
  const sensor = sensorAgainstItself(evidence);
  if (sensor) return sensor;
  const moved = triosOf(evidence).some((trio) => !readTogether(trio, evidence));
  if (!moved) return undefined;
  return 'Lamps and meter do not agree as the circuit stands at one time; only a neutral or joint that changes with the loads explains both. Read both again with nothing changed between them.';
}

function disagreement(pieces: readonly Piece[], evidence: WiringEvidence): string {
  const standing = pieces.map((piece) => ({ piece, left: standingUnder(piece, evidence) }));
  const alone = standing.find(({ left }) => left.size === 0);
  if (alone)
    return `No single fault reads like ${alone.piece.name}. Read it again; if it stays, several faults are present at once.`;
  for (const [index, one] of standing.entries())
    for (const other of standing.slice(index + 1))
      if (isDisjoint(one.left, other.left))
        return `Two things cannot both be right: ${one.piece.name}; and ${other.piece.name}. Read both again.`;
  return 'No single fault explains all of this together. Read it again; if it stays, several faults are present at once.';
}

function isDisjoint(a: ReadonlySet<Hypothesis>, b: ReadonlySet<Hypothesis>): boolean {
  return [...a].every((hypothesis) => !b.has(hypothesis));
}

/** Is there one wiring, with one set of loads, that shows these lamps and these volts? */
function readTogether(trio: VoltTrio, evidence: WiringEvidence): boolean {
  const { lamps, slots } = evidence;
  if (!lamps) return true;
  const off = loadsAreOff(evidence);
  return hypothesesOf(evidence).some((hypothesis) =>
    trioFits(hypothesis, trio, slots, off, (variant) => lampsFit(variant, lamps, slots)),
  );
}

function sensorAgainstItself({ sensor }: WiringEvidence): string | undefined {
  if (!sensor?.coverScrew || sensor.groundSlot !== false) return undefined;
  return 'The live-wire sensor answered at the cover screw and not at the ground slot. Prove it on a known live outlet and try both again; until then treat the metal as live.';
}
