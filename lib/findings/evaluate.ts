import { coverageOf } from './coverage';
import type { Coverage, Finding, Gap, InspectionFacts } from './facts';
import { collectGaps } from './gaps';
import { mergeFindings } from './merge';
import { buildWorld } from './points';
import { RULES } from './rules/all';

/** The report's raw material. */
export type Evaluation = { findings: Finding[]; gaps: Gap[]; coverage: Coverage };

/**
 * Everything that the recorded facts say about one inspection: findings merged per place with stable ids, what stays
 * unproven, and what was covered. Pure: the same facts in any order of rows give the same answer. Throws nothing for
 * facts that refer to rows that are not there; such rows are left out.
 */
export function evaluateInspection(facts: InspectionFacts): Evaluation {
  const world = buildWorld(facts);
  const findings = mergeFindings(
    RULES.flatMap((rule) => rule.find(world)),
    world,
  );
  return { findings, gaps: collectGaps(world, findings), coverage: coverageOf(world) };
}
