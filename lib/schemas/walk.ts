import type { z } from 'zod';
import type { NoticeFacts, ReadingFacts } from '@/lib/findings/facts';
import type { InspectionState, Signal, SkipReason, StateProfileCode } from '@/lib/findings/vocabulary';
import type {
  AREA_FIELDS,
  CIRCUIT_FIELDS,
  DECISIONS,
  INSPECTION_FIELDS,
  PANEL_FIELDS,
  RECEPTACLE_FIELDS,
  STRUCTURE_FIELDS,
} from './operations';

type Fields<Shape extends z.ZodRawShape> = z.infer<z.ZodObject<Shape>>;
type Tracked = { id: string; revisions: Record<string, number>; version: number; deleted: boolean };

export type WalkStructure = Tracked & Fields<typeof STRUCTURE_FIELDS>;
export type WalkArea = Tracked & Fields<typeof AREA_FIELDS>;
export type WalkPanel = Tracked & Fields<typeof PANEL_FIELDS>;
export type WalkCircuit = Tracked & Fields<typeof CIRCUIT_FIELDS>;
export type WalkReceptacle = Tracked & Fields<typeof RECEPTACLE_FIELDS>;
export type WalkReading = ReadingFacts & { visitId: string; withdrawn: boolean };
export type WalkSkip = {
  id: string;
  receptacleId?: string;
  areaId?: string;
  reason: SkipReason;
  note?: string;
  deleted: boolean;
};
export type WalkPhoto = {
  id: string;
  receptacleId?: string;
  areaId?: string;
  circuitId?: string;
  caption: string;
  order: number;
  state: 'announced' | 'stored' | 'refused';
  refusal?: string;
  sha256: string;
  revisions: Record<string, number>;
  deleted: boolean;
};
export type WalkDecision = {
  id: string;
  findingId: string;
  decision: (typeof DECISIONS)[number];
  reason?: string;
  ownWords?: { observed?: string; plain?: string };
  raisedSignal?: Signal;
  sawReadingIds: string[];
  order: number;
  by: string;
  at: string;
};
export type WalkConflict = {
  id: string;
  entity: string;
  entityId: string;
  field: string;
  theirs: unknown;
  yours: unknown;
  by: string;
  at: string;
};

/** Everything that a phone needs to work on one inspection, and what the desk screens derive findings from. */
export type WalkState = {
  inspection: {
    id: string;
    number: number;
    state: InspectionState;
    version: number;
    revisions: Record<string, number>;
    address: string;
    timeZone: string;
    stateProfile: StateProfileCode;
    scheduledAt: string;
    visitId: string;
  } & Fields<typeof INSPECTION_FIELDS>;
  structures: WalkStructure[];
  areas: WalkArea[];
  panels: WalkPanel[];
  circuits: WalkCircuit[];
  receptacles: WalkReceptacle[];
  readings: WalkReading[];
  skips: WalkSkip[];
  photos: WalkPhoto[];
  notices: NoticeFacts[];
  decisions: WalkDecision[];
  conflicts: WalkConflict[];
};

/** Who is signed in on this phone; answer to GET /api/me. */
export type WalkPerson = { userId: string; membershipId: string; name: string };

/** Answer to GET /api/inspections/[inspectionId]/walk: the state, who asks, and this browser's last counted operation. */
export type WalkAnswer = { state: WalkState; me: WalkPerson; lastMutation: number };
