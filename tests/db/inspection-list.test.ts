import { sql } from 'drizzle-orm';
import { beforeAll, expect, test } from 'vitest';
import { changeBooking, cancelInspection, assignInspectors } from '@/db/bookings';
import { createInspection, findInspection, listInspections } from '@/db/inspections';
import { withActor } from '@/db/with-actor';
import { listParties, removeParty, saveParty } from '@/db/parties';
import type { MemberActor } from '@/db/actor';
import { inspectionFilterSchema, INSPECTION_SORTS, type InspectionListItem } from '@/lib/schemas/inspection';
import { bookInspection, createFirm, type TestFirm } from '../support/firm';
import { asOwner } from '../support/owner';

let firm: TestFirm;
const STREETS = ['12 Elm Court', '120 Elmwood Drive', '7 Peña Road', "9 O'Hara Lane", '3 Birch St. Apt 4-B'];

beforeAll(async () => {
  firm = await createFirm();
  for (const [index, street] of STREETS.entries()) {
    await bookInspection(firm.office, {
      leadMembershipId: (index % 2 ? firm.colleague : firm.inspector).membershipId,
      address: { street, city: 'Salem', state: 'OR', zip: '97000', county: 'Marion' },
      // Two visits at the same minute: ties go by id.
      scheduledLocal: `2026-06-0${1 + Math.floor(index / 2)}T09:30`,
      buyerName: `Buyer ${street.split(' ')[1]}`,
    });
  }
});

type Given = Parameters<typeof inspectionFilterSchema.parse>[0];

async function list(actor: MemberActor, given: Given & object = {}, limit?: number) {
  const outcome = await listInspections(actor, inspectionFilterSchema.parse(given), limit);
  if (outcome.kind !== 'page') throw new Error(outcome.kind);
  return outcome.page;
}

const addresses = async (search: string, actor: MemberActor = firm.office) =>
  (await list(actor, { search })).items.map((item) => item.address).toSorted();

test.each(INSPECTION_SORTS)(
  'pages of two in the order %s miss nothing, repeat nothing and keep the order',
  async (sort) => {
    const whole = (await list(firm.office, { sort })).items;
    const paged: InspectionListItem[] = [];
    let cursor: string | undefined;
    do {
      const page = await list(firm.office, { sort, cursor }, 2);
      paged.push(...page.items);
      cursor = page.nextCursor;
    } while (cursor);
    expect(paged).toEqual(whole);
    expect(whole).toHaveLength(6);
    const values = whole.map((item) => (sort.startsWith('number') ? item.number : Date.parse(item.scheduledAt)));
    const ascending = values.toSorted((a, b) => a - b);
    expect(values).toEqual(sort.endsWith('newest') ? ascending.toReversed() : ascending);
  },
);

test('a search finds address, buyer and number by the beginnings of words, in any order and without accents', async () => {
  expect(await addresses('elm')).toEqual(['12 Elm Court', '120 Elmwood Drive']);
  expect(await addresses('court ELM')).toEqual(['12 Elm Court']);
  expect(await addresses('pena')).toEqual(['7 Peña Road']);
  expect(await addresses('Peña')).toEqual(['7 Peña Road']);
  expect(await addresses('ohara')).toEqual(["9 O'Hara Lane"]);
  expect(await addresses("buyer o'h")).toEqual(["9 O'Hara Lane"]);
  expect(await addresses('apt 4-b')).toEqual(['3 Birch St. Apt 4-B']);
  expect(await addresses('marion')).toHaveLength(5);
  expect(await addresses('6 birch')).toEqual(['3 Birch St. Apt 4-B']);
});

test('what a search box may hold breaks no query and matches no more than its words', async () => {
  for (const search of ['%', '_', "'", "' or 'x'='x", '\\', ':*', 'elm & !x', '()', "elm':* | 'b"]) {
    const found = await addresses(search);
    expect(found.length, search).toBeLessThanOrEqual(2);
  }
  expect(await addresses('%')).toEqual([]);
});

test('state and inspector narrow the list', async () => {
  const [item] = (await list(firm.office, { search: 'elmwood' })).items;
  await cancelInspection(firm.office, item?.id ?? '', 'Sale fell through');
  expect((await list(firm.office, { state: 'cancelled' })).items.map((row) => row.id)).toEqual([item?.id]);
  const colleague = await list(firm.office, { inspector: firm.colleague.membershipId });
  expect(colleague.items.map((row) => row.inspector)).toEqual(['Cody Marsh', 'Cody Marsh']);
});

test('an inspector lists the inspections they walk, and all where the firm shares drafts', async () => {
  expect((await list(firm.colleague)).items).toHaveLength(2);
  expect((await list({ ...firm.colleague, sharedDrafts: true })).items).toHaveLength(6);
  expect((await list({ ...firm.colleague, roles: [] })).items).toEqual([]);
  expect(await addresses('elm', firm.colleague)).toEqual(['120 Elmwood Drive']);
});

test('a cursor of another sort, or one made up, is not known', async () => {
  const page = await list(firm.office, { sort: 'number-newest' }, 2);
  const made = ['x', Buffer.from('["number-newest","1; drop","x"]').toString('base64url'), page.nextCursor];
  for (const cursor of made) {
    const filter = inspectionFilterSchema.parse({ sort: 'scheduled-newest', cursor });
    expect(await listInspections(firm.office, filter)).toEqual({ kind: 'unknown-cursor' });
  }
});

