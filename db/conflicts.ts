import 'server-only';
import { and, eq } from 'drizzle-orm';
import type { MemberActor } from './actor';
import { recordAudit } from './audit';
import { contextOf, lockInspection, refuse, Refusal, type Context } from './operations/context';
import { writeInspectionFields } from './operations/inspection';
import { checkReferences } from './operations/references';
import { removeStanding } from './operations/rows';
import { isEntity, requireRow, writeFields } from './operations/tracked';
import { conflicts, inspections } from './schema';
import { holds, inspectionsVisibleTo } from './scope';
import { memberNames, openConflicts } from './walk-rows';
import { withActor, type Transaction } from './with-actor';

export type OpenConflict = {
  id: string;
  entity: string;
  entityId: string;
  field: string;
  /** The value that stands, who wrote it and when it was captured there. */
  theirs: { value: unknown; by: string; at: string };
  /** The value that was refused, by whom and when. */
  yours: { value: unknown; by: string; at: string };
};

/** Fields of an inspection with two values, oldest first; empty where the actor may not see it. */
export async function listConflicts(actor: MemberActor, inspectionId: string): Promise<OpenConflict[]> {
  return withActor(actor, async (tx) => {
    const [inspection] = await tx
      .select({ firmId: inspections.firmId, id: inspections.id })
      .from(inspections)
      .where(and(eq(inspections.id, inspectionId), inspectionsVisibleTo(actor)));
    if (!inspection) return [];
    const names = await memberNames(tx, actor.firmId);
    const nameOf = (id: string | null) => (id && names.get(id)) || 'The office';
    return (await openConflicts(tx, inspection)).map((row) => ({
      id: row.id,
      entity: row.entity,
      entityId: row.entityId,
      field: row.field,
      theirs: {
        value: row.theirs,
        by: nameOf(row.theirMembershipId),
        at: (row.theirCapturedAt ?? row.createdAt).toISOString(),
      },
      yours: { value: row.yours, by: nameOf(row.membershipId), at: row.capturedAt.toISOString() },
    }));
  });
}

export type ResolveOutcome =
  { kind: 'resolved' } | { kind: 'already-resolved' } | { kind: 'refused'; says: string } | { kind: 'not-found' };

/** Keeps one of the two values of a disputed field. Both stay in the record. Owners and inspectors choose. */
export async function resolveConflict(
  actor: MemberActor,
  conflictId: string,
  keep: 'theirs' | 'yours',
): Promise<ResolveOutcome> {
  if (!holds(actor, 'owner', 'inspector')) return { kind: 'not-found' };
  try {
    return await withActor(actor, (tx) => resolveIn(tx, actor, conflictId, keep));
  } catch (error) {
    if (error instanceof Refusal) return { kind: 'refused', says: error.message };
    throw error;
  }
}

async function resolveIn(
  tx: Transaction,
  actor: MemberActor,
  conflictId: string,
  keep: 'theirs' | 'yours',
): Promise<ResolveOutcome> {
  const isConflict = and(eq(conflicts.firmId, actor.firmId), eq(conflicts.id, conflictId));
  const [found] = await tx.select({ inspectionId: conflicts.inspectionId }).from(conflicts).where(isConflict);
  const inspection = found && (await lockInspection(tx, actor, found.inspectionId));
  if (!inspection) return { kind: 'not-found' };
  const [conflict] = await tx.select().from(conflicts).where(isConflict);
  if (!conflict) return { kind: 'not-found' };
  if (conflict.resolvedAt) return { kind: 'already-resolved' };
  if (inspection.state === 'cancelled' || inspection.state === 'closed') {
    refuse('This inspection is over. Ask your office to open it again.');
  }

  const context = contextOf(tx, actor, actor.membershipId, inspection, new Date().toISOString());
  if (keep === 'yours') await writeYours(context, conflict);
  const { version } = context;
  await tx
    .update(conflicts)
    .set({ resolvedAt: new Date(), resolvedBy: actor.membershipId, kept: keep, version })
    .where(isConflict);
  await tx
    .update(inspections)
    .set({ version })
    .where(and(eq(inspections.firmId, actor.firmId), eq(inspections.id, inspection.id)));
  const { entity, entityId, field, theirs, yours } = conflict;
  await recordAudit(tx, inspection.id, 'conflict.resolved', {
    id: conflictId,
    entity,
    entityId,
    field,
    theirs,
    yours,
    keep,
  });
  return { kind: 'resolved' };
}

async function writeYours(context: Context, conflict: typeof conflicts.$inferSelect): Promise<void> {
  const { entity, entityId, field, yours } = conflict;
  if (entity === 'inspection') return writeInspectionFields(context, { [field]: yours });
  if (!isEntity(entity)) throw new Error(`conflict ${conflict.id} is about an unknown ${entity}`);
  const row = await requireRow(context, entity, entityId);
  if (field === 'deleted') return removeStanding(context, entity, row);
  await checkReferences(context, entity, entityId, { [field]: yours });
  await writeFields(context, entity, row, { [field]: yours });
}
