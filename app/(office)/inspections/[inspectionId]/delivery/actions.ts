'use server';

import { revalidatePath } from 'next/cache';
import { revokeGrant, sendReport, type SendReportOutcome } from '@/db/grants';
import { mintMailedLink } from '@/lib/auth/link-token';
import { requireMember } from '@/lib/auth/session';
import { textOf } from '@/lib/schemas/form';
import { idSchema } from '@/lib/schemas/id';

export type SendState = { outcome: SendReportOutcome | null };

/** Mails the buyer the link to the report. */
export async function sendReportAction(_: SendState, form: FormData): Promise<SendState> {
  const actor = await requireMember();
  const inspectionId = idSchema.safeParse(textOf(form, 'inspectionId'));
  const partyId = idSchema.safeParse(textOf(form, 'partyId'));
  if (!inspectionId.success || !partyId.success) return { outcome: { kind: 'not-found' } };

  const outcome = await sendReport(actor, inspectionId.data, partyId.data, mintMailedLink);
  revalidatePath(`/inspections/${inspectionId.data}/delivery`);
  return { outcome };
}

export async function revokeGrantAction(form: FormData): Promise<void> {
  const actor = await requireMember();
  const grantId = idSchema.safeParse(textOf(form, 'grantId'));
  if (grantId.success) await revokeGrant(actor, grantId.data);
  revalidatePath(`/inspections/${textOf(form, 'inspectionId')}/delivery`);
}
