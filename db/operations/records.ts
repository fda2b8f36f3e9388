import 'server-only';
import { and, eq, inArray, isNull } from 'drizzle-orm';
import { isDeepStrictEqual } from 'node:util';
import { decisions, notices, photos, readings, skips, visits } from '../schema';
import { holds } from '../scope';
import { refuse, takeOrder, type Context, type OperationOf } from './context';
import { checkReferences, keepChainStanding } from './references';
import { findRow, insertRow, raiseContents, requireRow } from './tracked';

const MOST_PHOTOS = 400;

const keyOf = (context: Context, id: string) => ({
  firmId: context.actor.firmId,
  id,
  inspectionId: context.inspection.id,
});
const whoAndWhen = (context: Context) => ({
  membershipId: context.actor.membershipId,
  recordedAt: new Date(context.capturedAt),
  version: context.version,
});

/** Recorded already: the same thing again is no news, another thing under its id is refused. */
function sameOrRefuse(context: Context, same: boolean): void {
  if (!same) refuse('Something else was recorded under this number. Record it once more.');
  context.merged = true;
  context.unchanged = true;
}

export async function addVisit(context: Context, op: OperationOf<'visit.add'>): Promise<void> {
  const [existing] = await context.tx
    .select()
    .from(visits)
    .where(one(visits, context, op.id));
  if (existing) return sameOrRefuse(context, existing.kind === op.kind);
  await context.tx.insert(visits).values({
    ...keyOf(context, op.id),
    kind: op.kind,
    startedAt: new Date(op.capturedAt),
    order: takeOrder(context),
  });
}

export async function addReading(context: Context, op: OperationOf<'reading.add'>): Promise<void> {
  const [existing] = await context.tx
    .select()
    .from(readings)
    .where(one(readings, context, op.id));
  if (existing) {
    const { kind, evidence, receptacleId, circuitId } = existing;
    const place = receptacleId === (op.receptacleId ?? null) && circuitId === (op.circuitId ?? null);
    return sameOrRefuse(context, place && isDeepStrictEqual({ kind, evidence }, { ...op.reading }));
  }
  const [visit] = await context.tx
    .select({ id: visits.id })
    .from(visits)
    .where(one(visits, context, op.visitId));
  if (!visit) refuse('The visit of this reading is not in this inspection. Load the inspection again.');
  if (op.supersedes !== undefined) await checkSuperseded(context, op, op.supersedes);
  await recordedIn(context, op);
  await context.tx.insert(readings).values({
    ...keyOf(context, op.id),
    visitId: op.visitId,
    receptacleId: op.receptacleId,
    circuitId: op.circuitId,
    kind: op.reading.kind,
    evidence: op.reading.evidence,
    supersedes: op.supersedes,
    order: takeOrder(context),
    ...whoAndWhen(context),
  });
}

async function checkSuperseded(context: Context, op: OperationOf<'reading.add'>, earlierId: string): Promise<void> {
  const [earlier] = await context.tx
    .select()
    .from(readings)
    .where(one(readings, context, earlierId));
  if (!earlier) refuse('The reading that this one corrects is not in this inspection.');
  const samePlace = earlier.receptacleId === (op.receptacleId ?? null) && earlier.circuitId === (op.circuitId ?? null);
  if (!samePlace || earlier.kind !== op.reading.kind) {
    refuse('A correction belongs to the same receptacle and the same kind of reading. Record a new reading instead.');
  }
}

/** Takes a reading back. Its own inspector may, and the firm's owner; the row stays. */
export async function withdrawReading(context: Context, op: OperationOf<'reading.withdraw'>): Promise<void> {
  const [reading] = await context.tx
    .select()
    .from(readings)
    .where(one(readings, context, op.id));
  if (!reading) refuse('This reading is not in this inspection. Load the inspection again.');
  if (reading.withdrawnAt) return sameOrRefuse(context, true);
  if (reading.membershipId !== context.actor.membershipId && !holds(context.actor, 'owner')) {
    refuse('Another inspector took this reading. Record your own beside it; a conflict between the two is shown.');
  }
  await context.tx
    .update(readings)
    .set({ withdrawnAt: new Date(), version: context.version })
    .where(and(one(readings, context, op.id), isNull(readings.withdrawnAt)));
  await recordedIn(context, { receptacleId: reading.receptacleId ?? undefined });
}

export async function addSkip(context: Context, op: OperationOf<'skip.add'>): Promise<void> {
  const [existing] = await context.tx
    .select()
    .from(skips)
    .where(one(skips, context, op.id));
  if (existing) return sameOrRefuse(context, existing.reason === op.reason);
  if ((op.receptacleId === undefined) === (op.areaId === undefined)) {
    refuse('Say which receptacle, or which area, was not tested.');
  }
  await recordedIn(context, op);
  const { receptacleId, areaId, reason, note } = op;
  await context.tx
    .insert(skips)
    .values({ ...keyOf(context, op.id), receptacleId, areaId, reason, note, ...whoAndWhen(context) });
}

