import 'server-only';
import type { SystemActor } from '@/db/actor';
import type { MailJob } from '@/db/jobs';
import { beginSending, recordSendFailure, recordSent } from '@/db/messages';
import { findNewestVersion } from '@/db/reports';
import { env } from '@/lib/env';
import { log } from '@/lib/log';
import { linkLetter } from '@/lib/mail/link-letters';
import { reportReadyLetter } from '@/lib/mail/report-ready';
import { sendLetter } from '@/lib/mail/send';
import type { Attempt } from './attempt';

const openAddress = () => `${new URL(env.APP_URL).origin}/open`;

/** Sends one mail. Throws where a later try may succeed; what will never be taken is recorded and not tried again. */
export async function sendMail(job: MailJob, attempt: Attempt): Promise<void> {
  if (job.kind === 'report-ready') return sendReportMail(job, attempt);
  const outcome = await sendLetter(linkLetter(job, openAddress()), {
    toName: job.name,
    toEmail: job.to,
    messageId: `job-${attempt.jobId}`,
  });
  if (outcome.kind === 'refused') log.warn({ kind: job.kind }, 'a mail with a link was refused for good');
  if (outcome.kind === 'unreachable') throw new Error(outcome.says);
}

async function sendReportMail(job: Extract<MailJob, { kind: 'report-ready' }>, attempt: Attempt): Promise<void> {
  const actor: SystemActor = { kind: 'system', firmId: job.firmId, task: 'send-mail' };
  const message = await beginSending(actor, job.messageId);
  if (!message?.inspectionId || !message.until) return;
  const version = await findNewestVersion(actor, message.inspectionId);
  if (!version) throw new Error('a report mail has no released version');

  const { snapshot } = version;
  const letter = reportReadyLetter(snapshot, {
    toName: message.toName,
    link: job.link,
    code: job.code,
    openAddress: openAddress(),
    until: message.until,
  });
  const replyTo = snapshot.firm.email ? { name: snapshot.firm.name, address: snapshot.firm.email } : undefined;
  const { toName, toEmail } = message;
  const outcome = await sendLetter(letter, { toName, toEmail, messageId: message.id, replyTo });
  if (outcome.kind === 'sent') return recordSent(actor, message.id);

  const isLast = outcome.kind === 'refused' || attempt.isLast;
  await recordSendFailure(actor, message.id, { says: outcome.says, isLast });
  if (outcome.kind === 'unreachable') throw new Error(outcome.says);
}
