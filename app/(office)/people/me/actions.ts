'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { changeOwnPassword, endOwnSessions, findAccount } from '@/db/auth';
import { saveOwnProfile, saveOwnSignature, type Profile } from '@/db/people';
import { hashPassword, isPasswordOf, refusePassword } from '@/lib/auth/password';
import { currentSessionHash, requireMember, startSession } from '@/lib/auth/session';
import { passwordAttempt, forgetAttempts } from '@/lib/auth/sign-in';
import { waitProblem } from '@/lib/auth/waiting';
import { problemsOf, profileSchema, type Problem } from '@/lib/schemas/account';
import { textOf, textsOf } from '@/lib/schemas/form';
import { idSchema } from '@/lib/schemas/id';

const FIELDS = ['name', 'licenseNumber', 'licenseState', 'licenseExpires', 'signatureName'] as const;
export type ProfileState = { values: Record<keyof Profile, string>; problems: Problem[]; isSaved: boolean };

export async function saveProfileAction(_: ProfileState, form: FormData): Promise<ProfileState> {
  const actor = await requireMember();
  const values = textsOf(form, FIELDS);
  const parsed = profileSchema.safeParse(values);
  if (!parsed.success) return { values, problems: problemsOf(parsed.error), isSaved: false };
  const licenseState = parsed.data.licenseState?.toUpperCase() ?? null;
  await saveOwnProfile(actor, { ...parsed.data, licenseState });
  revalidatePath('/people', 'layout');
  return { values, problems: [], isSaved: true };
}

export type PasswordState = { problems: Problem[]; isSaved: boolean };

/** A new password ends every other session; this one goes on under a new id. */
export async function changePasswordAction(_: PasswordState, form: FormData): Promise<PasswordState> {
  const actor = await requireMember();
  const wait = await passwordAttempt(actor.email);
  if (wait > 0) return { problems: [waitProblem('current', wait)], isSaved: false };
  const account = await findAccount(actor, actor.email);
  if (!account || !(await isPasswordOf(account.passwordHash, textOf(form, 'current')))) {
    return {
      problems: [{ field: 'current', says: 'This is not your present password. Type it again.' }],
      isSaved: false,
    };
  }
  await forgetAttempts(actor.email);
  const password = textOf(form, 'password');
  const refusal = refusePassword(password, [actor.email, actor.name, actor.firmName]);
  if (refusal) return { problems: [{ field: 'password', says: refusal }], isSaved: false };

  const keep = await currentSessionHash();
  if (!keep) redirect('/sign-in');
  await changeOwnPassword(actor, await hashPassword(password), keep);
  await startSession(actor.userId, actor.firmId);
  return { problems: [], isSaved: true };
}

export async function signOutEverywhereAction(): Promise<void> {
  const actor = await requireMember();
  await endOwnSessions(actor, await currentSessionHash());
  redirect('/people/me?notice=signed-out-elsewhere');
}

export async function switchFirmAction(form: FormData): Promise<void> {
  const actor = await requireMember();
  const firmId = idSchema.safeParse(textOf(form, 'firmId'));
  if (firmId.success) await startSession(actor.userId, firmId.data);
  redirect('/inspections');
}

export async function removeSignatureAction(): Promise<void> {
  const actor = await requireMember();
  await saveOwnSignature(actor, null);
  redirect('/people/me?notice=signature-removed');
}
