'use client';

import { keepPreviousData, useQuery } from '@tanstack/react-query';
import { tableFeatures, useTable, type ColumnDef } from '@tanstack/react-table';
import Link from 'next/link';
import { useRouter } from 'next/navigation';
import { useMemo, useState } from 'react';
import type { InspectionFilter, InspectionListItem, InspectionPage, InspectionSort } from '@/lib/schemas/inspection';
import { InspectionsFilter, type Inspector } from './inspections-filter';
import { STATE_WORDS } from './state-words';

const features = tableFeatures({});
const NO_ITEMS: InspectionListItem[] = [];
const columns: ColumnDef<typeof features, InspectionListItem>[] = [
  { id: 'day', header: 'Day', cell: ({ row }) => dayOf(row.original) },
  { id: 'time', header: 'Time', cell: ({ row }) => timeOf(row.original) },
  { id: 'number', header: 'No.', cell: ({ row }) => String(row.original.number).padStart(4, '0') },
  {
    id: 'house',
    header: 'House',
    cell: ({ row }) => (
      <Link className="font-bold underline underline-offset-4" href={`/inspections/${row.original.id}`}>
        {row.original.address}, {row.original.city}
      </Link>
    ),
  },
  { id: 'buyer', header: 'Buyer', cell: ({ row }) => row.original.buyer },
  { id: 'inspector', header: 'Inspector', cell: ({ row }) => row.original.inspector },
  { id: 'state', header: 'State', cell: ({ row }) => <b>{STATE_WORDS[row.original.state]}</b> },
];

const SORTED_BY: Partial<Record<string, [InspectionSort, InspectionSort]>> = {
  day: ['scheduled-newest', 'scheduled-oldest'],
  number: ['number-newest', 'number-oldest'],
};

