import 'server-only';
import { and, eq } from 'drizzle-orm';
import type { InspectionState } from '@/lib/findings/vocabulary';
import { inspections } from '../schema';
import { writerOf, type Context, type OperationOf } from './context';
import { acceptedFields } from './tracked';

export async function setInspection(context: Context, op: OperationOf<'inspection.set'>): Promise<void> {
  const { inspection } = context;
  const accepted = await acceptedFields(context, 'inspection', { ...inspection }, op.patch, op.base);
  await writeInspectionFields(context, accepted);
  context.unchanged = Object.keys(accepted).length === 0 && context.conflicts.length === 0;
}

/** Writes fields of the inspection's own row and numbers each. */
export async function writeInspectionFields(context: Context, fields: Record<string, unknown>): Promise<void> {
  const names = Object.keys(fields);
  if (names.length === 0) return;
  const { inspection, version } = context;
  const numbers = Object.fromEntries(names.map((field) => [field, version]));
  const writers = Object.fromEntries(names.map((field) => [field, writerOf(context)]));
  await context.tx
    .update(inspections)
    .set({
      ...fields,
      revisions: { ...inspection.revisions, ...numbers },
      writers: { ...inspection.writers, ...writers },
    })
    .where(and(eq(inspections.firmId, context.actor.firmId), eq(inspections.id, inspection.id)));
}

/** States that a walk moves between. A released inspection keeps its state: what comes late goes into the next draft. */
const FROM: Record<'on-site' | 'in-review', readonly InspectionState[]> = {
  'on-site': ['booked', 'in-review'],
  'in-review': ['booked', 'on-site'],
};

export async function advanceInspection(context: Context, op: OperationOf<'inspection.advance'>): Promise<void> {
  const { inspection } = context;
  if (!FROM[op.to].includes(inspection.state)) {
    context.merged = true;
    context.unchanged = true;
    return;
  }
  context.detail = { was: inspection.state };
  await context.tx
    .update(inspections)
    .set({ state: op.to })
    .where(and(eq(inspections.firmId, context.actor.firmId), eq(inspections.id, inspection.id)));
}
