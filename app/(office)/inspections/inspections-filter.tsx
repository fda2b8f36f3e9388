'use client';

import { useEffect, useRef, useState } from 'react';
import { INSPECTION_STATES } from '@/lib/findings/vocabulary';
import type { InspectionFilter } from '@/lib/schemas/inspection';
import { STATE_WORDS } from './state-words';

export type Inspector = { membershipId: string; name: string };

const WAIT_MS = 250;
const CONTROL = 'min-h-[44px] rounded-none border-b-2 border-ink bg-transparent px-1 font-bold';

/** The filter reads as a sentence. */
export function InspectionsFilter({
  filter,
  inspectors,
  onChange,
}: {
  filter: InspectionFilter;
  inspectors: Inspector[];
  onChange: (filter: InspectionFilter) => void;
}) {
  const [search, setSearch] = useState(filter.search);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  useEffect(() => () => clearTimeout(timer.current), []);

  function type(text: string) {
    setSearch(text);
    clearTimeout(timer.current);
    timer.current = setTimeout(() => onChange({ ...filter, search: text.trim() }), WAIT_MS);
  }

  return (
    <form
      role="search"
      aria-label="Filter"
      className="flex flex-wrap items-center gap-x-2 gap-y-1 font-serif text-l"
      onSubmit={(event) => event.preventDefault()}
    >
      Show
      <select
        aria-label="State"
        className={CONTROL}
        value={filter.state ?? ''}
        onChange={(event) =>
          onChange({ ...filter, state: INSPECTION_STATES.find((state) => state === event.target.value) })
        }
      >
        <option value="">every state</option>
        {INSPECTION_STATES.map((state) => (
          <option key={state} value={state}>
            {STATE_WORDS[state].toLowerCase()}
          </option>
        ))}
      </select>
      by
      <select
        aria-label="Inspector"
        className={CONTROL}
        value={filter.inspector ?? ''}
        onChange={(event) => onChange({ ...filter, inspector: event.target.value || undefined })}
      >
        <option value="">every inspector</option>
        {inspectors.map(({ membershipId, name }) => (
          <option key={membershipId} value={membershipId}>
            {name}
          </option>
        ))}
      </select>
      with
      <input
        aria-label="Address, buyer or number"
        placeholder="address, buyer or number"
        className={`${CONTROL} min-w-0 grow font-normal`}
        value={search}
        onChange={(event) => type(event.target.value)}
      />
    </form>
  );
}
