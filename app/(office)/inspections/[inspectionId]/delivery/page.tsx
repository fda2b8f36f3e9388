import type { Metadata, Route } from 'next';
import Link from 'next/link';
import { notFound } from 'next/navigation';
import { listGrants, type GrantListItem } from '@/db/grants';
import { findInspection } from '@/db/inspections';
import { listVersions } from '@/db/reports';
import { Button } from '@/components/ui/button';
import { requireMember } from '@/lib/auth/session';
import { dateIn, dateTimeIn } from '@/lib/messages/dates';
import { idSchema } from '@/lib/schemas/id';
import { RefreshWhile } from '../report/refresh-while';
import { revokeGrantAction } from './actions';
import { SendForm } from './send-form';

export const metadata: Metadata = { title: 'Delivery' };

/** Who gets the report: the buyer first. Who opened it, and the button that closes a link. */
export default async function DeliveryPage({ params }: PageProps<'/inspections/[inspectionId]/delivery'>) {
  const actor = await requireMember();
  const id = idSchema.safeParse((await params).inspectionId);
  const inspection = id.success ? await findInspection(actor, id.data) : null;
  if (!inspection) notFound();
  const [newest] = await listVersions(actor, inspection.id);
  const grants = await listGrants(actor, inspection.id);
  const buyers = inspection.parties.filter((party) => party.kind === 'buyer');
  const isWaiting = grants.some(({ mail }) => mail?.state === 'waiting' || mail?.state === 'sending');
  return (
    <div className="grid max-w-3xl gap-12">
      <RefreshWhile active={isWaiting} />
      <section aria-labelledby="buyer">
        <h2 id="buyer" className="border-b-2 border-ink pb-2 font-serif text-xl font-bold">
          The buyer comes first
        </h2>
        <p className="mt-3 max-w-[62ch] font-serif leading-relaxed">
          The buyer gets a link of their own, which works for 90 days. Nobody else reads the report unless the buyer
          names them.
        </p>
        {buyers.length === 0 && (
          <p className="mt-3">
            This inspection has no buyer.{' '}
            <Link href={`/inspections/${inspection.id}` as Route} className="underline">
              Add one in Visit
            </Link>
          </p>
        )}
        {buyers.map((buyer) => (
          <div key={buyer.id} className="grid gap-2 border-b border-hairline py-4">
            <h3 className="font-bold">{buyer.name}</h3>
            <p>{buyer.email ?? 'No e-mail address. Add it in Visit.'}</p>
            {newest ? (
              <SendForm
                inspectionId={inspection.id}
                partyId={buyer.id}
                label={`Send version ${newest.number} to ${buyer.name}`}
                isFirst={!grants.some((grant) => grant.partyId === buyer.id)}
              />
            ) : (
              <p>
                Nothing is released yet.{' '}
                <Link href={`/inspections/${inspection.id}/report` as Route} className="underline">
                  Open Report
                </Link>
              </p>
            )}
          </div>
        ))}
      </section>
      <section aria-labelledby="links">
        <h2 id="links" className="border-b-2 border-ink pb-2 font-serif text-xl font-bold">
          Links
        </h2>
        {grants.length === 0 && <p className="py-3">No link was sent yet.</p>}
        <ul>
          {grants.map((grant) => (
            <GrantRow key={grant.id} grant={grant} inspectionId={inspection.id} timeZone={inspection.timeZone} />
          ))}
        </ul>
      </section>
    </div>
  );
}

type GrantRowProps = { grant: GrantListItem; inspectionId: string; timeZone: string };

function GrantRow({ grant, inspectionId, timeZone }: GrantRowProps) {
  const isOpen = !grant.revokedAt;
  return (
    <li className="flex flex-wrap items-center justify-between gap-4 border-b border-hairline py-4">
      <div>
        <h3 className="font-bold">
          {grant.name}, {grant.email}
        </h3>
        <p>{mailWords(grant, timeZone)}</p>
        <p>{openedWords(grant, timeZone)}</p>
        <p className="text-s text-ink-2">
          {grant.revokedAt
            ? `Closed ${dateTimeIn(timeZone, grant.revokedAt)}`
            : `Works until ${dateIn(timeZone, grant.until)}`}
        </p>
      </div>
      {isOpen && (
        <form action={revokeGrantAction}>
          <input type="hidden" name="inspectionId" value={inspectionId} />
          <input type="hidden" name="grantId" value={grant.id} />
          <Button type="submit">
            Close this link<span className="sr-only"> of {grant.name}</span>
          </Button>
        </form>
      )}
    </li>
  );
}

function mailWords({ mail }: GrantListItem, timeZone: string): string {
  if (!mail) return '';
  if (mail.state === 'sent') return `Mailed ${mail.sentAt ? dateTimeIn(timeZone, mail.sentAt) : ''}`;
  if (mail.state === 'failed') return `Not mailed. ${mail.failure ?? ''}`;
  return `The mail is on its way.${mail.failure ? ` The last try did not work: ${mail.failure}` : ''}`;
}

function openedWords({ opens, openedAt }: GrantListItem, timeZone: string): string {
  if (!openedAt) return 'Not opened yet';
  return `Opened ${opens === 1 ? 'once' : `${opens} times`}, last ${dateTimeIn(timeZone, openedAt)}`;
}
