import type { Metadata, Route } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { findVersion } from '@/db/reports';
import { WebReport } from '@/components/report/web-report';
import { requireMember } from '@/lib/auth/session';
import { en } from '@/lib/messages/en';
import { idSchema } from '@/lib/schemas/id';

export const metadata: Metadata = { title: 'A released version' };

/** One frozen version, as the buyer reads it. */
export default async function VersionPage({
  params,
}: PageProps<'/inspections/[inspectionId]/report/[reportVersionId]'>) {
  const { inspectionId, reportVersionId } = await params;
  const actor = await requireMember();
  const id = idSchema.safeParse(reportVersionId);
  const version = id.success ? await findVersion(actor, id.data) : null;
  if (!version || version.inspectionId !== inspectionId) notFound();

  const { number } = version.snapshot;
  return (
    <div className="grid gap-8">
      <p className="flex flex-wrap items-center gap-4 print:hidden">
        <Link className="button" href={`/inspections/${inspectionId}/report` as Route}>
          Back to Report
        </Link>
        {number < version.newest && <strong>{en.report.web.olderVersion(number, version.newest)}</strong>}
      </p>
      <WebReport
        snapshot={version.snapshot}
        sha256={version.sha256}
        photoSrc={(photoId, size) => `/api/photos/${photoId}?size=${size}`}
      />
    </div>
  );
}
