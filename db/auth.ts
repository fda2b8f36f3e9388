import 'server-only';
import { sql } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import type { StateProfileCode } from '@/lib/findings/vocabulary';
import { VISITOR, type MemberActor, type VisitorActor } from './actor';
import type { Role } from './roles';
import { withActor } from './with-actor';

export type Account = { userId: string; name: string; passwordHash: string };

/** The account that may sign in with this canonical e-mail, or null: unknown, disabled, or in no firm. */
export async function findAccount(actor: VisitorActor | MemberActor, email: string): Promise<Account | null> {
  const [row] = await withActor(actor, async (tx) => {
    const found = await tx.execute<{ user_id: string; name: string; password_hash: string }>(
      sql`select * from find_account(${email})`,
    );
    return found.rows;
  });
  return row ? { userId: row.user_id, name: row.name, passwordHash: row.password_hash } : null;
}

export type AttemptLimit = { limit: number; windowSeconds: number; grows: boolean };

/** Counts an attempt under a key before it is made. Answers the seconds to wait, 0 to go on. Shared by all processes. */
export async function takeAttempt(actor: VisitorActor | MemberActor, key: string, rule: AttemptLimit): Promise<number> {
  return withActor(actor, async (tx) => {
    const { rows } = await tx.execute<{ seconds: number }>(
      sql`select take_attempt(${key}, ${rule.limit}, ${rule.windowSeconds}, ${rule.grows}) as seconds`,
    );
    return rows[0]?.seconds ?? 0;
  });
}

/** Forgets the attempts under a key, after one succeeded. */
export async function clearAttempts(actor: VisitorActor | MemberActor, key: string): Promise<void> {
  await withActor(actor, (tx) => tx.execute(sql`select clear_attempts(${key})`));
}

/** Takes back one attempt under a key, where it turned out to be rightful. */
export async function giveBackAttempt(actor: VisitorActor | MemberActor, key: string): Promise<void> {
  await withActor(actor, (tx) => tx.execute(sql`select give_back_attempt(${key})`));
}

export type NewSession = { idHash: Buffer; userId: string; firmId: string | null; userAgent: string };

/** Opens a session in the firm asked for, else the one used last. Null where the person may enter none. */
export async function openSession(actor: VisitorActor | MemberActor, session: NewSession): Promise<string | null> {
  return withActor(actor, async (tx) => {
    const { rows } = await tx.execute<{ firm_id: string | null }>(
      sql`select open_session(${session.idHash}, ${session.userId}, ${session.firmId}, ${session.userAgent}) as firm_id`,
    );
    return rows[0]?.firm_id ?? null;
  });
}

/** The member a session stands for as things are now, or null: ended, expired, or the person disabled. */
export async function findSessionMember(actor: VisitorActor, idHash: Buffer): Promise<MemberActor | null> {
  const [row] = await withActor(actor, async (tx) => {
    const found = await tx.execute<SessionRow>(sql`select * from find_session(${idHash})`);
    return found.rows;
  });
  if (!row) return null;
  return {
    kind: 'member',
    firmId: row.firm_id,
    userId: row.user_id,
    membershipId: row.membership_id,
    name: row.name,
    email: row.email,
    firmName: row.firm_name,
    roles: row.roles,
    sharedDrafts: row.shared_drafts,
  };
}

type SessionRow = {
  firm_id: string;
  user_id: string;
  membership_id: string;
  name: string;
  email: string;
  firm_name: string;
  roles: Role[];
  shared_drafts: boolean;
};

/** Ends one session. Ending it twice changes nothing. */
export async function endSession(actor: VisitorActor | MemberActor, idHash: Buffer): Promise<void> {
  await withActor(actor, (tx) => tx.execute(sql`select end_session(${idHash})`));
}

/** Ends the actor's sessions in every browser and firm but the one kept. Answers how many ended. */
export async function endOwnSessions(actor: MemberActor, keepHash: Buffer | null): Promise<number> {
  return withActor(actor, async (tx) => {
    const { rows } = await tx.execute<{ ended: number }>(sql`select end_own_sessions(${keepHash}) as ended`);
    return rows[0]?.ended ?? 0;
  });
}

/** Sets the actor's password, already hashed, and ends every other session. */
export async function changeOwnPassword(actor: MemberActor, passwordHash: string, keepHash: Buffer): Promise<void> {
  await withActor(actor, (tx) => tx.execute(sql`select change_own_password(${passwordHash}, ${keepHash})`));
}

export type NewFirm = {
  firmName: string;
  timeZone: string;
  stateProfile: StateProfileCode;
  name: string;
  email: string;
  passwordHash: string;
};
export type CreateFirmOutcome =
  { kind: 'created'; firmId: string; userId: string; membershipId: string } | { kind: 'email-taken' };

/** A new firm and its first person, owner and inspector, in one transaction. */
export async function createFirm(firm: NewFirm): Promise<CreateFirmOutcome> {
  const ids = { firmId: uuidv7(), userId: uuidv7(), membershipId: uuidv7() };
  const { rows } = await withActor(VISITOR, (tx) =>
    tx.execute<{ outcome: 'created' | 'email-taken' }>(
      sql`select create_firm(${ids.firmId}, ${firm.firmName}, ${firm.timeZone}, ${firm.stateProfile}, ${ids.userId},
        ${ids.membershipId}, ${firm.email}, ${firm.name}, ${firm.passwordHash}) as outcome`,
    ),
  );
  return rows[0]?.outcome === 'created' ? { kind: 'created', ...ids } : { kind: 'email-taken' };
}

/** The firms the actor may work in, by name; a session is in one of them. */
export async function listOwnFirms(actor: MemberActor): Promise<{ firmId: string; firmName: string }[]> {
  return withActor(actor, async (tx) => {
    const { rows } = await tx.execute<{ firm_id: string; firm_name: string }>(sql`select * from list_own_firms()`);
    return rows.map((row) => ({ firmId: row.firm_id, firmName: row.firm_name }));
  });
}

/** Deletes attempts, links and sessions that ended long ago. Answers how many rows. For the worker's sweep. */
export async function sweepSignIn(actor: VisitorActor): Promise<number> {
  return withActor(actor, async (tx) => {
    const { rows } = await tx.execute<{ gone: number }>(sql`select sweep_sign_in() as gone`);
    return rows[0]?.gone ?? 0;
  });
}
