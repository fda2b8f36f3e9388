import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { findLink } from '@/db/links';
import { hashSecret, keptSecret } from '@/lib/auth/link-secret';
import { InvitationForm } from './invitation-form';

export const metadata: Metadata = { title: 'Join your firm' };

export default async function InvitationPage() {
  const secret = await keptSecret();
  const link = secret ? await findLink(hashSecret(secret)) : null;
  if (link?.purpose !== 'invitation' || link.state !== 'ready') redirect('/open/expired');
  return (
    <>
      <h1 className="font-serif font-bold text-xl">Join {link.firmName}</h1>
      <p>
        {link.hasPassword
          ? `${link.email} has an account already. After joining, sign in with your own password.`
          : `Your account is ${link.email}. Choose a password for it.`}
      </p>
      <InvitationForm name={link.name} isNew={!link.hasPassword} />
    </>
  );
}
