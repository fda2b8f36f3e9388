import 'server-only';
import { and, desc, eq, inArray, isNull, sql } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import { VISITOR, type MemberActor, type RecipientActor, type SystemActor } from './actor';
import { recordAudit } from './audit';
import { enqueueJob } from './jobs';
import type { LinkToSend } from './links';
import { lockInspection } from './operations/context';
import { grants, inspections, messages, parties, reportVersions } from './schema';
import { holds, inspectionsVisibleTo } from './scope';
import { withActor, type Transaction } from './with-actor';

export type SendReportOutcome =
  | { kind: 'sent'; grantId: string }
  | { kind: 'already-waiting' }
  | { kind: 'no-email' }
  | { kind: 'not-released' }
  | { kind: 'not-allowed' }
  | { kind: 'not-found' };

/** Opens the released report to a buyer for 90 days and mails the link. The agent needs the buyer's consent first. */
export async function sendReport(
  actor: MemberActor,
  inspectionId: string,
  partyId: string,
  mint: (email: string) => LinkToSend,
): Promise<SendReportOutcome> {
  if (!holds(actor, 'owner', 'office', 'inspector')) return { kind: 'not-allowed' };
  return withActor(actor, async (tx) => {
    const inspection = await lockInspection(tx, actor, inspectionId);
    if (!inspection) return { kind: 'not-found' };
    return grantReport(tx, actor, inspectionId, partyId, mint);
  });
}

async function grantReport(
  tx: Transaction,
  actor: MemberActor | SystemActor,
  inspectionId: string,
  partyId: string,
  mint: (email: string) => LinkToSend,
): Promise<SendReportOutcome> {
  const { firmId } = actor;
  const [party] = await tx
    .select({ kind: parties.kind, name: parties.name, email: parties.email })
    .from(parties)
    .where(
      and(
        eq(parties.firmId, firmId),
        eq(parties.id, partyId),
        eq(parties.inspectionId, inspectionId),
        isNull(parties.deletedAt),
      ),
    );
  if (party?.kind !== 'buyer') return { kind: 'not-found' };
  const version = await newestVersion(tx, firmId, inspectionId);
  if (!version) return { kind: 'not-released' };
  if (!party.email) return { kind: 'no-email' };
  const dedupeKey = await nextDedupeKey(tx, firmId, `report-ready:${version}:${partyId}`);
  if (!dedupeKey) return { kind: 'already-waiting' };

  const link = mint(party.email);
  const [grantId, messageId] = [uuidv7(), uuidv7()];
  const { tokenHash, codeHash, address, code } = link;
  const until = sql`now() + interval '90 days'`;
  await tx.insert(grants).values({ firmId, id: grantId, inspectionId, partyId, tokenHash, codeHash, until });
  const mail = { kind: 'report-ready', toName: party.name, toEmail: party.email, dedupeKey };
  await tx.insert(messages).values({ firmId, id: messageId, inspectionId, grantId, ...mail });
  await enqueueJob(tx, 'send-mail', { kind: 'report-ready', firmId, messageId, link: address, code });
  await recordAudit(tx, inspectionId, 'report.sent', { grantId, partyId });
  return { kind: 'sent', grantId };
}

async function newestVersion(tx: Transaction, firmId: string, inspectionId: string): Promise<string | null> {
  const [version] = await tx
    .select({ id: reportVersions.id })
    .from(reportVersions)
    .where(and(eq(reportVersions.firmId, firmId), eq(reportVersions.inspectionId, inspectionId)))
    .orderBy(desc(reportVersions.number))
    .limit(1);
  return version?.id ?? null;
}

/** Null while an earlier mail about the same thing is still on its way: a second press sends nothing. */
async function nextDedupeKey(tx: Transaction, firmId: string, subject: string): Promise<string | null> {
  const earlier = await tx
    .select({ state: messages.state })
    .from(messages)
    .where(and(eq(messages.firmId, firmId), sql`starts_with(${messages.dedupeKey}, ${`${subject}:`})`));
  if (earlier.some(({ state }) => state === 'waiting' || state === 'sending')) return null;
  return `${subject}:${earlier.length + 1}`;
}

export type GrantListItem = {
  id: string;
  partyId: string;
  name: string;
  email: string | null;
  createdAt: string;
  until: string;
  revokedAt: string | null;
  openedAt: string | null;
  opens: number;
  mail: { state: 'waiting' | 'sending' | 'sent' | 'failed'; failure: string | null; sentAt: string | null } | null;
};

