import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { findLink } from '@/db/links';
import { hashSecret, keptSecret } from '@/lib/auth/link-secret';
import { ResetPasswordForm } from './reset-password-form';

export const metadata: Metadata = { title: 'Set a new password' };

export default async function ResetPasswordPage() {
  const secret = await keptSecret();
  const link = secret ? await findLink(hashSecret(secret)) : null;
  if (link?.purpose !== 'reset' || link.state !== 'ready') redirect('/open/expired');
  return (
    <>
      <h1 className="font-serif font-bold text-xl">Set a new password</h1>
      <p>
        For {link.email}. Setting it signs you out in every other browser and phone. Readings that wait on a phone stay
        there until you sign in again.
      </p>
      <ResetPasswordForm email={link.email} />
    </>
  );
}
