import { Logger, run } from 'graphile-worker';
import { EventEmitter } from 'node:events';
import { Pool } from 'pg';
import { closeDatabase } from '@/db/client';
import { env } from '@/lib/env';
import { startHeartbeat } from '@/lib/jobs/heartbeat';
import { CRONTAB, TASKS } from '@/lib/jobs/tasks';
import { log } from '@/lib/log';

/** Runs jobs until it is told to stop. Any number of these may run over one database and one store. */
async function main(): Promise<void> {
  const pool = new Pool({ connectionString: env.DATABASE_JOBS_URL, max: 5 });
  pool.on('error', (error) => log.error({ err: error }, 'the queue connection was lost'));
  const heartbeat = startHeartbeat(pool);
  const events = new EventEmitter();
  events.on('worker:create', ({ worker }: { worker: { workerId: string } }) => heartbeat.add(worker.workerId));

  const runner = await run({
    pgPool: pool,
    taskList: TASKS,
    crontab: CRONTAB,
    concurrency: 2,
    pollInterval: 2000,
    events,
    // Its own handling ends the process before the heartbeat and the connections are closed.
    noHandleSignals: true,
    logger: new Logger(() => (level, message) => {
      if (level === 'error' || level === 'warning') log.warn({ from: 'queue' }, message);
    }),
  });
  for (const signal of ['SIGTERM', 'SIGINT'] as const) process.once(signal, () => void runner.stop());
  log.info('the worker is ready');
  await runner.promise;
  await heartbeat.stop();
  await pool.end();
  await closeDatabase();
}

main().catch((error: unknown) => {
  log.fatal({ err: error }, 'the worker stopped');
  process.exitCode = 1;
});
