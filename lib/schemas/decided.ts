import type { Finding } from '@/lib/findings/facts';
import { SIGNALS, type Signal } from '@/lib/findings/vocabulary';
import type { WalkDecision } from './walk';

/** Where a finding stands with the inspector. `changed` means that its evidence changed since it was decided. */
export type FindingStanding = 'to-decide' | 'kept' | 'dismissed' | 'changed';

export type DecidedFinding = Finding & { standing: FindingStanding; decision?: WalkDecision };

/**
 * Derived findings with the last decision on each. A decision stays when the evidence changes; it is marked and must be
 * confirmed. A raised signal stands in for the derived one; it is never lowered.
 */
export function decideFindings(findings: Finding[], decisions: WalkDecision[]): DecidedFinding[] {
  const last = new Map<string, WalkDecision>();
  for (const decision of decisions.toSorted((a, b) => a.order - b.order)) last.set(decision.findingId, decision);
  return findings.map((finding) => {
    const decision = last.get(finding.id);
    if (!decision) return { ...finding, standing: 'to-decide' };
    const standing = sameReadings(decision.sawReadingIds, finding.readingIds) ? decision.decision : 'changed';
    return { ...finding, signal: graver(finding.signal, decision.raisedSignal), standing, decision };
  });
}

function sameReadings(seen: string[], now: string[]): boolean {
  return seen.length === now.length && new Set([...seen, ...now]).size === seen.length;
}

function graver(derived: Signal, raised: Signal | undefined): Signal {
  if (!raised) return derived;
  return SIGNALS.indexOf(raised) < SIGNALS.indexOf(derived) ? raised : derived;
}
