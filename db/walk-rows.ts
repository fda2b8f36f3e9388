import 'server-only';
import { and, asc, desc, eq, isNull } from 'drizzle-orm';
import type { ReadingFacts } from '@/lib/findings/facts';
import type { WalkDecision, WalkPhoto, WalkReading, WalkState } from '@/lib/schemas/walk';
import {
  areas,
  circuits,
  conflicts,
  decisions,
  inspections,
  memberships,
  notices,
  panels,
  photos,
  readings,
  receptacles,
  skips,
  structures,
  users,
  visits,
  type Address,
} from './schema';
import type { Transaction } from './with-actor';

type InspectionRow = typeof inspections.$inferSelect;

/** Everything of one inspection, tombstones included, as the phone and the engine's facts take it. */
export async function walkState(tx: Transaction, inspection: InspectionRow): Promise<WalkState> {
  const { firmId, id } = inspection;
  const names = await memberNames(tx, firmId);
  const nameOf = (membershipId: string | null) => (membershipId && names.get(membershipId)) || 'The office';
  const [visit] = await tx
    .select({ id: visits.id })
    .from(visits)
    .where(and(eq(visits.firmId, firmId), eq(visits.inspectionId, id)))
    .orderBy(desc(visits.order))
    .limit(1);
  if (!visit) throw new Error(`inspection ${id} has no visit`);

  const circuitRows = await rowsOf(tx, circuits, inspection);
  const goneCircuits = new Set(circuitRows.filter((row) => row.deletedAt).map((row) => row.id));
  const standing = (circuitId: string | null) => (circuitId && goneCircuits.has(circuitId) ? null : circuitId);
  return {
    inspection: inspectionOf(inspection, visit.id),
    structures: (await rowsOf(tx, structures, inspection)).map(tracked),
    areas: (await rowsOf(tx, areas, inspection)).map(tracked),
    panels: (await rowsOf(tx, panels, inspection)).map((row) => ({
      ...tracked(row),
      fedFromCircuitId: standing(row.fedFromCircuitId),
    })),
    circuits: circuitRows.map((row) => ({ ...tracked(row), poles: row.poles === 2 ? 2 : 1 })),
    receptacles: (await rowsOf(tx, receptacles, inspection)).map((row) => ({
      ...tracked(row),
      circuitId: standing(row.circuitId),
    })),
    readings: (await ordered(tx, readings, inspection)).map((row) => readingOf(row, nameOf)),
    skips: (await rowsOf(tx, skips, inspection)).map(({ id: skipId, reason, deletedAt, ...row }) => ({
      id: skipId,
      reason,
      ...filled({ receptacleId: row.receptacleId, areaId: row.areaId, note: row.note }),
      deleted: deletedAt !== null,
    })),
    photos: (await rowsOf(tx, photos, inspection)).map(photoOf),
    notices: (await ordered(tx, notices, inspection)).map((row) => ({
      id: row.id,
      kind: row.kind,
      ...filled({ receptacleId: row.receptacleId, circuitId: row.circuitId, readingId: row.readingId }),
      ...filled({ whom: row.whom, note: row.note }),
      order: row.order,
      at: row.recordedAt.toISOString(),
    })),
    decisions: (await ordered(tx, decisions, inspection)).map((row) => decisionOf(row, nameOf)),
    conflicts: (await openConflicts(tx, inspection)).map((row) => ({
      id: row.id,
      entity: row.entity,
      entityId: row.entityId,
      field: row.field,
      theirs: row.theirs,
      yours: row.yours,
      by: nameOf(row.theirMembershipId),
      at: (row.theirCapturedAt ?? row.createdAt).toISOString(),
    })),
  };
}

type OfInspection =
  | typeof structures
  | typeof areas
  | typeof panels
  | typeof circuits
  | typeof receptacles
  | typeof skips
  | typeof photos
  | typeof conflicts;
type Ordered = typeof readings | typeof notices | typeof decisions;

/** Ids are made in the order of making, which is a steady order of rows. */
async function rowsOf<Table extends OfInspection>(tx: Transaction, table: Table, { firmId, id }: InspectionRow) {
  const rows = await tx
    .select()
    .from(table as OfInspection)
    .where(and(eq(table.firmId, firmId), eq(table.inspectionId, id)))
    .orderBy(asc(table.id));
  return rows as Table['$inferSelect'][];
}

