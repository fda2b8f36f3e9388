import {
  boolean,
  date,
  foreignKey,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  primaryKey,
  text,
  uuid,
} from 'drizzle-orm/pg-core';
import { STATE_PROFILES } from '@/lib/findings/vocabulary';
import { createdAt, firmKey } from './columns';

export const stateProfile = pgEnum('state_profile', STATE_PROFILES);

/** Structured postal address; county decides which edition a town enforces. */
export type Address = { street: string; unit?: string; city: string; county?: string; state: string; zip: string };

export const firms = pgTable('firms', {
  id: uuid().primaryKey(),
  name: text().notNull(),
  address: jsonb().$type<Address>(),
  phone: text(),
  email: text(),
  licenseNumber: text(),
  logoKey: text(),
  timeZone: text().notNull().default('America/New_York'),
  stateProfile: stateProfile().notNull().default('general'),
  /** Inspectors see each other's drafts. */
  sharedDrafts: boolean().notNull().default(false),
  nextInspectionNumber: integer().notNull().default(1),
  ...createdAt,
});

/** From when a place enforces which edition of the model code, and who says so. */
export const adoptions = pgTable(
  'adoptions',
  {
    ...firmKey,
    place: text().notNull(),
    edition: integer().notNull(),
    from: date().notNull(),
    source: text().notNull(),
    ...createdAt,
  },
  (table) => [
    primaryKey({ columns: [table.firmId, table.id] }),
    foreignKey({ columns: [table.firmId], foreignColumns: [firms.id] }).onDelete('restrict'),
  ],
);
