import { customType, timestamp, uuid } from 'drizzle-orm/pg-core';

/** Every firm-scoped row: the firm, and an id made where the record was made. */
export const firmKey = { firmId: uuid().notNull(), id: uuid().notNull() };
export const instant = () => timestamp({ withTimezone: true });
export const createdAt = { createdAt: timestamp({ withTimezone: true }).notNull().defaultNow() };
/** Number of the last change per field, and the inspection's version at which the row last changed. */
export const bytea = customType<{ data: Buffer; driverData: Buffer }>({ dataType: () => 'bytea' });
