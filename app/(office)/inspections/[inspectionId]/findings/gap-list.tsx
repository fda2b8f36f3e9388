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
        {gaps.map((gap) => (
          <li key={gap.id}>
            <b>{gap.place}:</b> {gap.says}
          </li>
        ))}
      </ul>
    </section>
  );
}