async function ordered<Table extends Ordered>(tx: Transaction, table: Table, { firmId, id }: InspectionRow) {
  const rows = await tx
    .select()
    .from(table as Ordered)
    .where(and(eq(table.firmId, firmId), eq(table.inspectionId, id)))
    .orderBy(asc(table.order));
  return rows as Table['$inferSelect'][];
}

/** Conflicts that nobody has settled yet, oldest first. */
export function openConflicts(tx: Transaction, { firmId, id }: Pick<InspectionRow, 'firmId' | 'id'>) {
  return tx
    .select()
    .from(conflicts)
    .where(and(eq(conflicts.firmId, firmId), eq(conflicts.inspectionId, id), isNull(conflicts.resolvedAt)))
    .orderBy(asc(conflicts.id));
}

/** Names of the firm's people by membership, those who left included. */
export async function memberNames(tx: Transaction, firmId: string): Promise<Map<string, string>> {
  const rows = await tx
    .select({ id: memberships.id, name: users.name })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(eq(memberships.firmId, firmId));
  return new Map(rows.map((row) => [row.id, row.name]));
}

/** "41 Juniper Way, Unit 2, Fairview, OR 97000": the address in one line. */
export function addressLine({ street, unit, city, state, zip }: Address): string {
  return [street, unit, city, `${state} ${zip}`].filter(Boolean).join(', ');
}

function inspectionOf(row: InspectionRow, visitId: string): WalkState['inspection'] {
  return {
    id: row.id,
    number: row.number,
    state: row.state,
    version: row.version,
    revisions: row.revisions,
    address: addressLine(row.address),
    timeZone: row.timeZone,
    stateProfile: row.stateProfile,
    scheduledAt: row.scheduledAt.toISOString(),
    visitId,
    yearBuilt: row.yearBuilt,
    wiringMethod: row.wiringMethod,
    supply: row.supply,
    serviceAmps: row.serviceAmps,
    occupied: row.occupied,
    utilitiesOn: row.utilitiesOn,
    codeEdition: row.codeEdition,
    codeEditionSource: row.codeEditionSource,
    arrivalConfirmed: row.arrivalConfirmed,
    tripConfirmed: row.tripConfirmed,
    generalNote: row.generalNote,
  };
}

type Bookkeeping = { firmId: string; inspectionId: string; writers: unknown; createdAt: Date; deletedAt: Date | null };

function tracked<Row extends Bookkeeping>(row: Row) {
  const { firmId: _firm, inspectionId: _inspection, writers: _writers, createdAt: _made, deletedAt, ...rest } = row;
  return { ...rest, deleted: deletedAt !== null };
}

function readingOf(row: typeof readings.$inferSelect, nameOf: (id: string) => string): WalkReading {
  const { receptacleId, circuitId, supersedes } = row;
  const facts = {
    id: row.id,
    ...filled({ receptacleId, circuitId, supersedes }),
    kind: row.kind,
    evidence: row.evidence,
    order: row.order,
    by: nameOf(row.membershipId),
    recordedAt: row.recordedAt.toISOString(),
  } as ReadingFacts;
  return { ...facts, visitId: row.visitId, withdrawn: row.withdrawnAt !== null };
}

function photoOf(row: typeof photos.$inferSelect): WalkPhoto {
  const { receptacleId, areaId, circuitId, refusal } = row;
  return {
    id: row.id,
    ...filled({ receptacleId, areaId, circuitId, refusal }),
    caption: row.caption,
    order: row.order,
    state: row.state,
    sha256: row.sha256,
    revisions: row.revisions,
    deleted: row.deletedAt !== null,
  };
}

function decisionOf(row: typeof decisions.$inferSelect, nameOf: (id: string) => string): WalkDecision {
  return {
    id: row.id,
    findingId: row.findingId,
    decision: row.decision,
    ...filled({ reason: row.reason, ownWords: row.ownWords, raisedSignal: row.raisedSignal }),
    sawReadingIds: row.sawReadingIds,
    order: row.order,
    by: nameOf(row.membershipId),
    at: row.recordedAt.toISOString(),
  };
}

type Filled<Fields> = { [Name in keyof Fields]?: NonNullable<Fields[Name]> };

/** The fields that hold something. */
function filled<Fields extends Record<string, unknown>>(fields: Fields): Filled<Fields> {
  return Object.fromEntries(Object.entries(fields).filter(([, value]) => value !== null)) as Filled<Fields>;
}
