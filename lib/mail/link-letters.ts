import type { MailJob } from '@/db/jobs';
import { enMail } from '@/lib/messages/en-mail';
import type { Letter } from './letter';

type LinkJob = Extract<MailJob, { kind: 'invitation' | 'reset' | 'sign-in' }>;

/** The mail that carries a one-time link. */
export function linkLetter(job: LinkJob, openAddress: string): Letter {
  const { subject, says, button } = wordsOf(job);
  return {
    subject,
    parts: [
      { kind: 'text', text: enMail.hello(job.name) },
      { kind: 'text', text: says },
      { kind: 'button', label: button, href: job.link },
      { kind: 'small', text: enMail.code(openAddress, job.code) },
      { kind: 'small', text: enMail.notYours },
    ],
  };
}

function wordsOf({ kind, firmName }: LinkJob): { subject: string; says: string; button: string } {
  switch (kind) {
    case 'invitation': {
      const { subject, says, button } = enMail.invitation;
      const firm = firmName ?? 'A firm';
      return { subject: subject(firm), says: says(firm), button };
    }
    case 'reset':
      return enMail.reset;
    case 'sign-in':
      return enMail.signIn;
  }
}
