import type { Metadata } from 'next';
import Image from 'next/image';
import { listAdoptions, loadFirm } from '@/db/firms';
import { Button } from '@/components/ui/button';
import { requireMember } from '@/lib/auth/session';
import { AdoptionForm } from './adoption-form';
import { removeAdoptionAction, removeLogoAction } from './actions';
import { FirmForm } from './firm-form';

export const metadata: Metadata = { title: 'Firm' };

const NOTICES: Record<string, string> = {
  'logo-saved': 'The logo is saved. Reports released from now on show it.',
  'logo-removed': 'The logo is removed. Released reports keep it.',
  'adoption-removed': 'The edition is taken off the list.',
  'no-picture': 'No picture arrived. Choose it again.',
  'picture-too-large': 'That picture is over 5 MB. Choose a smaller one.',
  'picture-unusable': 'That file is not a whole JPEG or PNG picture. Choose another.',
};

export default async function FirmPage({ searchParams }: PageProps<'/firm'>) {
  const actor = await requireMember(['owner']);
  const { notice } = await searchParams;
  const [firm, adoptions] = await Promise.all([loadFirm(actor), listAdoptions(actor)]);
  const says = typeof notice === 'string' ? NOTICES[notice] : undefined;
  return (
    <>
      <h1 className="font-serif font-bold text-2xl">Firm</h1>
      {says && (
        <p role="status" className="mt-4 border-y border-ink py-3">
          {says}
        </p>
      )}
      <div className="mt-6 grid items-start gap-12 lg:grid-cols-[minmax(0,32rem)_minmax(0,1fr)]">
        <FirmForm
          values={{
            name: firm.name,
            phone: firm.phone ?? '',
            email: firm.email ?? '',
            licenseNumber: firm.licenseNumber ?? '',
            timeZone: firm.timeZone,
            stateProfile: firm.stateProfile,
            sharedDrafts: firm.sharedDrafts,
            address: {
              street: firm.address?.street ?? '',
              unit: firm.address?.unit ?? '',
              city: firm.address?.city ?? '',
              county: firm.address?.county ?? '',
              state: firm.address?.state ?? '',
              zip: firm.address?.zip ?? '',
            },
          }}
        />
        <div className="grid gap-12">
          <LogoSection logoKey={firm.logoKey} />
          <section aria-labelledby="editions" className="grid gap-4 border-t-2 border-ink pt-4">
            <h2 id="editions" className="font-serif font-bold text-l">
              Code editions in force
            </h2>
            <p className="max-w-[58ch]">
              Which edition of the electrical code a place enforces, from when, and who says so. Without a line here, an
              inspection shows the national years and says that the town may differ.
            </p>
            <AdoptionList adoptions={adoptions} />
            <AdoptionForm />
          </section>
        </div>
      </div>
    </>
  );
}

function LogoSection({ logoKey }: { logoKey: string | null }) {
  return (
    <section id="logo" aria-labelledby="logo-title" className="grid gap-4 border-t-2 border-ink pt-4">
      <h2 id="logo-title" className="font-serif font-bold text-l">
        Logo
      </h2>
      {logoKey ? (
        <>
          <Image
            width={400}
            height={200}
            unoptimized
            src={`/firm/logo?${logoKey.slice(-12)}`}
            alt="The firm’s logo"
            className="h-auto max-h-32 w-auto justify-self-start border border-rule bg-[#fff]"
          />
          <form action={removeLogoAction}>
            <Button type="submit">Remove the logo</Button>
          </form>
        </>
      ) : (
        <p>Reports show the name of the firm until there is a logo.</p>
      )}
      <form action="/firm/logo" method="post" encType="multipart/form-data" className="grid gap-2">
        <label htmlFor="logo-file" className="text-s font-bold">
          {logoKey ? 'Another logo' : 'The logo'}, JPEG or PNG, at most 5 MB
        </label>
        <input
          id="logo-file"
          type="file"
          name="picture"
          accept="image/png,image/jpeg"
          required
          className="min-h-[44px] max-w-full file:mr-3 file:min-h-[44px] file:cursor-pointer file:rounded-[2px] file:border file:border-solid file:border-ink file:px-4 file:font-bold"
        />
        <p>
          <Button type="submit">Use this logo</Button>
        </p>
      </form>
    </section>
  );
}

function AdoptionList({ adoptions }: { adoptions: Awaited<ReturnType<typeof listAdoptions>> }) {
  if (adoptions.length === 0) return <p>No edition is listed yet. Add the first below.</p>;
  return (
    <ul className="border-t border-ink">
      {adoptions.map(({ id, place, edition, from, source }) => (
        <li key={id} className="flex flex-wrap items-start justify-between gap-x-4 border-b border-hairline py-2">
          <div>
            <p>
              <b>{place}</b>: {edition} edition from {americanDate(from)}
            </p>
            <p className="text-s text-ink-2">{source}</p>
          </div>
          <form action={removeAdoptionAction}>
            <input type="hidden" name="adoptionId" value={id} />
            <Button weight="plain" type="submit">
              Remove
              <span className="sr-only">
                {' '}
                the {edition} edition of {place}
              </span>
            </Button>
          </form>
        </li>
      ))}
    </ul>
  );
}

function americanDate(day: string): string {
  const [year, month, date] = day.split('-').map(Number);
  return `${month}/${date}/${year}`;
}
