import type { Metadata } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { listConflicts } from '@/db/conflicts';
import { loadFindings } from '@/db/report-findings';
import { requireMember } from '@/lib/auth/session';
import { idSchema } from '@/lib/schemas/id';
import { ConflictList } from './conflict-list';
import { FindingDetail } from './finding-detail';
import { FindingsList } from './findings-list';
import { GapList } from './gap-list';

export const metadata: Metadata = { title: 'Findings' };

export default async function FindingsPage({
  params,
  searchParams,
}: PageProps<'/inspections/[inspectionId]/findings'>) {
  const actor = await requireMember();
  const id = idSchema.safeParse((await params).inspectionId);
  const loaded = id.success ? await loadFindings(actor, id.data) : null;
  if (!id.success || !loaded) notFound();
  const conflicts = await listConflicts(actor, id.data);
  const { show } = await searchParams;
  // On a phone the list comes first, and a chosen finding takes its place.
  const isChosen = typeof show === 'string';
  const shown = loaded.findings.find(({ finding }) => finding.id === show) ?? loaded.findings[0];
  const open = loaded.findings.filter(
    (one) => one !== shown && (one.standing === 'undecided' || one.standing === 'changed'),
  );
  const nextId =
    open.find((one) => loaded.findings.indexOf(one) > loaded.findings.indexOf(shown ?? one))?.finding.id ??
    open[0]?.finding.id;
  const mayDecide = actor.roles.includes('inspector') || actor.roles.includes('owner');

  return (
    <div className="grid gap-12">
      {conflicts.length > 0 && <ConflictList inspectionId={id.data} conflicts={conflicts} timeZone={loaded.timeZone} />}
      {loaded.findings.length === 0 ? (
        <p className="max-w-[44ch] font-serif text-l">
          Nothing to report yet. Findings are worked out as the walk goes on; open Walk and read the first receptacle.
        </p>
      ) : (
        <div className="grid gap-8 lg:grid-cols-[300px_minmax(0,1fr)] lg:gap-12">
          <div className={isChosen ? 'max-lg:hidden' : ''}>
            <FindingsList inspectionId={id.data} findings={loaded.findings} shownId={shown?.finding.id} />
          </div>
          {shown && (
            <div className={isChosen ? '' : 'max-lg:hidden'}>
              <Link
                href={`/inspections/${id.data}/findings`}
                className="mb-4 flex min-h-[44px] items-center underline lg:hidden"
              >
                All findings
              </Link>
              <FindingDetail
                key={shown.finding.id}
                inspectionId={id.data}
                shown={shown}
                photos={loaded.photos}
                timeZone={loaded.timeZone}
                mayDecide={mayDecide}
                nextId={nextId}
                left={open.length}
              />
            </div>
          )}
        </div>
      )}
      <div className={isChosen ? 'max-lg:hidden' : ''}>
        <GapList gaps={loaded.gaps} />
      </div>
    </div>
  );
}
