import 'server-only';
import type { Pool } from 'pg';
import { log } from '@/lib/log';

const BEAT_MS = 10_000;
/** A worker that was not seen for this long is taken for dead and its jobs are freed. Rendering blocks for less. */
const DEAD_SECONDS = 45;

/** Says every ten seconds that these workers live, and frees the jobs of those that no longer say so. */
export function startHeartbeat(pool: Pool): { add: (workerId: string) => void; stop: () => Promise<void> } {
  const workerIds = new Set<string>();
  const round = async () => {
    await beat(pool, [...workerIds]);
    await freeDeadWorkers(pool);
  };
  const run = () => void round().catch((error: unknown) => log.error({ err: error }, 'the heartbeat failed'));
  const timer = setInterval(run, BEAT_MS);
  return {
    add: (workerId) => {
      workerIds.add(workerId);
      run();
    },
    stop: async () => {
      clearInterval(timer);
      await pool.query('delete from worker_heartbeats where worker_id = any ($1)', [[...workerIds]]);
    },
  };
}

async function beat(pool: Pool, workerIds: string[]): Promise<void> {
  await pool.query(
    `insert into worker_heartbeats (worker_id, seen_at) select id, now() from unnest($1::text[]) id
     on conflict (worker_id) do update set seen_at = now()`,
    [workerIds],
  );
}

/** Dead is who holds a job without a fresh heartbeat: who stopped beating, and who died before the first beat. */
export async function freeDeadWorkers(pool: Pick<Pool, 'query'>): Promise<string[]> {
  const { rows } = await pool.query<{ worker_id: string }>(
    `select distinct locked_by as worker_id from graphile_worker.jobs
     where locked_by is not null and locked_at < now() - make_interval(secs => $1)
       and locked_by not in (select worker_id from worker_heartbeats where seen_at > now() - make_interval(secs => $1))`,
    [DEAD_SECONDS],
  );
  const dead = rows.map((row) => row.worker_id);
  if (dead.length > 0) {
    await pool.query('select graphile_worker.force_unlock_workers($1::text[])', [dead]);
    log.warn({ workers: dead.length }, 'jobs of dead workers were freed');
  }
  await pool.query('delete from worker_heartbeats where seen_at < now() - make_interval(secs => $1)', [
    DEAD_SECONDS * 20,
  ]);
  return dead;
}
