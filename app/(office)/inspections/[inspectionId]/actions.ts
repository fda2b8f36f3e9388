'use server';

import { revalidatePath } from 'next/cache';
import { cancelInspection, reopenInspection } from '@/db/bookings';
import { saveParty } from '@/db/parties';
import { applyFromDesk } from '@/db/sync';
import { requireMember } from '@/lib/auth/session';
import { problemsOf, type Problem } from '@/lib/schemas/account';
import { emailSchema } from '@/lib/schemas/email';
import { textOf, textsOf } from '@/lib/schemas/form';
import { idSchema } from '@/lib/schemas/id';
import { operationSchema } from '@/lib/schemas/operations';

const HOUSE_FIELDS = [
  'yearBuilt',
  'wiringMethod',
  'supply',
  'serviceAmps',
  'occupied',
  'utilitiesOn',
  'codeEdition',
  'codeEditionSource',
] as const;
const NUMBERS: readonly string[] = ['yearBuilt', 'serviceAmps', 'codeEdition'];
const YES_NO: readonly string[] = ['occupied', 'utilitiesOn'];

export type HouseState = { values: Record<(typeof HOUSE_FIELDS)[number], string>; problems: Problem[]; saved: boolean };

/** Saves the house through the one writer of what phones and desk share, as one operation. */
export async function saveHouseAction(
  inspectionId: string,
  revisions: Record<string, number>,
  _: HouseState,
  form: FormData,
): Promise<HouseState> {
  const actor = await requireMember();
  const values = textsOf(form, HOUSE_FIELDS);
  const patch = Object.fromEntries(HOUSE_FIELDS.map((field) => [field, valueOf(field, values[field])]));
  const base = Object.fromEntries(HOUSE_FIELDS.map((field) => [field, revisions[field] ?? 0]));
  const operation = operationSchema.safeParse({
    op: 'inspection.set',
    inspectionId,
    capturedAt: new Date().toISOString(),
    patch,
    base,
  });
  if (!operation.success) {
    return {
      values,
      saved: false,
      problems: problemsOf(operation.error).map(({ field, says }) => ({ field: field.replace(/^patch\./, ''), says })),
    };
  }
  const receipt = await applyFromDesk(actor, operation.data);
  revalidatePath(`/inspections/${inspectionId}`, 'layout');
  switch (receipt.outcome) {
    case 'applied':
    case 'merged':
      return { values, problems: [], saved: true };
    case 'conflict':
      return {
        values,
        saved: false,
        problems: receipt.conflicts.map(({ field, by, theirs }) => ({
          field,
          says: `${by} changed this meanwhile to “${String(theirs)}”. Choose under Findings which one stays.`,
        })),
      };
    case 'rejected':
      return { values, saved: false, problems: [{ field: 'yearBuilt', says: receipt.reason }] };
  }
}

function valueOf(field: string, text: string): string | number | boolean | null {
  const trimmed = text.trim();
  if (trimmed === '') return null;
  if (NUMBERS.includes(field)) return Number(trimmed);
  return YES_NO.includes(field) ? trimmed === 'yes' : trimmed;
}

export type PartyState = {
  values: { name: string; email: string; phone: string };
  problems: Problem[];
  saved: boolean;
};

export async function savePartyAction(
  inspectionId: string,
  kind: 'buyer' | 'agent',
  partyId: string | null,
  _: PartyState,
  form: FormData,
): Promise<PartyState> {
  const actor = await requireMember();
  const values = textsOf(form, ['name', 'email', 'phone'] as const);
  const problems: Problem[] = [];
  const name = values.name.trim().slice(0, 120);
  if (!name) problems.push({ field: `${kind}-name`, says: `Enter the ${kind}’s name` });
  const email =
    values.email.trim() === '' ? { success: true as const, data: null } : emailSchema.safeParse(values.email);
  if (!email.success) problems.push(...problemsOf(email.error).map(({ says }) => ({ field: `${kind}-email`, says })));
  if (problems.length > 0 || !email.success) return { values, problems, saved: false };

  const outcome = await saveParty(actor, inspectionId, {
    kind,
    name,
    email: email.data,
    phone: values.phone.trim().slice(0, 40) || null,
    ...(partyId ? { id: partyId } : {}),
  });
  revalidatePath(`/inspections/${inspectionId}`, 'layout');
  if (outcome.kind === 'not-found')
    return {
      values,
      saved: false,
      problems: [{ field: `${kind}-name`, says: 'This inspection no longer exists. Go back to your inspections.' }],
    };
  return { values, problems: [], saved: true };
}

export type BookingState = { says: string };

export async function cancelBookingAction(
  inspectionId: string,
  _: BookingState,
  form: FormData,
): Promise<BookingState> {
  const reason = textOf(form, 'reason').trim().slice(0, 300);
  if (!reason) return { says: 'Say why it is cancelled' };
  return change(inspectionId, (actor) => cancelInspection(actor, inspectionId, reason));
}

export async function reopenBookingAction(inspectionId: string): Promise<BookingState> {
  return change(inspectionId, (actor) => reopenInspection(actor, inspectionId));
}

type Change = (actor: Awaited<ReturnType<typeof requireMember>>) => ReturnType<typeof cancelInspection>;

async function change(inspectionId: string, work: Change): Promise<BookingState> {
  const actor = await requireMember();
  if (!idSchema.safeParse(inspectionId).success) return { says: 'This inspection no longer exists.' };
  const outcome = await work(actor);
  revalidatePath(`/inspections/${inspectionId}`, 'layout');
  switch (outcome.kind) {
    case 'changed':
      return { says: '' };
    case 'refused':
      return { says: outcome.says };
    case 'not-found':
      return { says: 'This inspection no longer exists. Go back to your inspections.' };
  }
}
