import { sql } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import { expect, test } from 'vitest';
import { verifyAuditChain } from '@/db/audit';
import { withActor } from '@/db/with-actor';
import { createFirm, logReceptacle, TestPhone } from '../support/firm';
import { asOwner } from '../support/owner';
import { releaseForTest } from '../support/released';

/** Append-only tables, and a change that somebody might like to make. */
const KEPT = {
  report_versions: "snapshot = '{}'",
  report_files: "sha256 = ''",
  audit_events: "kind = 'x'",
  mutation_log: 'n = n + 1000',
  notices: "whom = 'Nobody'",
  decisions: "reason = 'x'",
  readings: '"order" = "order" + 1000',
};

async function recorded() {
  const firm = await createFirm();
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  const { receptacleId } = await logReceptacle(phone, firm.inspection.structureId);
  const readingId = uuidv7();
  const evidence = { lamps: { hn: 'lit', hg: 'lit', ng: 'off' } } as const;
  const { visitId } = firm.inspection;
  await phone.put({ op: 'reading.add', id: readingId, visitId, receptacleId, reading: { kind: 'wiring', evidence } });
  await phone.put({ op: 'notice.add', id: uuidv7(), kind: 'danger-told', receptacleId, whom: 'Seller' });
  const sawReadingIds = [readingId];
  await phone.put({ op: 'finding.decide', id: uuidv7(), findingId: 'W01', decision: 'kept', sawReadingIds });
  const { versionId } = await releaseForTest(firm);
  await asOwner(
    `insert into report_files (firm_id, id, report_version_id, locale, renderer, key, bytes, pages, sha256)
     values ($1, $2, $3, 'en', 'r', 'k', 1, 1, repeat('0', 64))`,
    [firm.firmId, uuidv7(), versionId],
  );
  return { firm, phone, readingId };
}

test('nobody changes or deletes what was recorded, the owner of the tables included', async () => {
  const { firm } = await recorded();
  for (const [table, change] of Object.entries(KEPT)) {
    const rows = `where firm_id = '${firm.firmId}'`;
    const attacks = [
      `update ${table} set ${change} ${rows}`,
      `update ${table} set firm_id = gen_random_uuid() ${rows}`,
      `delete from ${table} ${rows}`,
      `with gone as (delete from ${table} ${rows} returning 1) select count(*) from gone`,
    ];
    for (const attack of attacks) {
      await expect(asOwner(attack), `owner: ${attack}`).rejects.toThrow(/never/);
      const asWeb = withActor(firm.owner, (tx) => tx.execute(sql.raw(attack)));
      await expect(asWeb, `web: ${attack}`).rejects.toThrow();
    }
    await expect(asOwner(`truncate ${table} cascade`), `truncate ${table}`).rejects.toThrow(/never/);
  }
});

test('a reading is withdrawn once and stays withdrawn', async () => {
  const { firm, phone, readingId } = await recorded();
  await phone.put({ op: 'reading.withdraw', id: readingId });
  const undo = sql`update readings set withdrawn_at = null where id = ${readingId}`;
  await expect(withActor(firm.owner, (tx) => tx.execute(undo))).rejects.toMatchObject({
    cause: { message: expect.stringContaining('withdrawn once') },
  });
});

test('the web’s role deletes no row of an inspection', async () => {
  const deletable = await asOwner(`select c.relname as name from pg_class c
    where c.relnamespace = 'public'::regnamespace and c.relkind = 'r'
      and has_table_privilege('ohmstead_app', c.oid, 'delete') order by 1`);
  expect(deletable.map((table) => table.name)).toEqual(['adoptions', 'inspection_inspectors']);
});

test('the record is written by its own function alone, by whoever the transaction runs for', async () => {
  const { firm } = await recorded();
  const forged = sql`insert into audit_events select * from audit_events where firm_id = ${firm.firmId} limit 1`;
  await expect(withActor(firm.owner, (tx) => tx.execute(forged))).rejects.toMatchObject({
    cause: { message: expect.stringContaining('permission denied') },
  });
});

test('a line of the record that somebody with every right changed or took out is named', async () => {
  const { firm } = await recorded();
  expect(await verifyAuditChain(firm.owner)).toMatchObject({ kind: 'whole' });
  const tamper = (statement: string) =>
    asOwner(`do $$ begin
      alter table audit_events disable trigger never_changed;
      ${statement} ;
      alter table audit_events enable trigger never_changed;
    end $$`);
  const where = (order: number) => `where firm_id = '${firm.firmId}' and "order" = ${order}`;
  await tamper(`update audit_events set detail = detail || '{"number": 7}' ${where(1)}`);
  expect(await verifyAuditChain(firm.owner)).toMatchObject({ kind: 'broken', order: 1 });
  await tamper(`update audit_events set detail = detail || '{"number": 1}' ${where(1)}`);
  expect(await verifyAuditChain(firm.owner)).toMatchObject({ kind: 'whole' });
  await tamper(`delete from audit_events ${where(3)}`);
  expect(await verifyAuditChain(firm.owner)).toMatchObject({ kind: 'broken', order: 4 });
  expect(await verifyAuditChain(firm.office)).toEqual({ kind: 'not-allowed' });
});
