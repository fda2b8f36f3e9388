import {
  foreignKey,
  index,
  integer,
  jsonb,
  pgEnum,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { LOCALES } from '@/lib/findings/vocabulary';
import { memberships } from './auth';
import { bytea, createdAt, firmKey, instant } from './columns';
import { inspections, parties } from './inspections';

export const locale = pgEnum('locale', LOCALES);
export const RENDER_STATES = ['waiting', 'rendering', 'ready', 'failed'] as const;
export const renderState = pgEnum('render_state', RENDER_STATES);
export const MESSAGE_STATES = ['waiting', 'sending', 'sent', 'failed'] as const;
export const messageState = pgEnum('message_state', MESSAGE_STATES);

/** Immutable. `snapshot` is canonical JSON as text, so that its SHA-256 can be recomputed from the row, byte for byte. */
export const reportVersions = pgTable(
  'report_versions',
  {
    ...firmKey,
    inspectionId: uuid().notNull(),
    number: integer().notNull(),
    snapshot: text().notNull(),
    sha256: text().notNull(),
    supersedes: uuid(),
    reason: text(),
    changes: jsonb().$type<string[]>().notNull().default([]),
    signedBy: uuid().notNull(),
    releasedAt: instant().notNull(),
    ...createdAt,
  },
  (table) => [
    primaryKey({ columns: [table.firmId, table.id] }),
    foreignKey({
      columns: [table.firmId, table.inspectionId],
      foreignColumns: [inspections.firmId, inspections.id],
    }).onDelete('restrict'),
    foreignKey({ columns: [table.firmId, table.supersedes], foreignColumns: [table.firmId, table.id] }).onDelete(
      'restrict',
    ),
    foreignKey({
      columns: [table.firmId, table.signedBy],
      foreignColumns: [memberships.firmId, memberships.id],
    }).onDelete('restrict'),
    unique().on(table.firmId, table.inspectionId, table.number),
  ],
);

/** Where the rendering of a version's PDF stands; a failure shows in the screen with a retry. */
export const renders = pgTable(
  'renders',
  {
    ...firmKey,
    reportVersionId: uuid().notNull(),
    locale: locale().notNull(),
    state: renderState().notNull().default('waiting'),
    attempts: integer().notNull().default(0),
    failure: text(),
    updatedAt: instant().notNull().defaultNow(),
  },
  (table) => [
    primaryKey({ columns: [table.firmId, table.id] }),
    foreignKey({
      columns: [table.firmId, table.reportVersionId],
      foreignColumns: [reportVersions.firmId, reportVersions.id],
    }).onDelete('restrict'),
    unique().on(table.firmId, table.reportVersionId, table.locale),
  ],
);

/** Insert only. The bytes stand in storage under `key`. */
export const reportFiles = pgTable(
  'report_files',
  {
    ...firmKey,
    reportVersionId: uuid().notNull(),
    locale: locale().notNull(),
    renderer: text().notNull(),
    key: text().notNull(),
    bytes: integer().notNull(),
    pages: integer().notNull(),
    sha256: text().notNull(),
    ...createdAt,
  },
  (table) => [
    primaryKey({ columns: [table.firmId, table.id] }),
    foreignKey({
      columns: [table.firmId, table.reportVersionId],
      foreignColumns: [reportVersions.firmId, reportVersions.id],
    }).onDelete('restrict'),
    unique().on(table.firmId, table.reportVersionId, table.locale, table.renderer),
  ],
);

/** What a recipient may open, until when. The token is mailed; its hash is stored. */
export const grants = pgTable(
  'grants',
  {
    ...firmKey,
    inspectionId: uuid().notNull(),
    partyId: uuid().notNull(),
    tokenHash: bytea().notNull().unique(),
    codeHash: bytea().notNull(),
    until: instant().notNull(),
    revokedAt: instant(),
    openedAt: instant(),
    opens: integer().notNull().default(0),
    ...createdAt,
  },
  (table) => [
    primaryKey({ columns: [table.firmId, table.id] }),
    foreignKey({
      columns: [table.firmId, table.inspectionId],
      foreignColumns: [inspections.firmId, inspections.id],
    }).onDelete('restrict'),
    foreignKey({ columns: [table.firmId, table.partyId], foreignColumns: [parties.firmId, parties.id] }).onDelete(
      'restrict',
    ),
    index().on(table.firmId, table.inspectionId),
  ],
);

/** One mail to one person. `dedupeKey` makes sending it twice impossible to ask for. */
export const messages = pgTable(
  'messages',
  {
    ...firmKey,
    inspectionId: uuid(),
    grantId: uuid(),
    kind: text().notNull(),
    toName: text().notNull(),
    toEmail: text().notNull(),
    dedupeKey: text().notNull(),
    state: messageState().notNull().default('waiting'),
    attempts: integer().notNull().default(0),
    failure: text(),
    sentAt: instant(),
    ...createdAt,
  },
  (table) => [
    primaryKey({ columns: [table.firmId, table.id] }),
    foreignKey({
      columns: [table.firmId, table.inspectionId],
      foreignColumns: [inspections.firmId, inspections.id],
    }).onDelete('restrict'),
    foreignKey({ columns: [table.firmId, table.grantId], foreignColumns: [grants.firmId, grants.id] }).onDelete(
      'restrict',
    ),
    unique().on(table.firmId, table.dedupeKey),
    index().on(table.firmId, table.inspectionId),
  ],
);
