'use server';

import { revalidatePath } from 'next/cache';
import { v7 as uuidv7 } from 'uuid';
import { resolveConflict } from '@/db/conflicts';
import { applyFromDesk } from '@/db/sync';
import { requireMember } from '@/lib/auth/session';
import { findForbiddenWords } from '@/lib/findings';
import { problemsOf, type Problem } from '@/lib/schemas/account';
import { textOf, textsOf } from '@/lib/schemas/form';
import { operationSchema } from '@/lib/schemas/operations';

export type DecisionState = {
  values: Record<'reason' | 'observed' | 'plain' | 'raisedSignal', string>;
  problems: Problem[];
  saved: boolean;
};

/** Records what the inspector decided, with the readings that were on the screen. */
export async function decideAction(
  inspectionId: string,
  findingId: string,
  sawReadingIds: string[],
  _: DecisionState,
  form: FormData,
): Promise<DecisionState> {
  const actor = await requireMember();
  const values = textsOf(form, ['reason', 'observed', 'plain', 'raisedSignal'] as const);
  const decision = textOf(form, 'decision');
  const found = problemsIn(values, decision);
  if (found.length > 0) return { values, problems: found, saved: false };

  const ownWords = {
    ...(values.observed.trim() ? { observed: values.observed } : {}),
    ...(values.plain.trim() ? { plain: values.plain } : {}),
  };
  const operation = operationSchema.safeParse({
    op: 'finding.decide',
    inspectionId,
    capturedAt: new Date().toISOString(),
    id: uuidv7(),
    findingId,
    decision,
    sawReadingIds,
    ...(decision === 'dismissed' ? { reason: values.reason } : {}),
    ...(Object.keys(ownWords).length > 0 ? { ownWords } : {}),
    ...(values.raisedSignal ? { raisedSignal: values.raisedSignal } : {}),
  });
  if (!operation.success)
    return {
      values,
      problems: problemsOf(operation.error).map(({ field, says }) => ({ field: field.replace('ownWords.', ''), says })),
      saved: false,
    };
  const receipt = await applyFromDesk(actor, operation.data);
  revalidatePath(`/inspections/${inspectionId}`, 'layout');
  if (receipt.outcome === 'rejected')
    return { values, problems: [{ field: 'reason', says: receipt.reason }], saved: false };
  return { values, problems: [], saved: true };
}

function problemsIn(values: DecisionState['values'], decision: string): Problem[] {
  if (decision === 'dismissed' && !values.reason.trim())
    return [{ field: 'reason', says: 'Say why this is not a finding' }];
  return (['observed', 'plain'] as const).flatMap((field) =>
    findForbiddenWords(values[field]).map(({ word, why }) => ({
      field,
      says: `“${word}” is never printed of a finding. ${why}`,
    })),
  );
}

/** Keeps one of two values of a field; both stay on record. */
export async function resolveConflictAction(inspectionId: string, form: FormData): Promise<void> {
  const actor = await requireMember();
  const keep = textOf(form, 'keep') === 'yours' ? 'yours' : 'theirs';
  await resolveConflict(actor, textOf(form, 'conflictId'), keep);
  revalidatePath(`/inspections/${inspectionId}`, 'layout');
}
