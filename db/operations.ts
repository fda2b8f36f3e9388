import 'server-only';
import { and, eq } from 'drizzle-orm';
import type { Operation, OperationName } from '@/lib/schemas/operations';
import type { MemberActor } from './actor';
import { recordAudit } from './audit';
import { contextOf, lockInspection, refuse, Refusal, type Applied, type Context } from './operations/context';
import { advanceInspection, setInspection } from './operations/inspection';
import {
  addNotice,
  addPhoto,
  addReading,
  addSkip,
  addVisit,
  decideFinding,
  removeSkip,
  withdrawReading,
} from './operations/records';
import { addRow, removeRow, restoreRow, setRow } from './operations/rows';
import { inspections } from './schema';
import { holds } from './scope';
import type { Transaction } from './with-actor';

export type { Applied } from './operations/context';

/** What the office may change: the house and its panels, never what was read in it or made of it. */
const OFFICE_MAY: ReadonlySet<OperationName> = new Set<OperationName>([
  'inspection.set',
  'visit.add',
  'structure.add',
  'structure.set',
  'structure.remove',
  'area.add',
  'area.set',
  'area.remove',
  'area.restore',
  'panel.add',
  'panel.set',
  'panel.remove',
  'circuit.add',
  'circuit.set',
  'circuit.remove',
]);

/**
 * The one writer of everything that phone and desk can edit. Locks the inspection, checks that the actor may do this now,
 * applies the conflict rule per field, raises the inspection's version and the fields' numbers, and records an audit
 * event, all in the caller's transaction. `client` is the browser that recorded it. A refusal leaves nothing behind.
 */
export async function applyOperation(
  tx: Transaction,
  actor: MemberActor,
  operation: Operation,
  client: string,
): Promise<Applied> {
  try {
    return await tx.transaction((inner) => applyOrRefuse(inner, actor, operation, client));
  } catch (error) {
    if (error instanceof Refusal) return { outcome: 'rejected', reason: error.message };
    throw error;
  }
}

async function applyOrRefuse(
  tx: Transaction,
  actor: MemberActor,
  operation: Operation,
  client: string,
): Promise<Applied> {
  const inspection = await lockInspection(tx, actor, operation.inspectionId);
  if (!inspection) refuse('This inspection no longer exists, or it is no longer yours. Ask your office.');
  refuseByState(inspection.state);
  if (!holds(actor, 'owner', 'inspector') && !OFFICE_MAY.has(operation.op)) {
    refuse('The office cannot change readings, devices or findings. Ask the inspector.');
  }
  const context = contextOf(tx, actor, client, inspection, operation.capturedAt);
  await dispatch(context, operation);
  return finish(context, operation);
}

function refuseByState(state: typeof inspections.$inferSelect.state): void {
  if (state === 'cancelled') refuse('This inspection is cancelled. Ask your office to book it again.');
  if (state === 'closed') refuse('This inspection is closed. Ask your office to open it again.');
}

function dispatch(context: Context, op: Operation): Promise<void> {
  switch (op.op) {
    case 'inspection.set':
      return setInspection(context, op);
    case 'inspection.advance':
      return advanceInspection(context, op);
    case 'visit.add':
      return addVisit(context, op);
    case 'structure.add':
      return addRow(context, 'structure', op.id, op.fields);
    case 'structure.set':
      return setRow(context, 'structure', op.id, op.patch, op.base);
    case 'structure.remove':
      return removeRow(context, 'structure', op.id, op.base);
    case 'area.add':
      return addRow(context, 'area', op.id, op.fields);
    case 'area.set':
      return setRow(context, 'area', op.id, op.patch, op.base);
    case 'area.remove':
      return removeRow(context, 'area', op.id, op.base);
    case 'area.restore':
      return restoreRow(context, 'area', op.id);
    case 'panel.add':
      return addRow(context, 'panel', op.id, op.fields);
    case 'panel.set':
      return setRow(context, 'panel', op.id, op.patch, op.base);
    case 'panel.remove':
      return removeRow(context, 'panel', op.id, op.base);
    case 'circuit.add':
      return addRow(context, 'circuit', op.id, op.fields);
    case 'circuit.set':
      return setRow(context, 'circuit', op.id, op.patch, op.base);
    case 'circuit.remove':
      return removeRow(context, 'circuit', op.id, op.base);
    case 'receptacle.add':
      return addRow(context, 'receptacle', op.id, op.fields);
    case 'receptacle.set':
      return setRow(context, 'receptacle', op.id, op.patch, op.base);
    case 'receptacle.remove':
      return removeRow(context, 'receptacle', op.id, op.base);
    case 'receptacle.restore':
      return restoreRow(context, 'receptacle', op.id);
    case 'reading.add':
      return addReading(context, op);
    case 'reading.withdraw':
      return withdrawReading(context, op);
    case 'skip.add':
      return addSkip(context, op);
    case 'skip.remove':
      return removeSkip(context, op);
    case 'notice.add':
      return addNotice(context, op);
    case 'photo.add':
      return addPhoto(context, op);
    case 'photo.set':
      return setRow(context, 'photo', op.id, op.patch, op.base);
    case 'photo.remove':
      return removeRow(context, 'photo', op.id, op.base);
    case 'photo.restore':
      return restoreRow(context, 'photo', op.id);
    case 'finding.decide':
      return decideFinding(context, op);
  }
}

async function finish(context: Context, operation: Operation): Promise<Applied> {
  const { tx, actor, inspection, conflicts, merged, unchanged, nextOrder } = context;
  if (unchanged) return { outcome: 'merged', version: inspection.version };
  const version = context.version;
  // The first thing recorded in a booked house says that somebody is there.
  const onSite = operation.op === 'reading.add' && inspection.state === 'booked';
  await tx
    .update(inspections)
    .set({ version, nextOrder, ...(onSite ? { state: 'on-site' as const } : {}) })
    .where(and(eq(inspections.firmId, actor.firmId), eq(inspections.id, inspection.id)));
  const { op, inspectionId: _inspectionId, ...rest } = operation;
  const kept = conflicts.length > 0 ? { conflicts } : {};
  await recordAudit(tx, inspection.id, op, { ...rest, ...context.detail, ...kept });
  if (conflicts.length > 0) return { outcome: 'conflict', version, conflicts };
  return { outcome: merged ? 'merged' : 'applied', version };
}
