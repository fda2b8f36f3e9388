import type { Confidence } from '../vocabulary';

/**
 * Edition of the model code (NEC) in which a thing was first asked of dwellings; `null` where the published histories
 * only say that it is old. Not the date on which any town enforced it. Section numbers and our own words only. `source`
 * is the id in the list of sources; "M" is from memory.
 */
export type EditionRow<Id extends string = string> = {
  id: Id;
  what: string;
  section: string;
  edition: number | null;
  effect: string;
  confidence: Confidence;
  source: string;
};

export const row = <const Id extends string>(
  id: Id,
  what: string,
  section: string,
  edition: number | null,
  effect: string,
  confidence: Confidence,
  source: string,
): EditionRow<Id> => ({ id, what, section, edition, effect, confidence, source });
