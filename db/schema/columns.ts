import { customType, timestamp, uuid } from 'drizzle-orm/pg-core';

/** Every firm-scoped row: the firm, and an id made where the record was made. */
export const firmKey = { firmId: uuid().notNull(), id: uuid().notNull() };
export const instant = () => timestamp({ withTimezone: true });
export const createdAt = { createdAt: timestamp({ withTimezone: true }).notNull().defaultNow() };
/** Per field, the inspection's version at its last change. */
export type Revisions = Record<string, number>;
/** Per field, who changed it last: the browser (null from the desk), the member, and when it was captured there. */
export type Writers = Record<string, { client: string | null; membershipId: string; at: string }>;
export const bytea = customType<{ data: Buffer; driverData: Buffer }>({ dataType: () => 'bytea' });
export const tsvector = customType<{ data: string }>({ dataType: () => 'tsvector' });
