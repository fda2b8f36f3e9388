'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';

const SCREENS = [
  { href: '/inspections', says: 'Inspections', forOwner: false },
  { href: '/people', says: 'People', forOwner: false },
  { href: '/firm', says: 'Firm', forOwner: true },
] as const;

export function OfficeNav({ isOwner }: { isOwner: boolean }) {
  const pathname = usePathname();
  return (
    <nav aria-label="Firm" className="order-3 sm:order-none">
      <ul className="flex gap-5">
        {SCREENS.filter(({ forOwner }) => isOwner || !forOwner).map(({ href, says }) => (
          <li key={href}>
            <Link
              href={href}
              aria-current={pathname.startsWith(href) ? 'page' : undefined}
              className="inline-flex min-h-11 items-center border-b-2 border-transparent no-underline hover:underline aria-[current]:border-ink aria-[current]:font-bold"
            >
              {says}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
