import type { Metadata } from 'next';
import Link from 'next/link';
import { redirect } from 'next/navigation';
import { nextPage } from '@/lib/auth/next-page';
import { currentMember } from '@/lib/auth/session';
import { DEMO_FIRM_NAME, DEMO_SIGN_INS } from '@/lib/demo';
import { env } from '@/lib/env';
import { SignInForm } from './sign-in-form';

export const metadata: Metadata = { title: 'Sign in' };

const NOTICES: Record<string, string> = {
  'password-set': 'Your new password is set. Sign in with it.',
  joined: 'You have joined the firm. Sign in with your own password.',
  'signed-out': 'You are signed out.',
};

export default async function SignInPage({ searchParams }: PageProps<'/sign-in'>) {
  const { next, notice } = await searchParams;
  if (await currentMember()) redirect(nextPage(next));

  const says = typeof notice === 'string' ? NOTICES[notice] : undefined;
  return (
    <>
      <h1 className="font-serif font-bold text-xl leading-snug">What every receptacle showed, and what it did not.</h1>
      {says && (
        <p role="status" className="border-y border-ink py-3">
          {says}
        </p>
      )}
      <SignInForm next={nextPage(next)} />
      <p className="text-s text-ink-2">
        A buyer, agent or electrician needs no password. Open the link in your mail, or{' '}
        <Link href="/open" className="underline">
          type its short code
        </Link>
        .
      </p>
      {env.SIGN_UP === 'open' && (
        <p className="text-s">
          New here?{' '}
          <Link href="/sign-up" className="inline-flex min-h-[44px] items-center underline">
            Set up your firm
          </Link>
        </p>
      )}
      {env.DEMO === '1' && <DemoSignIns />}
    </>
  );
}

function DemoSignIns() {
  return (
    <section aria-labelledby="demo" className="border-t border-rule pt-4">
      <h2 id="demo" className="font-serif font-bold text-m">
        {DEMO_FIRM_NAME}, the demo firm
      </h2>
      <table className="mt-2 w-full text-s">
        <caption className="sr-only">Demo sign-ins; the password is the same for all</caption>
        <tbody>
          {DEMO_SIGN_INS.map(({ label, email }) => (
            <tr key={email} className="border-b border-hairline">
              <th scope="row" className="py-2 pr-4 text-left">
                {label}
              </th>
              <td className="py-2 break-all">{email}</td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="mt-2 text-s">
        Password for each: <b>{DEMO_SIGN_INS[0].password}</b>
      </p>
    </section>
  );
}
