import 'server-only';
import { sql } from 'drizzle-orm';
import type { Transaction } from './with-actor';

/** The worker's tasks and what each is told. A handler may run twice for one job. */
export type Jobs = {
  'render-report': { firmId: string; reportVersionId: string; locale: 'en' | 'es' };
  'send-mail': MailJob;
};

export type MailJob =
  | {
      kind: 'invitation' | 'reset' | 'sign-in';
      to: string;
      name: string;
      firmName: string | null;
      /** Holds the token: the job's row goes when the mail is sent. */
      link: string;
      code: string;
    }
  | { kind: 'report-ready'; firmId: string; messageId: string; link: string; code: string };

/**
 * Asks the worker for something, in the caller's transaction: nothing happens unless it commits.
 * A job under a `key` that still waits is replaced instead of added twice.
 */
export async function enqueueJob<Task extends keyof Jobs>(
  tx: Transaction,
  task: Task,
  payload: Jobs[Task],
  options: { key?: string; queue?: string } = {},
): Promise<void> {
  await tx.execute(
    sql`select enqueue_job(${task}, ${JSON.stringify(payload)}::json, ${options.key ?? null}, ${options.queue ?? null})`,
  );
}
