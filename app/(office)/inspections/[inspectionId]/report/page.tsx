import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { HazardWord } from '@/components/findings/hazard-word';
import { listVersions, reviewInspection } from '@/db/reports';
import { requireMember } from '@/lib/auth/session';
import { stateProfile } from '@/lib/findings';
import { en } from '@/lib/messages/en';
import type { ReportSnapshot } from '@/lib/schemas/snapshot';
import { idSchema } from '@/lib/schemas/id';
import { ReleaseForm } from './release-form';
import { ReviewList } from './review-list';
import { VersionList } from './version-list';

export const metadata: Metadata = { title: 'Report' };

export default async function ReportPage({ params }: PageProps<'/inspections/[inspectionId]/report'>) {
  const actor = await requireMember();
  const id = idSchema.safeParse((await params).inspectionId);
  const review = id.success ? await reviewInspection(actor, id.data) : null;
  if (!id.success || !review) notFound();
  const versions = await listVersions(actor, id.data);
  const { lines, draft, signer, nextNumber, changes } = review;
  return (
    <div className="grid gap-12 lg:grid-cols-[2fr_1fr]">
      <div className="grid content-start gap-12">
        <ReviewList inspectionId={id.data} lines={lines} isUnchanged={changes?.length === 0} />
        <VersionList inspectionId={id.data} versions={versions} timeZone={draft.inspection.timeZone} />
      </div>
      <aside className="grid content-start gap-8 border-hairline lg:border-l lg:pl-6">
        <section aria-labelledby="release">
          <h2 id="release" className="font-bold">
            Release
          </h2>
          <p className="mt-1">
            Version {nextNumber} of inspection {draft.inspection.number}. After release the text, the photos and the PDF
            cannot change; a change makes a new version with its reason.
          </p>
          <p className="mt-3 text-s text-ink-2">Signed as</p>
          <p className="font-serif text-l italic">{signer.name || 'No signature yet'}</p>
          {signer.licenseNumber && <p className="text-s">{en.report.license(signer.licenseNumber)}</p>}
          <ReleaseForm
            inspectionId={id.data}
            nextNumber={nextNumber}
            changes={changes}
            held={lines.filter((line) => !line.overridable).length}
            overridable={lines.filter((line) => line.overridable)}
            mayRelease={actor.roles.includes('inspector')}
          />
        </section>
        <StateRules draft={draft} />
        <PageOne draft={draft} />
      </aside>
    </div>
  );
}

function StateRules({ draft: { stateProfile: frozen } }: { draft: ReportSnapshot }) {
  const profile = stateProfile(frozen.code);
  return (
    <section aria-labelledby="state" className="border-t border-hairline pt-6">
      <h2 id="state" className="font-bold">
        State profile: {profile.name}
      </h2>
      <ul className="mt-1 grid gap-1">
        {frozen.duties.map(({ says }) => (
          <li key={says}>{says}</li>
        ))}
      </ul>
      <p className="mt-1 text-s text-ink-2">
        {profile.section} {profile.confirm}
      </p>
    </section>
  );
}

function PageOne({ draft }: { draft: ReportSnapshot }) {
  return (
    <section aria-labelledby="page-one" className="border-t border-hairline pt-6">
      <h2 id="page-one" className="font-bold">
        Page one, as the buyer gets it
      </h2>
      <div className="mt-2 grid gap-3 bg-sheet p-4">
        <h3 className="font-serif text-l font-bold">{en.report.first.title}</h3>
        {draft.findings.length === 0 && <p>No finding is kept yet.</p>}
        {draft.findings.map((finding) => (
          <div key={finding.id}>
            <p>
              <HazardWord signal={finding.signal} small /> {finding.place}
            </p>
            <p>
              <b>{en.report.urgency[finding.urgency]}.</b> {finding.text.en.title}
            </p>
          </div>
        ))}
      </div>
    </section>
  );
}
