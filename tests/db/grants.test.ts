import { v7 as uuidv7 } from 'uuid';
import { expect, test } from 'vitest';
import {
  findGrantBySecret,
  findOpenGrant,
  listGrants,
  recordOpening,
  replaceExpiredGrant,
  revokeGrant,
  sendReport,
} from '@/db/grants';
import { listAudit } from '@/db/audit';
import { listParties } from '@/db/parties';
import { findPhoto } from '@/db/photos';
import { findNewestVersion, findVersion, releaseReport } from '@/db/reports';
import { hashCode, hashToken, mintLink } from '@/lib/auth/link-token';
import { createFirm } from '../support/firm';
import { asOwner } from '../support/owner';
import { readyToRelease } from '../support/report';

function minted() {
  const secrets: { token: string; code: string; email: string }[] = [];
  const mint = (email: string) => {
    const { token, code, tokenHash, codeHash } = mintLink(email);
    secrets.push({ token, code, email });
    return { tokenHash, codeHash, code, address: `http://127.0.0.1/open#${token}` };
  };
  return { secrets, mint };
}

async function sent() {
  const ready = await readyToRelease();
  const { inspector, office, inspection } = ready.firm;
  const released = await releaseReport(inspector, inspection.id);
  if (released.kind !== 'released') throw new Error(released.kind);
  const buyer = (await listParties(office, inspection.id)).find((party) => party.kind === 'buyer');
  if (!buyer) throw new Error('no buyer');
  const { secrets, mint } = minted();
  const outcome = await sendReport(office, inspection.id, buyer.id, mint);
  if (outcome.kind !== 'sent') throw new Error(outcome.kind);
  const [secret] = secrets;
  if (!secret) throw new Error('nothing was minted');
  return { ...ready, buyer, secret, grantId: outcome.grantId, reportVersionId: released.reportVersionId };
}

test('nothing is sent before a release, and not by another firm', async () => {
  const ready = await readyToRelease();
  const { office, inspector, inspection } = ready.firm;
  const [buyer] = await listParties(office, inspection.id);
  const { mint } = minted();
  expect(await sendReport(office, inspection.id, buyer?.id ?? '', mint)).toEqual({ kind: 'not-released' });
  await releaseReport(inspector, inspection.id);
  const stranger = await createFirm();
  expect(await sendReport(stranger.actor, inspection.id, buyer?.id ?? '', mint)).toEqual({ kind: 'not-found' });
});

test('a link opens the report by its token or by its code with the address, and nothing else', async () => {
  const { secret, reportVersionId, firm } = await sent();
  const byToken = await findGrantBySecret(hashToken(secret.token));
  const byCode = await findGrantBySecret(hashCode(secret.email, secret.code.toLowerCase()));
  expect(byToken?.state).toBe('ready');
  expect(byCode?.recipient).toEqual(byToken?.recipient);
  expect(await findGrantBySecret(hashCode('other@mail.example', secret.code))).toBeNull();
  if (!byToken) return;
  const version = await findNewestVersion(byToken.recipient, firm.inspection.id);
  expect(version?.id).toBe(reportVersionId);
  expect(await findPhoto(byToken.recipient, uuidv7())).toBeNull();
});

test('a reader of one report reads no other, of the same firm or of another', async () => {
  const mine = await sent();
  const other = await sent();
  const found = await findGrantBySecret(hashToken(mine.secret.token));
  if (!found) throw new Error('no grant');
  expect(await findVersion(found.recipient, other.reportVersionId)).toBeNull();
  expect(await findNewestVersion(found.recipient, other.firm.inspection.id)).toBeNull();
});

test('each opening is counted and stands in the record', async () => {
  const { secret, firm, grantId } = await sent();
  const found = await findGrantBySecret(hashToken(secret.token));
  if (!found) throw new Error('no grant');
  await recordOpening(found.recipient);
  await recordOpening(found.recipient);
  const [grant] = await listGrants(firm.office, firm.inspection.id);
  expect(grant).toMatchObject({ id: grantId, opens: 2 });
  const audit = await listAudit(firm.office, firm.inspection.id);
  expect(audit.at(-1)).toMatchObject({ kind: 'report.opened', who: found.recipient.name });
});

test('revoking closes a link at once, also for who acts on it already', async () => {
  const { secret, firm, grantId } = await sent();
  const found = await findGrantBySecret(hashToken(secret.token));
  if (!found) throw new Error('no grant');
  expect(await revokeGrant(firm.colleague, grantId)).toEqual({ kind: 'not-found' });
  expect(await revokeGrant(firm.office, grantId)).toEqual({ kind: 'revoked' });
  expect(await findOpenGrant(grantId)).toBeNull();
  expect(await findNewestVersion(found.recipient, firm.inspection.id)).toBeNull();
  expect((await findGrantBySecret(hashToken(secret.token)))?.state).toBe('revoked');
});

test('a link that ran out mails a new one to the same address, and a revoked one does not', async () => {
  const { secret, firm, grantId } = await sent();
  await asOwner(`update messages set state = 'sent' where grant_id = $1`, [grantId]);
  await asOwner(`update grants set until = now() - interval '1 hour' where id = $1`, [grantId]);
  expect(await findOpenGrant(grantId)).toBeNull();
  const { secrets, mint } = minted();
  expect(await replaceExpiredGrant(hashToken(secret.token), mint)).toBe('mailed');
  expect(secrets[0]?.email).toBe(secret.email);
  expect(await listGrants(firm.office, firm.inspection.id)).toHaveLength(2);
  await revokeGrant(firm.office, grantId);
  expect(await replaceExpiredGrant(hashToken(secret.token), mint)).toBe('none');
});

test('pressed twice, one mail goes out', async () => {
  const { firm, buyer } = await sent();
  const { mint } = minted();
  const press = () => sendReport(firm.office, firm.inspection.id, buyer.id, mint);
  const outcomes = await Promise.all([press(), press(), press()]);
  expect(outcomes.map((outcome) => outcome.kind)).toEqual(['already-waiting', 'already-waiting', 'already-waiting']);
});
