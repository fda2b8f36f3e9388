/** The parts of a finding's wording that a template writes, in the order in which they are read. */
export const WORDING_PARTS = [
  'title',
  'observed',
  'means',
  'hazardType',
  'consequence',
  'avoid',
  'plain',
  'doNext',
  'who',
  'caution',
  'unproven',
] as const;
export type WordingPart = (typeof WORDING_PARTS)[number];
/** A firm's own templates, per code of a finding and part. What is not named keeps the original. */
export type WordingSet = Record<string, Partial<Record<WordingPart, string>>>;
