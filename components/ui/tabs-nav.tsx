'use client';

import type { Route } from 'next';
import Link from 'next/link';
import { usePathname } from 'next/navigation';

export type Tab<Href extends string> = { href: Route<Href>; label: string; count?: string; exact?: boolean };

/** Links that look like tabs; the page on screen is marked. */
export function TabsNav<Href extends string>({ label, tabs }: { label: string; tabs: Tab<Href>[] }) {
  const path = usePathname();
  return (
    <nav aria-label={label} className="overflow-x-auto">
      <ul className="flex gap-5">
        {tabs.map(({ href, label: words, count, exact }) => {
          const current = exact ? path === href : path === href || path.startsWith(`${href}/`);
          return (
            <li key={href}>
              <Link
                href={href}
                aria-current={current ? 'page' : undefined}
                className={`flex min-h-[44px] items-center gap-1 border-b-4 whitespace-nowrap ${current ? 'border-ink font-bold' : 'border-transparent hover:border-rule'}`}
              >
                {words}
                {count && <span className="font-normal text-ink-2">{count}</span>}
              </Link>
            </li>
          );
        })}
      </ul>
    </nav>
  );
}