/** Who may open the report and who did, newest link first; empty where the actor may not see the inspection. */
export async function listGrants(actor: MemberActor, inspectionId: string): Promise<GrantListItem[]> {
  const rows = await withActor(actor, (tx) =>
    tx
      .select({ grant: grants, name: parties.name, email: parties.email, mail: messages })
      .from(grants)
      .innerJoin(inspections, and(eq(inspections.firmId, grants.firmId), eq(inspections.id, grants.inspectionId)))
      .innerJoin(parties, and(eq(parties.firmId, grants.firmId), eq(parties.id, grants.partyId)))
      .leftJoin(messages, and(eq(messages.firmId, grants.firmId), eq(messages.grantId, grants.id)))
      .where(and(eq(grants.inspectionId, inspectionId), inspectionsVisibleTo(actor)))
      .orderBy(desc(grants.createdAt), desc(grants.id)),
  );
  return rows.map(({ grant, name, email, mail }) => ({
    id: grant.id,
    partyId: grant.partyId,
    name,
    email,
    createdAt: grant.createdAt.toISOString(),
    until: grant.until.toISOString(),
    revokedAt: grant.revokedAt?.toISOString() ?? null,
    openedAt: grant.openedAt?.toISOString() ?? null,
    opens: grant.opens,
    mail: mail && { state: mail.state, failure: mail.failure, sentAt: mail.sentAt?.toISOString() ?? null },
  }));
}

export type RevokeOutcome = { kind: 'revoked' } | { kind: 'not-allowed' } | { kind: 'not-found' };

/** Closes a link at once, for every browser that holds it. */
export async function revokeGrant(actor: MemberActor, grantId: string): Promise<RevokeOutcome> {
  if (!holds(actor, 'owner', 'office', 'inspector')) return { kind: 'not-allowed' };
  return withActor(actor, async (tx) => {
    const visible = tx.select({ id: inspections.id }).from(inspections).where(inspectionsVisibleTo(actor));
    const [grant] = await tx
      .update(grants)
      .set({ revokedAt: sql`coalesce(${grants.revokedAt}, now())` })
      .where(and(eq(grants.firmId, actor.firmId), eq(grants.id, grantId), inArray(grants.inspectionId, visible)))
      .returning({ inspectionId: grants.inspectionId });
    if (!grant) return { kind: 'not-found' };
    await recordAudit(tx, grant.inspectionId, 'report.link-revoked', { grantId });
    return { kind: 'revoked' };
  });
}

type GrantRow = {
  firm_id: string;
  grant_id: string;
  inspection_id: string;
  party_id: string;
  party_name: string;
  token_hash: Buffer;
};
export type OpenGrant = { recipient: RecipientActor; tokenHash: Buffer };
export type FoundGrant = OpenGrant & { state: 'ready' | 'expired' | 'revoked' };

/** The grant that a mailed token or code names, by its hash; whatever has become of it. Null where there is none. */
export async function findGrantBySecret(secretHash: Buffer): Promise<FoundGrant | null> {
  const { rows } = await withActor(VISITOR, (tx) =>
    tx.execute<GrantRow & { state: FoundGrant['state'] }>(sql`select * from find_grant_by_secret(${secretHash})`),
  );
  return rows[0] ? { ...openGrantOf(rows[0]), state: rows[0].state } : null;
}

/** A grant that counts now, by its id. The caller compares the browser's cookie with it before acting as the recipient. */
export async function findOpenGrant(grantId: string): Promise<OpenGrant | null> {
  const { rows } = await withActor(VISITOR, (tx) =>
    tx.execute<GrantRow>(sql`select * from find_open_grant(${grantId}::uuid)`),
  );
  return rows[0] ? openGrantOf(rows[0]) : null;
}

function openGrantOf(row: GrantRow): OpenGrant {
  return {
    recipient: {
      kind: 'recipient',
      firmId: row.firm_id,
      grantId: row.grant_id,
      inspectionId: row.inspection_id,
      partyId: row.party_id,
      name: row.party_name,
    },
    tokenHash: row.token_hash,
  };
}

/** Counts an opening of the recipient's link and writes it to the firm's record; 90 days count from it. */
export async function recordOpening(actor: RecipientActor): Promise<void> {
  await withActor(actor, async (tx) => {
    await tx.execute(sql`select count_opening()`);
    await recordAudit(tx, actor.inspectionId, 'report.opened', { grantId: actor.grantId });
  });
}

/** Mails a new link in place of one that ran out, to the address of the same party. Nothing where it was revoked. */
export async function replaceExpiredGrant(
  secretHash: Buffer,
  mint: (email: string) => LinkToSend,
): Promise<'mailed' | 'none'> {
  const found = await findGrantBySecret(secretHash);
  if (found?.state !== 'expired') return 'none';
  const { firmId, inspectionId, partyId } = found.recipient;
  const actor: SystemActor = { kind: 'system', firmId, task: 'renew-link' };
  const outcome = await withActor(actor, (tx) => grantReport(tx, actor, inspectionId, partyId, mint));
  return outcome.kind === 'sent' ? 'mailed' : 'none';
}
