'use server';

import { headers } from 'next/headers';
import { notFound, redirect } from 'next/navigation';
import { createFirm } from '@/db/auth';
import { hashPassword, refusePassword } from '@/lib/auth/password';
import { startSession } from '@/lib/auth/session';
import { addressAttempt, visitorOf } from '@/lib/auth/sign-in';
import { waitProblem } from '@/lib/auth/waiting';
import { env } from '@/lib/env';
import { problemsOf, signUpSchema, type Problem } from '@/lib/schemas/account';
import { textOf, textsOf } from '@/lib/schemas/form';

const FIELDS = ['firmName', 'name', 'email', 'stateProfile', 'timeZone'] as const;
export type SignUpState = { values: Record<(typeof FIELDS)[number], string>; problems: Problem[] };

export async function signUpAction(_: SignUpState, form: FormData): Promise<SignUpState> {
  if (env.SIGN_UP === 'closed') notFound();
  const values = textsOf(form, FIELDS);
  const password = textOf(form, 'password');
  const parsed = signUpSchema.safeParse({ ...values, password });
  const refusal = refusePassword(password, [values.email, values.name, values.firmName]);
  const problems = [
    ...(parsed.success ? [] : problemsOf(parsed.error)),
    ...(refusal ? [{ field: 'password', says: refusal }] : []),
  ];
  if (!parsed.success || refusal) return { values, problems };

  const wait = await addressAttempt('sign-up', visitorOf(await headers()));
  if (wait > 0) return { values, problems: [waitProblem('email', wait)] };
  const { password: _password, ...firm } = parsed.data;
  const outcome = await createFirm({ ...firm, passwordHash: await hashPassword(password) });
  if (outcome.kind === 'email-taken') {
    return { values, problems: [{ field: 'email', says: 'This e-mail has an account. Sign in with it instead.' }] };
  }
  await startSession(outcome.userId, outcome.firmId);
  redirect('/inspections');
}
