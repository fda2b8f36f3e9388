import Link from 'next/link';
import type { ReactNode } from 'react';
import { BrandMark } from '@/components/brand-mark';
import { SignInPlate } from './sign-in-plate';

/** Before sign-in: an untested receptacle on the left, one form on the right. */
export default function AuthLayout({ children }: { children: ReactNode }) {
  return (
    <div className="grid min-h-screen grid-cols-1 lg:grid-cols-[minmax(0,1fr)_minmax(0,32rem)]">
      <div aria-hidden="true" className="hidden place-items-center border-r border-hairline lg:grid">
        <SignInPlate />
      </div>
      <main className="flex flex-col justify-center gap-6 px-4 py-8 sm:px-12">
        <Link href="/" className="inline-flex items-center gap-2 self-start font-serif text-l font-bold no-underline">
          <BrandMark />
          Ohmstead
        </Link>
        {children}
      </main>
    </div>
  );
}
