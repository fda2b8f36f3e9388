import Link from 'next/link';

export default function NotFound() {
  return (
    <main className="mx-auto grid max-w-[44ch] gap-4 px-6 py-16">
      <title>Not here · Ohmstead</title>
      <h1 className="font-serif text-2xl font-bold">This page is not here</h1>
      <p>It was removed, or the link is not complete, or it is not yours to open.</p>
      <p>
        <Link className="button" href="/inspections">
          Go to your inspections
        </Link>
      </p>
    </main>
  );
}
