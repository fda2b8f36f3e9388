import 'server-only';
import { createHash } from 'node:crypto';
import type { SystemActor } from '@/db/actor';
import type { Jobs } from '@/db/jobs';
import { beginRender, recordRenderFailure, recordReportFile } from '@/db/report-files';
import { findVersion, type Version } from '@/db/reports';
import { log } from '@/lib/log';
import { renderReportPdf, type ReportAssets } from '@/lib/reports/render-pdf';
import { RENDERER } from '@/lib/schemas/snapshot';
import { reportKey } from '@/lib/storage/keys';
import { readObject, storage } from '@/lib/storage/storage';
import type { Attempt } from './attempt';

/** Renders the PDF of a version, stores it once and records it. A second run finds it there and changes nothing. */
export async function renderReport(job: Jobs['render-report'], attempt: Attempt): Promise<void> {
  const actor: SystemActor = { kind: 'system', firmId: job.firmId, task: 'render-report' };
  const { reportVersionId, locale } = job;
  if (!(await beginRender(actor, reportVersionId, locale))) return;
  try {
    const version = await findVersion(actor, reportVersionId);
    if (!version) throw new Error('the version is not there');
    const assets = await loadAssets(version);
    const { pdf, pages } = await renderReportPdf(version.snapshot, version.sha256, locale, assets);
    const key = reportKey(job.firmId, reportVersionId, locale, RENDERER);
    const stored = await storeOnce(key, pdf);
    const sha256 = sha256Of(stored);
    await recordReportFile(actor, {
      ...{ reportVersionId, locale, renderer: RENDERER, key, pages, sha256 },
      bytes: stored.length,
    });
  } catch (error) {
    log.error({ err: error, reportVersionId }, 'a report could not be rendered');
    const says = error instanceof MissingPicture ? error.message : 'The PDF could not be made.';
    await recordRenderFailure(actor, reportVersionId, locale, { says, isLast: attempt.isLast });
    throw error;
  }
}

/** What was stored first is the record. */
async function storeOnce(key: string, pdf: Buffer): Promise<Buffer> {
  const put = await storage().putIfAbsent(key, pdf);
  if (put.kind === 'stored') return pdf;
  const earlier = await readObject(key);
  if (!earlier) throw new Error('a stored PDF could not be read back');
  return earlier;
}

class MissingPicture extends Error {}

async function loadAssets({ snapshot }: Version): Promise<ReportAssets> {
  const photos = new Map<string, Buffer>();
  for (const { id, key, sha256Of1600, number } of snapshot.photos)
    photos.set(id, await loadPicture({ key, sha256: sha256Of1600 }, `Photo ${number}`));
  const { logo } = snapshot.firm;
  const { image } = snapshot.signature;
  return {
    photos,
    ...(logo ? { logo: await loadPicture(logo, 'The logo') } : {}),
    ...(image ? { signatureImage: await loadPicture(image, 'The signature') } : {}),
  };
}

/** Bytes of a picture, the very ones that were released. */
async function loadPicture(picture: { key: string; sha256: string }, name: string): Promise<Buffer> {
  const bytes = await readObject(picture.key);
  if (!bytes) throw new MissingPicture(`${name} is missing in the store.`);
  if (sha256Of(bytes) !== picture.sha256) throw new MissingPicture(`${name} is not the one that was released.`);
  return bytes;
}

function sha256Of(bytes: Buffer): string {
  return createHash('sha256').update(bytes).digest('hex');
}
