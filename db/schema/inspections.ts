import { sql } from 'drizzle-orm';
import {
  boolean,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  pgView,
  primaryKey,
  text,
  unique,
  uuid,
  type AnyPgColumn,
} from 'drizzle-orm/pg-core';
import {
  BREAKER_PROTECTIONS,
  COVER_KINDS,
  DEVICE_KINDS,
  DEVICE_MARKS,
  DISTANCE_ENDS,
  DO_NOT_TRIP_REASONS,
  INSPECTION_STATES,
  PLACES,
  PRESENCES,
  SINK_KINDS,
  SLOT_PATTERNS,
  STRUCTURE_KINDS,
  SUPPLIES,
  WIRING_METHODS,
  YES_NO_UNKNOWN,
} from '@/lib/findings/vocabulary';
import { memberships } from './auth';
import { createdAt, firmKey, instant, tsvector, type Revisions, type Writers } from './columns';
import { firms, stateProfile, type Address } from './firms';

export const inspectionState = pgEnum('inspection_state', INSPECTION_STATES);
export const wiringMethod = pgEnum('wiring_method', WIRING_METHODS);
export const supply = pgEnum('supply', SUPPLIES);
export const place = pgEnum('place', PLACES);
export const structureKind = pgEnum('structure_kind', STRUCTURE_KINDS);
export const panelKind = pgEnum('panel_kind', ['main', 'sub']);
export const breakerProtection = pgEnum('breaker_protection', BREAKER_PROTECTIONS);
export const slotPattern = pgEnum('slot_pattern', SLOT_PATTERNS);
export const deviceKind = pgEnum('device_kind', DEVICE_KINDS);
export const deviceMark = pgEnum('device_mark', DEVICE_MARKS);
export const coverKind = pgEnum('cover_kind', COVER_KINDS);
export const presence = pgEnum('presence', PRESENCES);
export const sinkKind = pgEnum('sink_kind', SINK_KINDS);
export const distanceEnd = pgEnum('distance_end', DISTANCE_ENDS);
export const doNotTripReason = pgEnum('do_not_trip_reason', DO_NOT_TRIP_REASONS);
export const yesNoUnknown = pgEnum('yes_no_unknown', YES_NO_UNKNOWN);
export const VISIT_KINDS = ['first', 'return', 're-test'] as const;
export const visitKind = pgEnum('visit_kind', VISIT_KINDS);
export const PARTY_KINDS = ['buyer', 'agent', 'seller', 'electrician', 'occupant', 'other'] as const;
export const partyKind = pgEnum('party_kind', PARTY_KINDS);

/**
 * `revisions` holds, per field, the inspection's version at its last change, and `writers` who made it; `version` is that of
 * the row's last change; `deletedAt` is a tombstone. The field `contents` stands for what was recorded inside the row.
 */
const tracked = {
  revisions: jsonb().$type<Revisions>().notNull().default({}),
  writers: jsonb().$type<Writers>().notNull().default({}),
  version: integer().notNull(),
  deletedAt: instant(),
  ...createdAt,
};

export const inspections = pgTable(
  'inspections',
  {
    ...firmKey,
    number: integer().notNull(),
    state: inspectionState().notNull().default('booked'),
    address: jsonb().$type<Address>().notNull(),
    /** Number, address and parties as plain lower-case words with one space between, for the list's search. */
    searchText: text().notNull(),
    /** The words, and the firm as one more, so that the index answers for one firm without an extension. */
    searchWords: tsvector().generatedAlwaysAs(
      sql`array_to_tsvector(string_to_array(replace(firm_id::text, '-', '') || ' ' || search_text, ' '))`,
    ),
    timeZone: text().notNull(),
    stateProfile: stateProfile().notNull(),
    scheduledAt: instant().notNull(),
    yearBuilt: integer(),
    wiringMethod: wiringMethod().notNull().default('unknown'),
    supply: supply().notNull().default('120/240'),
    serviceAmps: integer(),
    occupied: boolean(),
    utilitiesOn: boolean(),
    codeEdition: integer(),
    codeEditionSource: text(),
    arrivalConfirmed: boolean().notNull().default(false),
    tripConfirmed: boolean().notNull().default(false),
    generalNote: text(),
    /** Order of readings, notices and decisions; taken under the row lock. */
    nextOrder: integer().notNull().default(1),
    releasedAt: instant(),
    ...tracked,
  },
  (table) => [
    primaryKey({ columns: [table.firmId, table.id] }),
    foreignKey({ columns: [table.firmId], foreignColumns: [firms.id] }).onDelete('restrict'),
    unique().on(table.firmId, table.number),
    index().on(table.firmId, table.scheduledAt, table.id),
    index().on(table.firmId, table.state, table.scheduledAt, table.id),
    index().on(table.firmId, table.number, table.id),
    index().on(table.firmId, table.state, table.number, table.id),
    index().using('gin', table.searchWords).with({ fastupdate: false }),
  ],
);

const ofInspection = (table: { firmId: AnyPgColumn; id: AnyPgColumn; inspectionId: AnyPgColumn }) => [
  primaryKey({ columns: [table.firmId, table.id] }),
  foreignKey({
    columns: [table.firmId, table.inspectionId],
    foreignColumns: [inspections.firmId, inspections.id],
  }).onDelete('restrict'),
  index().on(table.firmId, table.inspectionId),
];
const inspectionKey = { ...firmKey, inspectionId: uuid().notNull() };

