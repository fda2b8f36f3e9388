import 'server-only';
import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import type { InspectionFacts } from '@/lib/findings/facts';
import { STRUCTURE_DEFAULTS } from '@/lib/schemas/defaults';
import { inspectionFacts } from '@/lib/schemas/inspection-facts';
import type { InspectionFilter, InspectionPage, NewInspection } from '@/lib/schemas/inspection';
import type { WalkAnswer } from '@/lib/schemas/walk';
import type { Actor, MemberActor } from './actor';
import { recordAudit } from './audit';
import { inspects, isTimeZone, isWallTime } from './booking-rules';
import { listRows, readCursor, writeCursor } from './inspection-list';
import {
  firms,
  inspectionInspectors,
  inspections,
  memberships,
  parties,
  structures,
  syncClients,
  users,
  visits,
} from './schema';
import { holds, inspectionsVisibleTo } from './scope';
import { searchText } from './search-words';
import { addressLine, walkState } from './walk-rows';
import { ONE_MOMENT, withActor, type Transaction } from './with-actor';

export type CreateInspectionOutcome =
  { kind: 'created'; inspectionId: string; number: number } | { kind: 'not-allowed'; says: string };

/**
 * Books an inspection: the next number of the firm, the buyer and the agent, the lead inspector, a first visit and the
 * main house. An inspector books for oneself; owner and office for anybody who inspects.
 */
export async function createInspection(actor: MemberActor, input: NewInspection): Promise<CreateInspectionOutcome> {
  const refusal = bookingRefusal(actor, input);
  if (refusal) return { kind: 'not-allowed', says: refusal };
  return withActor(actor, async (tx) => {
    if (!(await inspects(tx, actor.firmId, input.leadMembershipId))) {
      return { kind: 'not-allowed', says: 'Choose an inspector of your firm.' };
    }
    const inspectionId = uuidv7();
    const number = await nextNumber(tx, actor.firmId);
    const people = partiesOf(input);
    const { address, timeZone, stateProfile, yearBuilt, wiringMethod, occupied, utilitiesOn } = input;
    await tx.insert(inspections).values({
      firmId: actor.firmId,
      id: inspectionId,
      number,
      address,
      searchText: searchText(number, address, people),
      timeZone,
      stateProfile,
      scheduledAt: sql`${input.scheduledLocal}::timestamp at time zone ${timeZone}`,
      yearBuilt,
      wiringMethod,
      occupied,
      utilitiesOn,
      nextOrder: 2,
      version: 1,
    });
    const key = { firmId: actor.firmId, inspectionId };
    await tx.insert(parties).values(people.map((party) => ({ ...key, id: uuidv7(), ...party })));
    await tx
      .insert(inspectionInspectors)
      .values({ ...key, id: uuidv7(), membershipId: input.leadMembershipId, leads: true });
    await tx.insert(visits).values({ ...key, id: uuidv7(), kind: 'first', startedAt: new Date(), order: 1 });
    await tx.insert(structures).values({ ...key, id: uuidv7(), ...STRUCTURE_DEFAULTS, version: 1 });
    await recordAudit(tx, inspectionId, 'inspection.booked', { number, lead: input.leadMembershipId });
    return { kind: 'created', inspectionId, number };
  });
}

function bookingRefusal(actor: MemberActor, input: NewInspection): string | null {
  const forOneself = holds(actor, 'inspector') && input.leadMembershipId === actor.membershipId;
  if (!holds(actor, 'owner', 'office') && !forOneself) return 'Ask your office to book for another inspector.';
  if (!isTimeZone(input.timeZone)) return 'Choose the time zone of the house from the list.';
  if (!isWallTime(input.scheduledLocal)) return 'Check the day of the visit: the calendar has no such day.';
  return null;
}

async function nextNumber(tx: Transaction, firmId: string): Promise<number> {
  const [row] = await tx
    .update(firms)
    .set({ nextInspectionNumber: sql`${firms.nextInspectionNumber} + 1` })
    .where(eq(firms.id, firmId))
    .returning({ next: firms.nextInspectionNumber });
  if (!row) throw new Error(`firm ${firmId} gave no inspection number`);
  return row.next - 1;
}

type NewParty = Pick<typeof parties.$inferInsert, 'kind' | 'name' | 'email' | 'phone'>;

function partiesOf(input: NewInspection): NewParty[] {
  const { buyerName, buyerEmail, buyerPhone, agentName, agentEmail } = input;
  const people: NewParty[] = [{ kind: 'buyer', name: buyerName, email: buyerEmail || null, phone: buyerPhone || null }];
  if (agentName || agentEmail) {
    people.push({ kind: 'agent', name: agentName || agentEmail, email: agentEmail || null });
  }
  return people;
}

