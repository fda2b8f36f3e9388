import type { Metadata } from 'next';
import { listMembers } from '@/db/people';
import { loadFirm } from '@/db/firms';
import { requireMember } from '@/lib/auth/session';
import { InspectionForm } from './inspection-form';

export const metadata: Metadata = { title: 'Book an inspection' };

export default async function NewInspectionPage() {
  const actor = await requireMember();
  const [firm, members] = await Promise.all([loadFirm(actor), listMembers(actor)]);
  const mayBookOthers = actor.roles.includes('owner') || actor.roles.includes('office');
  const inspectors = members
    .filter(
      ({ roles, state, membershipId }) =>
        roles.includes('inspector') && state === 'active' && (mayBookOthers || membershipId === actor.membershipId),
    )
    .map(({ membershipId, name }) => ({ membershipId, name }));
  const lead = inspectors.find(({ membershipId }) => membershipId === actor.membershipId) ?? inspectors[0];
  return (
    <div className="grid max-w-[720px] gap-6">
      <h1 className="font-serif text-2xl font-bold">Book an inspection</h1>
      <InspectionForm
        inspectors={inspectors}
        leadMembershipId={lead?.membershipId ?? ''}
        timeZone={firm.timeZone}
        stateProfile={firm.stateProfile}
      />
    </div>
  );
}
