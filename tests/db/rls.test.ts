import { sql } from 'drizzle-orm';
import { Pool } from 'pg';
import { afterAll, expect, test } from 'vitest';
import { VISITOR, type MemberActor, type RecipientActor } from '@/db/actor';
import { database } from '@/db/client';
import { withActor } from '@/db/with-actor';
import { createFirm } from '../support/firm';
import { asOwner } from '../support/owner';
import { releaseForTest } from '../support/released';

const pool = new Pool({ connectionString: process.env.DATABASE_URL, max: 2 });
afterAll(() => pool.end());

const TABLES_WITH_FIRM = `select c.oid, c.relname as name, c.relrowsecurity and c.relforcerowsecurity as forced,
    pg_get_userbyid(c.relowner) as owner
  from pg_class c join pg_namespace n on n.oid = c.relnamespace
  where n.nspname = 'public' and c.relkind in ('r', 'p') and (c.relname in ('firms', 'users', 'rate_limits') or exists (
    select 1 from pg_attribute a where a.attrelid = c.oid and a.attname = 'firm_id' and not a.attisdropped))`;

test('row security is forced on every table of a firm, with a policy for reading and one for writing', async () => {
  const tables = await asOwner(TABLES_WITH_FIRM);
  expect(tables.length).toBeGreaterThan(25);
  expect(tables.filter((table) => !table.forced)).toEqual([]);
  const bare = await asOwner(`select name from (${TABLES_WITH_FIRM}) t where not exists (
    select 1 from pg_policies p where p.schemaname = 'public' and p.tablename = t.name
      and p.qual is not null and p.with_check is not null)`);
  expect(bare).toEqual([]);
});

test('no policy of the web’s role lets every row through', async () => {
  const open = await asOwner(`select tablename, policyname from pg_policies where schemaname = 'public'
    and ('ohmstead_app' = any(roles) or 'public' = any(roles)) and (qual = 'true' or with_check = 'true')`);
  expect(open).toEqual([]);
});

test('every foreign key between tables of a firm carries the firm', async () => {
  const keys = await asOwner(`select conrelid::regclass::text as table, conname from pg_constraint k
    where contype = 'f'
      and exists (select 1 from pg_attribute a where a.attrelid = k.confrelid and a.attname = 'firm_id')
      and not exists (select 1 from pg_attribute a
        where a.attrelid = k.conrelid and a.attname = 'firm_id' and a.attnum = any(k.conkey))`);
  expect(keys).toEqual([]);
});

test('the web’s and the worker’s roles own nothing, pass no policy and are no one’s superuser', async () => {
  const roles = await asOwner(`select rolname, rolsuper, rolbypassrls, rolcreaterole,
      (select count(*)::int from pg_class where relowner = r.oid) as owns
    from pg_roles r where rolname in ('ohmstead_app', 'ohmstead_jobs') order by rolname`);
  const nothing = { rolsuper: false, rolbypassrls: false, rolcreaterole: false, owns: 0 };
  expect(roles).toEqual([
    { rolname: 'ohmstead_app', ...nothing },
    { rolname: 'ohmstead_jobs', ...nothing },
  ]);
});

test('every security-definer function fixes its search path and is not everybody’s', async () => {
  const loose = await asOwner(`select proname from pg_proc where pronamespace = 'public'::regnamespace and prosecdef
    and (not exists (select 1 from unnest(proconfig) setting where setting like 'search_path=%')
      or has_function_privilege('public', oid, 'execute'))`);
  expect(loose).toEqual([]);
});

test('the web’s role reads no password, session, link or attempt', async () => {
  const reads = await asOwner(`select
    has_column_privilege('ohmstead_app', 'users', 'password_hash', 'select') as password,
    has_table_privilege('ohmstead_app', 'sessions', 'select, insert, update, delete') as sessions,
    has_table_privilege('ohmstead_app', 'link_tokens', 'select, insert, update, delete') as links,
    has_table_privilege('ohmstead_app', 'rate_limits', 'select, insert, update, delete') as attempts`);
  expect(reads).toEqual([{ password: false, sessions: false, links: false, attempts: false }]);
});

