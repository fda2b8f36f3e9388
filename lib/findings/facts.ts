import type {
  AfciVerdict,
  BreakerMarking,
  BreakerProtection,
  CoverKind,
  DeviceKind,
  DeviceMark,
  DistanceEnd,
  DoNotTripReason,
  GfciDevice,
  GfciVerdict,
  Lamp,
  Meter,
  PhysicalSign,
  PlaceKind,
  Presence,
  Protects,
  Retrip,
  SinkKind,
  SkipReason,
  SlotPattern,
  StateProfileCode,
  Supply,
  TripResult,
  WiringCheck,
  WiringCondition,
  WiringMethod,
  YesNoUnknown,
} from './vocabulary';

/** Lamps between hot–neutral, hot–ground and neutral–ground. */
export type LampPattern = { hn: Lamp; hg: Lamp; ng: Lamp };
/** V rms. */
export type VoltTrio = { hn: number; hg: number; ng: number; meter: Meter };
/** Amperes and V rms. */
export type LoadTest = { amps: number; noLoadHn: number; loadedHn: number; noLoadNg?: number; loadedNg?: number };
/** Whether a non-contact detector responds there. */
export type ContactSensor = { hotSlot?: boolean; neutralSlot?: boolean; groundSlot?: boolean; coverScrew?: boolean };

export type WiringEvidence = {
  slots: 2 | 3;
  nominalVolts?: 120 | 240;
  lamps?: LampPattern;
  volts?: VoltTrio;
  moreVolts?: VoltTrio[];
  loadTest?: LoadTest;
  sensor?: ContactSensor;
  loadsUnplugged?: YesNoUnknown;
  hardWiredLoadsOff?: YesNoUnknown;
  supply?: Supply;
  wiringMethod?: WiringMethod;
  sharedNeutral?: YesNoUnknown;
  nearBondedPanel?: boolean;
  groundOhms?: number;
  groundJumperSeen?: boolean;
  powerChecked?: boolean;
};

export type WiringCandidate = { condition: WiringCondition; standing: 'leading' | 'possible'; because: string };
export type WiringDiagnosis = {
  /** Leading first; all that fit the evidence. */
  candidates: WiringCandidate[];
  ruledOut: { condition: WiringCondition; because: string }[];
  /** What this evidence cannot tell; never empty. */
  notProven: string[];
  /** The one check that splits the candidates best. */
  nextCheck?: { kind: WiringCheck; instruction: string; separates: WiringCondition[] };
  /** Set where two pieces of evidence cannot both be right. */
  conflict?: string;
};

export type GfciTrial = {
  device: GfciDevice;
  lamps?: LampPattern;
  deadBefore?: boolean;
  /** For a downstream point: the upstream device's button kills it, or not. */
  button?: TripResult;
  faceDead?: boolean;
  tester?: TripResult;
  resets?: boolean;
  downstreamDead?: boolean;
  endOfLife?: boolean;
  retrips?: Retrip;
  upstreamTrippedFirst?: boolean;
  deviceFound?: boolean;
  measured?: { milliamps: number; seconds: number };
  notTestedReason?: string;
  breakerMarking?: BreakerMarking;
};
export type GfciAssessment = { verdict: GfciVerdict; row: string; protects: Protects; says: string };

export type AfciTrial = {
  button?: TripResult;
  circuitDead?: boolean;
  resets?: boolean;
  indicator?: TripResult;
  notTestedReason?: string;
};
export type AfciAssessment = { verdict: AfciVerdict; row: string; protects: Protects; says: string };

// ---- What one inspection recorded -----------------------------------------------------------------------------------

/** The part of WiringEvidence that a person reads at the receptacle; the rest comes from the device and the house. */
export type WiringReadingEvidence = Omit<
  WiringEvidence,
  'slots' | 'nominalVolts' | 'supply' | 'wiringMethod' | 'loadTest'
>;
/** Receptacle ids that went dead on this trial; they are off until a later notice says otherwise. */
export type GfciReadingEvidence = Omit<GfciTrial, 'lamps'> & {
  lamps?: LampPattern;
  wentDead?: string[];
  upstreamReceptacleId?: string;
};
export type AfciReadingEvidence = AfciTrial & { wentDead?: string[] };
export type PhysicalReadingEvidence = {
  signs: PhysicalSign[];
  note?: string;
  temperatureRiseF?: number;
  amps?: number;
};

