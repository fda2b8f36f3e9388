import 'server-only';
import { and, eq, sql, type SQL } from 'drizzle-orm';
import type { Actor, MemberActor } from './actor';
import type { Role } from './roles';
import { inspections } from './schema';

/**
 * Which inspections an actor may see, as the condition of a query that has `inspections` in it. The only such place:
 * owner and office see the firm's, an inspector those they walk (all where the firm shares drafts), a recipient the one
 * of the grant, a job the firm's, a visitor none.
 */
export function inspectionsVisibleTo(actor: Actor): SQL | undefined {
  switch (actor.kind) {
    case 'member':
      return and(eq(inspections.firmId, actor.firmId), memberSees(actor));
    case 'recipient':
      return and(eq(inspections.firmId, actor.firmId), eq(inspections.id, actor.inspectionId));
    case 'system':
      return eq(inspections.firmId, actor.firmId);
    case 'visitor':
      return sql`false`;
  }
}

/** True where the member holds one of the roles. */
export function holds(actor: MemberActor, ...roles: Role[]): boolean {
  return roles.some((role) => actor.roles.includes(role));
}

/** True where the member sees every inspection of the firm. */
export function seesAll(actor: MemberActor): boolean {
  return holds(actor, 'owner', 'office') || (holds(actor, 'inspector') && actor.sharedDrafts);
}

function memberSees(actor: MemberActor): SQL | undefined {
  if (seesAll(actor)) return undefined;
  if (!holds(actor, 'inspector')) return sql`false`;
  return walkedBy(actor.membershipId);
}

/** Condition that a membership walks the inspection of the query. */
export function walkedBy(membershipId: string): SQL {
  return sql`exists (select 1 from inspection_inspectors w where w.firm_id = ${inspections.firmId}
    and w.inspection_id = ${inspections.id} and w.membership_id = ${membershipId})`;
}
