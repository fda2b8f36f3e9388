import 'server-only';
import { and, eq } from 'drizzle-orm';
import { isDeepStrictEqual } from 'node:util';
import { areas, circuits, panels, photos, receptacles, structures } from '../schema';
import type { Revisions, Writers } from '../schema/columns';
import { keepBoth, refuse, writerOf, type Context } from './context';

const TABLES = {
  structure: structures,
  area: areas,
  panel: panels,
  circuit: circuits,
  receptacle: receptacles,
  photo: photos,
} as const;
export type Entity = keyof typeof TABLES;
type Fields = Record<string, unknown>;

export function isEntity(name: string): name is Entity {
  return name in TABLES;
}

/** The columns that every tracked table has, and the entity's own fields beside them. */
export type TrackedRow = {
  id: string;
  inspectionId: string;
  revisions: Revisions;
  writers: Writers;
  version: number;
  deletedAt: Date | null;
} & Fields;

const WORDS: Record<Entity, string> = {
  structure: 'structure',
  area: 'area',
  panel: 'panel',
  circuit: 'circuit',
  receptacle: 'receptacle',
  photo: 'photo',
};

/** One shape stands for all six at the only two places that read or write them by name. */
function tableOf(entity: Entity): typeof areas {
  return TABLES[entity] as unknown as typeof areas;
}

function isRow(context: Context, entity: Entity, id: string) {
  const table = tableOf(entity);
  return and(eq(table.firmId, context.actor.firmId), eq(table.inspectionId, context.inspection.id), eq(table.id, id));
}

/** A row of this inspection, deleted or not, or null. */
export async function findRow(context: Context, entity: Entity, id: string): Promise<TrackedRow | null> {
  const key = `${entity} ${id}`;
  const known = context.rows.get(key);
  if (known) return known as TrackedRow;
  const [row] = await context.tx
    .select()
    .from(tableOf(entity))
    .where(isRow(context, entity, id));
  if (row) context.rows.set(key, row);
  return (row as TrackedRow | undefined) ?? null;
}

/** A row of this inspection; refuses the operation where there is none. */
export async function requireRow(context: Context, entity: Entity, id: string): Promise<TrackedRow> {
  const row = await findRow(context, entity, id);
  return row ?? refuse(`This ${WORDS[entity]} is not in this inspection. Load the inspection again.`);
}

export async function insertRow(context: Context, entity: Entity, id: string, fields: Fields): Promise<void> {
  const values = { ...fields, firmId: context.actor.firmId, id, inspectionId: context.inspection.id };
  await context.tx.insert(tableOf(entity)).values({ ...values, version: context.version } as typeof areas.$inferInsert);
}

/** Writes fields of a row and numbers each: the inspection's version, and who wrote it. */
export async function writeFields(context: Context, entity: Entity, row: TrackedRow, fields: Fields): Promise<void> {
  const numbered = number(context, row, Object.keys(fields));
  const { deleted, contents: _contents, ...columns } = fields;
  const tombstone = deleted === undefined ? {} : { deletedAt: deleted ? new Date() : null };
  const updated = await context.tx
    .update(tableOf(entity))
    .set({ ...columns, ...tombstone, ...numbered })
    .where(isRow(context, entity, row.id))
    .returning({ id: tableOf(entity).id });
  if (updated.length !== 1) throw new Error(`update of ${entity} ${row.id} changed ${updated.length} rows`);
  Object.assign(row, columns, tombstone, numbered);
}

function number(context: Context, row: Pick<TrackedRow, 'revisions' | 'writers'>, fields: string[]) {
  const revisions = { ...row.revisions };
  const writers = { ...row.writers };
  for (const field of fields) {
    revisions[field] = context.version;
    writers[field] = writerOf(context);
  }
  return { revisions, writers, version: context.version };
}

/** Says that something was recorded inside a row, so that a deletion by somebody who had not seen it is a conflict. */
export async function raiseContents(context: Context, entity: Entity, row: TrackedRow): Promise<void> {
  await writeFields(context, entity, row, { contents: true });
}

type Editable = { id: string; revisions: Revisions; writers: Writers } & Fields;

/**
 * Splits a patch by the conflict rule: a field is written where its number is the one the person saw, where this browser
 * wrote it last, or where the values are equal; otherwise the value that stands stays and both are kept.
 */
export async function acceptedFields(
  context: Context,
  entity: string,
  row: Editable,
  patch: Fields,
  base: Revisions,
): Promise<Fields> {
  const accepted: Fields = {};
  const was: Fields = {};
  for (const [field, value] of Object.entries(patch)) {
    if (value === undefined) continue;
    const seen = (row.revisions[field] ?? 0) === (base[field] ?? 0);
    const writer = row.writers[field];
    if (isDeepStrictEqual(row[field], value)) {
      context.merged ||= !seen;
      continue;
    }
    if (!seen && writer?.client !== context.client) {
      const what = { entity, entityId: row.id, field, theirs: row[field], yours: value };
      await keepBoth(context, what, writer, writerOf(context));
      continue;
    }
    context.merged ||= !seen;
    was[field] = row[field];
    accepted[field] = value;
  }
  context.detail = { ...context.detail, was };
  return accepted;
}

/** Fields changed by another browser since the numbers in `base` were seen. */
export function unseenChanges(context: Context, row: TrackedRow, base: Revisions): string[] {
  return Object.entries(row.revisions)
    .filter(([field, revision]) => revision > (base[field] ?? 0) && row.writers[field]?.client !== context.client)
    .sort(([, a], [, b]) => b - a)
    .map(([field]) => field);
}

/**
 * Brings a deleted row back because somebody who did not know of the deletion recorded something on it. What was seen in
 * the house is never dropped; whether to delete is left to a person.
 */
export async function keepStanding(context: Context, entity: Entity, row: TrackedRow): Promise<void> {
  if (!row.deletedAt) return;
  const deletedBy = row.writers.deleted ?? writerOf(context);
  await writeFields(context, entity, row, { deleted: false });
  const what = { entity, entityId: row.id, field: 'deleted', theirs: false, yours: true };
  await keepBoth(context, what, writerOf(context), deletedBy);
}
