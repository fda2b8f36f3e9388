import {
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  primaryKey,
  text,
  uuid,
  type AnyPgColumn,
} from 'drizzle-orm/pg-core';
import { NOTICE_KINDS, type ReadingFacts } from '@/lib/findings/facts';
import { READING_KINDS, SIGNALS, SKIP_REASONS } from '@/lib/findings/vocabulary';
import { DECISIONS } from '@/lib/schemas/operations';
import { memberships } from './auth';
import { createdAt, firmKey, instant } from './columns';
import { areas, circuits, inspections, receptacles, visits } from './inspections';

export const readingKind = pgEnum('reading_kind', READING_KINDS);
export const skipReason = pgEnum('skip_reason', SKIP_REASONS);
export const noticeKind = pgEnum('notice_kind', NOTICE_KINDS);
export const findingDecision = pgEnum('finding_decision', DECISIONS);
export const signal = pgEnum('signal', SIGNALS);

const inspectionKey = { ...firmKey, inspectionId: uuid().notNull() };
const ofInspection = (table: { firmId: AnyPgColumn; id: AnyPgColumn; inspectionId: AnyPgColumn }) => [
  primaryKey({ columns: [table.firmId, table.id] }),
  foreignKey({
    columns: [table.firmId, table.inspectionId],
    foreignColumns: [inspections.firmId, inspections.id],
  }).onDelete('restrict'),
  index().on(table.firmId, table.inspectionId),
];

/** Append-only. The evidence of a receptacle is the union of its readings of a visit that no later one supersedes. */
export const readings = pgTable(
  'readings',
  {
    ...inspectionKey,
    visitId: uuid().notNull(),
    receptacleId: uuid(),
    circuitId: uuid(),
    kind: readingKind().notNull(),
    evidence: jsonb().$type<ReadingFacts['evidence']>().notNull(),
    supersedes: uuid(),
    /** The server's order within the inspection. Never a clock. */
    order: integer().notNull(),
    membershipId: uuid().notNull(),
    recordedAt: instant().notNull(),
    /** Set by Undo; the row stays. */
    withdrawnAt: instant(),
    version: integer().notNull(),
    ...createdAt,
  },
  (table) => [
    ...ofInspection(table),
    foreignKey({ columns: [table.firmId, table.visitId], foreignColumns: [visits.firmId, visits.id] }).onDelete(
      'restrict',
    ),
    foreignKey({
      columns: [table.firmId, table.receptacleId],
      foreignColumns: [receptacles.firmId, receptacles.id],
    }).onDelete('restrict'),
    foreignKey({ columns: [table.firmId, table.circuitId], foreignColumns: [circuits.firmId, circuits.id] }).onDelete(
      'restrict',
    ),
    foreignKey({ columns: [table.firmId, table.supersedes], foreignColumns: [table.firmId, table.id] }).onDelete(
      'restrict',
    ),
    foreignKey({
      columns: [table.firmId, table.membershipId],
      foreignColumns: [memberships.firmId, memberships.id],
    }).onDelete('restrict'),
    index().on(table.firmId, table.receptacleId),
  ],
);

export const skips = pgTable(
  'skips',
  {
    ...inspectionKey,
    receptacleId: uuid(),
    areaId: uuid(),
    reason: skipReason().notNull(),
    note: text(),
    membershipId: uuid().notNull(),
    recordedAt: instant().notNull(),
    version: integer().notNull(),
    deletedAt: instant(),
    ...createdAt,
  },
  (table) => [
    ...ofInspection(table),
    foreignKey({
      columns: [table.firmId, table.receptacleId],
      foreignColumns: [receptacles.firmId, receptacles.id],
    }).onDelete('restrict'),
    foreignKey({ columns: [table.firmId, table.areaId], foreignColumns: [areas.firmId, areas.id] }).onDelete(
      'restrict',
    ),
  ],
);

/** What was told to whom, and how a point that a trial killed came back. Append-only. */
export const notices = pgTable(
  'notices',
  {
    ...inspectionKey,
    kind: noticeKind().notNull(),
    receptacleId: uuid(),
    circuitId: uuid(),
    readingId: uuid(),
    whom: text(),
    note: text(),
    order: integer().notNull(),
    membershipId: uuid().notNull(),
    recordedAt: instant().notNull(),
    version: integer().notNull(),
    ...createdAt,
  },
  (table) => [
    ...ofInspection(table),
    foreignKey({
      columns: [table.firmId, table.receptacleId],
      foreignColumns: [receptacles.firmId, receptacles.id],
    }).onDelete('restrict'),
    foreignKey({ columns: [table.firmId, table.readingId], foreignColumns: [readings.firmId, readings.id] }).onDelete(
      'restrict',
    ),
  ],
);

/** What the inspector decided of a derived finding, and the evidence seen then. Append-only; the last one stands. */
export const decisions = pgTable(
  'decisions',
  {
    ...inspectionKey,
    findingId: text().notNull(),
    decision: findingDecision().notNull(),
    reason: text(),
    ownWords: jsonb().$type<{ observed?: string; plain?: string }>(),
    raisedSignal: signal(),
    sawReadingIds: uuid().array().notNull(),
    order: integer().notNull(),
    membershipId: uuid().notNull(),
    recordedAt: instant().notNull(),
    version: integer().notNull(),
    ...createdAt,
  },
  (table) => [
    ...ofInspection(table),
    foreignKey({
      columns: [table.firmId, table.membershipId],
      foreignColumns: [memberships.firmId, memberships.id],
    }).onDelete('restrict'),
    index().on(table.firmId, table.inspectionId, table.findingId, table.order),
  ],
);
