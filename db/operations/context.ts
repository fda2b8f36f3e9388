import 'server-only';
import { and, eq } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import type { Operation } from '@/lib/schemas/operations';
import type { FieldConflict } from '@/lib/schemas/sync';
import type { Actor, MemberActor } from '../actor';
import { conflicts, inspections, memberships, users } from '../schema';
import { inspectionsVisibleTo } from '../scope';
import type { Transaction } from '../with-actor';

export type Applied =
  | { outcome: 'applied' | 'merged'; version: number }
  | { outcome: 'conflict'; version: number; conflicts: FieldConflict[] }
  | { outcome: 'rejected'; reason: string };

export type LockedInspection = typeof inspections.$inferSelect;

/** One operation under way. The inspection's row is locked; `version` is the number that this operation gives it. */
export type Context = {
  tx: Transaction;
  actor: MemberActor;
  /** The browser that recorded it. */
  client: string;
  inspection: LockedInspection;
  version: number;
  capturedAt: string;
  /** Next server order of readings, notices, decisions and visits. */
  nextOrder: number;
  conflicts: FieldConflict[];
  /** Something was accepted although it was not based on what stands. */
  merged: boolean;
  /** Nothing changed: what was asked for is already so. */
  unchanged: boolean;
  /** What the audit event says beside the operation. */
  detail: Record<string, unknown>;
  /** Rows read so far, by entity and id: the inspection's lock keeps others from changing them. */
  rows: Map<string, unknown>;
};

/** Thrown to refuse an operation; caught by `applyOperation`, which undoes what was written. */
export class Refusal extends Error {}

export function refuse(reason: string): never {
  throw new Refusal(reason);
}

/** Locks the inspection for this transaction, or null where the actor may not see it. */
export async function lockInspection(
  tx: Transaction,
  actor: Actor,
  inspectionId: string,
): Promise<LockedInspection | null> {
  const [row] = await tx
    .select()
    .from(inspections)
    .where(and(eq(inspections.id, inspectionId), inspectionsVisibleTo(actor)))
    .for('update', { of: inspections });
  return row ?? null;
}

/** A context on a locked inspection. */
export function contextOf(
  tx: Transaction,
  actor: MemberActor,
  client: string,
  inspection: LockedInspection,
  capturedAt: string,
): Context {
  return {
    tx,
    actor,
    client,
    inspection,
    version: inspection.version + 1,
    capturedAt,
    nextOrder: inspection.nextOrder,
    conflicts: [],
    merged: false,
    unchanged: false,
    detail: {},
    rows: new Map(),
  };
}

export function takeOrder(context: Context): number {
  return context.nextOrder++;
}

export type Writer = { client: string | null; membershipId: string; at: string };

export function writerOf(context: Context): Writer {
  return { client: context.client, membershipId: context.actor.membershipId, at: context.capturedAt };
}

type Disagreement = { entity: string; entityId: string; field: string; theirs: unknown; yours: unknown };

/** Keeps both values of a field until a person chooses. `standing` wrote the value that stands, `refused` the other. */
export async function keepBoth(
  context: Context,
  what: Disagreement,
  standing: Writer | undefined,
  refused: Writer,
): Promise<void> {
  const id = uuidv7();
  await context.tx.insert(conflicts).values({
    firmId: context.actor.firmId,
    id,
    inspectionId: context.inspection.id,
    ...what,
    theirMembershipId: standing?.membershipId,
    theirCapturedAt: standing && new Date(standing.at),
    membershipId: refused.membershipId,
    capturedAt: new Date(refused.at),
    version: context.version,
  });
  const { field, theirs, yours } = what;
  const by = standing ? await nameOf(context, standing.membershipId) : 'The office';
  context.conflicts.push({ id, field, theirs, yours, by, at: standing?.at ?? context.capturedAt });
}

async function nameOf(context: Context, membershipId: string): Promise<string> {
  if (membershipId === context.actor.membershipId) return context.actor.name;
  const [row] = await context.tx
    .select({ name: users.name })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(memberships.firmId, context.actor.firmId), eq(memberships.id, membershipId)));
  return row?.name ?? 'A colleague';
}

export type OperationOf<Name extends Operation['op']> = Extract<Operation, { op: Name }>;
