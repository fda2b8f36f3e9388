'use server';

import { redirect } from 'next/navigation';
import { findLink, resetPassword } from '@/db/links';
import { dropSecret, hashSecret, keptSecret } from '@/lib/auth/link-secret';
import { hashPassword, refusePassword } from '@/lib/auth/password';
import { forgetAttempts } from '@/lib/auth/sign-in';
import type { Problem } from '@/lib/schemas/account';
import { textOf } from '@/lib/schemas/form';

export type ResetState = { problems: Problem[] };

export async function resetPasswordAction(_: ResetState, form: FormData): Promise<ResetState> {
  const secret = await keptSecret();
  const link = secret ? await findLink(hashSecret(secret)) : null;
  if (!secret || link?.purpose !== 'reset' || link.state !== 'ready') redirect('/open/expired');

  const password = textOf(form, 'password');
  const refusal = refusePassword(password, [link.email, link.name]);
  if (refusal) return { problems: [{ field: 'password', says: refusal }] };

  const done = await resetPassword(hashSecret(secret), await hashPassword(password));
  if (!done) redirect('/open/expired');
  await forgetAttempts(done.email);
  await dropSecret();
  redirect('/sign-in?notice=password-set');
}