export async function removeSkip(context: Context, op: OperationOf<'skip.remove'>): Promise<void> {
  const [skip] = await context.tx
    .select()
    .from(skips)
    .where(one(skips, context, op.id));
  if (!skip) refuse('This note is not in this inspection. Load the inspection again.');
  if (skip.deletedAt) return sameOrRefuse(context, true);
  await context.tx
    .update(skips)
    .set({ deletedAt: new Date(), version: context.version })
    .where(one(skips, context, op.id));
}

export async function addNotice(context: Context, op: OperationOf<'notice.add'>): Promise<void> {
  const [existing] = await context.tx
    .select()
    .from(notices)
    .where(one(notices, context, op.id));
  if (existing) return sameOrRefuse(context, existing.kind === op.kind && existing.whom === (op.whom ?? null));
  if (op.readingId !== undefined) {
    const [reading] = await context.tx
      .select()
      .from(readings)
      .where(one(readings, context, op.readingId));
    if (!reading) refuse('The reading of this note is not in this inspection. Load the inspection again.');
  }
  await recordedIn(context, op);
  const { kind, receptacleId, circuitId, readingId, whom, note } = op;
  await context.tx.insert(notices).values({
    ...keyOf(context, op.id),
    kind,
    receptacleId,
    circuitId,
    readingId,
    whom,
    note,
    order: takeOrder(context),
    ...whoAndWhen(context),
  });
}

/** Announces a photo; its bytes follow in pieces of their own. */
export async function addPhoto(context: Context, op: OperationOf<'photo.add'>): Promise<void> {
  const existing = await findRow(context, 'photo', op.id);
  if (existing) return sameOrRefuse(context, existing.sha256 === op.sha256);
  const standing = and(
    eq(photos.firmId, context.actor.firmId),
    eq(photos.inspectionId, context.inspection.id),
    isNull(photos.deletedAt),
  );
  if ((await context.tx.$count(photos, standing)) >= MOST_PHOTOS) {
    refuse(`This inspection has ${MOST_PHOTOS} photos, the most that it can hold. Delete some, then add this one.`);
  }
  await recordedIn(context, op);
  const { receptacleId, areaId, circuitId, sha256, bytes, type, caption = '', order } = op;
  await checkReferences(context, 'photo', op.id, { receptacleId, areaId, circuitId });
  await insertRow(context, 'photo', op.id, {
    receptacleId,
    areaId,
    circuitId,
    sha256,
    bytes,
    type,
    caption,
    order,
    takenAt: op.takenAt === undefined ? null : new Date(op.takenAt),
  });
}

export async function decideFinding(context: Context, op: OperationOf<'finding.decide'>): Promise<void> {
  const [existing] = await context.tx
    .select()
    .from(decisions)
    .where(one(decisions, context, op.id));
  if (existing) return sameOrRefuse(context, existing.findingId === op.findingId && existing.decision === op.decision);
  if (op.decision === 'dismissed' && !op.reason) refuse('Say why this finding is dismissed.');
  const sawReadingIds = [...new Set(op.sawReadingIds)];
  const known = and(
    eq(readings.firmId, context.actor.firmId),
    eq(readings.inspectionId, context.inspection.id),
    inArray(readings.id, sawReadingIds),
  );
  if (sawReadingIds.length > 0 && (await context.tx.$count(readings, known)) !== sawReadingIds.length) {
    refuse('This decision rests on readings that are not in this inspection. Open the finding again and decide.');
  }
  const { findingId, decision, reason, ownWords, raisedSignal } = op;
  await context.tx.insert(decisions).values({
    ...keyOf(context, op.id),
    findingId,
    decision,
    reason,
    ownWords,
    raisedSignal,
    sawReadingIds,
    order: takeOrder(context),
    ...whoAndWhen(context),
  });
}

type Place = { receptacleId?: string; areaId?: string; circuitId?: string };

/** Refuses a place outside this inspection, brings a deleted one back, and numbers what was recorded in it. */
async function recordedIn(context: Context, { receptacleId, areaId, circuitId }: Place): Promise<void> {
  if (circuitId !== undefined) await keepChainStanding(context, 'circuit', circuitId);
  let area = areaId;
  if (receptacleId !== undefined) {
    await keepChainStanding(context, 'receptacle', receptacleId);
    const row = await requireRow(context, 'receptacle', receptacleId);
    await raiseContents(context, 'receptacle', row);
    area = String(row.areaId);
  }
  if (area === undefined) return;
  await keepChainStanding(context, 'area', area);
  await raiseContents(context, 'area', await requireRow(context, 'area', area));
}

type RecordTable = typeof visits | typeof readings | typeof skips | typeof notices | typeof decisions;

function one(table: RecordTable, context: Context, id: string) {
  return and(eq(table.firmId, context.actor.firmId), eq(table.inspectionId, context.inspection.id), eq(table.id, id));
}
