import type { ReactNode } from 'react';

export type Fact = { term: string; value: ReactNode; source?: string };

/** Term, value and where the value comes from. */
export function Facts({ facts }: { facts: Fact[] }) {
  return (
    <dl className="grid grid-cols-[minmax(7rem,15rem)_1fr]">
      {facts.map(({ term, value, source }) => (
        <div key={term} className="col-span-2 grid grid-cols-subgrid border-b border-hairline">
          <dt className="py-2 pr-4 text-ink-2">{term}</dt>
          <dd className="py-2 break-words">
            {value}
            {source && <span className="block text-s text-ink-2">{source}</span>}
          </dd>
        </div>
      ))}
    </dl>
  );
}
