import type { Metadata } from 'next';
import Link from 'next/link';
import { findGrantBySecret } from '@/db/grants';
import { findLink } from '@/db/links';
import { BrandMark } from '@/components/brand-mark';
import { Button } from '@/components/ui/button';
import { hashSecret, keptSecret } from '@/lib/auth/link-secret';
import { replaceLinkAction } from '../actions';

export const metadata: Metadata = { title: 'This link has run out', robots: { index: false } };

const NOTICES: Record<string, string> = {
  sent: 'A new link is on its way to the address the old one went to.',
  'not-sent': 'No new link was sent. Open the old link from the mail again, then ask for a new one.',
};

export default async function ExpiredPage({ searchParams }: PageProps<'/open/expired'>) {
  const { notice } = await searchParams;
  const secret = await keptSecret();
  const state = secret ? await stateOf(hashSecret(secret)) : 'unknown';
  const says = typeof notice === 'string' ? NOTICES[notice] : undefined;
  return (
    <main className="mx-auto grid max-w-lg gap-6 px-4 py-8">
      <p className="inline-flex items-center gap-2 font-serif text-l font-bold">
        <BrandMark />
        Ohmstead
      </p>
      {says ? <p role="status">{says}</p> : <WhatHappened state={state} />}
      <p>
        <Link href="/sign-in" className="inline-flex min-h-[44px] items-center underline">
          Go to sign-in
        </Link>
      </p>
    </main>
  );
}

type LinkState = 'ready' | 'used' | 'expired' | 'unknown';

/** Of a link to a report, or of a one-time link. */
async function stateOf(hash: Buffer): Promise<LinkState> {
  const grant = await findGrantBySecret(hash);
  if (grant) return grant.state === 'revoked' ? 'unknown' : grant.state;
  return (await findLink(hash))?.state ?? 'unknown';
}

function WhatHappened({ state }: { state: LinkState }) {
  switch (state) {
    case 'expired':
      return (
        <form action={replaceLinkAction} className="grid gap-5">
          <h1 className="font-serif font-bold text-xl">This link has run out</h1>
          <p>Nothing is lost. A new one goes to the same address.</p>
          <p>
            <Button weight="solid" type="submit">
              Mail me a new link
            </Button>
          </p>
        </form>
      );
    case 'used':
      return (
        <>
          <h1 className="font-serif font-bold text-xl">This link was used already</h1>
          <p>Each link works once, and a later one ends those before it. Sign in, or ask for a new link there.</p>
        </>
      );
    case 'ready':
    case 'unknown':
      return (
        <>
          <h1 className="font-serif font-bold text-xl">This link opens nothing any more</h1>
          <p>Open the newest mail and use the link in it, or ask for a new one at sign-in.</p>
        </>
      );
  }
}
