import type { Metadata, Route } from 'next';
import Link from 'next/link';
import { findReportFile } from '@/db/report-files';
import { findNewestVersion } from '@/db/reports';
import { BrandMark } from '@/components/brand-mark';
import { WebReport } from '@/components/report/web-report';
import { currentRecipient } from '@/lib/auth/recipient';
import { en } from '@/lib/messages/en';

export const metadata: Metadata = { title: 'Your report', robots: { index: false }, referrer: 'no-referrer' };

/** What the buyer reads. It needs no script and no account. */
export default async function SharedReportPage({ params }: PageProps<'/shared/[grantId]'>) {
  const { grantId } = await params;
  const recipient = await currentRecipient(grantId);
  if (!recipient) return <Closed />;
  const version = await findNewestVersion(recipient, recipient.inspectionId);
  if (!version) return <Closed />;

  const pdf = await findReportFile(recipient, version.id, 'en');
  const address = (path: string) => `${path}${path.includes('?') ? '&' : '?'}grant=${grantId}`;
  return (
    <main className="px-4 py-8 sm:px-8">
      <p className="mx-auto mb-8 flex max-w-3xl flex-wrap items-center justify-between gap-4">
        <span className="inline-flex items-center gap-2 font-serif text-l font-bold">
          <BrandMark />
          Ohmstead
        </span>
        {pdf ? (
          <a className="button print:hidden" href={address(`/api/reports/${version.id}/pdf`)}>
            {en.report.web.pdf}
          </a>
        ) : (
          <span className="text-s text-ink-2 print:hidden">{en.report.web.pdfSoon}</span>
        )}
      </p>
      <WebReport
        snapshot={version.snapshot}
        sha256={version.sha256}
        photoSrc={(photoId, size) => address(`/api/photos/${photoId}?size=${size}`)}
      />
    </main>
  );
}

function Closed() {
  return (
    <main className="mx-auto grid max-w-lg gap-4 px-4 py-8">
      <h1 className="font-serif text-xl font-bold">This page is closed</h1>
      <p className="max-w-[62ch]">
        Open the link in your mail again, on this device. If it no longer opens, it was closed or has run out: ask the
        firm that inspected the house to send a new one.
      </p>
      <p>
        <Link href={'/open' as Route} className="underline">
          Type the short code from the mail
        </Link>
      </p>
    </main>
  );
}
