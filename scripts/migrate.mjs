import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { drizzle } from 'drizzle-orm/node-postgres';
import { readMigrationFiles } from 'drizzle-orm/migrator';
import { migrate as applyFolder } from 'drizzle-orm/node-postgres/migrator';
import { runMigrations } from 'graphile-worker';
import pg from 'pg';
import { existsSync } from 'node:fs';
import { explain, say, Stop } from './say.mjs';

const FOLDER = fileURLToPath(new URL('../drizzle', import.meta.url));
const LOCK = 7_204_117;

/** Brings a database to this version's schema, as the owner role. Any number of machines may do so at once. */
export async function migrate(ownerUrl) {
  const client = new pg.Client({ connectionString: ownerUrl });
  try {
    await client.connect();
  } catch (error) {
    throw new Stop(`The database cannot be reached: ${error.message || error.code}. Check DATABASE_OWNER_URL.`);
  }
  try {
    await client.query('select pg_advisory_lock($1)', [LOCK]);
    await requireRoles(client);
    await refuseNewerSchema(client);
    await runMigrations({ connectionString: ownerUrl });
    await openQueueToWorkers(client);
    if (existsSync(path.join(FOLDER, 'meta/_journal.json')))
      await applyFolder(drizzle(client), { migrationsFolder: FOLDER });
  } finally {
    await client.end();
  }
}

async function requireRoles(client) {
  const { rows } = await client.query(
    `select name from unnest(array['ohmstead_app', 'ohmstead_jobs']) name where not exists (select from pg_roles where rolname = name)`,
  );
  if (rows.length > 0)
    throw new Stop(`The database server has no role ${rows[0].name}: make the three roles as README.md says.`);
}

async function refuseNewerSchema(client) {
  const { rows: tables } = await client.query(`select to_regclass('drizzle.__drizzle_migrations') is not null as ours,
    exists (select from pg_tables where schemaname = 'public') as filled`);
  if (!tables[0].ours && tables[0].filled) {
    throw new Stop(
      'The database holds tables that Ohmstead did not make: name an empty one in DATABASE_OWNER_URL and DATABASE_URL.',
    );
  }
  if (!tables[0].ours || !existsSync(path.join(FOLDER, 'meta/_journal.json'))) return;
  const known = new Set(readMigrationFiles({ migrationsFolder: FOLDER }).map((migration) => migration.hash));
  const { rows } = await client.query('select hash from drizzle.__drizzle_migrations');
  if (rows.every((row) => known.has(row.hash))) return;
  throw new Stop(
    'The database was made by a newer or different version of Ohmstead: start that version, or restore a backup made by this one.',
  );
}

/**
 * graphile-worker switches row security on for its tables and writes no policy, so that a role other than their owner
 * sees no jobs and says nothing. The worker's own role gets one for each.
 */
async function openQueueToWorkers(client) {
  const { rows } = await client.query(`select tablename as name from pg_tables where schemaname = 'graphile_worker'`);
  const policies = rows.map(
    ({ name }) => `drop policy if exists worker on graphile_worker.${name};
      create policy worker on graphile_worker.${name} for all to ohmstead_jobs using (true) with check (true);`,
  );
  await client.query(`begin;
    grant usage on schema graphile_worker to ohmstead_jobs;
    grant select, insert, update, delete on all tables in schema graphile_worker to ohmstead_jobs;
    grant usage, select on all sequences in schema graphile_worker to ohmstead_jobs;
    grant execute on all functions in schema graphile_worker to ohmstead_jobs;
    ${policies.join('\n')}
    commit`);
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  migrate(process.env.DATABASE_OWNER_URL).catch((error) => {
    say(explain(error));
    process.exitCode = 1;
  });
}
