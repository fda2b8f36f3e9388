'use server';

import { headers } from 'next/headers';
import { mailLinkAfterAnswer } from '@/lib/auth/mail-link';
import { mailAttempt, visitorOf } from '@/lib/auth/sign-in';
import { waitProblem } from '@/lib/auth/waiting';
import type { Problem } from '@/lib/schemas/account';
import { emailSchema } from '@/lib/schemas/email';
import { textOf } from '@/lib/schemas/form';

export type ForgotState = { email: string; problems: Problem[]; mailedTo: string | null };

export async function mailResetAction(_: ForgotState, form: FormData): Promise<ForgotState> {
  const email = textOf(form, 'email');
  const parsed = emailSchema.safeParse(email);
  if (!parsed.success) {
    return { email, problems: [{ field: 'email', says: parsed.error.issues[0]?.message ?? '' }], mailedTo: null };
  }
  const wait = await mailAttempt(parsed.data, visitorOf(await headers()));
  if (wait > 0) return { email, problems: [waitProblem('email', wait)], mailedTo: null };
  mailLinkAfterAnswer(parsed.data, 'reset');
  return { email, problems: [], mailedTo: parsed.data };
}
