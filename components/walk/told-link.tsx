'use client';

import { useMemo } from 'react';
import { evaluateInspection } from '@/lib/findings';
import type { InspectionFacts } from '@/lib/findings/facts';
import type { WalkState } from '@/lib/schemas/walk';
import { addressOf } from './walk-address';

/** Leads to the told card while something here is to be left alone and nobody is recorded as told. */
export function ToldLink({
  state,
  facts,
  receptacleId,
}: {
  state: WalkState;
  facts: InspectionFacts;
  receptacleId: string;
}) {
  const isUntold = useMemo(() => needsTelling(facts, receptacleId), [facts, receptacleId]);
  if (!isUntold) return null;
  return (
    <a
      className="flex min-h-[56px] items-center justify-center rounded-[2px] border-(length:--line-2) border-ink px-4 font-bold"
      href={addressOf(state.inspection.id, { kind: 'told', receptacleId })}
    >
      Stop using it now: say who was told
    </a>
  );
}

/** A finding to stop using, about this receptacle, of which nobody was told yet. */
function needsTelling(facts: InspectionFacts, receptacleId: string): boolean {
  if (facts.notices.some((notice) => notice.kind === 'danger-told' && notice.receptacleId === receptacleId))
    return false;
  return evaluateInspection(facts).findings.some(
    (finding) =>
      finding.urgency === 'U1' &&
      'receptacleIds' in finding.subject &&
      finding.subject.receptacleIds.includes(receptacleId),
  );
}
