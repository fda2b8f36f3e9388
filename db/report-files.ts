import 'server-only';
import { and, eq, sql } from 'drizzle-orm';
import { v7 as uuidv7 } from 'uuid';
import type { Locale } from '@/lib/findings/vocabulary';
import type { Actor, MemberActor, SystemActor } from './actor';
import { recordAudit } from './audit';
import { enqueueRender } from './reports';
import { inspections, renders, reportFiles, reportVersions } from './schema';
import { holds, inspectionsVisibleTo } from './scope';
import { withActor } from './with-actor';

export type ReportFile = { key: string; bytes: number; sha256: string; number: number; street: string };

/** Where the PDF of a version stands in storage, or null: not there yet, or not the actor's. */
export async function findReportFile(
  actor: Actor,
  reportVersionId: string,
  locale: Locale,
): Promise<ReportFile | null> {
  const [file] = await withActor(actor, (tx) =>
    tx
      .select({
        key: reportFiles.key,
        bytes: reportFiles.bytes,
        sha256: reportFiles.sha256,
        number: reportVersions.number,
        street: sql<string>`${inspections.address} ->> 'street'`,
      })
      .from(reportFiles)
      .innerJoin(
        reportVersions,
        and(eq(reportVersions.firmId, reportFiles.firmId), eq(reportVersions.id, reportFiles.reportVersionId)),
      )
      .innerJoin(
        inspections,
        and(eq(inspections.firmId, reportVersions.firmId), eq(inspections.id, reportVersions.inspectionId)),
      )
      .where(
        and(
          eq(reportFiles.reportVersionId, reportVersionId),
          eq(reportFiles.locale, locale),
          inspectionsVisibleTo(actor),
        ),
      )
      .limit(1),
  );
  return file ?? null;
}

/** Says that the worker is at a version's PDF. False where the PDF is already there. */
export async function beginRender(actor: SystemActor, reportVersionId: string, locale: Locale): Promise<boolean> {
  return withActor(actor, async (tx) => {
    const [changed] = await tx
      .update(renders)
      .set({ state: 'rendering', attempts: sql`${renders.attempts} + 1`, updatedAt: sql`now()` })
      .where(and(isRender(actor, reportVersionId, locale), sql`${renders.state} <> 'ready'`))
      .returning({ id: renders.id });
    return changed !== undefined;
  });
}

export type NewReportFile = {
  reportVersionId: string;
  locale: Locale;
  renderer: string;
  key: string;
  bytes: number;
  pages: number;
  sha256: string;
};

/** Records a stored PDF, once per version, language and renderer. A second recording of it changes nothing. */
export async function recordReportFile(actor: SystemActor, file: NewReportFile): Promise<void> {
  const { firmId } = actor;
  await withActor(actor, async (tx) => {
    await tx
      .insert(reportFiles)
      .values({ firmId, id: uuidv7(), ...file })
      .onConflictDoNothing({
        target: [reportFiles.firmId, reportFiles.reportVersionId, reportFiles.locale, reportFiles.renderer],
      });
    await tx
      .update(renders)
      .set({ state: 'ready', failure: null, updatedAt: sql`now()` })
      .where(isRender(actor, file.reportVersionId, file.locale));
  });
}

/** Keeps why a rendering did not succeed, for the Report screen. `isLast` says that nobody tries again by itself. */
export async function recordRenderFailure(
  actor: SystemActor,
  reportVersionId: string,
  locale: Locale,
  failure: { says: string; isLast: boolean },
): Promise<void> {
  await withActor(actor, (tx) =>
    tx
      .update(renders)
      .set({ state: failure.isLast ? 'failed' : 'waiting', failure: failure.says, updatedAt: sql`now()` })
      .where(and(isRender(actor, reportVersionId, locale), sql`${renders.state} <> 'ready'`)),
  );
}

export type RetryOutcome = { kind: 'asked' } | { kind: 'already-there' } | { kind: 'not-found' };

/** Asks again for the PDF of a version. */
export async function retryRender(actor: MemberActor, reportVersionId: string): Promise<RetryOutcome> {
  if (!holds(actor, 'owner', 'office', 'inspector')) return { kind: 'not-found' };
  return withActor(actor, async (tx) => {
    const [version] = await tx
      .select({ inspectionId: reportVersions.inspectionId })
      .from(reportVersions)
      .innerJoin(
        inspections,
        and(eq(inspections.firmId, reportVersions.firmId), eq(inspections.id, reportVersions.inspectionId)),
      )
      .where(and(eq(reportVersions.id, reportVersionId), inspectionsVisibleTo(actor)));
    if (!version) return { kind: 'not-found' };
    const [changed] = await tx
      .update(renders)
      .set({ state: 'waiting', failure: null, updatedAt: sql`now()` })
      .where(and(isRender(actor, reportVersionId, 'en'), sql`${renders.state} <> 'ready'`))
      .returning({ id: renders.id });
    if (!changed) return { kind: 'already-there' };
    await enqueueRender(tx, actor.firmId, reportVersionId);
    await recordAudit(tx, version.inspectionId, 'report.render-retried', { reportVersionId });
    return { kind: 'asked' };
  });
}

function isRender({ firmId }: { firmId: string }, reportVersionId: string, locale: Locale) {
  return and(eq(renders.firmId, firmId), eq(renders.reportVersionId, reportVersionId), eq(renders.locale, locale));
}
