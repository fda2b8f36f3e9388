import type { Finding } from '../facts';
import { URGENCIES, type Urgency } from '../vocabulary';

/** The five sentences that say what to do; no other words are used for urgency. */
export const URGENCY_SENTENCES: Record<Urgency, string> = {
  U1: 'Stop using it now',
  U2: 'Have it repaired within days',
  U3: 'Plan a repair',
  U4: 'Consider an upgrade',
  note: 'For your records',
};

/** Findings for "what to do first": one group per urgency that has any, most urgent first, each in the order given. */
export function whatToDoFirst<One extends Pick<Finding, 'urgency'>>(
  findings: readonly One[],
): { urgency: Urgency; sentence: string; findings: One[] }[] {
  return URGENCIES.map((urgency) => ({
    urgency,
    sentence: URGENCY_SENTENCES[urgency],
    findings: findings.filter((finding) => finding.urgency === urgency),
  })).filter((group) => group.findings.length > 0);
}
