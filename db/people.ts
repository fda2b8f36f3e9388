import 'server-only';
import { and, eq, sql } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import type { MemberActor } from './actor';
import { recordAudit } from './audit';
import { enqueueLinkMail, type LinkToSend } from './links';
import type { Role } from './roles';
import { firms, memberships } from './schema';
import { withActor, type Transaction } from './with-actor';

export type Member = {
  membershipId: string;
  userId: string;
  name: string;
  email: string;
  roles: Role[];
  licenseNumber: string | null;
  licenseState: string | null;
  /** A date, YYYY-MM-DD. */
  licenseExpires: string | null;
  signatureName: string | null;
  signatureKey: string | null;
  state: 'active' | 'invited' | 'disabled';
  lastSeenAt: Date | null;
};

/** The people of the actor's firm, by name, with those invited and disabled. */
export async function listMembers(actor: MemberActor): Promise<Member[]> {
  return withActor(actor, async (tx) => {
    const { rows } = await tx.execute<MemberRow>(sql`select * from list_members()`);
    return rows.map(toMember);
  });
}

/** The actor's own line in that list. */
export async function loadOwnMember(actor: MemberActor): Promise<Member> {
  const own = (await listMembers(actor)).find((member) => member.membershipId === actor.membershipId);
  if (!own) throw new Error('the actor has no membership in its firm');
  return own;
}

export type Invitation = { email: string; name: string; roles: Role[] };
export type InviteOutcome = { kind: 'invited' } | { kind: 'already-member' } | { kind: 'not-allowed' };

/** Invites a person by mail; `seconds` is how long the link counts. Owners only. The same answer whether or not that e-mail is known. */
export async function inviteMember(
  actor: MemberActor,
  invitation: Invitation,
  link: LinkToSend,
  seconds: number,
): Promise<InviteOutcome> {
  if (!actor.roles.includes('owner')) return { kind: 'not-allowed' };
  const { email, name, roles } = invitation;
  return withActor(actor, async (tx) => {
    const membershipId = uuidv7();
    const { rows } = await tx.execute<{ outcome: 'invited' | 'already-member' }>(
      sql`select invite_member(${membershipId}, ${uuidv7()}, ${email}, ${name}, ${sql.param(roles)}::role[],
        ${link.tokenHash}, ${link.codeHash}, ${seconds}) as outcome`,
    );
    if (rows[0]?.outcome !== 'invited') return { kind: 'already-member' };
    await enqueueLinkMail(tx, { purpose: 'invitation', email, name, firmName: actor.firmName }, link);
    await recordAudit(tx, null, 'member-invited', { membershipId, roles });
    return { kind: 'invited' };
  });
}

/** Mails a waiting invitation again, with a new link. Owners only. */
export async function renewInvitation(
  actor: MemberActor,
  membershipId: string,
  mint: (email: string) => LinkToSend,
  seconds: number,
): Promise<{ kind: 'invited' } | { kind: 'not-found' } | { kind: 'not-allowed' }> {
  if (!actor.roles.includes('owner')) return { kind: 'not-allowed' };
  const waiting = (await listMembers(actor)).find((member) => member.membershipId === membershipId);
  if (waiting?.state !== 'invited') return { kind: 'not-found' };
  const link = mint(waiting.email);
  return withActor(actor, async (tx) => {
    const { rows } = await tx.execute<{ email: string; name: string }>(
      sql`select * from renew_invitation(${membershipId}, ${link.tokenHash}, ${link.codeHash}, ${seconds})`,
    );
    const [person] = rows;
    if (!person) return { kind: 'not-found' };
    await enqueueLinkMail(tx, { purpose: 'invitation', ...person, firmName: actor.firmName }, link);
    await recordAudit(tx, null, 'invitation-renewed', { membershipId });
    return { kind: 'invited' };
  });
}

export type ChangeMemberOutcome =
  { kind: 'changed' } | { kind: 'last-owner' } | { kind: 'not-found' } | { kind: 'not-allowed' };

/** Gives a member other roles, at least one. Owners only; the last owner of a firm keeps that role. */
export async function setMemberRoles(
  actor: MemberActor,
  membershipId: string,
  roles: Role[],
): Promise<ChangeMemberOutcome> {
  return changeMember(actor, membershipId, { roles }, 'member-roles-changed');
}

