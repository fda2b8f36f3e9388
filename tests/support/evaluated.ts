import { composeFinding, evaluateInspection } from '@/lib/findings';
import type { Finding, InspectionFacts } from '@/lib/findings/facts';
import { emptyHouse, readings, receptacle } from './facts';

/** The finding with this id, if the facts give it. */
export function find(facts: InspectionFacts, id: string): Finding | undefined {
  return evaluateInspection(facts).findings.find((finding) => finding.id === id);
}

/** Everything that a finding says, as one text. */
export function says(finding: Finding | undefined): string {
  if (!finding) return '';
  const { hazard, evidence, unproven, ...parts } = composeFinding(finding, { locale: 'en' });
  return [...Object.values(parts), ...Object.values(hazard), ...evidence, ...unproven].join(' ');
}

/** "kind: text" of each gap at a receptacle. */
export function gapsAt(facts: InspectionFacts, receptacleId: string): string[] {
  return evaluateInspection(facts)
    .gaps.filter((gap) => gap.receptacleId === receptacleId)
    .map((gap) => `${gap.kind}: ${gap.says}`);
}

/** A house with one receptacle, `a`. */
export function one(
  rows: Parameters<typeof readings>[0],
  row: Partial<InspectionFacts['receptacles'][number]> = {},
  house: Parameters<typeof emptyHouse>[0] = {},
) {
  return emptyHouse({
    receptacles: [receptacle({ id: 'a', label: 'by the door', ...row })],
    readings: readings(rows),
    ...house,
  });
}
