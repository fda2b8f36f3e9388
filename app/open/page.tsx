import type { Metadata } from 'next';
import { BrandMark } from '@/components/brand-mark';
import { CodeForm } from './code-form';
import { OpenLink } from './open-link';

export const metadata: Metadata = { title: 'Open your link', robots: { index: false } };

/** The token stands in the fragment, which no server sees; without script, or without a fragment, the short code does. */
export default function OpenPage() {
  return (
    <main className="mx-auto grid max-w-lg gap-6 px-4 py-8">
      <p className="inline-flex items-center gap-2 font-serif text-l font-bold">
        <BrandMark />
        Ohmstead
      </p>
      <OpenLink>
        <h1 className="font-serif font-bold text-xl">Open it by the short code</h1>
        <p>
          The mail that brought you here has a short code beside its link. It works with the address it was sent to.
        </p>
        <CodeForm />
      </OpenLink>
    </main>
  );
}
