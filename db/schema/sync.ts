import {
  bigint,
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  primaryKey,
  text,
  uuid,
} from 'drizzle-orm/pg-core';
import { createdAt, firmKey, instant } from './columns';
import { inspections } from './inspections';

export const OPERATION_OUTCOMES = ['applied', 'merged', 'conflict', 'rejected'] as const;
export const operationOutcome = pgEnum('operation_outcome', OPERATION_OUTCOMES);

/** One browser of one member. `last` is the number of its last operation, stored with that operation's effect. */
export const syncClients = pgTable(
  'sync_clients',
  { ...firmKey, userId: uuid().notNull(), last: integer().notNull().default(0), ...createdAt },
  (table) => [primaryKey({ columns: [table.firmId, table.id] })],
);

/** Every operation that arrived, with its answer. Append-only. */
export const mutationLog = pgTable(
  'mutation_log',
  {
    firmId: uuid().notNull(),
    clientId: uuid().notNull(),
    n: integer().notNull(),
    inspectionId: uuid(),
    operation: jsonb().$type<unknown>().notNull(),
    outcome: operationOutcome().notNull(),
    receipt: jsonb().$type<unknown>().notNull(),
    ...createdAt,
  },
  (table) => [
    primaryKey({ columns: [table.firmId, table.clientId, table.n] }),
    foreignKey({
      columns: [table.firmId, table.clientId],
      foreignColumns: [syncClients.firmId, syncClients.id],
    }).onDelete('restrict'),
    index().on(table.firmId, table.inspectionId),
  ],
);

/** Two values for one field, until a person chooses. Blocks release while open. */
export const conflicts = pgTable(
  'conflicts',
  {
    ...firmKey,
    inspectionId: uuid().notNull(),
    entity: text().notNull(),
    entityId: uuid().notNull(),
    field: text().notNull(),
    /** The value that stands, by whom and when. */
    theirs: jsonb().$type<unknown>(),
    theirMembershipId: uuid(),
    theirCapturedAt: instant(),
    /** The value that was refused, by whom and when. */
    yours: jsonb().$type<unknown>(),
    membershipId: uuid().notNull(),
    capturedAt: instant().notNull(),
    resolvedAt: instant(),
    resolvedBy: uuid(),
    kept: text(),
    version: integer().notNull(),
    ...createdAt,
  },
  (table) => [
    primaryKey({ columns: [table.firmId, table.id] }),
    foreignKey({
      columns: [table.firmId, table.inspectionId],
      foreignColumns: [inspections.firmId, inspections.id],
    }).onDelete('restrict'),
    index().on(table.firmId, table.inspectionId),
  ],
);

/** What happened, by whom. Insert only, chained by hash per firm. */
export const auditEvents = pgTable(
  'audit_events',
  {
    firmId: uuid().notNull(),
    order: bigint({ mode: 'number' }).notNull(),
    inspectionId: uuid(),
    actorKind: text().notNull(),
    actorId: uuid(),
    actorName: text().notNull(),
    kind: text().notNull(),
    detail: jsonb().$type<Record<string, unknown>>().notNull().default({}),
    at: instant().notNull().defaultNow(),
    previousHash: text().notNull(),
    hash: text().notNull(),
  },
  (table) => [primaryKey({ columns: [table.firmId, table.order] }), index().on(table.firmId, table.inspectionId)],
);
