import 'server-only';
import { and, eq, isNull } from 'drizzle-orm';
import { memberships } from './schema';
import type { Transaction } from './with-actor';

/** True of a name that the time zone database has. */
export function isTimeZone(name: string): boolean {
  try {
    return new Intl.DateTimeFormat('en-US', { timeZone: name }).format(0) !== '';
  } catch {
    return false;
  }
}

/** A day and time that the calendar has, such as 2026-02-28T09:30; not 2026-02-30T09:30. */
export function isWallTime(local: string): boolean {
  const instant = new Date(`${local}:00Z`);
  return !Number.isNaN(instant.getTime()) && instant.toISOString().startsWith(local);
}

/** True of a member who inspects, has joined and is not disabled. */
export async function inspects(tx: Transaction, firmId: string, membershipId: string): Promise<boolean> {
  const [row] = await tx
    .select({ roles: memberships.roles })
    .from(memberships)
    .where(
      and(
        eq(memberships.firmId, firmId),
        eq(memberships.id, membershipId),
        isNull(memberships.disabledAt),
        isNull(memberships.invitedAt),
      ),
    );
  return row?.roles.includes('inspector') ?? false;
}
