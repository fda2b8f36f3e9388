'use server';

import { revalidatePath } from 'next/cache';
import { retryRender } from '@/db/report-files';
import { REVIEW_CODES, type ReviewCode } from '@/db/report-review';
import { releaseReport, type ReleaseOutcome } from '@/db/reports';
import { requireMember } from '@/lib/auth/session';
import { textOf } from '@/lib/schemas/form';
import { idSchema } from '@/lib/schemas/id';

export type ReleaseState = { outcome: ReleaseOutcome | null; reason: string; overrides: Record<string, string> };

/** Signs and releases. What was typed comes back with the answer, so that nothing is lost. */
export async function releaseAction(_: ReleaseState, form: FormData): Promise<ReleaseState> {
  const actor = await requireMember();
  const reason = textOf(form, 'reason').slice(0, 500);
  const overrides = overridesOf(form);
  const id = idSchema.safeParse(textOf(form, 'inspectionId'));
  if (!id.success) return { outcome: { kind: 'not-found' }, reason, overrides };

  const outcome = await releaseReport(actor, id.data, { reason, overrides });
  revalidatePath(`/inspections/${id.data}`, 'layout');
  return { outcome, reason, overrides };
}

function overridesOf(form: FormData): Partial<Record<ReviewCode, string>> {
  const given = REVIEW_CODES.flatMap((code) => {
    const reason = textOf(form, `override-${code}`).slice(0, 500);
    return reason ? [[code, reason]] : [];
  });
  return Object.fromEntries(given) as Partial<Record<ReviewCode, string>>;
}

/** Asks the worker for a PDF again. */
export async function retryRenderAction(form: FormData): Promise<void> {
  const actor = await requireMember();
  const id = idSchema.safeParse(textOf(form, 'reportVersionId'));
  if (id.success) await retryRender(actor, id.data);
  revalidatePath(`/inspections/${textOf(form, 'inspectionId')}/report`);
}
