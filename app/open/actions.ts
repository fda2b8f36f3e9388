'use server';

import { headers } from 'next/headers';
import { redirect } from 'next/navigation';
import { after } from 'next/server';
import { replaceExpiredGrant } from '@/db/grants';
import { replaceExpiredLink } from '@/db/links';
import { dropSecret, hashSecret, keptSecret } from '@/lib/auth/link-secret';
import { mintMailedLink } from '@/lib/auth/link-token';
import { addressAttempt, codeAttempt, forgiveCode, visitorOf } from '@/lib/auth/sign-in';
import { waitProblem } from '@/lib/auth/waiting';
import { log } from '@/lib/log';
import type { Problem } from '@/lib/schemas/account';
import { emailSchema } from '@/lib/schemas/email';
import { textOf } from '@/lib/schemas/form';
import { openSecret } from './dispatch';

export type CodeState = { email: string; problems: Problem[] };

/** For a reader without script, or with the mail on another device: the short code of the mail and its address. */
export async function openByCodeAction(_: CodeState, form: FormData): Promise<CodeState> {
  const email = textOf(form, 'email');
  const code = textOf(form, 'code')
    .toUpperCase()
    .replace(/[^0-9A-Z]/g, '');
  const parsed = emailSchema.safeParse(email);
  const problems = [
    ...(parsed.success ? [] : [{ field: 'email', says: parsed.error.issues[0]?.message ?? '' }]),
    ...(code.length >= 8 && code.length <= 20
      ? []
      : [{ field: 'code', says: 'Enter the whole short code from the mail, like ABCDE-23456' }]),
  ];
  if (!parsed.success || problems.length > 0) return { email, problems };

  const visitor = visitorOf(await headers());
  const wait = await codeAttempt(parsed.data, visitor);
  if (wait > 0) return { email, problems: [waitProblem('code', wait)] };
  const opened = await openSecret({ kind: 'code', email: parsed.data, code });
  if (opened.kind === 'unknown') {
    return {
      email,
      problems: [
        { field: 'code', says: 'This e-mail and this code do not belong together. Check both against the mail.' },
      ],
    };
  }
  await forgiveCode(parsed.data, visitor);
  redirect(opened.to);
}

/** Mails a new link in place of the expired one in hand, to the address that one went to. */
export async function replaceLinkAction(): Promise<void> {
  const secret = await keptSecret();
  const wait = await addressAttempt('open', visitorOf(await headers()));
  if (!secret || wait > 0) redirect('/open/expired?notice=not-sent');
  const oldHash = hashSecret(secret);
  after(() =>
    replaceExpired(oldHash).catch((error: unknown) => {
      log.error({ err: error }, 'an expired link could not be replaced');
    }),
  );
  await dropSecret();
  redirect('/open/expired?notice=sent');
}

/** A link to a report, or a one-time link: a secret belongs to one of them. */
async function replaceExpired(oldHash: Buffer): Promise<void> {
  const report = await replaceExpiredGrant(oldHash, mintMailedLink);
  if (report === 'none') await replaceExpiredLink(oldHash, mintMailedLink);
}
