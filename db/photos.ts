import 'server-only';
import { and, asc, eq, isNull } from 'drizzle-orm';
import type { Actor, MemberActor, SystemActor } from './actor';
import { recordAudit } from './audit';
import { lockInspection } from './operations/context';
import { inspections, photos } from './schema';
import { holds, inspectionsVisibleTo } from './scope';
import { withActor, type Transaction } from './with-actor';

const SHOWN = {
  firmId: photos.firmId,
  id: photos.id,
  inspectionId: photos.inspectionId,
  receptacleId: photos.receptacleId,
  areaId: photos.areaId,
  circuitId: photos.circuitId,
  caption: photos.caption,
  order: photos.order,
  state: photos.state,
  refusal: photos.refusal,
  type: photos.type,
  /** Of the original, as announced; in bytes. */
  bytes: photos.bytes,
  sha256: photos.sha256,
  sha256Of1600: photos.sha256Of1600,
  sha256Of480: photos.sha256Of480,
  width: photos.width,
  height: photos.height,
  takenAt: photos.takenAt,
  revisions: photos.revisions,
};

/**
 * A photo that stands, or null: not there, deleted, or not the actor's. A recipient finds those of a released version
 * only; the caller gives a recipient the shared copies, never the original.
 */
export async function findPhoto(actor: Actor, photoId: string) {
  const [photo] = await withActor(actor, (tx) =>
    tx
      .select(SHOWN)
      .from(photos)
      .innerJoin(inspections, and(eq(inspections.firmId, photos.firmId), eq(inspections.id, photos.inspectionId)))
      .where(and(eq(photos.id, photoId), standsFor(actor), inspectionsVisibleTo(actor))),
  );
  return photo ?? null;
}
export type Photo = NonNullable<Awaited<ReturnType<typeof findPhoto>>>;

/** A photo deleted after a release is still in the version that was released. */
function standsFor(actor: Actor) {
  return actor.kind === 'recipient' ? eq(photos.state, 'stored') : isNull(photos.deletedAt);
}

/** The photos of an inspection that stand, in their order; empty where the actor may not see it. */
export async function listPhotos(actor: MemberActor | SystemActor, inspectionId: string): Promise<Photo[]> {
  return withActor(actor, (tx) =>
    tx
      .select(SHOWN)
      .from(photos)
      .innerJoin(inspections, and(eq(inspections.firmId, photos.firmId), eq(inspections.id, photos.inspectionId)))
      .where(and(eq(photos.inspectionId, inspectionId), isNull(photos.deletedAt), inspectionsVisibleTo(actor)))
      .orderBy(asc(photos.order), asc(photos.id)),
  );
}

/** What was made of the bytes. Sizes in pixels of the upright picture; hashes as hex SHA-256 of the shared copies. */
export type StoredPhoto = {
  /** Of the original that arrived: it must be the one that was announced. */
  sha256: string;
  width: number;
  height: number;
  sha256Of1600: string;
  sha256Of480: string;
  takenAt?: Date;
};
export type RecordPhotoOutcome = { kind: 'recorded' } | { kind: 'other-bytes' } | { kind: 'not-found' };

/** Says that a photo's bytes are stored. Saying it twice changes nothing; other bytes than announced are refused. */
export async function recordStored(
  actor: MemberActor | SystemActor,
  photoId: string,
  stored: StoredPhoto,
): Promise<RecordPhotoOutcome> {
  return changePhoto(actor, photoId, async (tx, photo, version) => {
    if (photo.sha256 !== stored.sha256) return { kind: 'other-bytes' };
    if (photo.state === 'stored') return { kind: 'recorded' };
    const { width, height, sha256Of1600, sha256Of480, takenAt = photo.takenAt } = stored;
    const made = { width, height, sha256Of1600, sha256Of480, takenAt };
    await write(tx, photo, version, { ...made, state: 'stored', refusal: null, storedAt: new Date() });
    await recordAudit(tx, photo.inspectionId, 'photo.stored', { id: photo.id, sha256: photo.sha256 });
    return { kind: 'recorded' };
  });
}

/** Says why a photo's bytes could not be taken, for the person who took it. A stored photo stays stored. */
export async function recordRefused(
  actor: MemberActor | SystemActor,
  photoId: string,
  refusal: string,
): Promise<RecordPhotoOutcome> {
  return changePhoto(actor, photoId, async (tx, photo, version) => {
    if (photo.state === 'stored') return { kind: 'recorded' };
    await write(tx, photo, version, { state: 'refused', refusal });
    await recordAudit(tx, photo.inspectionId, 'photo.refused', { id: photo.id, refusal });
    return { kind: 'recorded' };
  });
}

type Change = (tx: Transaction, photo: PhotoRow, version: number) => Promise<RecordPhotoOutcome>;

/** Changes a photo under its inspection's lock; a change raises the inspection's version so that phones see it. */
async function changePhoto(
  actor: MemberActor | SystemActor,
  photoId: string,
  change: Change,
): Promise<RecordPhotoOutcome> {
  if (actor.kind === 'member' && !holds(actor, 'owner', 'inspector')) return { kind: 'not-found' };
  return withActor(actor, async (tx) => {
    const isPhoto = and(eq(photos.firmId, actor.firmId), eq(photos.id, photoId));
    const [found] = await tx.select({ inspectionId: photos.inspectionId }).from(photos).where(isPhoto);
    const inspection = found && (await lockInspection(tx, actor, found.inspectionId));
    if (!inspection) return { kind: 'not-found' };
    const [photo] = await tx.select().from(photos).where(isPhoto);
    if (!photo) return { kind: 'not-found' };
    return change(tx, photo, inspection.version + 1);
  });
}

type PhotoRow = typeof photos.$inferSelect;

async function write(
  tx: Transaction,
  { firmId, id, inspectionId }: PhotoRow,
  version: number,
  fields: Partial<PhotoRow>,
) {
  await tx
    .update(photos)
    .set({ ...fields, version })
    .where(and(eq(photos.firmId, firmId), eq(photos.id, id)));
  await tx
    .update(inspections)
    .set({ version })
    .where(and(eq(inspections.firmId, firmId), eq(inspections.id, inspectionId)));
}
