import type { Metadata } from 'next';
import Link from 'next/link';
import { ForgotPasswordForm } from './forgot-password-form';

export const metadata: Metadata = { title: 'A new password' };

export default function ForgotPasswordPage() {
  return (
    <>
      <h1 className="font-serif font-bold text-xl">Set a new password</h1>
      <p>Enter the e-mail you sign in with. A link to set a new password comes by mail.</p>
      <ForgotPasswordForm />
      <p className="text-s">
        <Link href="/sign-in" className="inline-flex min-h-[44px] items-center underline">
          Back to sign-in
        </Link>
      </p>
    </>
  );
}
