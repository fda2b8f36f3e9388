'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import {
  inviteMember,
  renewInvitation,
  setMemberDisabled,
  setMemberRoles,
  signOutMember,
  type ChangeMemberOutcome,
} from '@/db/people';
import { INVITATION_SECONDS, mintMailedLink } from '@/lib/auth/link-token';
import { requireMember } from '@/lib/auth/session';
import { invitationSchema, problemsOf, rolesSchema, type Problem } from '@/lib/schemas/account';
import { textOf } from '@/lib/schemas/form';
import { idSchema } from '@/lib/schemas/id';

export type InviteState = { name: string; email: string; roles: string[]; problems: Problem[]; invited: string | null };

export async function inviteAction(_: InviteState, form: FormData): Promise<InviteState> {
  const actor = await requireMember(['owner']);
  const typed = { name: textOf(form, 'name'), email: textOf(form, 'email'), roles: form.getAll('roles').map(String) };
  const parsed = invitationSchema.safeParse(typed);
  if (!parsed.success) {
    const problems = problemsOf(parsed.error).map(({ field, says }) => ({ field: field.split('.')[0] ?? field, says }));
    return { ...typed, problems, invited: null };
  }
  const outcome = await inviteMember(actor, parsed.data, mintMailedLink(parsed.data.email), INVITATION_SECONDS);
  switch (outcome.kind) {
    case 'invited':
      revalidatePath('/people');
      return { name: '', email: '', roles: ['inspector'], problems: [], invited: parsed.data.email };
    case 'already-member':
      return {
        ...typed,
        problems: [{ field: 'email', says: 'This person is in your firm already. See the list.' }],
        invited: null,
      };
    case 'not-allowed':
      return { ...typed, problems: [{ field: 'email', says: 'Only an owner can invite people.' }], invited: null };
  }
}

export async function renewInvitationAction(form: FormData): Promise<void> {
  const actor = await requireMember(['owner']);
  const id = idSchema.safeParse(textOf(form, 'membershipId'));
  if (!id.success) redirect('/people?notice=not-found');
  const outcome = await renewInvitation(actor, id.data, mintMailedLink, INVITATION_SECONDS);
  redirect(`/people?notice=${outcome.kind === 'invited' ? 'invited-again' : outcome.kind}`);
}

export async function setRolesAction(form: FormData): Promise<void> {
  const actor = await requireMember(['owner']);
  const id = idSchema.safeParse(textOf(form, 'membershipId'));
  const roles = rolesSchema.safeParse(form.getAll('roles').map(String));
  if (!id.success) redirect('/people?notice=not-found');
  if (!roles.success) redirect('/people?notice=no-role');
  answer(await setMemberRoles(actor, id.data, roles.data), 'roles-changed');
}

export async function setDisabledAction(form: FormData): Promise<void> {
  const actor = await requireMember(['owner']);
  const id = idSchema.safeParse(textOf(form, 'membershipId'));
  if (!id.success) redirect('/people?notice=not-found');
  const isDisabled = textOf(form, 'disabled') === 'yes';
  answer(await setMemberDisabled(actor, id.data, isDisabled), isDisabled ? 'disabled' : 'enabled');
}

export async function signOutMemberAction(form: FormData): Promise<void> {
  const actor = await requireMember(['owner']);
  const id = idSchema.safeParse(textOf(form, 'membershipId'));
  if (!id.success) redirect('/people?notice=not-found');
  answer(await signOutMember(actor, id.data), 'signed-out');
}

function answer(outcome: ChangeMemberOutcome, done: string): never {
  revalidatePath('/people');
  redirect(`/people?notice=${outcome.kind === 'changed' ? done : outcome.kind}`);
}
