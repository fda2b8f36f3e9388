import { notFound } from 'next/navigation';
import { TabsNav } from '@/components/ui/tabs-nav';
import { findInspection } from '@/db/inspections';
import { requireMember } from '@/lib/auth/session';
import { idSchema } from '@/lib/schemas/id';
import { STATE_WORDS } from '../state-words';

export default async function InspectionLayout({ children, params }: LayoutProps<'/inspections/[inspectionId]'>) {
  const actor = await requireMember();
  const id = idSchema.safeParse((await params).inspectionId);
  const inspection = id.success ? await findInspection(actor, id.data) : null;
  if (!inspection) notFound();
  const buyer = inspection.parties.find((party) => party.kind === 'buyer');
  const when = new Intl.DateTimeFormat('en-US', {
    timeZone: inspection.timeZone,
    dateStyle: 'full',
    timeStyle: 'short',
  }).format(inspection.scheduledAt);
  const base = `/inspections/${inspection.id}` as const;
  return (
    <div className="grid gap-8">
      <header className="border-b border-ink print:hidden">
        <p className="text-s text-ink-2">
          Inspection {String(inspection.number).padStart(4, '0')} ·{' '}
          <b className="text-ink">{STATE_WORDS[inspection.state]}</b>
        </p>
        <h1 className="mt-1 font-serif text-2xl font-bold break-words">{inspection.addressLine}</h1>
        <p className="mt-1 text-ink-2">
          {inspection.yearBuilt ? `Built ${inspection.yearBuilt}` : 'Year built not known'} · {when}
          {buyer && ` · ${buyer.name}, buyer`}
        </p>
        <div className="mt-4 flex flex-wrap items-end justify-between gap-x-6">
          <TabsNav
            label="Inspection"
            tabs={[
              { href: base, label: 'Visit', exact: true },
              { href: `${base}/findings`, label: 'Findings' },
              { href: `${base}/report`, label: 'Report' },
              { href: `${base}/delivery`, label: 'Delivery' },
            ]}
          />
          <a href={`/walk#${inspection.id}`} className="button mb-2">
            Open Walk
          </a>
        </div>
      </header>
      {children}
    </div>
  );
}
