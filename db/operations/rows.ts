import 'server-only';
import { and, eq, isNull, sql } from 'drizzle-orm';
import {
  AREA_DEFAULTS,
  CIRCUIT_DEFAULTS,
  PANEL_DEFAULTS,
  RECEPTACLE_DEFAULTS,
  STRUCTURE_DEFAULTS,
} from '@/lib/schemas/defaults';
import { isDeepStrictEqual } from 'node:util';
import { areas, circuits, readings } from '../schema';
import type { Revisions } from '../schema/columns';
import { keepBoth, refuse, writerOf, type Context } from './context';
import { checkReferences } from './references';
import {
  acceptedFields,
  findRow,
  insertRow,
  keepStanding,
  raiseContents,
  requireRow,
  unseenChanges,
  writeFields,
  type Entity,
  type TrackedRow,
} from './tracked';

type Fields = Record<string, unknown>;
export type AddableEntity = Exclude<Entity, 'photo'>;

const DEFAULTS: Record<AddableEntity, Fields> = {
  structure: STRUCTURE_DEFAULTS,
  area: AREA_DEFAULTS,
  panel: PANEL_DEFAULTS,
  circuit: CIRCUIT_DEFAULTS,
  receptacle: RECEPTACLE_DEFAULTS,
};

/** Fields without which a row means nothing, and what to say. */
const REQUIRED: Partial<Record<AddableEntity, [field: string, says: string][]>> = {
  area: [
    ['structureId', 'Choose the structure that this area is in.'],
    ['name', 'Name the area.'],
  ],
  panel: [['name', 'Name the panel.']],
  circuit: [
    ['panelId', 'Choose the panel that this circuit is in.'],
    ['breaker', 'Give the breaker position.'],
  ],
  receptacle: [['areaId', 'Choose the area that this receptacle is in.']],
};

/** Where a row stands, whose contents it adds to. */
const PARENTS: Partial<Record<AddableEntity, { field: string; entity: Entity }>> = {
  area: { field: 'structureId', entity: 'structure' },
  circuit: { field: 'panelId', entity: 'panel' },
  receptacle: { field: 'areaId', entity: 'area' },
};

export async function addRow(context: Context, entity: AddableEntity, id: string, given: Fields): Promise<void> {
  const fields = { ...DEFAULTS[entity], ...defined(given) };
  const existing = await findRow(context, entity, id);
  if (existing) {
    const same = Object.entries(given).every(([field, value]) => isDeepStrictEqual(existing[field], value));
    if (!same) refuse('Another record has this number already. Load the inspection again and add it once more.');
    context.merged = true;
    context.unchanged = true;
    return;
  }
  const lacking = REQUIRED[entity]?.find(([field]) => !fields[field]);
  if (lacking) refuse(lacking[1]);
  await checkReferences(context, entity, id, fields);
  await insertRow(context, entity, id, fields);
  const parent = PARENTS[entity];
  if (!parent) return;
  const row = await requireRow(context, parent.entity, String(fields[parent.field]));
  await raiseContents(context, parent.entity, row);
}

export async function setRow(context: Context, entity: Entity, id: string, patch: Fields, base: Revisions) {
  const row = await requireRow(context, entity, id);
  const accepted = await acceptedFields(context, entity, row, patch, base);
  await keepStanding(context, entity, row);
  if (Object.keys(accepted).length === 0) {
    context.unchanged = context.conflicts.length === 0;
    return;
  }
  await checkReferences(context, entity, id, accepted);
  await writeFields(context, entity, row, accepted);
}

/** A tombstone, unless somebody changed the row since the remover saw it: then it stands until a person chooses. */
export async function removeRow(context: Context, entity: Entity, id: string, base: Revisions): Promise<void> {
  const row = await requireRow(context, entity, id);
  if (row.deletedAt) {
    context.merged = true;
    context.unchanged = true;
    return;
  }
  const [latest] = unseenChanges(context, row, base);
  if (latest !== undefined) {
    const what = { entity, entityId: id, field: 'deleted', theirs: false, yours: true };
    await keepBoth(context, what, row.writers[latest], writerOf(context));
    return;
  }
  await removeStanding(context, entity, row);
}

/** The tombstone itself; refuses while something that would be left hanging stands in the row. */
export async function removeStanding(context: Context, entity: Entity, row: TrackedRow): Promise<void> {
  await refuseWhileInUse(context, entity, row.id);
  await writeFields(context, entity, row, { deleted: true });
}

export async function restoreRow(context: Context, entity: Entity, id: string): Promise<void> {
  const row = await requireRow(context, entity, id);
  if (!row.deletedAt) {
    context.merged = true;
    context.unchanged = true;
    return;
  }
  await writeFields(context, entity, row, { deleted: false });
  await checkReferences(context, entity, id, row);
}

async function refuseWhileInUse(context: Context, entity: Entity, id: string): Promise<void> {
  const { tx, actor } = context;
  if (entity === 'structure') {
    const inside = and(eq(areas.firmId, actor.firmId), eq(areas.structureId, id), isNull(areas.deletedAt));
    if ((await tx.$count(areas, inside)) > 0) refuse('Areas stand in this structure. Move or remove them first.');
  }
  if (entity === 'panel') {
    const inside = and(eq(circuits.firmId, actor.firmId), eq(circuits.panelId, id), isNull(circuits.deletedAt));
    if ((await tx.$count(circuits, inside)) > 0) refuse('Circuits stand in this panel. Move or remove them first.');
  }
  if (entity === 'circuit') {
    const on = and(eq(readings.firmId, actor.firmId), eq(readings.circuitId, id), isNull(readings.withdrawnAt));
    if ((await tx.$count(readings, on)) > 0) refuse('This circuit has trials on record. Take them back first.');
    await refuseWhileFeeding(context, id);
  }
}

async function refuseWhileFeeding(context: Context, circuitId: string): Promise<void> {
  const { rows } = await context.tx.execute<{ on: string }>(sql`
    select (select count(*) from receptacles where firm_id = ${context.actor.firmId} and circuit_id = ${circuitId}
        and deleted_at is null)
      + (select count(*) from panels where firm_id = ${context.actor.firmId} and fed_from_circuit_id = ${circuitId}
        and deleted_at is null) as on`);
  if (Number(rows[0]?.on) > 0) {
    refuse('Receptacles or a panel are on this circuit. Put them on another circuit first.');
  }
}

function defined(fields: Fields): Fields {
  return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== undefined));
}
