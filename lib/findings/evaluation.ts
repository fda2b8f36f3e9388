import type { LampPattern, VoltTrio } from './facts';
import type { Confidence, DeviceKind, Fixer, Signal, SlotPattern, Urgency, WiringCondition } from './vocabulary';

export type FindingSubject =
  | { kind: 'receptacles'; receptacleIds: string[] }
  | { kind: 'circuit'; circuitId: string; receptacleIds: string[] }
  | { kind: 'panel'; panelId: string }
  | { kind: 'inspection' };

/** Variables of the templates. The documented list is `TEMPLATE_VARIABLES` in wording/variables.ts. */
export type TemplateValues = Record<string, string | number | boolean | string[]>;

/** One thing to report. Derived: the same facts give the same findings and ids in any order of input. */
export type Finding = {
  /** Code + place group, or code + device where findings are not merged. Stable when one more receptacle joins. */
  id: string;
  code: string;
  signal: Signal;
  urgency: Urgency;
  who: Fixer;
  subject: FindingSubject;
  /** Where, in words: "Garage, bench left" or "3 of 4 exterior receptacles". */
  place: string;
  /** Every reading that this finding rests on, sorted by server order. */
  readingIds: string[];
  photoIds: string[];
  values: TemplateValues;
  /** Evidence lines for people: when, what instrument, what it showed, who. */
  evidence: EvidenceLine[];
  /** What the evidence does not prove; never empty. */
  unproven: string[];
  /** For the drawing: what was read at the receptacle that stands first, and the leading condition. */
  drawing?: {
    pattern: SlotPattern;
    device: DeviceKind;
    lamps?: LampPattern;
    volts?: VoltTrio;
    condition?: WiringCondition;
  };
  /** Section of the model code that the idea comes from, and since when it was asked. */
  hook?: { section: string; since?: number; confidence: Confidence };
};

export type EvidenceLine = {
  readingId?: string;
  receptacleId?: string;
  at?: string;
  instrument: string;
  showed: string;
  by?: string;
};

/** What stays unproven, and why; printed in the report. */
export type Gap = {
  id: string;
  kind: 'not-tested' | 'unproven' | 'conflict' | 'incomplete' | 'still-off' | 'not-told';
  receptacleId?: string;
  areaId?: string;
  circuitId?: string;
  place: string;
  says: string;
  readingIds: string[];
};

export type AreaCoverage = { areaId: string; present: number; tested: number; skipped: number; needs: string[] };
export type Coverage = { complete: boolean; areas: AreaCoverage[]; leftOff: string[] };

export type ComposedFinding = {
  title: string;
  observed: string;
  means: string;
  hazard: { signal: Signal; type: string; consequence: string; avoid: string };
  plain: string;
  doNext: string;
  who: string;
  caution: string;
  evidence: string[];
  unproven: string[];
};
