import type { Metadata } from 'next';
import Link from 'next/link';
import { env } from '@/lib/env';
import { SignUpForm } from './sign-up-form';

export const metadata: Metadata = { title: 'Set up your firm' };

export default function SignUpPage() {
  if (env.SIGN_UP === 'closed') {
    return (
      <>
        <h1 className="font-serif font-bold text-xl">New firms are not taken here</h1>
        <p>Ask the owner of your firm for an invitation. It comes by mail with a link.</p>
        <p>
          <Link href="/sign-in" className="inline-flex min-h-[44px] items-center underline">
            Back to sign-in
          </Link>
        </p>
      </>
    );
  }
  return (
    <>
      <h1 className="font-serif font-bold text-xl">Set up your firm</h1>
      <p>You become its owner and first inspector. Others come by invitation.</p>
      <SignUpForm />
      <p className="text-s">
        <Link href="/sign-in" className="inline-flex min-h-[44px] items-center underline">
          I have an account
        </Link>
      </p>
    </>
  );
}
