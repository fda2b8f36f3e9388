'use server';

import { createInspection } from '@/db/inspections';
import { requireMember } from '@/lib/auth/session';
import { newInspectionSchema } from '@/lib/schemas/inspection';

export type BookingOutcome =
  { kind: 'booked'; inspectionId: string } | { kind: 'problems'; problems: { field: string; says: string }[] };

/** Books an inspection from the form; problems come back with the field that each belongs to. */
export async function bookInspectionAction(input: unknown): Promise<BookingOutcome> {
  const actor = await requireMember();
  const parsed = newInspectionSchema.safeParse(input);
  if (!parsed.success) {
    return {
      kind: 'problems',
      problems: parsed.error.issues.map((issue) => ({ field: issue.path.join('.'), says: issue.message })),
    };
  }
  const outcome = await createInspection(actor, parsed.data);
  switch (outcome.kind) {
    case 'created':
      return { kind: 'booked', inspectionId: outcome.inspectionId };
    case 'not-allowed':
      return { kind: 'problems', problems: [{ field: 'leadMembershipId', says: outcome.says }] };
  }
}
