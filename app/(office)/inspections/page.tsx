import type { Metadata } from 'next';
import Link from 'next/link';
import { listInspections } from '@/db/inspections';
import { listMembers } from '@/db/people';
import { requireMember } from '@/lib/auth/session';
import { inspectionFilterSchema } from '@/lib/schemas/inspection';
import { InspectionsTable } from './inspections-table';
import { QueryProvider } from './query-provider';

export const metadata: Metadata = { title: 'Inspections' };

export default async function InspectionsPage({ searchParams }: PageProps<'/inspections'>) {
  const actor = await requireMember();
  const asked = inspectionFilterSchema.safeParse(await searchParams);
  const filter = asked.success ? asked.data : inspectionFilterSchema.parse({});
  const [first, members] = await Promise.all([listInspections(actor, filter), listMembers(actor)]);
  const inspectors = members
    .filter((member) => member.roles.includes('inspector'))
    .map(({ membershipId, name }) => ({ membershipId, name }));

  return (
    <div className="grid gap-6">
      <div className="flex flex-wrap items-end justify-between gap-4">
        <h1 className="font-serif text-2xl font-bold">Inspections</h1>
        <Link
          href="/inspections/new"
          className="inline-flex min-h-[44px] items-center rounded-[2px] bg-inverse px-5 font-bold text-on-inverse"
        >
          Book an inspection
        </Link>
      </div>
      <QueryProvider>
        <InspectionsTable
          start={first.kind === 'page' ? first.page : { items: [] }}
          filter={filter}
          inspectors={inspectors}
        />
      </QueryProvider>
    </div>
  );
}
