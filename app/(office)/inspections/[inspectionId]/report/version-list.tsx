import type { Route } from 'next';
import Link from 'next/link';
import type { VersionListItem } from '@/db/reports';
import { grouped } from '@/components/report/report-facts';
import { Button } from '@/components/ui/button';
import { dateTimeIn } from '@/lib/messages/dates';
import { retryRenderAction } from './actions';
import { RefreshWhile } from './refresh-while';

type VersionListProps = { inspectionId: string; versions: VersionListItem[]; timeZone: string };

/** The released versions with their hash, and where each PDF stands. */
export function VersionList({ inspectionId, versions, timeZone }: VersionListProps) {
  const isWaiting = versions.some(({ render }) => render.state === 'waiting' || render.state === 'rendering');
  return (
    <section aria-labelledby="versions">
      <h2 id="versions" className="border-b-2 border-ink pb-2 font-serif text-xl font-bold">
        Versions
      </h2>
      <RefreshWhile active={isWaiting} />
      {versions.length === 0 && <p className="py-3">No version was released yet.</p>}
      <ol>
        {versions.map((version) => (
          <li key={version.id} className="grid gap-2 border-b border-hairline py-4">
            <h3 className="font-bold">
              Version {version.number}, released {dateTimeIn(timeZone, version.releasedAt)}
            </h3>
            {version.reason && <p>{version.reason}</p>}
            {version.changes.length > 0 && <p className="text-s text-ink-2">{version.changes.join(' ')}</p>}
            <p className="text-s break-words text-ink-2">SHA-256 of the record: {grouped(version.sha256)}</p>
            <div className="flex flex-wrap items-center gap-4">
              <Link className="button" href={`/inspections/${inspectionId}/report/${version.id}` as Route}>
                Read version {version.number}
              </Link>
              <PdfState inspectionId={inspectionId} version={version} />
            </div>
          </li>
        ))}
      </ol>
    </section>
  );
}

function PdfState({ inspectionId, version }: { inspectionId: string; version: VersionListItem }) {
  const { render, file, id, number } = version;
  if (file)
    return (
      <a className="button" href={`/api/reports/${id}/pdf`}>
        PDF of version {number}, {file.pages} pages
      </a>
    );
  if (render.state !== 'failed')
    return (
      <p role="status">
        The PDF is being made.{render.failure && ` The last try did not work: ${render.failure} It is tried again.`}
      </p>
    );
  return (
    <form action={retryRenderAction} className="flex flex-wrap items-center gap-4">
      <input type="hidden" name="inspectionId" value={inspectionId} />
      <input type="hidden" name="reportVersionId" value={id} />
      <p role="alert">The PDF could not be made. {render.failure}</p>
      <Button type="submit">Make it again</Button>
    </form>
  );
}
