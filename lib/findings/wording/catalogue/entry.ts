import type { Confidence, Fixer, Signal, Urgency } from '../../vocabulary';
import type { WordingPart } from '../wording-set';

/**
 * One row of the catalogue. The templates are Liquid; the names they may use are in ../variables.ts.
 * Short sentences: a hazard sentence has 20 words at most and the plain text reads at grade 8 or lower.
 */
export type CatalogueEntry = {
  code: string;
  signal: Signal;
  urgency: Urgency;
  who: Fixer;
  /** What has to be on record for the finding to stand, for the inspector. */
  evidenceNeeded: string[];
  /** Section of the model code that the idea comes from. Never a claim that anything breaks a rule. */
  hook?: { section: string; since?: number; confidence: Confidence };
  en: Record<WordingPart, string>;
};
