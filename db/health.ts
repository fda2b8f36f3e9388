import 'server-only';
import { sql } from 'drizzle-orm';
import { VISITOR } from './actor';
import { withActor } from './with-actor';

export type Health = { database: 'ok' | 'down'; queue: 'ok' | 'no-worker' | 'down' };

/** Whether the database answers, and whether a worker has been seen in the last minute. Tells of no firm. */
export async function checkHealth(): Promise<Health> {
  try {
    return await withActor(VISITOR, async (tx) => {
      const { rows } = await tx.execute<{ alive: boolean }>(
        sql`select exists (select from worker_heartbeats where seen_at > now() - interval '1 minute' and not stopping) as alive`,
      );
      return { database: 'ok', queue: rows[0]?.alive ? 'ok' : 'no-worker' };
    });
  } catch {
    return { database: 'down', queue: 'down' };
  }
}
