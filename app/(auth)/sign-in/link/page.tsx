import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { findLink } from '@/db/links';
import { Button } from '@/components/ui/button';
import { hashSecret, keptSecret } from '@/lib/auth/link-secret';
import { redeemSignInLinkAction } from '../actions';

export const metadata: Metadata = { title: 'Sign in by link' };

/** Opening this page uses nothing up; the button does. */
export default async function SignInLinkPage() {
  const secret = await keptSecret();
  const link = secret ? await findLink(hashSecret(secret)) : null;
  if (link?.purpose !== 'sign-in' || link.state !== 'ready') redirect('/open/expired');
  return (
    <form action={redeemSignInLinkAction} className="grid gap-5">
      <h1 className="font-serif font-bold text-xl">Sign in as {link.name}</h1>
      <p>{link.email}</p>
      <p>
        <Button weight="solid" type="submit">
          Sign in
        </Button>
      </p>
    </form>
  );
}
