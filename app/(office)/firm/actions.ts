'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { addAdoption, removeAdoption, saveFirm, saveLogo } from '@/db/firms';
import { requireMember } from '@/lib/auth/session';
import { adoptionSchema, firmSchema, problemsOf, type Problem } from '@/lib/schemas/account';
import { textOf, textsOf } from '@/lib/schemas/form';
import { idSchema } from '@/lib/schemas/id';

const FIELDS = ['name', 'phone', 'email', 'licenseNumber', 'timeZone', 'stateProfile'] as const;
const ADDRESS_FIELDS = ['street', 'unit', 'city', 'county', 'state', 'zip'] as const;

export type FirmValues = Record<(typeof FIELDS)[number], string> & {
  address: Record<(typeof ADDRESS_FIELDS)[number], string>;
  sharedDrafts: boolean;
};
export type FirmState = { values: FirmValues; problems: Problem[]; isSaved: boolean };

export async function saveFirmAction(_: FirmState, form: FormData): Promise<FirmState> {
  const actor = await requireMember(['owner']);
  const values = {
    ...textsOf(form, FIELDS),
    address: textsOf(form, ADDRESS_FIELDS),
    sharedDrafts: form.get('sharedDrafts') === 'yes',
  };
  const parsed = firmSchema.safeParse(values);
  if (!parsed.success) {
    const problems = problemsOf(parsed.error).map(({ field, says }) => ({
      field: field.replace('address.', ''),
      says,
    }));
    return { values, problems, isSaved: false };
  }
  await saveFirm(actor, parsed.data);
  revalidatePath('/', 'layout');
  return { values, problems: [], isSaved: true };
}

const ADOPTION_FIELDS = ['place', 'edition', 'from', 'source'] as const;
export type AdoptionState = { values: Record<(typeof ADOPTION_FIELDS)[number], string>; problems: Problem[] };

export async function addAdoptionAction(_: AdoptionState, form: FormData): Promise<AdoptionState> {
  const actor = await requireMember(['owner']);
  const values = textsOf(form, ADOPTION_FIELDS);
  const parsed = adoptionSchema.safeParse(values);
  if (!parsed.success) return { values, problems: problemsOf(parsed.error) };
  await addAdoption(actor, parsed.data);
  revalidatePath('/firm');
  return { values: { place: '', edition: '', from: '', source: '' }, problems: [] };
}

export async function removeAdoptionAction(form: FormData): Promise<void> {
  const actor = await requireMember(['owner']);
  const id = idSchema.safeParse(textOf(form, 'adoptionId'));
  if (id.success) await removeAdoption(actor, id.data);
  redirect('/firm?notice=adoption-removed');
}

export async function removeLogoAction(): Promise<void> {
  const actor = await requireMember(['owner']);
  await saveLogo(actor, null);
  redirect('/firm?notice=logo-removed');
}
