import { createHash, randomBytes } from 'node:crypto';
import { inspect } from 'node:util';
import { afterAll, expect, test } from 'vitest';
import { VISITOR, type MemberActor } from '@/db/actor';
import {
  changeOwnPassword,
  createFirm,
  endOwnSessions,
  endSession,
  findAccount,
  findSessionMember,
  openSession,
  sweepSignIn,
  takeAttempt,
} from '@/db/auth';
import { closeDatabase } from '@/db/client';
import { acceptInvitation, findLink, redeemSignInLink, requestLink, resetPassword } from '@/db/links';
import { inviteMember, listMembers, setMemberDisabled, setMemberRoles, signOutMember } from '@/db/people';
import type { Role } from '@/db/roles';
import { asOwner, closeOwner } from '@/tests/support/owner';

afterAll(async () => {
  await closeDatabase();
  await closeOwner();
});

test('a new firm has one person, who owns it and inspects', async () => {
  const { actor } = await foundFirm();
  expect(actor.roles).toEqual(['owner', 'inspector']);
  expect(actor.firmName).toBe('Quill Street Inspections');
  expect(await listMembers(actor)).toMatchObject([{ name: 'Ines Farrow', state: 'active' }]);
});

test('an e-mail that has an account founds no second firm', async () => {
  const { actor } = await foundFirm();
  expect((await foundWith(actor.email)).kind).toBe('email-taken');
});

test('a session ends when it is signed out, and not before', async () => {
  const { actor } = await foundFirm();
  const idHash = await signIn(actor.userId);
  expect(await findSessionMember(VISITOR, idHash)).toMatchObject({ userId: actor.userId });
  await endSession(VISITOR, idHash);
  expect(await findSessionMember(VISITOR, idHash)).toBeNull();
});

test('a session ends twelve hours after it was last seen, and thirty days after it began', async () => {
  const { actor } = await foundFirm();
  const idle = await signIn(actor.userId);
  const old = await signIn(actor.userId);
  const fresh = await signIn(actor.userId);
  await asOwner(`update sessions set last_seen_at = now() - interval '12 hours 1 minute' where id_hash = $1`, [idle]);
  await asOwner(`update sessions set expires_at = now() - interval '1 minute' where id_hash = $1`, [old]);
  await asOwner(`update sessions set last_seen_at = now() - interval '11 hours' where id_hash = $1`, [fresh]);

  expect(await findSessionMember(VISITOR, idle)).toBeNull();
  expect(await findSessionMember(VISITOR, old)).toBeNull();
  expect(await findSessionMember(VISITOR, fresh)).not.toBeNull();
  const [row] = await asOwner(
    `select now() - last_seen_at < interval '1 minute' as seen from sessions where id_hash = $1`,
    [fresh],
  );
  expect(row?.seen).toBe(true);
});

test('signing out everywhere, and a new password, leave one session', async () => {
  const { actor } = await foundFirm();
  const [here, phone, desk] = await Promise.all([signIn(actor.userId), signIn(actor.userId), signIn(actor.userId)]);
  // The session that founded the firm's actor ends as well.
  expect(await endOwnSessions(actor, here)).toBe(3);
  expect(await findSessionMember(VISITOR, phone)).toBeNull();
  expect(await findSessionMember(VISITOR, desk)).toBeNull();

  const other = await signIn(actor.userId);
  await changeOwnPassword(actor, 'another hash', here);
  expect(await findSessionMember(VISITOR, other)).toBeNull();
  expect(await findSessionMember(VISITOR, here)).not.toBeNull();
  expect(await findAccount(VISITOR, actor.email)).toMatchObject({ passwordHash: 'another hash' });
});

test('a disabled member is nobody at the next request and cannot sign in', async () => {
  const { actor: owner } = await foundFirm();
  const member = await joinFirm(owner, ['inspector']);
  const idHash = await signIn(member.userId);
  expect((await setMemberDisabled(owner, member.membershipId, true)).kind).toBe('changed');
  expect(await findSessionMember(VISITOR, idHash)).toBeNull();
  expect(await findAccount(VISITOR, member.email)).toBeNull();
  expect(await openSession(VISITOR, newSession(member.userId))).toBeNull();

  await setMemberDisabled(owner, member.membershipId, false);
  expect(await findSessionMember(VISITOR, idHash)).not.toBeNull();
});

test('a change of roles counts at the next request', async () => {
  const { actor: owner } = await foundFirm();
  const member = await joinFirm(owner, ['inspector']);
  const idHash = await signIn(member.userId);
  await setMemberRoles(owner, member.membershipId, ['office', 'inspector']);
  expect((await findSessionMember(VISITOR, idHash))?.roles).toEqual(['office', 'inspector']);
});

