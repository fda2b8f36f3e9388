import type { Confidence } from '../vocabulary';

/**
 * Edition of the model code (NEC) in which a thing was first asked of dwellings. Not the date on which any town enforced
 * it. Section numbers and our own words only. `source` is the id in the list of sources; "M" is from memory.
 */
export type EditionRow = {
  id: string;
  what: string;
  section: string;
  edition: number;
  effect: string;
  confidence: Confidence;
  source: string;
};

export const row = (
  id: string,
  what: string,
  section: string,
  edition: number,
  effect: string,
  confidence: Confidence,
  source: string,
): EditionRow => ({
  id,
  what,
  section,
  edition,
  effect,
  confidence,
  source,
});
