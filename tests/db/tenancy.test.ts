import { readdirSync, readFileSync } from 'node:fs';
import { v7 as uuidv7 } from 'uuid';
import { beforeAll, expect, test } from 'vitest';
import type { Actor, RecipientActor } from '@/db/actor';
import { listConflicts } from '@/db/conflicts';
import { bookInspection, createFirm, createMember, logReceptacle, TestPhone, type TestFirm } from '../support/firm';
import { asOwner } from '../support/owner';
import { releaseForTest } from '../support/released';
import { goldenSnapshot } from '../support/snapshot';
import { ENTRIES, RECIPIENT_ENTRIES, type Target } from '../support/tenancy';

let here: TestFirm;
let there: TestFirm;
let target: Target;

beforeAll(async () => {
  [here, there] = await Promise.all([createFirm('Firm of Heath'), createFirm('Firm of Thorn')]);
  target = await fill(here);
});

/** Something of each kind in a firm, so that there is something to be refused. */
async function fill(firm: TestFirm): Promise<Target> {
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  const { areaId, receptacleId } = await logReceptacle(phone, firm.inspection.structureId);
  const photo = { photoId: uuidv7(), photoSha256: 'a'.repeat(64) };
  const bytes = { sha256: photo.photoSha256, bytes: 9, type: 'image/png', order: 1 } as const;
  await phone.put({ op: 'photo.add', id: photo.photoId, receptacleId, ...bytes });
  const relabel = (by: TestPhone, label: string) =>
    by.put({ op: 'receptacle.set', id: receptacleId, patch: { label }, base: {} });
  await relabel(phone, 'one');
  await relabel(new TestPhone(firm.actor, firm.inspection.id), 'two');
  const [conflict] = await listConflicts(firm.inspector, firm.inspection.id);
  const [party] = await asOwner('select id from parties where firm_id = $1', [firm.firmId]);
  const invited = await createMember({ firmId: firm.firmId, firmName: 'x' }, 'Ivo Waits', ['inspector']);
  await asOwner('update memberships set invited_at = now() where firm_id = $1 and id = $2', [
    firm.firmId,
    invited.membershipId,
  ]);
  const adoptionId = uuidv7();
  await asOwner(
    `insert into adoptions (firm_id, id, place, edition, "from", source) values ($1, $2, 'Heath', 2020, now(), 'x')`,
    [firm.firmId, adoptionId],
  );
  return {
    inspectionId: firm.inspection.id,
    areaId,
    receptacleId,
    ...photo,
    conflictId: conflict?.id ?? '',
    partyId: String(party?.id),
    membershipId: firm.inspector.membershipId,
    invitedId: invited.membershipId,
    adoptionId,
    ...(await releaseAnother(firm)),
  };
}

async function releaseAnother(firm: TestFirm) {
  const inspection = await bookInspection(firm.office, { leadMembershipId: firm.inspector.membershipId });
  const { snapshot } = await goldenSnapshot();
  const { versionId, grantId } = await releaseForTest({ ...firm, inspection }, JSON.stringify(snapshot));
  await asOwner(
    `insert into report_files (firm_id, id, report_version_id, locale, renderer, key, bytes, pages, sha256)
     values ($1, $2, $3, 'en', 'r', 'k', 1, 1, repeat('0', 64))`,
    [firm.firmId, uuidv7(), versionId],
  );
  return { releasedId: inspection.id, versionId, grantId };
}

function nowhere(): Target {
  const ids = Object.keys(target).map((name) => [name, uuidv7()]);
  return { ...(Object.fromEntries(ids) as Target), photoSha256: target.photoSha256 };
}

/** An answer without the ids that were asked about, so that only what it says is compared. */
async function answer(asked: Promise<unknown>): Promise<string> {
  const value = await asked;
  return JSON.stringify(value ?? null).replaceAll(/[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}/g, 'id');
}

