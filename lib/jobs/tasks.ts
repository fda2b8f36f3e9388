import 'server-only';
import type { JobHelpers, TaskList } from 'graphile-worker';
import { z } from 'zod';
import { LOCALES } from '@/lib/findings/vocabulary';
import { log } from '@/lib/log';
import { idSchema } from '@/lib/schemas/id';
import type { Attempt } from './attempt';
import { renderReport } from './render-report';
import { sendMail } from './send-mail';

const renderSchema = z.object({ firmId: idSchema, reportVersionId: idSchema, locale: z.enum(LOCALES) });
const mailSchema = z.discriminatedUnion('kind', [
  z.object({
    kind: z.enum(['invitation', 'reset', 'sign-in']),
    to: z.string(),
    name: z.string(),
    firmName: z.string().nullable(),
    link: z.string(),
    code: z.string(),
  }),
  z.object({
    kind: z.literal('report-ready'),
    firmId: idSchema,
    messageId: idSchema,
    link: z.string(),
    code: z.string(),
  }),
]);

/** The worker's tasks by the name they are asked for. */
export const TASKS: TaskList = {
  'render-report': (payload, helpers) => renderReport(renderSchema.parse(payload), attemptOf(helpers)),
  'send-mail': (payload, helpers) => sendMail(mailSchema.parse(payload), attemptOf(helpers)),
  sweep: async (_payload, helpers) => {
    const { rows } = await helpers.query<{ lost: number }>('select sweep_renders() as lost');
    if (rows[0]?.lost) log.warn({ versions: rows[0].lost }, 'PDFs that were missing were asked for again');
  },
};

/** Every two minutes: what got lost between a release and its PDF is found again. */
export const CRONTAB = '*/2 * * * * sweep';

function attemptOf({ job }: JobHelpers): Attempt {
  return { jobId: job.id, isLast: job.attempts >= job.max_attempts };
}
