'use client';

import { v7 as uuidv7 } from 'uuid';
import { PHYSICAL_SIGNS, type PhysicalSign } from '@/lib/findings/vocabulary';
import type { WalkReceptacle, WalkState } from '@/lib/schemas/walk';
import type { Walk } from '@/lib/walk/use-walk';
import { SIGN_LABELS } from './labels';
import { standingReadings } from './progress';
import { WalkButton } from './walk-button';

/** What was seen, heard or felt. One reading holds all signs; a change supersedes it. */
export function PhysicalSigns({
  walk,
  state,
  receptacle,
}: {
  walk: Walk;
  state: WalkState;
  receptacle: WalkReceptacle;
}) {
  const held = standingReadings(state, receptacle.id).findLast((row) => row.kind === 'physical');
  const signs = held?.kind === 'physical' ? held.evidence.signs : [];

  async function toggle(sign: PhysicalSign) {
    const next = signs.includes(sign) ? signs.filter((other) => other !== sign) : [...signs, sign];
    if (next.length === 0) {
      if (held) await walk.save([{ op: 'reading.withdraw', id: held.id }]);
      return;
    }
    const note = held?.kind === 'physical' ? held.evidence.note : undefined;
    await walk.save([
      {
        op: 'reading.add',
        id: uuidv7(),
        visitId: state.inspection.visitId,
        receptacleId: receptacle.id,
        supersedes: held?.id,
        reading: { kind: 'physical', evidence: { signs: next, ...(note ? { note } : {}) } },
      },
    ]);
  }

  return (
    <fieldset className="grid gap-2">
      <legend className="mb-2 font-bold">Seen, heard or felt</legend>
      <div className="grid grid-cols-2 gap-2">
        {PHYSICAL_SIGNS.map((sign) => (
          <WalkButton
            key={sign}
            weight={signs.includes(sign) ? 'solid' : 'outline'}
            aria-pressed={signs.includes(sign)}
            onClick={() => void toggle(sign)}
          >
            {SIGN_LABELS[sign]}
          </WalkButton>
        ))}
      </div>
    </fieldset>
  );
}
