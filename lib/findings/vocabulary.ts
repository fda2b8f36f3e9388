/** Closed sets. Each is declared here once and used by the engine, the zod schemas and the database enums. */

export const LAMPS = ['lit', 'dim', 'off'] as const;
export type Lamp = (typeof LAMPS)[number];

export const WIRING_CONDITIONS = [
  'correct',
  'open-ground',
  'open-neutral',
  'open-neutral-with-load',
  'open-hot',
  'no-power',
  'hot-neutral-reversed',
  'hot-ground-reversed',
  'hot-on-neutral-hot-open',
  'hot-on-ground-hot-open',
  'neutral-on-hot-hot-on-ground-neutral-open',
  'neutral-ground-swapped',
  'bootleg-ground',
  'reversed-bootleg-ground',
  'open-ground-hot-neutral-reversed',
  'open-neutral-and-ground',
  'same-leg-on-both',
  'line-to-line-240',
  'shared-neutral-open',
  'service-neutral-open',
  'high-resistance-ground',
  'high-resistance-neutral',
  'high-resistance-hot',
  'bootleg-ground-open-neutral',
  'open-ground-energized',
] as const;
export type WiringCondition = (typeof WIRING_CONDITIONS)[number];

/** Checks that an inspector can make, in the order of the inspector's own safety. */
export const WIRING_CHECKS = [
  'sensor',
  'power',
  'unplug',
  'high-impedance',
  'low-impedance-neutral',
  'low-impedance-all',
  'load-test',
  'ground-ohms',
] as const;
export type WiringCheck = (typeof WIRING_CHECKS)[number];

export const YES_NO_UNKNOWN = ['yes', 'no', 'unknown'] as const;
export type YesNoUnknown = (typeof YES_NO_UNKNOWN)[number];

export const TRIP_RESULTS = ['trips', 'no-trip'] as const;
export type TripResult = (typeof TRIP_RESULTS)[number];

export const METERS = ['high-impedance', 'low-impedance'] as const;
export type Meter = (typeof METERS)[number];

export const SUPPLIES = ['120/240', '208Y/120'] as const;
export type Supply = (typeof SUPPLIES)[number];

export const WIRING_METHODS = ['grounded-cable', 'metal-raceway', 'two-wire', 'unknown'] as const;
export type WiringMethod = (typeof WIRING_METHODS)[number];

export const PLACES = [
  'bathroom',
  'kitchen-counter',
  'kitchen-wall',
  'dishwasher',
  'laundry-area',
  'wet-bar',
  'garage',
  'accessory-building',
  'outdoors',
  'crawl-space',
  'basement',
  'attic',
  'bedroom',
  'living-room',
  'dining-room',
  'family-room',
  'recreation-room',
  'office',
  'hallway',
  'closet',
  'sunroom',
  'pool-area',
  'boathouse',
  'other-room',
] as const;
export type PlaceKind = (typeof PLACES)[number];

export const SINK_KINDS = ['kitchen', 'laundry', 'utility', 'wet-bar', 'other'] as const;
export type SinkKind = (typeof SINK_KINDS)[number];

export const DISTANCE_ENDS = ['outside-edge', 'inside-bowl-edge'] as const;
export type DistanceEnd = (typeof DISTANCE_ENDS)[number];

/** NEMA patterns that the receptacle drawing knows. */
export const SLOT_PATTERNS = ['5-15R', '5-20R', '1-15R', '6-15R', '6-20R', '10-30R', '14-30R', '14-50R'] as const;
export type SlotPattern = (typeof SLOT_PATTERNS)[number];

export const DEVICE_KINDS = [
  'receptacle',
  'gfci-receptacle',
  'afci-receptacle',
  'dual-function-receptacle',
  'hard-wired-outlet',
] as const;
export type DeviceKind = (typeof DEVICE_KINDS)[number];

/** Marks that can be read on a device or its cover plate. */
export const DEVICE_MARKS = ['tamper-resistant', 'weather-resistant', 'no-equipment-ground', 'gfci-protected'] as const;
export type DeviceMark = (typeof DEVICE_MARKS)[number];

export const COVER_KINDS = ['indoor', 'flap', 'in-use', 'metal', 'missing', 'broken'] as const;
export type CoverKind = (typeof COVER_KINDS)[number];

export const PRESENCES = ['present', 'not-present', 'removed'] as const;
export type Presence = (typeof PRESENCES)[number];

export const READING_KINDS = ['wiring', 'gfci', 'afci', 'load', 'physical'] as const;
export type ReadingKind = (typeof READING_KINDS)[number];

export const GFCI_DEVICES = ['receptacle', 'breaker', 'downstream'] as const;
export type GfciDevice = (typeof GFCI_DEVICES)[number];

export const BREAKER_MARKINGS = ['class-a-gfci', 'dual-function', 'afci', 'other'] as const;
export type BreakerMarking = (typeof BREAKER_MARKINGS)[number];

