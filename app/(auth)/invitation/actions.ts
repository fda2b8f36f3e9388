'use server';

import { redirect } from 'next/navigation';
import { acceptInvitation, findLink, type MailedLink } from '@/db/links';
import { dropSecret, hashSecret, keptSecret, type LinkSecret } from '@/lib/auth/link-secret';
import { hashPassword, refusePassword } from '@/lib/auth/password';
import { currentMember, startSession } from '@/lib/auth/session';
import { problemsOf, profileSchema, type Problem } from '@/lib/schemas/account';
import { textOf } from '@/lib/schemas/form';

export type InvitationState = { name: string; problems: Problem[] };

export async function acceptInvitationAction(_: InvitationState, form: FormData): Promise<InvitationState> {
  const secret = await keptSecret();
  const link = secret ? await findLink(hashSecret(secret)) : null;
  if (!secret || link?.purpose !== 'invitation' || link.state !== 'ready') redirect('/open/expired');
  return link.hasPassword ? joinWithOwnPassword(secret, link) : joinAsNew(secret, link, form);
}

async function joinWithOwnPassword(secret: LinkSecret, link: MailedLink): Promise<never> {
  const joined = await acceptInvitation(hashSecret(secret), { name: link.name, passwordHash: null });
  if (!joined) redirect('/open/expired');
  await dropSecret();
  const member = await currentMember();
  // The mail proves the mailbox; it does not stand in for the password of an account that has one.
  if (member?.userId !== joined.userId) redirect('/sign-in?notice=joined');
  await startSession(joined.userId, joined.firmId);
  redirect('/inspections');
}

async function joinAsNew(secret: LinkSecret, link: MailedLink, form: FormData): Promise<InvitationState> {
  const name = textOf(form, 'name');
  const password = textOf(form, 'password');
  const parsed = profileSchema.shape.name.safeParse(name);
  const refusal = refusePassword(password, [link.email, name, link.firmName ?? '']);
  const problems = [
    ...(parsed.success ? [] : problemsOf(parsed.error).map(({ says }) => ({ field: 'name', says }))),
    ...(refusal ? [{ field: 'password', says: refusal }] : []),
  ];
  if (!parsed.success || refusal) return { name, problems };

  const passwordHash = await hashPassword(password);
  const joined = await acceptInvitation(hashSecret(secret), { name: parsed.data, passwordHash });
  if (!joined || !(await startSession(joined.userId, joined.firmId))) redirect('/open/expired');
  await dropSecret();
  redirect('/inspections');
}
