import 'server-only';
import { and, asc, desc, eq, isNull } from 'drizzle-orm';
import { evaluateInspection } from '@/lib/findings';
import type { Evaluation } from '@/lib/findings/evaluate';
import type { InspectionFacts } from '@/lib/findings/facts';
import { inspectionFacts } from '@/lib/schemas/inspection-facts';
import type { WalkState } from '@/lib/schemas/walk';
import type { MemberActor } from './actor';
import type { LockedInspection } from './operations/context';
import { firms, inspectionInspectors, memberships, parties, photos, reportVersions, users } from './schema';
import { walkState } from './walk-rows';
import type { Transaction } from './with-actor';

export type Signer = {
  membershipId: string;
  name: string;
  signatureName: string | null;
  signatureKey: string | null;
  licenseNumber: string | null;
  licenseState: string | null;
};

/** Everything that a review looks at and a snapshot freezes, read in one transaction. */
export type ReportSources = {
  inspection: LockedInspection;
  firm: typeof firms.$inferSelect;
  state: WalkState;
  facts: InspectionFacts;
  evaluation: Evaluation;
  parties: { kind: (typeof parties.$inferSelect)['kind']; name: string; email: string | null; phone: string | null }[];
  inspectors: (Signer & { leads: boolean })[];
  /** Who would sign: the actor. */
  signer: Signer;
  /** Photos that stand, in their order. */
  photos: (typeof photos.$inferSelect)[];
  previous: { id: string; number: number; sha256: string; snapshot: string } | null;
};

/** Reads the sources of an inspection that the caller may see. With the row locked, nothing changes until the end. */
export async function loadReportSources(
  tx: Transaction,
  actor: MemberActor,
  inspection: LockedInspection,
): Promise<ReportSources> {
  const state = await walkState(tx, inspection);
  const facts = inspectionFacts(state);
  const people = await loadInspectors(tx, inspection);
  return {
    inspection,
    firm: await loadFirmRow(tx, actor.firmId),
    state,
    facts,
    evaluation: evaluateInspection(facts),
    parties: await loadParties(tx, inspection),
    inspectors: people,
    signer: await loadSigner(tx, actor),
    photos: await loadPhotos(tx, inspection),
    previous: await loadPrevious(tx, inspection),
  };
}

async function loadFirmRow(tx: Transaction, firmId: string) {
  const [firm] = await tx.select().from(firms).where(eq(firms.id, firmId));
  if (!firm) throw new Error(`firm ${firmId} is not there`);
  return firm;
}

const SIGNER = {
  membershipId: memberships.id,
  name: users.name,
  signatureName: memberships.signatureName,
  signatureKey: memberships.signatureKey,
  licenseNumber: memberships.licenseNumber,
  licenseState: memberships.licenseState,
};

async function loadSigner(tx: Transaction, actor: MemberActor): Promise<Signer> {
  const [signer] = await tx
    .select(SIGNER)
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(memberships.firmId, actor.firmId), eq(memberships.id, actor.membershipId)));
  if (!signer) throw new Error('the actor has no membership in its firm');
  return signer;
}

/** Who leads comes first. */
async function loadInspectors(tx: Transaction, { firmId, id }: LockedInspection) {
  return tx
    .select({ ...SIGNER, leads: inspectionInspectors.leads })
    .from(inspectionInspectors)
    .innerJoin(
      memberships,
      and(eq(memberships.firmId, inspectionInspectors.firmId), eq(memberships.id, inspectionInspectors.membershipId)),
    )
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(inspectionInspectors.firmId, firmId), eq(inspectionInspectors.inspectionId, id)))
    .orderBy(desc(inspectionInspectors.leads), asc(inspectionInspectors.id));
}

async function loadParties(tx: Transaction, { firmId, id }: LockedInspection) {
  return tx
    .select({ kind: parties.kind, name: parties.name, email: parties.email, phone: parties.phone })
    .from(parties)
    .where(and(eq(parties.firmId, firmId), eq(parties.inspectionId, id), isNull(parties.deletedAt)))
    .orderBy(asc(parties.createdAt), asc(parties.id));
}

async function loadPhotos(tx: Transaction, { firmId, id }: LockedInspection) {
  return tx
    .select()
    .from(photos)
    .where(and(eq(photos.firmId, firmId), eq(photos.inspectionId, id), isNull(photos.deletedAt)))
    .orderBy(asc(photos.order), asc(photos.id));
}

async function loadPrevious(tx: Transaction, { firmId, id }: LockedInspection) {
  const [previous] = await tx
    .select({
      id: reportVersions.id,
      number: reportVersions.number,
      sha256: reportVersions.sha256,
      snapshot: reportVersions.snapshot,
    })
    .from(reportVersions)
    .where(and(eq(reportVersions.firmId, firmId), eq(reportVersions.inspectionId, id)))
    .orderBy(desc(reportVersions.number))
    .limit(1);
  return previous ?? null;
}