export const RETRIPS = ['unloaded', 'with-appliance'] as const;
export type Retrip = (typeof RETRIPS)[number];

export const PROTECTS = ['yes', 'no', 'unproven'] as const;
export type Protects = (typeof PROTECTS)[number];

export const GFCI_VERDICTS = [
  'replace',
  'power-left-off',
  'no-reset',
  'no-power',
  'hold',
  'not-tested',
  'reason-required',
  'incomplete',
  'upstream-protects-no-ground',
  'upstream-protects-ground-doubtful',
  'upstream-protects',
  'unconfirmed-tester-invalid',
  'unconfirmed',
  'line-load-reversed',
  'face-stays-live',
  'button-failed',
  'failed',
  'load-side-fault',
  'appliance-suspected',
  'slow',
  'breaker-type-unproven',
  'ground-doubtful',
  'works-button-only',
  'works-no-ground',
  'breaker-works',
  'works-upstream-tripped-first',
  'works-local-only',
  'works',
  'tester-only',
] as const;
export type GfciVerdict = (typeof GFCI_VERDICTS)[number];

export const AFCI_VERDICTS = [
  'incomplete',
  'works',
  'failed',
  'no-reset',
  'face-stays-live',
  'indication-only',
  'inconclusive',
  'not-tested',
  'reason-required',
] as const;
export type AfciVerdict = (typeof AFCI_VERDICTS)[number];

/** ANSI Z535.4 signal words, gravest first. */
export const SIGNALS = ['DANGER', 'WARNING', 'CAUTION', 'NOTICE'] as const;
export type Signal = (typeof SIGNALS)[number];

/** U1 stop using now, U2 within days, U3 planned repair, U4 upgrade, note for the records. */
export const URGENCIES = ['U1', 'U2', 'U3', 'U4', 'note'] as const;
export type Urgency = (typeof URGENCIES)[number];

export const FIXERS = ['electrician', 'owner', 'electrician-or-owner', 'utility', 'seller', 'specialist'] as const;
export type Fixer = (typeof FIXERS)[number];

export const SKIP_REASONS = [
  'blocked',
  'in-use',
  'occupied',
  'locked',
  'wet',
  'unsafe',
  'utility-off',
  'medical-equipment',
  'freezer-or-sump',
  'computer-or-alarm',
  'owner-refused',
  'client-excluded',
  'out-of-reach',
  'representative-sample',
] as const;
export type SkipReason = (typeof SKIP_REASONS)[number];

/** Things seen, heard, felt or found at a receptacle without an instrument. */
export const PHYSICAL_SIGNS = [
  'cracked',
  'scorched',
  'warm',
  'buzzing',
  'weak-grip',
  'ground-contact-loose',
  'loose-in-box',
  'box-recessed',
  'cover-missing',
  'live-terminals-exposed',
  'painted',
  'water-or-rust',
  'object-in-slot',
  'half-not-working',
  'live-plate-or-plumbing',
  'end-of-life-indicator',
  'hard-to-reach-gfci',
  'feeds-freezer-or-sump',
] as const;
export type PhysicalSign = (typeof PHYSICAL_SIGNS)[number];

export const DO_NOT_TRIP_REASONS = [
  'medical-equipment',
  'freezer',
  'sump-pump',
  'aquarium',
  'computer',
  'alarm',
  'occupant-asked',
] as const;
export type DoNotTripReason = (typeof DO_NOT_TRIP_REASONS)[number];

export const BREAKER_PROTECTIONS = ['none', 'gfci', 'afci', 'dual-function', 'unknown'] as const;
export type BreakerProtection = (typeof BREAKER_PROTECTIONS)[number];

export const STRUCTURE_KINDS = ['main-house', 'garage', 'unit', 'accessory'] as const;
export type StructureKind = (typeof STRUCTURE_KINDS)[number];

export const INSPECTION_STATES = ['booked', 'on-site', 'in-review', 'released', 'closed', 'cancelled'] as const;
export type InspectionState = (typeof INSPECTION_STATES)[number];

export const STATE_PROFILES = ['NY', 'TX', 'NJ', 'IL', 'NC', 'WA', 'MA', 'FL', 'general'] as const;
export type StateProfileCode = (typeof STATE_PROFILES)[number];

export const CONFIDENCES = ['high', 'medium', 'low'] as const;
export type Confidence = (typeof CONFIDENCES)[number];

/** NEC edition years that the rows of facts cover; the year picker of Visit offers these. */
export const NEC_EDITIONS = [
  1959, 1962, 1965, 1968, 1971, 1975, 1978, 1981, 1984, 1987, 1990, 1993, 1996, 1999, 2002, 2005, 2008, 2011, 2014,
  2017, 2020, 2023, 2026,
] as const;

export const LOCALES = ['en', 'es'] as const;
export type Locale = (typeof LOCALES)[number];