/** Who walks; one leads. */
export const inspectionInspectors = pgTable(
  'inspection_inspectors',
  { ...inspectionKey, membershipId: uuid().notNull(), leads: boolean().notNull().default(false), ...createdAt },
  (table) => [
    ...ofInspection(table),
    foreignKey({
      columns: [table.firmId, table.membershipId],
      foreignColumns: [memberships.firmId, memberships.id],
    }).onDelete('restrict'),
    unique().on(table.firmId, table.inspectionId, table.membershipId),
    index().on(table.firmId, table.membershipId),
  ],
);

export const visits = pgTable(
  'visits',
  {
    ...inspectionKey,
    kind: visitKind().notNull(),
    startedAt: instant().notNull(),
    order: integer().notNull(),
    ...createdAt,
  },
  (table) => ofInspection(table),
);

export const parties = pgTable(
  'parties',
  {
    ...inspectionKey,
    kind: partyKind().notNull(),
    name: text().notNull(),
    email: text(),
    phone: text(),
    deletedAt: instant(),
    ...createdAt,
  },
  (table) => ofInspection(table),
);

export const structures = pgTable(
  'structures',
  {
    ...inspectionKey,
    name: text().notNull(),
    kind: structureKind().notNull(),
    order: doublePrecision().notNull(),
    ...tracked,
  },
  (table) => ofInspection(table),
);

export const areas = pgTable(
  'areas',
  {
    ...inspectionKey,
    structureId: uuid().notNull(),
    name: text().notNull(),
    place: place().notNull(),
    alsoPlace: place(),
    floor: integer().notNull().default(1),
    order: doublePrecision().notNull(),
    finished: boolean(),
    gradeAccess: boolean(),
    closed: boolean().notNull().default(false),
    ...tracked,
  },
  (table) => [
    ...ofInspection(table),
    foreignKey({
      columns: [table.firmId, table.structureId],
      foreignColumns: [structures.firmId, structures.id],
    }).onDelete('restrict'),
  ],
);

export const panels = pgTable(
  'panels',
  {
    ...inspectionKey,
    name: text().notNull(),
    kind: panelKind().notNull(),
    fedFromCircuitId: uuid(),
    place: text(),
    order: doublePrecision().notNull(),
    ...tracked,
  },
  (table) => ofInspection(table),
);

export const circuits = pgTable(
  'circuits',
  {
    ...inspectionKey,
    panelId: uuid().notNull(),
    breaker: text().notNull(),
    poles: integer().notNull().default(1),
    amps: integer(),
    wireAwg: integer(),
    labelAsFound: text(),
    protection: breakerProtection().notNull().default('unknown'),
    sharedNeutral: yesNoUnknown().notNull().default('unknown'),
    order: doublePrecision().notNull(),
    ...tracked,
  },
  (table) => [
    ...ofInspection(table),
    foreignKey({ columns: [table.firmId, table.panelId], foreignColumns: [panels.firmId, panels.id] }).onDelete(
      'restrict',
    ),
  ],
);

export const receptacles = pgTable(
  'receptacles',
  {
    ...inspectionKey,
    areaId: uuid().notNull(),
    label: text().notNull().default(''),
    order: doublePrecision().notNull(),
    pattern: slotPattern().notNull().default('5-15R'),
    device: deviceKind().notNull().default('receptacle'),
    presence: presence().notNull().default('present'),
    marks: deviceMark().array().notNull().default([]),
    marksChecked: boolean().notNull().default(false),
    cover: coverKind(),
    circuitId: uuid(),
    fedFromReceptacleId: uuid(),
    dedicatedAppliance: boolean(),
    heightFt: doublePrecision(),
    sinkFt: doublePrecision(),
    noSinkNear: boolean().notNull().default(false),
    sinkKind: sinkKind(),
    tubOrShowerFt: doublePrecision(),
    noTubNear: boolean().notNull().default(false),
    poolFt: doublePrecision(),
    noPoolNear: boolean().notNull().default(false),
    measuredTo: distanceEnd(),
    doNotTrip: doNotTripReason(),
    nearBondedPanel: boolean(),
    ...tracked,
  },
  (table) => [
    ...ofInspection(table),
    foreignKey({ columns: [table.firmId, table.areaId], foreignColumns: [areas.firmId, areas.id] }).onDelete(
      'restrict',
    ),
    foreignKey({ columns: [table.firmId, table.circuitId], foreignColumns: [circuits.firmId, circuits.id] }).onDelete(
      'restrict',
    ),
    index().on(table.firmId, table.areaId),
  ],
);

/** The list's rows, made by hand in a migration: row security would keep the planner from using the word index. */
export const listedInspections = pgView('listed_inspections', {
  firmId: uuid().notNull(),
  id: uuid().notNull(),
  number: integer().notNull(),
  state: inspectionState().notNull(),
  address: jsonb().$type<Address>().notNull(),
  timeZone: text().notNull(),
  scheduledAt: instant().notNull(),
  yearBuilt: integer(),
  searchWords: tsvector().notNull(),
}).existing();
