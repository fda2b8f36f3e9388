import Link from 'next/link';
import { BrandMark } from '@/components/brand-mark';

export default function FrontPage() {
  return (
    <main className="mx-auto grid max-w-3xl gap-6 px-4 py-12">
      <p className="inline-flex items-center gap-2 font-serif text-l font-bold">
        <BrandMark />
        Ohmstead
      </p>
      <h1 className="font-serif font-bold text-2xl leading-tight">
        What every receptacle showed, and what it did not.
      </h1>
      <p className="max-w-[58ch] font-serif leading-relaxed">
        For home-inspection firms. Record what the tester, the meter and the trip test showed at each receptacle, see
        which wiring faults that can mean and which it cannot exclude, and send the buyer a report that says no more
        than the evidence does.
      </p>
      <p className="flex flex-wrap items-center gap-5">
        <Link href="/sign-in" className="button button-solid">
          Sign in
        </Link>
        <Link href="/open" className="inline-flex min-h-[44px] items-center underline">
          I have a link or a short code from a mail
        </Link>
      </p>
    </main>
  );
}
