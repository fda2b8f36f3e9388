import type { MailJob } from '@/db/jobs';
import { en } from '@/lib/messages/en';
import type { Letter } from './letter';

type LinkJob = Extract<MailJob, { kind: 'invitation' | 'reset' | 'sign-in' }>;

/** The mail that carries a one-time link. */
export function linkLetter(job: LinkJob, openAddress: string): Letter {
  const { subject, says, button } = wordsOf(job);
  return {
    subject,
    parts: [
      { kind: 'text', text: en.mail.hello(job.name) },
      { kind: 'text', text: says },
      { kind: 'button', label: button, href: job.link },
      { kind: 'small', text: en.mail.code(openAddress, job.code) },
      { kind: 'small', text: en.mail.notYours },
    ],
  };
}

function wordsOf({ kind, firmName }: LinkJob): { subject: string; says: string; button: string } {
  switch (kind) {
    case 'invitation': {
      const { subject, says, button } = en.mail.invitation;
      const firm = firmName ?? 'A firm';
      return { subject: subject(firm), says: says(firm), button };
    }
    case 'reset':
      return en.mail.reset;
    case 'sign-in':
      return en.mail.signIn;
  }
}
