import 'server-only';
import { createHash } from 'node:crypto';
import { and, desc, eq } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import { canonicalJson, parseSnapshot, type ReportSnapshot } from '@/lib/schemas/snapshot';
import { snapshotChanges } from '@/lib/schemas/snapshot-changes';
import type { Actor, MemberActor } from './actor';
import { recordAudit } from './audit';
import { enqueueJob } from './jobs';
import { lockInspection, type LockedInspection } from './operations/context';
import { decideFindings, type DecidedFinding } from './report-findings';
import { reviewSources, type ReviewCode, type ReviewLine } from './report-review';
import { buildSnapshot, type Release } from './report-snapshot';
import { loadReportSources, type ReportSources } from './report-sources';
import { inspections, renders, reportFiles, reportVersions } from './schema';
import { holds, inspectionsVisibleTo } from './scope';
import { ONE_MOMENT, withActor, type Transaction } from './with-actor';

export type Review = {
  /** What holds the release; empty where nothing does. */
  lines: ReviewLine[];
  /** Every finding of the facts, gravest first, with its decision. */
  findings: DecidedFinding[];
  /** The report as it would be released now. */
  draft: ReportSnapshot;
  signer: { name: string; licenseNumber: string | null };
  nextNumber: number;
  /** What a new version would change; null where none was released yet. */
  changes: string[] | null;
};

/** What holds the release of an inspection, and what would be released. Null where the actor may not see it. */
export async function reviewInspection(actor: MemberActor, inspectionId: string): Promise<Review | null> {
  return withActor(
    actor,
    async (tx) => {
      const [inspection] = await tx
        .select()
        .from(inspections)
        .where(and(eq(inspections.id, inspectionId), inspectionsVisibleTo(actor)));
      if (!inspection) return null;
      const sources = await loadReportSources(tx, actor, inspection);
      const { lines, draft, changes } = review(sources, releaseOf(sources, new Date(), {}));
      const { signer, previous } = sources;
      return {
        lines,
        findings: decideFindings(sources),
        draft,
        signer: { name: signer.signatureName ?? '', licenseNumber: signer.licenseNumber },
        nextNumber: (previous?.number ?? 0) + 1,
        changes,
      };
    },
    ONE_MOMENT,
  );
}

function review(sources: ReportSources, release: Release) {
  const draft = buildSnapshot(sources, release);
  const changes = sources.previous ? snapshotChanges(parseSnapshot(sources.previous.snapshot), draft) : null;
  return { draft, changes, lines: reviewSources(sources, decideFindings(sources), draft) };
}

export type ReleaseRequest = {
  /** Why a later version is made; needed from version 2 on. */
  reason?: string;
  /** Reasons to release although something holds it, by code. Counts for lines that may be overridden. */
  overrides?: Partial<Record<ReviewCode, string>>;
};
export type ReleaseOutcome =
  | { kind: 'released'; reportVersionId: string; number: number }
  | { kind: 'held'; lines: ReviewLine[] }
  | { kind: 'nothing-changed'; number: number }
  | { kind: 'reason-needed'; number: number }
  | { kind: 'not-allowed' }
  | { kind: 'not-found' };

/**
 * Releases the report: reviews again under the inspection's lock, freezes the snapshot, numbers it, and asks for its
 * PDF, all in one transaction. Two releases at one moment take different numbers, or the later one finds nothing changed.
 */
export async function releaseReport(
  actor: MemberActor,
  inspectionId: string,
  request: ReleaseRequest = {},
): Promise<ReleaseOutcome> {
  if (!holds(actor, 'inspector')) return { kind: 'not-allowed' };
  return withActor(actor, async (tx) => {
    const inspection = await lockInspection(tx, actor, inspectionId);
    if (!inspection) return { kind: 'not-found' };
    const sources = await loadReportSources(tx, actor, inspection);
    const release = releaseOf(sources, new Date(), request);
    const { lines, draft, changes } = review(sources, release);

    const holding = lines.filter((line) => !line.overridable || !request.overrides?.[line.code]?.trim());
    if (holding.length > 0) return { kind: 'held', lines: holding };
    if (changes?.length === 0) return { kind: 'nothing-changed', number: release.number - 1 };
    if (sources.previous && !release.reason) return { kind: 'reason-needed', number: release.number };

    const snapshot: ReportSnapshot = {
      ...draft,
      changes: changes ?? [],
      overrides: lines.map(({ code, says }) => ({ code, says, reason: request.overrides?.[code] ?? '' })),
    };
    await storeVersion(tx, actor, inspection, snapshot);
    return { kind: 'released', reportVersionId: release.reportVersionId, number: release.number };
  });
}

function releaseOf({ previous }: ReportSources, now: Date, { reason }: ReleaseRequest): Release {
  return {
    reportVersionId: uuidv7(),
    number: (previous?.number ?? 0) + 1,
    releasedAt: now.toISOString(),
    ...(reason?.trim() ? { reason: reason.trim() } : {}),
    overrides: [],
  };
}

