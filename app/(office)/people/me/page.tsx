import type { Metadata } from 'next';
import { listOwnFirms } from '@/db/auth';
import { loadOwnMember } from '@/db/people';
import { Button } from '@/components/ui/button';
import { requireMember } from '@/lib/auth/session';
import { signOutEverywhereAction, switchFirmAction } from './actions';
import { PasswordForm } from './password-form';
import { ProfileForm } from './profile-form';
import { SignatureSection } from './signature-section';

export const metadata: Metadata = { title: 'You' };

const NOTICES: Record<string, string> = {
  'signed-out-elsewhere':
    'You are signed out in every other browser and phone. Readings that wait on a phone stay there.',
  'signature-saved': 'Your signature is saved.',
  'signature-removed': 'Your signature is removed. Released reports keep it.',
  'no-picture': 'No picture arrived. Choose it again.',
  'picture-too-large': 'That picture is over 5 MB. Choose a smaller one.',
  'picture-unusable': 'That file is not a whole JPEG or PNG picture. Choose another.',
};

export default async function MePage({ searchParams }: PageProps<'/people/me'>) {
  const actor = await requireMember();
  const { notice } = await searchParams;
  const [member, firms] = await Promise.all([loadOwnMember(actor), listOwnFirms(actor)]);
  const says = typeof notice === 'string' ? NOTICES[notice] : undefined;
  const others = firms.filter(({ firmId }) => firmId !== actor.firmId);
  return (
    <div className="grid items-start gap-12 lg:grid-cols-[minmax(0,32rem)_minmax(0,32rem)]">
      <div className="grid gap-12">
        <section>
          <h1 className="font-serif font-bold text-2xl">{member.name}</h1>
          <p className="text-ink-2">{member.email}</p>
          {says && (
            <p role="status" className="mt-4 border-y border-ink py-3">
              {says}
            </p>
          )}
          <ProfileForm
            values={{
              name: member.name,
              licenseNumber: member.licenseNumber ?? '',
              licenseState: member.licenseState ?? '',
              licenseExpires: member.licenseExpires ?? '',
              signatureName: member.signatureName ?? '',
            }}
          />
        </section>
        <SignatureSection signatureKey={member.signatureKey} />
      </div>
      <div className="grid gap-12">
        <section aria-labelledby="password-title" className="border-t-2 border-ink pt-4">
          <h2 id="password-title" className="font-serif font-bold text-l">
            Change your password
          </h2>
          <PasswordForm email={member.email} />
        </section>
        <section aria-labelledby="elsewhere" className="grid gap-3 border-t-2 border-ink pt-4">
          <h2 id="elsewhere" className="font-serif font-bold text-l">
            Signed in elsewhere
          </h2>
          <p>After a phone is lost, or on a computer that was not yours.</p>
          <form action={signOutEverywhereAction}>
            <Button type="submit">Sign out everywhere else</Button>
          </form>
        </section>
        {others.length > 0 && (
          <section aria-labelledby="firms" className="grid gap-3 border-t-2 border-ink pt-4">
            <h2 id="firms" className="font-serif font-bold text-l">
              Your other firms
            </h2>
            {others.map(({ firmId, firmName }) => (
              <form key={firmId} action={switchFirmAction}>
                <input type="hidden" name="firmId" value={firmId} />
                <Button type="submit">Work in {firmName}</Button>
              </form>
            ))}
          </section>
        )}
      </div>
    </div>
  );
}
