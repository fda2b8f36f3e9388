import 'server-only';
import { and, asc, eq, sql } from 'drizzle-orm';
import type { Actor, MemberActor } from './actor';
import { holds, inspectionsVisibleTo } from './scope';
import { auditEvents, inspections } from './schema';
import { withActor, type Transaction } from './with-actor';

/**
 * Adds a line to the firm's record, by whom the transaction runs. Lines of a firm are written one after the other until
 * the transaction ends, so call it last.
 */
export async function recordAudit(
  tx: Transaction,
  inspectionId: string | null,
  kind: string,
  detail: Record<string, unknown> = {},
): Promise<void> {
  await tx.execute(sql`select record_audit(${inspectionId}::uuid, ${kind}, ${JSON.stringify(detail)}::jsonb)`);
}

export type AuditLine = {
  order: number;
  kind: string;
  who: string;
  at: string;
  detail: Record<string, unknown>;
};

/** What happened to an inspection, oldest first. Empty where the actor may not see it; only members see it at all. */
export async function listAudit(actor: Actor, inspectionId: string): Promise<AuditLine[]> {
  if (actor.kind !== 'member') return [];
  return withActor(actor, async (tx) => {
    const rows = await tx
      .select({
        order: auditEvents.order,
        kind: auditEvents.kind,
        who: auditEvents.actorName,
        at: auditEvents.at,
        detail: auditEvents.detail,
      })
      .from(auditEvents)
      .innerJoin(
        inspections,
        and(eq(inspections.firmId, auditEvents.firmId), eq(inspections.id, auditEvents.inspectionId)),
      )
      .where(and(eq(auditEvents.inspectionId, inspectionId), inspectionsVisibleTo(actor)))
      .orderBy(asc(auditEvents.order));
    return rows.map((row) => ({ ...row, at: row.at.toISOString() }));
  });
}

export type ChainCheck =
  { kind: 'whole'; lines: number } | { kind: 'broken'; order: number; says: string } | { kind: 'not-allowed' };

/** Recomputes every hash of the firm's record and names the first line that does not follow. For the owner. */
export async function verifyAuditChain(actor: MemberActor): Promise<ChainCheck> {
  if (!holds(actor, 'owner')) return { kind: 'not-allowed' };
  return withActor(actor, async (tx) => {
    const { rows } = await tx.execute<{ order: string; missing: boolean; changed: boolean }>(sql`
      select "order", missing, changed from (
        select "order",
          "order" <> row_number() over (order by "order")
            or previous_hash <> coalesce(lag(hash) over (order by "order"), '') as missing,
          hash <> audit_hash(previous_hash, firm_id, "order", inspection_id, actor_kind, actor_id, actor_name, kind,
            detail, at) as changed
        from audit_events where firm_id = ${actor.firmId}
      ) lines where missing or changed order by "order" limit 1`);
    const [bad] = rows;
    if (bad) {
      const says = bad.changed ? 'This line was changed after it was written.' : 'A line before this one is missing.';
      return { kind: 'broken', order: Number(bad.order), says };
    }
    const lines = await tx.$count(auditEvents, eq(auditEvents.firmId, actor.firmId));
    return { kind: 'whole', lines };
  });
}
