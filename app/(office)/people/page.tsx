import type { Metadata } from 'next';
import Link from 'next/link';
import { listMembers } from '@/db/people';
import { requireMember } from '@/lib/auth/session';
import { InviteForm } from './invite-form';
import { MemberRow } from './member-row';

export const metadata: Metadata = { title: 'People' };

const NOTICES: Record<string, string> = {
  'invited-again': 'A new invitation is on its way. The link before it no longer works.',
  'roles-changed': 'The roles are changed. They count from the next page that person opens.',
  'no-role': 'Nothing was changed: a person needs at least one role.',
  disabled: 'That person can no longer open anything of the firm. What they recorded stays.',
  enabled: 'That person can sign in again.',
  'signed-out': 'That person is signed out of this firm everywhere. Readings that wait on a phone stay there.',
  'last-owner': 'Nothing was changed: this is the last owner. Make somebody else an owner first.',
  'not-found': 'That person is not in the list any more.',
  'not-allowed': 'Only an owner can change people.',
};

export default async function PeoplePage({ searchParams }: PageProps<'/people'>) {
  const actor = await requireMember();
  const { notice } = await searchParams;
  const members = await listMembers(actor);
  const isOwner = actor.roles.includes('owner');
  const says = typeof notice === 'string' ? NOTICES[notice] : undefined;
  return (
    <>
      <h1 className="font-serif font-bold text-2xl">People</h1>
      {says && (
        <p role="status" className="mt-4 border-y border-ink py-3">
          {says}
        </p>
      )}
      <ul className="mt-6 border-t border-ink">
        {members.map((member) => (
          <MemberRow
            key={member.membershipId}
            member={member}
            canManage={isOwner}
            isSelf={member.membershipId === actor.membershipId}
          />
        ))}
      </ul>
      <p className="mt-4">
        <Link href="/people/me" className="inline-flex min-h-[44px] items-center underline">
          Your own name, license, signature and password
        </Link>
      </p>
      {isOwner && (
        <section aria-labelledby="invite" className="mt-12 max-w-lg border-t-2 border-ink pt-4">
          <h2 id="invite" className="font-serif font-bold text-l">
            Invite somebody
          </h2>
          <InviteForm />
        </section>
      )}
    </>
  );
}
