'use client';

import { useEffect, useRef } from 'react';

/** Lists every problem with a link to its field, and takes the focus when it appears. */
export function ErrorSummary({ problems }: { problems: { field: string; says: string }[] }) {
  const heading = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (problems.length > 0) heading.current?.focus();
  }, [problems]);
  if (problems.length === 0) return null;
  return (
    <div ref={heading} role="alert" tabIndex={-1} className="border-2 border-ink p-4">
      <h2 className="font-serif text-l font-bold">There is a problem</h2>
      <ul className="mt-2 grid gap-1">
        {problems.map(({ field, says }) => (
          <li key={`${field}${says}`}>
            <a className="inline-flex min-h-[24px] items-center font-bold underline" href={`#${field}`}>
              {says}
            </a>
          </li>
        ))}
      </ul>
    </div>
  );
}
