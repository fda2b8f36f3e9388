import 'server-only';
import { and, eq, isNull, notInArray, sql } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import type { InspectionState, StateProfileCode } from '@/lib/findings/vocabulary';
import type { MemberActor } from './actor';
import { recordAudit } from './audit';
import { inspects, isTimeZone, isWallTime } from './booking-rules';
import { lockInspection, type LockedInspection } from './operations/context';
import { inspectionInspectors, inspections, parties, type Address } from './schema';
import { holds } from './scope';
import { searchText } from './search-words';
import { withActor, type Transaction } from './with-actor';

export type BookingChangeOutcome = { kind: 'changed' } | { kind: 'refused'; says: string } | { kind: 'not-found' };

/** Says who leads an inspection and who else walks it. Owner and office only. */
export async function assignInspectors(
  actor: MemberActor,
  inspectionId: string,
  people: { lead: string; others: string[] },
): Promise<BookingChangeOutcome> {
  return asOffice(actor, inspectionId, async (tx, inspection) => {
    const walkers = [...new Set([people.lead, ...people.others])];
    for (const membershipId of walkers) {
      if (!(await inspects(tx, actor.firmId, membershipId))) {
        return { kind: 'refused', says: 'Choose inspectors of your firm.' };
      }
    }
    const key = { firmId: actor.firmId, inspectionId };
    const mine = and(
      eq(inspectionInspectors.firmId, actor.firmId),
      eq(inspectionInspectors.inspectionId, inspectionId),
    );
    await tx.delete(inspectionInspectors).where(and(mine, notInArray(inspectionInspectors.membershipId, walkers)));
    for (const membershipId of walkers) {
      const leads = membershipId === people.lead;
      await tx
        .insert(inspectionInspectors)
        .values({ ...key, id: uuidv7(), membershipId, leads })
        .onConflictDoUpdate({
          target: [inspectionInspectors.firmId, inspectionInspectors.inspectionId, inspectionInspectors.membershipId],
          set: { leads },
        });
    }
    return changed(tx, inspection, 'inspection.assigned', {}, { lead: people.lead, walkers });
  });
}

const NOT_WALKED_YET: readonly InspectionState[] = ['booked', 'on-site', 'in-review'];

/** Calls an inspection off, with the reason. What was recorded stays, and nothing more is taken. Owner and office only. */
export async function cancelInspection(
  actor: MemberActor,
  inspectionId: string,
  reason: string,
): Promise<BookingChangeOutcome> {
  return asOffice(actor, inspectionId, async (tx, inspection) => {
    if (inspection.state === 'cancelled') return { kind: 'changed' };
    if (!NOT_WALKED_YET.includes(inspection.state)) {
      return { kind: 'refused', says: 'Its report is released. It can be closed, not cancelled.' };
    }
    return changed(tx, inspection, 'inspection.cancelled', { state: 'cancelled' }, { reason, was: inspection.state });
  });
}

/** Takes up a cancelled inspection again, or opens a closed one, which stays released. Owner and office only. */
export async function reopenInspection(actor: MemberActor, inspectionId: string): Promise<BookingChangeOutcome> {
  return asOffice(actor, inspectionId, async (tx, inspection) => {
    if (inspection.state !== 'cancelled' && inspection.state !== 'closed') return { kind: 'changed' };
    const state = inspection.state === 'closed' ? 'released' : 'booked';
    return changed(tx, inspection, 'inspection.reopened', { state }, { was: inspection.state });
  });
}

/** `scheduledLocal` is wall time at the house, as "2026-05-04T09:30". */
export type Booking = { address: Address; scheduledLocal: string; timeZone: string; stateProfile: StateProfileCode };

/** Corrects where and when an inspection is. Released versions keep what they were released with. Owner and office only. */
export async function changeBooking(
  actor: MemberActor,
  inspectionId: string,
  booking: Booking,
): Promise<BookingChangeOutcome> {
  const { address, scheduledLocal, timeZone, stateProfile } = booking;
  if (!isTimeZone(timeZone)) return { kind: 'refused', says: 'Choose the time zone of the house from the list.' };
  if (!isWallTime(scheduledLocal)) {
    return { kind: 'refused', says: 'Check the day of the visit: the calendar has no such day.' };
  }
  return asOffice(actor, inspectionId, async (tx, inspection) => {
    const people = await tx
      .select({ name: parties.name })
      .from(parties)
      .where(and(eq(parties.firmId, actor.firmId), eq(parties.inspectionId, inspectionId), isNull(parties.deletedAt)));
    const fields = {
      address,
      timeZone,
      stateProfile,
      scheduledAt: sql`${scheduledLocal}::timestamp at time zone ${timeZone}`,
      searchText: searchText(inspection.number, address, people),
    };
    return changed(tx, inspection, 'inspection.rebooked', fields, { ...booking });
  });
}

type OfficeWork = (tx: Transaction, inspection: LockedInspection) => Promise<BookingChangeOutcome>;

async function asOffice(actor: MemberActor, inspectionId: string, work: OfficeWork): Promise<BookingChangeOutcome> {
  return withActor(actor, async (tx) => {
    const inspection = await lockInspection(tx, actor, inspectionId);
    if (!inspection) return { kind: 'not-found' };
    if (!holds(actor, 'owner', 'office')) return { kind: 'refused', says: 'Ask your office to change the booking.' };
    return work(tx, inspection);
  });
}

type InspectionChange = Parameters<ReturnType<Transaction['update']>['set']>[0];

async function changed(
  tx: Transaction,
  inspection: LockedInspection,
  event: string,
  fields: InspectionChange,
  detail: Record<string, unknown> = {},
): Promise<BookingChangeOutcome> {
  await tx
    .update(inspections)
    .set({ ...fields, version: inspection.version + 1 })
    .where(and(eq(inspections.firmId, inspection.firmId), eq(inspections.id, inspection.id)));
  await recordAudit(tx, inspection.id, event, detail);
  return { kind: 'changed' };
}