async function storeVersion(
  tx: Transaction,
  actor: MemberActor,
  inspection: LockedInspection,
  snapshot: ReportSnapshot,
): Promise<void> {
  const { firmId } = actor;
  const { reportVersionId, number, reason, changes } = snapshot;
  const releasedAt = new Date(snapshot.releasedAt);
  const text = canonicalJson(snapshot);
  const sha256 = createHash('sha256').update(text).digest('hex');
  await tx.insert(reportVersions).values({
    firmId,
    id: reportVersionId,
    inspectionId: inspection.id,
    number,
    snapshot: text,
    sha256,
    supersedes: snapshot.supersedes?.id,
    reason,
    changes,
    signedBy: actor.membershipId,
    releasedAt,
  });
  await tx.insert(renders).values({ firmId, id: uuidv7(), reportVersionId, locale: 'en' });
  await tx
    .update(inspections)
    .set({ state: 'released', releasedAt, version: inspection.version + 1 })
    .where(and(eq(inspections.firmId, firmId), eq(inspections.id, inspection.id)));
  await enqueueRender(tx, firmId, reportVersionId);
  await recordAudit(tx, inspection.id, 'report.released', { reportVersionId, number, sha256 });
}

export async function enqueueRender(tx: Transaction, firmId: string, reportVersionId: string): Promise<void> {
  const payload = { firmId, reportVersionId, locale: 'en' } as const;
  await enqueueJob(tx, 'render-report', payload, { key: `render:${reportVersionId}:en` });
}

export type VersionListItem = {
  id: string;
  number: number;
  sha256: string;
  releasedAt: string;
  reason: string | null;
  changes: string[];
  render: { state: 'waiting' | 'rendering' | 'ready' | 'failed'; failure: string | null };
  file: { pages: number; bytes: number; sha256: string } | null;
};

/** The released versions of an inspection, newest first, each with where its PDF stands. */
export async function listVersions(actor: Actor, inspectionId: string): Promise<VersionListItem[]> {
  const rows = await withActor(actor, (tx) =>
    tx
      .select({ version: VERSION_LINE, render: renders, file: reportFiles })
      .from(reportVersions)
      .innerJoin(inspections, ofVersion())
      .leftJoin(renders, and(eq(renders.firmId, reportVersions.firmId), eq(renders.reportVersionId, reportVersions.id)))
      .leftJoin(
        reportFiles,
        and(eq(reportFiles.firmId, reportVersions.firmId), eq(reportFiles.reportVersionId, reportVersions.id)),
      )
      .where(and(eq(reportVersions.inspectionId, inspectionId), inspectionsVisibleTo(actor)))
      .orderBy(desc(reportVersions.number)),
  );
  return rows.map(({ version, render, file }) => ({
    ...version,
    releasedAt: version.releasedAt.toISOString(),
    render: { state: render?.state ?? 'waiting', failure: render?.failure ?? null },
    file: file && { pages: file.pages, bytes: file.bytes, sha256: file.sha256 },
  }));
}

const VERSION_LINE = {
  id: reportVersions.id,
  number: reportVersions.number,
  sha256: reportVersions.sha256,
  releasedAt: reportVersions.releasedAt,
  reason: reportVersions.reason,
  changes: reportVersions.changes,
};

function ofVersion() {
  return and(eq(inspections.firmId, reportVersions.firmId), eq(inspections.id, reportVersions.inspectionId));
}

export type Version = { id: string; inspectionId: string; sha256: string; snapshot: ReportSnapshot; newest: number };

/** One released version, or null: not there, or not the actor's. `newest` is the number of the last one. */
export async function findVersion(actor: Actor, reportVersionId: string): Promise<Version | null> {
  return withActor(actor, async (tx) => {
    const [row] = await tx
      .select({
        id: reportVersions.id,
        inspectionId: reportVersions.inspectionId,
        sha256: reportVersions.sha256,
        snapshot: reportVersions.snapshot,
      })
      .from(reportVersions)
      .innerJoin(inspections, ofVersion())
      .where(and(eq(reportVersions.id, reportVersionId), inspectionsVisibleTo(actor)));
    if (!row) return null;
    const [last] = await tx
      .select({ number: reportVersions.number })
      .from(reportVersions)
      .where(eq(reportVersions.inspectionId, row.inspectionId))
      .orderBy(desc(reportVersions.number))
      .limit(1);
    return { ...row, snapshot: parseSnapshot(row.snapshot), newest: last?.number ?? 0 };
  });
}

/** The newest released version of an inspection, or null. */
export async function findNewestVersion(actor: Actor, inspectionId: string): Promise<Version | null> {
  const [newest] = await listVersions(actor, inspectionId);
  return newest ? findVersion(actor, newest.id) : null;
}