test('without an actor, and for a visitor, no table of a firm shows a row or takes one', async () => {
  const firm = await createFirm();
  for (const { name } of await asOwner(TABLES_WITH_FIRM)) {
    const readable = await asOwner(`select has_any_column_privilege('ohmstead_app', $1, 'select') as yes`, [name]);
    if (!readable[0]?.yes) continue;
    const [column] = await asOwner(
      `select column_name as name from information_schema.columns where table_name = $1
        and has_column_privilege('ohmstead_app', $1, column_name, 'select') limit 1`,
      [name],
    );
    const query = `select "${String(column?.name)}" from "${String(name)}"`;
    expect((await pool.query(query)).rows).toEqual([]);
    expect((await withActor(VISITOR, (tx) => tx.execute(sql.raw(query)))).rows).toEqual([]);
  }
  const view = sql`select id from listed_inspections`;
  expect((await withActor(VISITOR, (tx) => tx.execute(view))).rows).toEqual([]);
  expect((await withActor(firm.owner, (tx) => tx.execute(view))).rows).toEqual([{ id: firm.inspection.id }]);
  const insert =
    'insert into adoptions (firm_id, id, place, edition, "from", source) values ($1, $1, $2, 2020, now(), $2)';
  await expect(pool.query(insert, [firm.firmId, 'x'])).rejects.toThrow(/row-level security/);
});

test('a row cannot be written into another firm, nor moved there', async () => {
  const [here, there] = await Promise.all([createFirm(), createFirm()]);
  const adoption = sql`insert into adoptions (firm_id, id, place, edition, "from", source)
    values (${there.firmId}, gen_random_uuid(), 'x', 2020, now(), 'x')`;
  await expect(withActor(here.owner, (tx) => tx.execute(adoption))).rejects.toThrow();
  const move = sql`update inspections set firm_id = ${there.firmId} where id = ${here.inspection.id}`;
  await expect(withActor(here.owner, (tx) => tx.execute(move))).rejects.toThrow();
  const reach = sql`update inspections set general_note = 'x' where id = ${there.inspection.id}`;
  expect((await withActor(here.owner, (tx) => tx.execute(reach))).rowCount).toBe(0);
});

test('five hundred requests of two firms over two connections never see the other firm', async () => {
  const firms = await Promise.all([createFirm(), createFirm()]);
  const ask = async (actor: MemberActor, index: number) => {
    const client = await pool.connect();
    try {
      await client.query('begin');
      await client.query(`select set_config('app.kind', 'member', true), set_config('app.firm_id', $1, true)`, [
        actor.firmId,
      ]);
      const { rows } = await client.query<{ firm_id: string }>('select firm_id from inspections');
      // Every seventh request fails half-way; its connection goes back to the pool all the same.
      if (index % 7 === 0) await client.query('select 1 / 0').catch(() => undefined);
      await client.query(index % 3 === 0 || index % 7 === 0 ? 'rollback' : 'commit');
      return rows.map((row) => row.firm_id);
    } finally {
      client.release();
    }
  };
  const seen = await Promise.all(
    Array.from({ length: 500 }, async (_, index) => {
      const { owner, firmId } = firms[index % 2] ?? firms[0];
      return { firmId, rows: await ask(owner, index) };
    }),
  );
  expect(seen.filter(({ firmId, rows }) => rows.length !== 1 || rows[0] !== firmId)).toEqual([]);
  const left = await pool.query(`select current_setting('app.firm_id', true) as firm`);
  expect(left.rows[0]?.firm ?? '').toBe('');
});

test('a connection returned after an error carries no firm', async () => {
  const firm = await createFirm();
  await expect(withActor(firm.owner, () => Promise.reject(new Error('half-way')))).rejects.toThrow('half-way');
  await Promise.all(Array.from({ length: 20 }, () => withActor(firm.owner, (tx) => tx.execute(sql`select 1`))));
  // Straight through the pool, as nothing but this test does.
  const left = Array.from({ length: 20 }, () => database().execute(sql`select app_firm() as firm, app_kind() as kind`));
  for (const { rows } of await Promise.all(left)) expect(rows).toEqual([{ firm: null, kind: null }]);
});

test('a recipient sees the released version of one inspection and no row of the draft', async () => {
  const firm = await createFirm();
  const released = await releaseForTest(firm);
  const recipient: RecipientActor = { kind: 'recipient', firmId: firm.firmId, name: 'Bea Winter', ...released };
  const count = async (table: string) => {
    const { rows } = await withActor(recipient, (tx) => tx.execute(sql.raw(`select count(*)::int as n from ${table}`)));
    return rows[0]?.n;
  };
  const seen = ['report_versions', 'inspections', 'grants', 'parties', 'firms'];
  for (const table of seen) expect([table, await count(table)]).toEqual([table, 1]);
  const hidden = [
    'listed_inspections',
    'readings',
    'receptacles',
    'areas',
    'decisions',
    'memberships',
    'users',
    'audit_events',
    'mutation_log',
  ];
  for (const table of hidden) expect([table, await count(table)]).toEqual([table, 0]);
  await expect(
    withActor(recipient, (tx) => tx.execute(sql`update inspections set general_note = 'x'`)),
  ).resolves.toMatchObject({ rowCount: 0 });

  await asOwner('update grants set revoked_at = now() where firm_id = $1', [firm.firmId]);
  for (const table of seen) expect([table, await count(table)]).toEqual([table, 0]);
});
