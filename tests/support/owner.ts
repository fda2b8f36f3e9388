import { Pool } from 'pg';

let pool: Pool | undefined;

/** A statement as the role that owns the tables, for what no function of the program can do, such as letting time pass. */
export async function asOwner(text: string, values: unknown[] = []): Promise<Record<string, unknown>[]> {
  pool ??= new Pool({ connectionString: process.env.DATABASE_OWNER_URL, max: 2 });
  return (await pool.query<Record<string, unknown>>(text, values)).rows;
}

export async function closeOwner(): Promise<void> {
  await pool?.end();
  pool = undefined;
}