test('the list answers from the indexes of the firm’s rows, row security and all', async () => {
  const big = await createFirm();
  await asOwner(
    `insert into inspections (firm_id, id, number, address, search_text, time_zone, state_profile, scheduled_at, version)
     select $1, gen_random_uuid(), n, '{"street": "1", "city": "c", "state": "OR", "zip": "1"}', n || ' oak' || n % 500,
       'UTC', 'general', now() + n * interval '1 hour', 1 from generate_series(100, 5000) n`,
    [big.firmId],
  );
  await asOwner('analyze inspections');
  const plan = async (condition: string, order: string) => {
    const { rows } = await withActor(big.office, (tx) =>
      tx.execute(
        sql.raw(
          `explain select * from listed_inspections where firm_id = '${big.firmId}' ${condition} order by ${order} limit 25`,
        ),
      ),
    );
    return rows.map((row) => String(row['QUERY PLAN'])).join('\n');
  };
  const words = `'${big.firmId.replaceAll('-', '')}' & 'oak77':*`;
  const plans = {
    scheduled: await plan('', 'scheduled_at desc, id desc'),
    state: await plan(`and state = 'cancelled'`, 'scheduled_at desc, id desc'),
    number: await plan('', 'number, id'),
    search: await plan(`and search_words @@ '${words.replaceAll("'", "''")}'::tsquery`, 'scheduled_at desc, id desc'),
  };
  for (const text of Object.values(plans)) expect(text).not.toContain('Seq Scan');
  expect(plans.scheduled).not.toContain('Sort');
  expect(plans.search).toContain('search_words_index');
  expect(plans.state).not.toContain('Sort');
});

test('numbers count up in a firm, without a gap, however many book at once', async () => {
  const other = await createFirm();
  const leadMembershipId = other.inspector.membershipId;
  const booked = await Promise.all(Array.from({ length: 8 }, () => bookInspection(other.office, { leadMembershipId })));
  expect(booked.map((inspection) => inspection.number).toSorted((a, b) => a - b)).toEqual([2, 3, 4, 5, 6, 7, 8, 9]);
});

test('a booking says the house’s own time, over both clock changes', async () => {
  const there = await createFirm();
  const at = async (scheduledLocal: string) => {
    const { id } = await bookInspection(there.office, {
      leadMembershipId: there.inspector.membershipId,
      scheduledLocal,
    });
    return (await findInspection(there.owner, id))?.scheduledAt.toISOString();
  };
  expect(await at('2026-03-07T09:30')).toBe('2026-03-07T17:30:00.000Z');
  expect(await at('2026-03-09T09:30')).toBe('2026-03-09T16:30:00.000Z');
  expect(await at('2026-10-31T09:30')).toBe('2026-10-31T16:30:00.000Z');
  expect(await at('2026-11-02T09:30')).toBe('2026-11-02T17:30:00.000Z');
});

test('a booking is refused for a day that does not exist, a made-up time zone, and one who does not inspect', async () => {
  const base = {
    address: { street: '1 Oak St', city: 'Salem', state: 'OR', zip: '97000' },
    timeZone: 'America/Los_Angeles',
    stateProfile: 'general' as const,
    scheduledLocal: '2026-05-04T09:30',
    wiringMethod: 'unknown' as const,
    buyerName: 'B',
    buyerEmail: '',
    agentEmail: '',
    leadMembershipId: firm.inspector.membershipId,
  };
  const refused = [
    { ...base, scheduledLocal: '2026-02-30T09:30' },
    { ...base, timeZone: 'Mars/Olympus' },
    { ...base, leadMembershipId: firm.office.membershipId },
  ];
  for (const input of refused) expect((await createInspection(firm.office, input)).kind).toBe('not-allowed');
  expect((await createInspection(firm.colleague, base)).kind).toBe('not-allowed');
});

test('a party or an address that changes is found by its new words only', async () => {
  const { id } = firm.inspection;
  const [buyer] = await listParties(firm.office, id);
  await saveParty(firm.office, id, { kind: 'agent', name: 'Zelda Quill', email: null, phone: null });
  expect(await addresses('zelda')).toHaveLength(1);
  await removeParty(
    firm.office,
    id,
    (await listParties(firm.office, id)).find((row) => row.id !== buyer?.id)?.id ?? '',
  );
  expect(await addresses('zelda')).toEqual([]);
  const moved = await changeBooking(firm.office, id, {
    address: { street: '5 Walnut Row', city: 'Salem', state: 'OR', zip: '97000' },
    scheduledLocal: '2026-07-01T10:00',
    timeZone: 'America/Los_Angeles',
    stateProfile: 'general',
  });
  expect(moved).toEqual({ kind: 'changed' });
  expect([await addresses('juniper'), await addresses('walnut bea')]).toEqual([[], ['5 Walnut Row']]);
  const people = { lead: firm.colleague.membershipId, others: [] };
  await assignInspectors(firm.office, id, people);
  expect(await findInspection(firm.inspector, id)).toBeNull();
  expect((await findInspection(firm.colleague, id))?.inspectors).toMatchObject([{ name: 'Cody Marsh', leads: true }]);
});
