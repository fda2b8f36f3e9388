import type { AfciVerdict } from '../vocabulary';
import type { AfciResult } from '../points';
import type { RawFinding, Rule } from './rule';

const TOLD: Partial<Record<AfciVerdict, string>> = {
  failed: 'no-trip',
  'face-stays-live': 'stays-live',
  'no-reset': 'no-reset',
};

/** A01: what the trials of arc protection showed, at a device or at a breaker. */
export const afciRule: Rule = {
  codes: ['A01'],
  find: (world) => [
    ...world.points.flatMap((point) => {
      const result = point.afci.at(-1);
      return result ? told(result, { group: point.receptacle.id, receptacleIds: [point.receptacle.id] }) : [];
    }),
    ...world.breakerAfci.flatMap((result) => {
      const { circuitId, evidence } = result.reading;
      return circuitId ? told(result, { group: circuitId, circuitId, receptacleIds: evidence.wentDead ?? [] }) : [];
    }),
  ],
};

function told(result: AfciResult, subject: Pick<RawFinding, 'group' | 'receptacleIds' | 'circuitId'>): RawFinding[] {
  const outcome = TOLD[result.assessment.verdict];
  if (!outcome) return [];
  return [
    {
      code: 'A01',
      ...subject,
      readingIds: [result.reading.id],
      values: { result: outcome, verdict: result.assessment.verdict },
    },
  ];
}
