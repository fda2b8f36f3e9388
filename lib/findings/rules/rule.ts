import type { EvidenceLine, Finding, TemplateValues } from '../facts';
import type { World } from '../points';
import type { Fixer, Signal, Urgency } from '../vocabulary';

/**
 * What a rule found at one point, circuit or house, before places are put together.
 * Raw findings with the same code and group become one finding; its id is `code:group`.
 */
export type RawFinding = {
  code: string;
  /** A receptacle, circuit, structure or kind of place. Never depends on how many points are in it. */
  group: string;
  receptacleIds: string[];
  circuitId?: string;
  /** Circuits are named in the place instead of rooms. */
  byBreaker?: boolean;
  wholeHouse?: boolean;
  readingIds: string[];
  /** Where the evidence calls for another word than the catalogue row. */
  signal?: Signal;
  urgency?: Urgency;
  who?: Fixer;
  values?: TemplateValues;
  evidence?: EvidenceLine[];
  unproven?: string[];
  drawing?: Finding['drawing'];
  /** Since which edition, where the rule worked it out from the place. */
  hook?: Finding['hook'];
  /** How many points the same question was asked at, for "3 of 4 exterior receptacles". */
  outOf?: { count: number; noun: string };
};

/** One family of findings. It returns nothing where the facts do not speak; it never guesses. */
export type Rule = { codes: readonly string[]; find: (world: World) => RawFinding[] };
