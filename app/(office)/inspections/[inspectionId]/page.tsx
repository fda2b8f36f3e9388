import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { Facts } from '@/components/ui/facts';
import { findInspection, loadWalk } from '@/db/inspections';
import { listAudit } from '@/db/audit';
import { requireMember } from '@/lib/auth/session';
import { stateProfile } from '@/lib/findings';
import { idSchema } from '@/lib/schemas/id';
import { ActivityList } from './activity-list';
import { BookingForm } from './booking-form';
import { HouseForm } from './house-form';
import { PartyForm } from './party-form';

export const metadata: Metadata = { title: 'Visit' };

export default async function VisitPage({ params }: PageProps<'/inspections/[inspectionId]'>) {
  const actor = await requireMember();
  const id = idSchema.safeParse((await params).inspectionId);
  if (!id.success) notFound();
  const [inspection, walk, activity] = await Promise.all([
    findInspection(actor, id.data),
    loadWalk(actor, id.data),
    listAudit(actor, id.data),
  ]);
  if (!inspection || !walk) notFound();
  const profile = stateProfile(inspection.stateProfile);
  const buyer = inspection.parties.find((party) => party.kind === 'buyer');
  const agent = inspection.parties.find((party) => party.kind === 'agent');
  const { revisions } = walk.state.inspection;

  return (
    <div className="grid gap-12 lg:grid-cols-[minmax(0,1fr)_320px]">
      <div className="grid content-start gap-12">
        <section aria-labelledby="house">
          <h2 id="house" className="font-serif text-l font-bold">
            House
          </h2>
          <HouseForm inspectionId={inspection.id} facts={walk.state.inspection} revisions={revisions} />
        </section>
        <section aria-labelledby="people">
          <h2 id="people" className="font-serif text-l font-bold">
            People
          </h2>
          <div className="mt-4 grid gap-8 sm:grid-cols-2">
            <PartyForm inspectionId={inspection.id} kind="buyer" title="Buyer" party={buyer} />
            <PartyForm inspectionId={inspection.id} kind="agent" title="Agent" party={agent} />
          </div>
        </section>
        <section aria-labelledby="booking">
          <h2 id="booking" className="font-serif text-l font-bold">
            Booking
          </h2>
          <BookingForm inspectionId={inspection.id} state={inspection.state} />
        </section>
      </div>
      <aside className="grid content-start gap-8 border-hairline text-s lg:border-l lg:pl-6">
        <section>
          <h2 className="mb-2 font-bold">Inspector</h2>
          <Facts
            facts={inspection.inspectors.map(({ name, leads, licenseNumber }) => ({
              term: leads ? 'Leads' : 'Walks too',
              value: name,
              source: licenseNumber ? `License ${licenseNumber}` : 'No license number recorded',
            }))}
          />
        </section>
        <section>
          <h2 className="mb-2 font-bold">State profile: {profile.name}</h2>
          <p className="text-ink-2">
            {profile.section} {profile.confirm}
          </p>
        </section>
        <ActivityList lines={activity.slice(-12).toReversed()} timeZone={inspection.timeZone} />
      </aside>
    </div>
  );
}