type ReadingOf<Kind extends string, Evidence> = {
  id: string;
  /** A wiring, load or physical reading has a receptacle; a trial at a breaker has a circuit. */
  receptacleId?: string;
  circuitId?: string;
  kind: Kind;
  evidence: Evidence;
  /** The id of the earlier reading that this one corrects. */
  supersedes?: string;
  /** The server's order within the inspection. Never a clock. */
  order: number;
  by: string;
  /** Shown only; it orders nothing. ISO 8601. */
  recordedAt: string;
};
export type ReadingFacts =
  | ReadingOf<'wiring', WiringReadingEvidence>
  | ReadingOf<'load', LoadTest>
  | ReadingOf<'gfci', GfciReadingEvidence>
  | ReadingOf<'afci', AfciReadingEvidence>
  | ReadingOf<'physical', PhysicalReadingEvidence>;

export type AreaFacts = {
  id: string;
  structureId: string;
  name: string;
  place: PlaceKind;
  /** A second kind where the area is two at once, such as a laundry in an unfinished basement. */
  alsoPlace?: PlaceKind;
  floor: number;
  order: number;
  finished?: boolean;
  /** Outdoors: reached from the ground without a step. */
  gradeAccess?: boolean;
};

export type ReceptacleFacts = {
  id: string;
  areaId: string;
  label: string;
  order: number;
  pattern: SlotPattern;
  device: DeviceKind;
  presence: Presence;
  marks: DeviceMark[];
  /** Marks were looked for; without it an absent mark means nothing. */
  marksChecked?: boolean;
  cover?: CoverKind;
  circuitId?: string;
  fedFromReceptacleId?: string;
  /** A dedicated appliance stands in front of it. */
  dedicatedAppliance?: boolean;
  heightFt?: number;
  sinkFt?: number | 'none';
  sinkKind?: SinkKind;
  tubOrShowerFt?: number | 'none';
  poolFt?: number | 'none';
  measuredTo?: DistanceEnd;
  doNotTrip?: DoNotTripReason;
  /** Cable distance to any neutral–ground bond is under about 10 m (33 ft). */
  nearBondedPanel?: boolean;
};

export type PanelFacts = { id: string; name: string; kind: 'main' | 'sub'; fedFromCircuitId?: string; place?: string };

export type CircuitFacts = {
  id: string;
  panelId: string;
  /** Breaker position as printed, such as "12" or "7/9". */
  breaker: string;
  poles: 1 | 2;
  amps?: number;
  wireAwg?: number;
  labelAsFound?: string;
  protection: BreakerProtection;
  sharedNeutral?: YesNoUnknown;
};

export type SkipFacts = { id: string; receptacleId?: string; areaId?: string; reason: SkipReason; note?: string };
export type PhotoFacts = {
  id: string;
  receptacleId?: string;
  areaId?: string;
  circuitId?: string;
  caption?: string;
  order: number;
};

export const NOTICE_KINDS = ['danger-told', 'back-on', 'handed-over'] as const;
/** What was told to whom, or how a point that was killed by a trial came back. */
export type NoticeFacts = {
  id: string;
  kind: (typeof NOTICE_KINDS)[number];
  receptacleId?: string;
  circuitId?: string;
  readingId?: string;
  whom?: string;
  note?: string;
  order: number;
  at: string;
};

export type InspectionFacts = {
  inspection: {
    id: string;
    stateProfile: StateProfileCode;
    yearBuilt?: number;
    wiringMethod: WiringMethod;
    supply: Supply;
    /** Edition of the model code taken for this house; absent where nobody could say. */
    codeEdition?: number;
    codeEditionSource?: string;
  };
  structures: { id: string; name: string }[];
  areas: AreaFacts[];
  panels: PanelFacts[];
  circuits: CircuitFacts[];
  receptacles: ReceptacleFacts[];
  readings: ReadingFacts[];
  skips: SkipFacts[];
  photos: PhotoFacts[];
  notices: NoticeFacts[];
};

// What the engine makes of it.
export type {
  FindingSubject,
  TemplateValues,
  Finding,
  EvidenceLine,
  Gap,
  AreaCoverage,
  Coverage,
  ComposedFinding,
} from './evaluation';
