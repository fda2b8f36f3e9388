import 'server-only';
import { and, asc, eq, isNull } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import type { MemberActor } from './actor';
import { recordAudit } from './audit';
import { lockInspection, type LockedInspection } from './operations/context';
import { inspections, parties } from './schema';
import { searchText } from './search-words';
import { inspectionsVisibleTo } from './scope';
import { withActor, type Transaction } from './with-actor';

export type Party = {
  id: string;
  kind: (typeof parties.$inferSelect)['kind'];
  name: string;
  email: string | null;
  phone: string | null;
};

/** Who takes part in an inspection, in the order of entry; empty where the actor may not see it. */
export async function listParties(actor: MemberActor, inspectionId: string): Promise<Party[]> {
  return withActor(actor, (tx) =>
    tx
      .select({ id: parties.id, kind: parties.kind, name: parties.name, email: parties.email, phone: parties.phone })
      .from(parties)
      .innerJoin(inspections, and(eq(inspections.firmId, parties.firmId), eq(inspections.id, parties.inspectionId)))
      .where(and(eq(parties.inspectionId, inspectionId), isNull(parties.deletedAt), inspectionsVisibleTo(actor)))
      .orderBy(asc(parties.createdAt), asc(parties.id)),
  );
}

export type SavePartyOutcome = { kind: 'saved'; partyId: string } | { kind: 'not-found' };

/** Adds a party, or with `id` corrects one. */
export async function saveParty(
  actor: MemberActor,
  inspectionId: string,
  party: Omit<Party, 'id'> & { id?: string },
): Promise<SavePartyOutcome> {
  return withActor(actor, async (tx) => {
    const inspection = await lockInspection(tx, actor, inspectionId);
    if (!inspection) return { kind: 'not-found' };
    const { id: partyId = uuidv7(), kind, name, email, phone } = party;
    if (party.id === undefined) {
      const key = { firmId: actor.firmId, inspectionId, id: partyId };
      await tx.insert(parties).values({ ...key, kind, name, email, phone });
    } else {
      const changed = await tx
        .update(parties)
        .set({ kind, name, email, phone })
        .where(standing(inspection, partyId))
        .returning({ id: parties.id });
      if (changed.length === 0) return { kind: 'not-found' };
    }
    await refreshSearch(tx, inspection);
    await recordAudit(tx, inspectionId, 'party.saved', { id: partyId, kind });
    return { kind: 'saved', partyId };
  });
}

/** Takes a party out; what was sent to them stays on record. */
export async function removeParty(
  actor: MemberActor,
  inspectionId: string,
  partyId: string,
): Promise<SavePartyOutcome> {
  return withActor(actor, async (tx) => {
    const inspection = await lockInspection(tx, actor, inspectionId);
    if (!inspection) return { kind: 'not-found' };
    const removed = await tx
      .update(parties)
      .set({ deletedAt: new Date() })
      .where(standing(inspection, partyId))
      .returning({ id: parties.id });
    if (removed.length === 0) return { kind: 'not-found' };
    await refreshSearch(tx, inspection);
    await recordAudit(tx, inspectionId, 'party.removed', { id: partyId });
    return { kind: 'saved', partyId };
  });
}

function standing(inspection: LockedInspection, partyId: string) {
  return and(
    eq(parties.firmId, inspection.firmId),
    eq(parties.inspectionId, inspection.id),
    eq(parties.id, partyId),
    isNull(parties.deletedAt),
  );
}

async function refreshSearch(tx: Transaction, { firmId, id, number, address }: LockedInspection): Promise<void> {
  const people = await tx
    .select({ name: parties.name })
    .from(parties)
    .where(and(eq(parties.firmId, firmId), eq(parties.inspectionId, id), isNull(parties.deletedAt)));
  await tx
    .update(inspections)
    .set({ searchText: searchText(number, address, people) })
    .where(and(eq(inspections.firmId, firmId), eq(inspections.id, id)));
}
