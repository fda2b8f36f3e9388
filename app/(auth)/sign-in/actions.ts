'use server';

import { headers } from 'next/headers';
import { redirect } from 'next/navigation';
import { redeemSignInLink } from '@/db/links';
import { dropSecret, hashSecret, keptSecret } from '@/lib/auth/link-secret';
import { mailLinkAfterAnswer } from '@/lib/auth/mail-link';
import { nextPage } from '@/lib/auth/next-page';
import { endCurrentSession, startSession } from '@/lib/auth/session';
import { checkPassword, mailAttempt, visitorOf } from '@/lib/auth/sign-in';
import { waitProblem } from '@/lib/auth/waiting';
import { problemsOf, type Problem } from '@/lib/schemas/account';
import { emailSchema } from '@/lib/schemas/email';
import { textOf } from '@/lib/schemas/form';

/** The typed password never comes back; the e-mail does. */
export type SignInState = { email: string; problems: Problem[]; mailedTo: string | null };

/** Two buttons, one action, so that both work without script. */
export async function signInAction(_: SignInState, form: FormData): Promise<SignInState> {
  return form.get('intent') === 'mail-link' ? mailSignInLink(form) : signIn(form);
}

/** Uses the link from the mail up: only this button does. */
export async function redeemSignInLinkAction(): Promise<void> {
  const secret = await keptSecret();
  const userId = secret ? await redeemSignInLink(hashSecret(secret)) : null;
  await dropSecret();
  if (userId === null || !(await startSession(userId))) redirect('/open/expired');
  redirect('/inspections');
}

export async function signOutAction(): Promise<void> {
  await endCurrentSession();
  redirect('/sign-in?notice=signed-out');
}

async function signIn(form: FormData): Promise<SignInState> {
  const email = textOf(form, 'email');
  const password = textOf(form, 'password');
  const missing = [
    ...(email ? [] : [{ field: 'email', says: 'Enter your e-mail address' }]),
    ...(password ? [] : [{ field: 'password', says: 'Enter your password' }]),
  ];
  if (missing.length > 0) return { email, problems: missing, mailedTo: null };

  const outcome = await checkPassword(email, password, visitorOf(await headers()));
  if (outcome.kind === 'wait') return { email, problems: [waitProblem('email', outcome.seconds)], mailedTo: null };
  const isIn = outcome.kind === 'signed-in' && (await startSession(outcome.userId));
  if (!isIn) return { email, problems: [NO_MATCH], mailedTo: null };
  redirect(nextPage(form.get('next')));
}

/** Says the same, as fast, whether or not the e-mail has an account: the mail is written after the answer is sent. */
async function mailSignInLink(form: FormData): Promise<SignInState> {
  const email = textOf(form, 'email');
  const parsed = emailSchema.safeParse(email);
  if (!parsed.success) {
    return { email, problems: problemsOf(parsed.error).map(({ says }) => ({ field: 'email', says })), mailedTo: null };
  }
  const wait = await mailAttempt(parsed.data, visitorOf(await headers()));
  if (wait > 0) return { email, problems: [waitProblem('email', wait)], mailedTo: null };
  mailLinkAfterAnswer(parsed.data, 'sign-in');
  return { email, problems: [], mailedTo: parsed.data };
}

const NO_MATCH: Problem = { field: 'email', says: 'The e-mail and the password do not belong together. Check both.' };
