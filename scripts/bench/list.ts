import { Pool } from 'pg';
import type { MemberActor } from '@/db/actor';
import { createFirm } from '@/db/auth';
import { listInspections } from '@/db/inspections';
import { INSPECTION_STATES } from '@/lib/findings/vocabulary';
import type { InspectionFilter } from '@/lib/schemas/inspection';
import { env } from '@/lib/env';
import { compare, ms, type Measured } from './measure';

const FEW = 200;
const MANY = 20_000;
const INSPECTORS = 10;
const ROUNDS = 31;

export type BenchFirm = { owner: MemberActor; inspectors: MemberActor[] };
export type BenchFirms = { small: BenchFirm; large: BenchFirm };

/** Two firms in the database of this run, alike but for how many inspections they have. */
export async function seedLists(): Promise<BenchFirms> {
  const pool = new Pool({ connectionString: env.DATABASE_OWNER_URL, max: 1 });
  try {
    const small = await seedFirm(pool, FEW);
    const large = await seedFirm(pool, MANY);
    await pool.query('analyze inspections, inspection_inspectors, parties');
    return { small, large };
  } finally {
    await pool.end();
  }
}

/** Each way to ask for a page, of the large firm against the small one. */
export async function listRows({ small, large }: BenchFirms): Promise<Measured[]> {
  const base: InspectionFilter = { search: '', sort: 'scheduled-newest' };
  const plain = (filter: Partial<InspectionFilter>) => () => ({ ...base, ...filter });
  const rows: [string, (firm: BenchFirm) => InspectionFilter | Promise<InspectionFilter>, Who?][] = [
    ['first page', plain({})],
    ['a page in the middle', async (firm) => ({ ...base, cursor: await middleOf(firm, base) })],
    ['by number, oldest first', plain({ sort: 'number-oldest' })],
    ['in review', plain({ state: 'in-review' })],
    ['one inspector', (firm) => ({ ...base, inspector: firm.inspectors[3]?.membershipId })],
    ['search for a street of every tenth', plain({ search: 'maple' })],
    ['search for one number', plain({ search: '150' })],
    ['an inspector’s own', plain({}), ({ inspectors, owner }) => inspectors[3] ?? owner],
  ];
  const measured: Measured[] = [];
  for (const [what, filterOf, who = ({ owner }: BenchFirm) => owner] of rows) {
    const [few, many] = [await filterOf(small), await filterOf(large)];
    const { floorMs, productMs, ratio } = await compare(
      ROUNDS,
      () => listInspections(who(small), few),
      () => listInspections(who(large), many),
    );
    measured.push({
      what: `list of ${MANY} inspections, ${what}`,
      product: ms(productMs),
      floor: `of ${FEW}, ${ms(floorMs)}`,
      ratio,
      bar: 'at most 1.5',
    });
  }
  return measured;
}

type Who = (firm: BenchFirm) => MemberActor;

async function middleOf({ owner }: BenchFirm, filter: InspectionFilter): Promise<string | undefined> {
  const cursors: string[] = [];
  for (let cursor: string | undefined; ;) {
    const answer = await listInspections(owner, { ...filter, cursor }, 100);
    cursor = answer.kind === 'page' ? answer.page.nextCursor : undefined;
    if (cursor === undefined) return cursors[Math.floor(cursors.length / 2)];
    cursors.push(cursor);
  }
}

async function seedFirm(pool: Pool, count: number): Promise<BenchFirm> {
  const firm = await createFirm({
    firmName: `Bench ${count}`,
    timeZone: 'America/New_York',
    stateProfile: 'general',
    name: 'Olive Ames',
    email: `owner-${count}@bench.example`,
    passwordHash: 'opens nothing',
  });
  if (firm.kind !== 'created') throw new Error('the firms of an earlier run are in this database');
  const base = { kind: 'member' as const, firmId: firm.firmId, firmName: `Bench ${count}`, sharedDrafts: false };
  const owner: MemberActor = {
    ...base,
    userId: firm.userId,
    membershipId: firm.membershipId,
    name: 'Olive Ames',
    email: `owner-${count}@bench.example`,
    roles: ['owner'],
  };
  const { rows } = await pool.query<{ user: string; membership: string }>(PEOPLE, [firm.firmId, INSPECTORS, count]);
  const inspectors = rows.map(({ user, membership }, n): MemberActor => ({
    ...base,
    userId: user,
    membershipId: membership,
    name: `Inspector ${n}`,
    email: `${user}@bench.example`,
    roles: ['inspector'],
  }));
  await pool.query(INSPECTIONS, [firm.firmId, count, INSPECTION_STATES]);
  await pool.query(INSPECTORS_OF, [firm.firmId, rows.map(({ membership }) => membership)]);
  await pool.query(BUYERS_OF, [firm.firmId]);
  return { owner, inspectors };
}

const PEOPLE = `
  with people as (
    insert into users (id, email, name)
    select gen_random_uuid(), 'inspector-' || n || '-' || $3::integer || '@bench.example', 'Inspector ' || n
    from generate_series(1, $2::integer) n returning id)
  insert into memberships (firm_id, id, user_id, roles)
  select $1::uuid, gen_random_uuid(), id, '{inspector}' from people returning user_id as "user", id as membership`;

const INSPECTIONS = `
  insert into inspections (firm_id, id, number, state, address, search_text, time_zone, state_profile, scheduled_at, version)
  select $1::uuid, gen_random_uuid(), n, (($3::text[])[1 + n % cardinality($3::text[])])::inspection_state,
    jsonb_build_object('street', n || ' ' || street || ' Road', 'city', 'Fairview', 'state', 'OR', 'zip', '97000'),
    lower(n || ' ' || n || ' ' || street || ' road fairview or 97000 buyer ' || n), 'America/Los_Angeles', 'general',
    timestamptz '2026-11-01 09:00Z' - n * interval '37 minutes', 1
  from generate_series(1, $2::integer) n,
    lateral (select (array['Maple','Elm','Oak','Juniper','Alder','Birch','Cedar','Willow','Aspen','Laurel'])[1 + n % 10]) s(street)`;

const INSPECTORS_OF = `
  insert into inspection_inspectors (firm_id, id, inspection_id, membership_id, leads)
  select firm_id, gen_random_uuid(), id, ($2::uuid[])[1 + (number / 7) % cardinality($2::uuid[])], true
  from inspections where firm_id = $1::uuid`;

const BUYERS_OF = `
  insert into parties (firm_id, id, inspection_id, kind, name)
  select firm_id, gen_random_uuid(), id, 'buyer', 'Buyer ' || number from inspections where firm_id = $1::uuid`;