async function everythingOf(firm: TestFirm): Promise<string> {
  const tables = await asOwner(`select table_name as name from information_schema.columns
    where table_schema = 'public' and column_name = 'firm_id' and table_name not like 'listed%' order by 1`);
  const sums = tables.map(
    ({ name }) =>
      `select '${String(name)}' as name, md5(coalesce(string_agg(t::text, '|' order by t::text), '')) as sum
       from "${String(name)}" t where firm_id = '${firm.firmId}'`,
  );
  const firmRow = `select 'firms', md5(t::text) from firms t where id = '${firm.firmId}'`;
  return JSON.stringify(await asOwner([...sums, firmRow].join(' union all ')));
}

test('every exported function of db/ says how it refuses a stranger', async () => {
  const folder = new URL('../../db/', import.meta.url);
  const files = readdirSync(folder).filter((name) => name.endsWith('.ts'));
  const exported = files.flatMap((file) => {
    const source = readFileSync(new URL(file, folder), 'utf8');
    const functions = source.matchAll(/^export (?:async )?(?:function|const) (\w+)(?= ?[(<]| = (?:async )?\()/gm);
    return [...functions].map(([, name]) => `${file.slice(0, -3)}.${name}`);
  });
  expect(exported.filter((name) => !(name in ENTRIES))).toEqual([]);
  expect(Object.keys(ENTRIES).filter((name) => !exported.includes(name))).toEqual([]);
});

const asking = Object.entries(ENTRIES).flatMap(([name, entry]) => ('asks' in entry ? [[name, entry] as const] : []));
const firmWide = Object.entries(ENTRIES).flatMap(([name, entry]) =>
  'firmOf' in entry ? [[name, entry] as const] : [],
);
const ABOUT_INSPECTIONS = /^(audit|bookings|conflicts|grants|inspections|parties|photos|reports|report-files|sync)\./;

test.each(asking)('%s answers another firm as it does about nothing, and changes nothing there', async (_, entry) => {
  const before = await everythingOf(here);
  const strangers = [there.actor, there.office, { ...there.actor, firmId: there.firmId, sharedDrafts: true }];
  for (const stranger of strangers) {
    expect(await answer(entry.asks(stranger, target))).toBe(await answer(entry.asks(stranger, nowhere())));
  }
  expect(await everythingOf(here)).toBe(before);
});

test.each(asking.filter(([name]) => ABOUT_INSPECTIONS.test(name) && name !== 'inspections.createInspection'))(
  '%s answers an inspector of the firm who does not walk the inspection as it does about nothing',
  async (_, entry) => {
    expect(await answer(entry.asks(here.colleague, target))).toBe(await answer(entry.asks(here.colleague, nowhere())));
  },
);

test.each(firmWide)('%s names nothing of another firm and changes nothing there', async (_, entry) => {
  const before = await everythingOf(here);
  const text = JSON.stringify((await entry.firmOf(there.actor)) ?? null);
  for (const secret of [here.firmId, ...Object.values(target), 'Heath']) expect(text).not.toContain(secret);
  expect(await everythingOf(here)).toBe(before);
});

test.each(Object.entries(RECIPIENT_ENTRIES))(
  '%s answers a recipient of another inspection as about nothing',
  async (_, asks) => {
    const released = await releaseForTest(await createFirm());
    const [firm] = await asOwner('select firm_id from grants where id = $1', [released.grantId]);
    const strangers: Actor[] = [
      { kind: 'recipient', firmId: String(firm?.firm_id), name: 'Stranger', ...released } satisfies RecipientActor,
      // Somebody who made up that their grant is in this firm and names this inspection.
      { kind: 'recipient', firmId: here.firmId, name: 'Liar', ...released, inspectionId: target.inspectionId },
      { kind: 'visitor' },
    ];
    for (const stranger of strangers) {
      expect(await answer(asks(stranger, target))).toBe(await answer(asks(stranger, nowhere())));
    }
  },
);

test.each(asking.filter(([, entry]) => entry.own !== false))(
  '%s answers its own firm about what is there, so that the refusals above mean something',
  async (_, entry) => {
    const firm = await createFirm();
    const own = await fill(firm);
    expect(await answer(entry.asks(firm.actor, own))).not.toBe(await answer(entry.asks(firm.actor, nowhere())));
  },
);
