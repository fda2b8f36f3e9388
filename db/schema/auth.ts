import {
  boolean,
  index,
  inet,
  integer,
  pgEnum,
  pgTable,
  primaryKey,
  text,
  timestamp,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { ROLES } from '../roles';
import { bytea, createdAt, instant } from './columns';
import { firms } from './firms';

export const LINK_PURPOSES = ['invitation', 'reset', 'sign-in'] as const;
export const linkPurpose = pgEnum('link_purpose', LINK_PURPOSES);
export const role = pgEnum('role', ROLES);

/** A person who signs in. Belongs to no firm by itself; the app role reaches it through named functions only. */
export const users = pgTable('users', {
  id: uuid().primaryKey(),
  email: text().notNull().unique(),
  name: text().notNull(),
  passwordHash: text(),
  disabledAt: instant(),
  ...createdAt,
});

/** A person in a firm. Row security by firm. */
export const memberships = pgTable(
  'memberships',
  {
    firmId: uuid()
      .notNull()
      .references(() => firms.id, { onDelete: 'restrict' }),
    id: uuid().notNull(),
    userId: uuid()
      .notNull()
      .references(() => users.id, { onDelete: 'restrict' }),
    roles: role().array().notNull(),
    licenseNumber: text(),
    licenseState: text(),
    licenseExpires: text(),
    signatureName: text(),
    /** Object key of the drawn signature. */
    signatureKey: text(),
    /** Set while the invitation waits; accepting it clears it, and until then the membership opens nothing. */
    invitedAt: instant(),
    disabledAt: instant(),
    ...createdAt,
  },
  (table) => [primaryKey({ columns: [table.firmId, table.id] }), unique().on(table.firmId, table.userId)],
);

/** One signed-in browser. The token names it; the row decides at each request whether it still counts. */
export const sessions = pgTable(
  'sessions',
  {
    idHash: bytea().primaryKey(),
    userId: uuid()
      .notNull()
      .references(() => users.id, { onDelete: 'restrict' }),
    firmId: uuid().notNull(),
    userAgent: text(),
    lastSeenAt: instant().notNull().defaultNow(),
    expiresAt: instant().notNull(),
    revokedAt: instant(),
    ...createdAt,
  },
  (table) => [index().on(table.userId)],
);

/** One-time links of our own: the token is mailed, its hash is stored, a POST uses it up. */
export const linkTokens = pgTable('link_tokens', {
  tokenHash: bytea().primaryKey(),
  /** Of the e-mail and the short code that the same mail carries, for a reader without script. */
  codeHash: bytea().notNull().unique(),
  purpose: linkPurpose().notNull(),
  email: text().notNull(),
  userId: uuid(),
  firmId: uuid(),
  membershipId: uuid(),
  expiresAt: instant().notNull(),
  usedAt: instant(),
  ...createdAt,
});

/** Failed sign-ins, resets and link openings, shared by all web processes. */
export const rateLimits = pgTable('rate_limits', {
  key: text().primaryKey(),
  points: integer().notNull().default(0),
  expire: timestamp({ withTimezone: true }),
});

export const workerHeartbeats = pgTable('worker_heartbeats', {
  workerId: text().primaryKey(),
  seenAt: instant().notNull().defaultNow(),
  stopping: boolean().notNull().default(false),
  address: inet(),
});