/** Shuts a member out of the firm at their next request, or lets them in again. Owners only; never the last owner. */
export async function setMemberDisabled(
  actor: MemberActor,
  membershipId: string,
  isDisabled: boolean,
): Promise<ChangeMemberOutcome> {
  const change = { disabledAt: isDisabled ? new Date() : null };
  return changeMember(actor, membershipId, change, isDisabled ? 'member-disabled' : 'member-enabled');
}

/** Ends a member's sessions in this firm. Owners only. */
export async function signOutMember(actor: MemberActor, membershipId: string): Promise<ChangeMemberOutcome> {
  if (!actor.roles.includes('owner')) return { kind: 'not-allowed' };
  return withActor(actor, async (tx) => {
    const [member] = await tx.select({ id: memberships.id }).from(memberships).where(isMember(actor, membershipId));
    if (!member) return { kind: 'not-found' };
    await tx.execute(sql`select end_member_sessions(${membershipId})`);
    await recordAudit(tx, null, 'member-signed-out', { membershipId });
    return { kind: 'changed' };
  });
}

export type Profile = {
  name: string;
  licenseNumber: string | null;
  licenseState: string | null;
  licenseExpires: string | null;
  signatureName: string | null;
};

/** The actor's own name, license and typed signature. */
export async function saveOwnProfile(actor: MemberActor, profile: Profile): Promise<void> {
  const { name, ...membership } = profile;
  await withActor(actor, async (tx) => {
    await tx.execute(sql`select rename_acting_user(${name})`);
    await tx.update(memberships).set(membership).where(isMember(actor, actor.membershipId));
    await recordAudit(tx, null, 'profile-changed', { membershipId: actor.membershipId });
  });
}

/** The object key of the actor's drawn signature, or null to go without. */
export async function saveOwnSignature(actor: MemberActor, signatureKey: string | null): Promise<void> {
  await withActor(actor, async (tx) => {
    await tx.update(memberships).set({ signatureKey }).where(isMember(actor, actor.membershipId));
    await recordAudit(tx, null, 'signature-changed', { membershipId: actor.membershipId });
  });
}

async function changeMember(
  actor: MemberActor,
  membershipId: string,
  change: { roles: Role[] } | { disabledAt: Date | null },
  kind: string,
): Promise<ChangeMemberOutcome> {
  if (!actor.roles.includes('owner')) return { kind: 'not-allowed' };
  return withActor(actor, async (tx) => {
    // Two owners who remove each other at the same moment wait here, and the second finds that it is the last.
    await tx.select({ id: firms.id }).from(firms).where(eq(firms.id, actor.firmId)).for('update');
    const [member] = await tx
      .select({ roles: memberships.roles, disabledAt: memberships.disabledAt })
      .from(memberships)
      .where(isMember(actor, membershipId));
    if (!member) return { kind: 'not-found' };

    const after = { ...member, ...change };
    const staysOwner = after.roles.includes('owner') && after.disabledAt === null;
    if (!staysOwner && !(await hasOtherOwner(tx, actor, membershipId))) return { kind: 'last-owner' };
    await tx.update(memberships).set(change).where(isMember(actor, membershipId));
    await recordAudit(tx, null, kind, { membershipId, roles: after.roles });
    return { kind: 'changed' };
  });
}

async function hasOtherOwner(tx: Transaction, actor: MemberActor, membershipId: string): Promise<boolean> {
  const { rows } = await tx.execute(
    sql`select 1 from memberships where firm_id = ${actor.firmId} and id <> ${membershipId}
      and 'owner' = any (roles) and disabled_at is null and invited_at is null limit 1`,
  );
  return rows.length > 0;
}

function isMember(actor: MemberActor, membershipId: string) {
  return and(eq(memberships.firmId, actor.firmId), eq(memberships.id, membershipId));
}

type MemberRow = {
  membership_id: string;
  user_id: string;
  name: string;
  email: string;
  roles: Role[];
  license_number: string | null;
  license_state: string | null;
  license_expires: string | null;
  signature_name: string | null;
  signature_key: string | null;
  state: Member['state'];
  last_seen_at: string | null;
};

function toMember(row: MemberRow): Member {
  return {
    membershipId: row.membership_id,
    userId: row.user_id,
    name: row.name,
    email: row.email,
    roles: row.roles,
    licenseNumber: row.license_number,
    licenseState: row.license_state,
    licenseExpires: row.license_expires,
    signatureName: row.signature_name,
    signatureKey: row.signature_key,
    state: row.state,
    lastSeenAt: row.last_seen_at === null ? null : new Date(row.last_seen_at),
  };
}
