import type { Gap } from '@/lib/findings/facts';

/** What stays unproven, and why; the report prints it. */
export function GapList({ gaps }: { gaps: Gap[] }) {
  if (gaps.length === 0) return null;
  return (
    <section aria-labelledby="gaps" className="max-w-[80ch]">
      <h2 id="gaps" className="font-serif text-l font-bold">
        What stays unproven
      </h2>
      <ul className="limits mt-3 grid gap-2">
        {grouped(gaps).map(({ places, says }) => (
          <li key={says}>
            <b>{places.join('; ')}:</b> {says}
          </li>
        ))}
      </ul>
    </section>
  );
}

/** The same sentence is said once, with all its places. */
function grouped(gaps: Gap[]): { places: string[]; says: string }[] {
  const bySentence = new Map<string, string[]>();
  for (const { place, says } of gaps) bySentence.set(says, [...(bySentence.get(says) ?? []), place]);
  return Array.from(bySentence, ([says, places]) => ({ places, says }));
}