test('a firm keeps its last owner, even when two owners remove each other at once', async () => {
  const { actor: first } = await foundFirm();
  expect(await setMemberRoles(first, first.membershipId, ['inspector'])).toEqual({ kind: 'last-owner' });
  expect(await setMemberDisabled(first, first.membershipId, true)).toEqual({ kind: 'last-owner' });

  const second = await joinFirm(first, ['owner']);
  const outcomes = await Promise.all([
    setMemberRoles(first, second.membershipId, ['inspector']),
    setMemberRoles(second, first.membershipId, ['inspector']),
  ]);
  expect(outcomes.map(({ kind }) => kind).toSorted()).toEqual(['changed', 'last-owner']);
});

test('an invited owner who has not come yet does not count as one', async () => {
  const { actor } = await foundFirm();
  await inviteMember(actor, { email: anEmail(), name: 'Later Owner', roles: ['owner'] }, aLink(), 600);
  expect(await setMemberRoles(actor, actor.membershipId, ['inspector'])).toEqual({ kind: 'last-owner' });
});

test('only owners invite, change and sign out people', async () => {
  const { actor: owner } = await foundFirm();
  const office = await joinFirm(owner, ['office']);
  const invitation = { email: anEmail(), name: 'Somebody', roles: ['inspector' as const] };
  expect(await inviteMember(office, invitation, aLink(), 600)).toEqual({ kind: 'not-allowed' });
  expect(await setMemberRoles(office, owner.membershipId, ['inspector'])).toEqual({ kind: 'not-allowed' });
  expect(await signOutMember(office, owner.membershipId)).toEqual({ kind: 'not-allowed' });
  // The role the code was told is not believed by the door behind it.
  await expect(inviteMember({ ...office, roles: ['owner'] }, invitation, aLink(), 600)).rejects.toThrow();
});

test('an invitation opens nothing before it is accepted, and is accepted once', async () => {
  const { actor: owner } = await foundFirm();
  const email = anEmail();
  const link = aLink();
  await inviteMember(owner, { email, name: 'New Person', roles: ['inspector'] }, link, 600);
  expect(await findAccount(VISITOR, email)).toBeNull();
  for (let look = 0; look < 20; look += 1) {
    expect(await findLink(link.tokenHash)).toMatchObject({ purpose: 'invitation', state: 'ready', hasPassword: false });
  }

  const accept = () => acceptInvitation(link.tokenHash, { name: 'New Person', passwordHash: 'hash' });
  const accepted = await Promise.all([accept(), accept(), accept(), accept()]);
  expect(accepted.filter((one) => one !== null)).toHaveLength(1);
  expect(await findLink(link.codeHash)).toMatchObject({ state: 'used' });
  expect(await findAccount(VISITOR, email)).toMatchObject({ name: 'New Person' });
});

test('inviting somebody again by another firm does not change their password', async () => {
  const { actor: first } = await foundFirm();
  const { actor: second } = await foundFirm();
  const link = aLink();
  await inviteMember(first, { email: second.email, name: 'Other Name', roles: ['inspector'] }, link, 600);
  await acceptInvitation(link.codeHash, { name: 'Other Name', passwordHash: 'a stranger would set this' });
  const account = await findAccount(VISITOR, second.email);
  expect(account).toMatchObject({ passwordHash: 'first hash', name: 'Ines Farrow' });
});

test('a reset link sets one password, once, and ends every session', async () => {
  const { actor } = await foundFirm();
  const idHash = await signIn(actor.userId);
  const link = aLink();
  await requestLink(actor.email, 'reset', link, 600);
  const outcomes = await Promise.all(['a', 'b', 'c'].map((hash) => resetPassword(link.tokenHash, hash)));
  expect(outcomes.filter((one) => one !== null)).toHaveLength(1);
  expect(await findSessionMember(VISITOR, idHash)).toBeNull();
});

test('a link ends with its time, with a later one, and counts for its own purpose only', async () => {
  const { actor } = await foundFirm();
  const [late, early, signInLink] = [aLink(), aLink(), aLink()];
  await requestLink(actor.email, 'reset', early, 600);
  await requestLink(actor.email, 'reset', late, 600);
  await requestLink(actor.email, 'sign-in', signInLink, 600);
  expect(await resetPassword(early.tokenHash, 'x')).toBeNull();
  expect(await resetPassword(signInLink.tokenHash, 'x')).toBeNull();
  expect(await redeemSignInLink(late.tokenHash)).toBeNull();

  await asOwner(`update link_tokens set expires_at = now() - interval '1 second' where token_hash = $1`, [
    late.tokenHash,
  ]);
  expect(await findLink(late.tokenHash)).toMatchObject({ state: 'expired' });
  expect(await resetPassword(late.tokenHash, 'x')).toBeNull();
  expect(await redeemSignInLink(signInLink.codeHash)).toBe(actor.userId);
});

test('an e-mail without an account gets no link', async () => {
  const link = aLink();
  await requestLink(anEmail(), 'reset', link, 600);
  expect(await findLink(link.tokenHash)).toBeNull();
});

