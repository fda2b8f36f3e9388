import {
  doublePrecision,
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
import { createdAt, firmKey, instant, type Revisions, type Writers } from './columns';
import { areas, circuits, inspections, receptacles } from './inspections';

export const PHOTO_STATES = ['announced', 'stored', 'refused'] as const;
export const photoState = pgEnum('photo_state', PHOTO_STATES);

/** The original stays private to the firm; 1600 and 480 px copies without metadata are what is shared. */
export const photos = pgTable(
  'photos',
  {
    ...firmKey,
    inspectionId: uuid().notNull(),
    receptacleId: uuid(),
    areaId: uuid(),
    circuitId: uuid(),
    caption: text().notNull().default(''),
    order: doublePrecision().notNull(),
    state: photoState().notNull().default('announced'),
    refusal: text(),
    type: text().notNull(),
    bytes: integer().notNull(),
    sha256: text().notNull(),
    width: integer(),
    height: integer(),
    sha256Of1600: text(),
    sha256Of480: text(),
    markings: jsonb().$type<unknown[]>().notNull().default([]),
    takenAt: instant(),
    storedAt: instant(),
    revisions: jsonb().$type<Revisions>().notNull().default({}),
    writers: jsonb().$type<Writers>().notNull().default({}),
    version: integer().notNull(),
    deletedAt: instant(),
    ...createdAt,
  },
  (table) => [
    primaryKey({ columns: [table.firmId, table.id] }),
    foreignKey({
      columns: [table.firmId, table.inspectionId],
      foreignColumns: [inspections.firmId, inspections.id],
    }).onDelete('restrict'),
    foreignKey({
      columns: [table.firmId, table.receptacleId],
      foreignColumns: [receptacles.firmId, receptacles.id],
    }).onDelete('restrict'),
    foreignKey({ columns: [table.firmId, table.areaId], foreignColumns: [areas.firmId, areas.id] }).onDelete(
      'restrict',
    ),
    foreignKey({ columns: [table.firmId, table.circuitId], foreignColumns: [circuits.firmId, circuits.id] }).onDelete(
      'restrict',
    ),
    index().on(table.firmId, table.inspectionId),
  ],
);
