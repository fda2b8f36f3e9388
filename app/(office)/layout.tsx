import Link from 'next/link';
import type { ReactNode } from 'react';
import { BrandMark } from '@/components/brand-mark';
import { Button } from '@/components/ui/button';
import { requireMember } from '@/lib/auth/session';
import { signOutAction } from '../(auth)/sign-in/actions';
import { OfficeNav } from './office-nav';

export default async function OfficeLayout({ children }: { children: ReactNode }) {
  const member = await requireMember();
  return (
    <>
      <a href="#main" className="sr-only focus:not-sr-only">
        Skip to the page
      </a>
      <header className="flex flex-wrap items-center gap-x-8 gap-y-1 border-b border-hairline px-4 py-2 sm:px-8 print:hidden">
        <Link
          href="/inspections"
          className="inline-flex min-h-[44px] items-center gap-2 font-serif text-l font-bold no-underline"
        >
          <BrandMark />
          Ohmstead
        </Link>
        <OfficeNav isOwner={member.roles.includes('owner')} />
        <div className="ml-auto flex flex-wrap items-center gap-x-4 text-s text-ink-2">
          <Link href="/people/me" className="inline-flex min-h-[44px] items-center">
            {member.name} · {member.firmName}
          </Link>
          <form action={signOutAction}>
            <Button weight="plain" type="submit">
              Sign out
            </Button>
          </form>
        </div>
      </header>
      <main id="main" tabIndex={-1} className="mx-auto max-w-[1280px] px-4 pt-6 pb-16 outline-none sm:px-8">
        {children}
      </main>
    </>
  );
}