test('what ended long ago is swept away, and nothing that still counts', async () => {
  const { actor } = await foundFirm();
  const [old, fresh] = [await signIn(actor.userId), await signIn(actor.userId)];
  const [oldLink, freshLink] = [aLink(), aLink()];
  await requestLink(actor.email, 'reset', oldLink, 600);
  await asOwner(`update link_tokens set expires_at = now() - interval '61 days' where token_hash = $1`, [
    oldLink.tokenHash,
  ]);
  await requestLink(actor.email, 'reset', freshLink, 600);
  await asOwner(`update sessions set last_seen_at = now() - interval '61 days' where id_hash = $1`, [old]);
  expect(await sweepSignIn(VISITOR)).toBeGreaterThanOrEqual(2);
  expect(await findLink(oldLink.tokenHash)).toBeNull();
  expect(await findLink(freshLink.tokenHash)).toMatchObject({ state: 'ready' });
  expect(await findSessionMember(VISITOR, fresh)).not.toBeNull();
  expect(await asOwner('select from sessions where id_hash = $1', [old])).toEqual([]);
});

test('an error of the database repeats none of the values it was given', async () => {
  const { actor } = await foundFirm();
  const link = aLink();
  await requestLink(actor.email, 'reset', link, 600);
  const failure: unknown = await requestLink(actor.email, 'reset', { ...link, code: 'SECRET-CODE' }, 600).catch(
    (e) => e,
  );
  const cause = (failure as Error).cause as Error;
  const printed = [String(failure), (failure as Error).stack, inspect(failure), inspect(cause)].join();
  expect(printed).toContain('request_link');
  for (const value of [actor.email, link.tokenHash.toString('hex'), link.tokenHash.toString('base64')]) {
    expect(printed).not.toContain(value);
  }
});

test('at most five tries go through, however many ask at once, and each later one waits longer', async () => {
  const key = randomBytes(8).toString('hex');
  const rule = { limit: 5, windowSeconds: 900, grows: true };
  expect(await takeAttempt(VISITOR, key, rule)).toBe(0);
  // A lock held for a moment lines the tries up, so that they start from the same count.
  const held = asOwner(`select pg_sleep(0.5) from (select from rate_limits where key = $1 for update) r`, [key]);
  const waits = await Promise.all(Array.from({ length: 9 }, () => takeAttempt(VISITOR, key, rule)));
  await held;
  expect(waits.filter((wait) => wait === 0)).toHaveLength(4);

  const runOut = () => asOwner(`update rate_limits set expire = now() - interval '1 second' where key = $1`, [key]);
  await runOut();
  expect(await takeAttempt(VISITOR, key, rule)).toBe(0);
  const sixth = await takeAttempt(VISITOR, key, rule);
  expect(sixth).toBeGreaterThan(900);
  await runOut();
  expect(await takeAttempt(VISITOR, key, rule)).toBe(0);
  expect(await takeAttempt(VISITOR, key, rule)).toBeGreaterThan(sixth);

  await asOwner(`update rate_limits set expire = now() - interval '25 hours' where key = $1`, [key]);
  expect(await takeAttempt(VISITOR, key, rule)).toBe(0);
  expect(await takeAttempt(VISITOR, key, rule)).toBe(0);
});

async function foundFirm(): Promise<{ actor: MemberActor }> {
  const firm = await foundWith(anEmail());
  if (firm.kind !== 'created') throw new Error('the firm was not created');
  const actor = await findSessionMember(VISITOR, await signIn(firm.userId));
  if (!actor) throw new Error('the founder cannot sign in');
  return { actor };
}

function foundWith(email: string) {
  const place = { timeZone: 'America/New_York', stateProfile: 'general' as const };
  return createFirm({
    firmName: 'Quill Street Inspections',
    name: 'Ines Farrow',
    email,
    passwordHash: 'first hash',
    ...place,
  });
}

async function joinFirm(owner: MemberActor, roles: Role[]): Promise<MemberActor> {
  const link = aLink();
  await inviteMember(owner, { email: anEmail(), name: 'Joan Pell', roles }, link, 600);
  const joined = await acceptInvitation(link.tokenHash, { name: 'Joan Pell', passwordHash: 'hash' });
  const actor = joined && (await findSessionMember(VISITOR, await signIn(joined.userId)));
  if (!actor) throw new Error('the invited person cannot sign in');
  return actor;
}

async function signIn(userId: string): Promise<Buffer> {
  const session = newSession(userId);
  await openSession(VISITOR, session);
  return session.idHash;
}

function newSession(userId: string) {
  return { idHash: randomBytes(32), userId, firmId: null, userAgent: 'test' };
}

function aLink() {
  const hash = () => createHash('sha256').update(randomBytes(32)).digest();
  return { tokenHash: hash(), codeHash: hash(), address: 'http://127.0.0.1/open#x', code: 'ABCDE-23456' };
}

function anEmail(): string {
  return `${randomBytes(6).toString('hex')}@quill-street.example`;
}