const PAGE_SIZE = 25;
export type ListOutcome = { kind: 'page'; page: InspectionPage } | { kind: 'unknown-cursor' };

/** One page of the inspections that the actor may see. `limit` is in rows, 100 at most. */
export async function listInspections(
  actor: MemberActor,
  filter: InspectionFilter,
  limit = PAGE_SIZE,
): Promise<ListOutcome> {
  const after = filter.cursor === undefined ? undefined : readCursor(filter.cursor, filter.sort);
  if (after === null) return { kind: 'unknown-cursor' };
  const size = Math.min(Math.max(limit, 1), 100);
  const rows = await withActor(actor, (tx) => listRows(tx, actor, filter, after, size + 1));
  const shown = rows.slice(0, size);
  const last = rows.length > size ? shown.at(-1) : undefined;
  const nextCursor = last && writeCursor(filter.sort, last.cursor);
  return { kind: 'page', page: { items: shown.map((row) => row.item), ...(nextCursor ? { nextCursor } : {}) } };
}

/** One inspection with its people, for the desk, or null: not there, or not the actor's. Of a released one, a recipient too. */
export async function findInspection(actor: Actor, inspectionId: string) {
  return withActor(actor, async (tx) => {
    const [row] = await tx
      .select()
      .from(inspections)
      .where(and(eq(inspections.id, inspectionId), inspectionsVisibleTo(actor)));
    if (!row) return null;
    const { searchText: _text, searchWords: _words, writers: _writers, nextOrder: _order, ...inspection } = row;
    const of = (table: typeof parties | typeof inspectionInspectors) =>
      and(eq(table.firmId, row.firmId), eq(table.inspectionId, row.id));
    const people = await tx
      .select({ id: parties.id, kind: parties.kind, name: parties.name, email: parties.email, phone: parties.phone })
      .from(parties)
      .where(and(of(parties), isNull(parties.deletedAt)))
      .orderBy(asc(parties.createdAt), asc(parties.id));
    const inspectors = await tx
      .select({
        membershipId: memberships.id,
        name: users.name,
        leads: inspectionInspectors.leads,
        licenseNumber: memberships.licenseNumber,
      })
      .from(inspectionInspectors)
      .innerJoin(
        memberships,
        and(eq(memberships.firmId, inspectionInspectors.firmId), eq(memberships.id, inspectionInspectors.membershipId)),
      )
      .innerJoin(users, eq(users.id, memberships.userId))
      .where(of(inspectionInspectors));
    return { ...inspection, addressLine: addressLine(row.address), parties: people, inspectors };
  });
}
export type InspectionDetail = NonNullable<Awaited<ReturnType<typeof findInspection>>>;

/** What a phone needs to work on an inspection, all of one moment, or null. `clientId` is the browser that asks. */
export async function loadWalk(
  actor: MemberActor,
  inspectionId: string,
  clientId?: string,
): Promise<WalkAnswer | null> {
  const read = async (tx: Transaction): Promise<WalkAnswer | null> => {
    const state = await readState(tx, actor, inspectionId);
    if (!state) return null;
    const { userId, membershipId, name } = actor;
    const lastMutation = clientId === undefined ? 0 : await lastOf(tx, actor, clientId);
    return { state, me: { userId, membershipId, name }, lastMutation };
  };
  return withActor(actor, read, ONE_MOMENT);
}

/** The engine's facts of an inspection, or null where the actor may not see it. With `visitId`, readings of that visit. */
export async function loadInspectionFacts(
  actor: MemberActor,
  inspectionId: string,
  visitId?: string,
): Promise<InspectionFacts | null> {
  const state = await withActor(actor, (tx) => readState(tx, actor, inspectionId), ONE_MOMENT);
  if (!state) return null;
  if (visitId === undefined) return inspectionFacts(state);
  return inspectionFacts({ ...state, readings: state.readings.filter((reading) => reading.visitId === visitId) });
}

async function readState(tx: Transaction, actor: MemberActor, inspectionId: string) {
  const [row] = await tx
    .select()
    .from(inspections)
    .where(and(eq(inspections.id, inspectionId), inspectionsVisibleTo(actor)));
  return row ? walkState(tx, row) : null;
}

async function lastOf(tx: Transaction, actor: MemberActor, clientId: string): Promise<number> {
  const [client] = await tx
    .select({ last: syncClients.last })
    .from(syncClients)
    .where(
      and(eq(syncClients.firmId, actor.firmId), eq(syncClients.id, clientId), eq(syncClients.userId, actor.userId)),
    );
  return client?.last ?? 0;
}
