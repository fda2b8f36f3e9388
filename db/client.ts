import 'server-only';
import { drizzle } from 'drizzle-orm/node-postgres';
import { Pool } from 'pg';
import { env } from '@/lib/env';
import * as schema from './schema';

export type Database = ReturnType<typeof connect>;

let opened: Database | undefined;

/** The web role's pool, opened at the first query so that a build needs no database. Only db/with-actor.ts uses it. */
export function database(): Database {
  opened ??= connect();
  return opened;
}

/** Ends every connection of this process; the next query opens new ones. */
export async function closeDatabase(): Promise<void> {
  const closing = opened;
  opened = undefined;
  await closing?.$client.end();
}

function connect() {
  const pool = new Pool({ connectionString: env.DATABASE_URL, max: 10, idleTimeoutMillis: 30_000 });
  // An idle connection that the server ends is dropped from the pool; without a listener it would end the process.
  pool.on('error', () => undefined);
  return drizzle(pool, { schema, casing: 'snake_case' });
}
