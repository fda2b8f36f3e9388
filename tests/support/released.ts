import { v7 as uuidv7 } from 'uuid';
import type { TestFirm } from './firm';
import { asOwner } from './owner';

/** A released version and a grant for the buyer, written as rows: for tests of what rows may be seen and changed. */
export async function releaseForTest(firm: TestFirm, snapshot = '{"schema":1}') {
  const [versionId, grantId] = [uuidv7(), uuidv7()];
  const inspectionId = firm.inspection.id;
  await asOwner(
    `insert into report_versions (firm_id, id, inspection_id, number, snapshot, sha256, signed_by, released_at)
     values ($1, $2, $3, 1, $4, repeat('0', 64), $5, now())`,
    [firm.firmId, versionId, inspectionId, snapshot, firm.inspector.membershipId],
  );
  await asOwner(`update inspections set state = 'released', released_at = now() where firm_id = $1 and id = $2`, [
    firm.firmId,
    inspectionId,
  ]);
  const [party] = await asOwner('select id from parties where firm_id = $1 and inspection_id = $2 limit 1', [
    firm.firmId,
    inspectionId,
  ]);
  const partyId = String(party?.id);
  await asOwner(
    `insert into grants (firm_id, id, inspection_id, party_id, token_hash, code_hash, until)
     values ($1, $2, $3, $4, sha256($5), sha256($6), now() + interval '90 days')`,
    [firm.firmId, grantId, inspectionId, partyId, Buffer.from(`token ${grantId}`), Buffer.from(`code ${grantId}`)],
  );
  return { versionId, grantId, inspectionId, partyId };
}
