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
        <Link
          href="/people/me"
          className="order-4 ml-auto inline-flex min-h-[44px] max-w-full items-center text-s text-ink-2 sm:order-none"
        >
          <span className="truncate">
            {member.name}
            <span className="max-sm:sr-only"> · {member.firmName}</span>
          </span>
        </Link>
        <form action={signOutAction} className="max-sm:ml-auto">
          <Button weight="plain" type="submit" className="text-s">
            Sign out
          </Button>
        </form>
      </header>
      <main id="main" tabIndex={-1} className="mx-auto max-w-[1280px] px-4 pt-6 pb-16 outline-none sm:px-8">
        {children}
      </main>
    </>
  );
}