/** The firm's inspections, filtered and paged by the server; the address bar keeps the filter. */
export function InspectionsTable({
  start,
  filter: first,
  inspectors,
}: {
  start: InspectionPage;
  filter: InspectionFilter;
  inspectors: Inspector[];
}) {
  const router = useRouter();
  const [filter, setFilter] = useState(first);
  const [earlier, setEarlier] = useState<(string | undefined)[]>([]);
  const asked = useMemo(() => queryOf(filter), [filter]);
  const query = useQuery({
    queryKey: ['inspections', asked],
    queryFn: ({ signal }) => fetchPage(asked, signal),
    initialData: asked === queryOf(first) ? start : undefined,
    placeholderData: keepPreviousData,
  });
  const items = query.data?.items ?? NO_ITEMS;
  const table = useTable({ features, columns, data: items });

  function show(next: InspectionFilter, back: (string | undefined)[] = []) {
    setFilter(next);
    setEarlier(back);
    router.replace(`/inspections?${queryOf(next)}`, { scroll: false });
  }
  const next = query.data?.nextCursor;
  return (
    <div className="grid gap-4">
      <InspectionsFilter
        filter={filter}
        inspectors={inspectors}
        onChange={(changed) => show({ ...changed, cursor: undefined })}
      />
      <p role="status" className="text-s text-ink-2">
        {query.error
          ? `▲ ${query.error.message}`
          : query.isFetching
            ? 'Working…'
            : countWords(items.length, next !== undefined || earlier.length > 0)}
      </p>
      {items.length === 0 && !query.isFetching ? (
        <Empty filtered={isFiltered(filter)} onClear={() => show({ search: '', sort: filter.sort })} />
      ) : (
        <table className="w-full border-collapse text-left max-md:block">
          <thead className="max-md:sr-only">
            {table.getHeaderGroups().map((group) => (
              <tr key={group.id} className="border-b border-ink">
                {group.headers.map((header) => (
                  <th
                    key={header.id}
                    scope="col"
                    className="py-2 pr-4 text-s font-bold"
                    aria-sort={ariaSort(header.column.id, filter.sort)}
                  >
                    <SortButton
                      id={header.column.id}
                      sort={filter.sort}
                      onSort={(sort) => show({ ...filter, sort, cursor: undefined })}
                    >
                      <table.FlexRender header={header} />
                    </SortButton>
                  </th>
                ))}
              </tr>
            ))}
          </thead>
          <tbody className="max-md:block">
            {table.getRowModel().rows.map((row) => (
              <tr
                key={row.id}
                className="border-b border-hairline max-md:grid max-md:grid-cols-[auto_1fr] max-md:gap-x-4 max-md:py-3"
              >
                {row.getAllCells().map((cell) => (
                  <td
                    key={cell.id}
                    className="py-3 pr-4 align-top tabular-nums max-md:py-0.5 max-md:nth-4:order-first max-md:nth-4:col-span-2"
                  >
                    <table.FlexRender cell={cell} />
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      )}
      <nav aria-label="Pages" className="flex justify-between">
        <PageButton
          shown={earlier.length > 0}
          onClick={() => show({ ...filter, cursor: earlier.at(-1) }, earlier.slice(0, -1))}
        >
          Back
        </PageButton>
        <PageButton
          shown={next !== undefined}
          onClick={() => show({ ...filter, cursor: next }, [...earlier, filter.cursor])}
        >
          More
        </PageButton>
      </nav>
    </div>
  );
}

async function fetchPage(asked: string, signal: AbortSignal): Promise<InspectionPage> {
  const response = await fetch(`/api/inspections?${asked}`, { signal });
  if (response.status === 401) throw new Error('You are signed out. Reload this page to sign in again.');
  if (!response.ok) throw new Error('The list could not be read. Check the connection; nothing is lost.');
  return (await response.json()) as InspectionPage;
}

function queryOf(filter: InspectionFilter): string {
  const given = Object.entries(filter).filter(([, value]) => value !== undefined && value !== '') as [string, string][];
  return new URLSearchParams(given.toSorted(([a], [b]) => a.localeCompare(b))).toString();
}

function isFiltered({ search, state, inspector }: InspectionFilter): boolean {
  return search !== '' || state !== undefined || inspector !== undefined;
}

function countWords(count: number, more: boolean): string {
  if (more) return `${count} shown`;
  return `${count} inspection${count === 1 ? '' : 's'}`;
}

function dayOf({ scheduledAt, timeZone }: InspectionListItem): string {
  return new Intl.DateTimeFormat('en-US', {
    timeZone,
    weekday: 'short',
    month: 'short',
    day: 'numeric',
    year: 'numeric',
  }).format(new Date(scheduledAt));
}

function timeOf({ scheduledAt, timeZone }: InspectionListItem): string {
  return new Intl.DateTimeFormat('en-US', {
    timeZone,
    hour: 'numeric',
    minute: '2-digit',
    timeZoneName: 'short',
  }).format(new Date(scheduledAt));
}

function ariaSort(column: string, sort: InspectionSort): 'ascending' | 'descending' | undefined {
  const [newest, oldest] = SORTED_BY[column] ?? [];
  if (sort === newest) return 'descending';
  return sort === oldest ? 'ascending' : undefined;
}

function SortButton({
  id,
  sort,
  onSort,
  children,
}: {
  id: string;
  sort: InspectionSort;
  onSort: (sort: InspectionSort) => void;
  children: React.ReactNode;
}) {
  const sorts = SORTED_BY[id];
  if (!sorts) return <>{children}</>;
  const [newest, oldest] = sorts;
  return (
    <button
      type="button"
      className="min-h-[24px] underline underline-offset-4"
      onClick={() => onSort(sort === newest ? oldest : newest)}
    >
      {children}
      <span aria-hidden="true">{sort === newest ? ' ↓' : sort === oldest ? ' ↑' : ''}</span>
    </button>
  );
}

function PageButton({ shown, onClick, children }: { shown: boolean; onClick: () => void; children: React.ReactNode }) {
  if (!shown) return <span />;
  return (
    <button type="button" className="min-h-[44px] rounded-[2px] border border-ink px-5 font-bold" onClick={onClick}>
      {children}
    </button>
  );
}

function Empty({ filtered, onClear }: { filtered: boolean; onClear: () => void }) {
  if (!filtered) {
    return (
      <div className="grid justify-items-start gap-4 py-8">
        <p className="font-serif text-l">No inspection is booked yet. Book the first one; it takes a minute.</p>
        <Link
          className="inline-flex min-h-[44px] items-center rounded-[2px] border border-ink px-5 font-bold"
          href="/inspections/new"
        >
          Book an inspection
        </Link>
      </div>
    );
  }
  return (
    <div className="grid justify-items-start gap-4 py-8">
      <p className="font-serif text-l">Nothing matches this filter.</p>
      <button type="button" className="min-h-[44px] rounded-[2px] border border-ink px-5 font-bold" onClick={onClear}>
        Show every inspection
      </button>
    </div>
  );
}
