import { en } from '@/lib/messages/en';
import { dayIn } from '@/lib/messages/dates';
import type { ReportSnapshot } from '@/lib/schemas/snapshot';
import { Facts } from '@/components/ui/facts';
import { coverFacts } from './report-facts';
import { inFirstList, leadCounts, otherPhotoIds } from './report-order';
import { WebCircuits, WebLog } from './web-log';
import { WebHeading } from './web-heading';
import { WebFinding, WebPhotos } from './web-finding';
import { WebFirst, WebLater } from './web-first';
import { WebCoverage, WebGaps, WebLimits, WebNotTested, WebSignature } from './web-end';

export type WebReportProps = {
  snapshot: ReportSnapshot;
  sha256: string;
  /** Address of the shared copy of a photo, 480 or 1600 px wide. */
  photoSrc: (photoId: string, size: '480' | '1600') => string;
};

/** The whole report as a page: the accessible original of the PDF, from the same snapshot. It reads without script. */
export function WebReport({ snapshot, sha256, photoSrc }: WebReportProps) {
  const { inspection, findings } = snapshot;
  const first = findings.filter(inFirstList);
  const later = findings.filter((finding) => !inFirstList(finding));
  const { now, days, rest } = leadCounts(findings);
  const others = otherPhotoIds(snapshot);
  return (
    <article lang="en" className="mx-auto grid max-w-3xl grid-cols-[minmax(0,1fr)] gap-12">
      <header>
        <p className="text-s text-ink-2">
          {inspection.street}, {inspection.cityLine} · {dayIn(inspection.timeZone, inspection.scheduledAt)} ·{' '}
          {snapshot.firm.name}
        </p>
        <h1 className="mt-2 font-serif text-2xl font-bold sm:text-3xl">{en.report.first.title}</h1>
        <p className="mt-4 max-w-[62ch] font-serif text-m leading-relaxed">
          {findings.length > 0 ? en.report.first.lead(now, days, rest) : en.report.first.nothing}
        </p>
      </header>
      {first.length > 0 && <WebFirst findings={first} />}
      {later.length > 0 && <WebLater findings={later} />}
      <WebUnknown snapshot={snapshot} />
      <section aria-labelledby="findings" className="grid grid-cols-[minmax(0,1fr)] gap-16">
        <WebHeading id="findings">{en.report.web.findings}</WebHeading>
        {findings.map((finding) => (
          <WebFinding key={finding.id} finding={finding} snapshot={snapshot} photoSrc={photoSrc} />
        ))}
      </section>
      <WebGaps snapshot={snapshot} />
      <WebLog snapshot={snapshot} />
      {others.length > 0 && (
        <section aria-labelledby="photos">
          <WebHeading id="photos">{en.report.log.photos}</WebHeading>
          <WebPhotos photoIds={others} snapshot={snapshot} photoSrc={photoSrc} />
        </section>
      )}
      <WebCircuits snapshot={snapshot} />
      <WebNotTested snapshot={snapshot} />
      <WebCoverage snapshot={snapshot} />
      <WebLimits snapshot={snapshot} />
      <section aria-labelledby="house">
        <WebHeading id="house">{en.report.web.house}</WebHeading>
        <Facts facts={coverFacts(snapshot, en.report).map(([term, value]) => ({ term, value }))} />
      </section>
      <WebSignature snapshot={snapshot} sha256={sha256} />
    </article>
  );
}

/** What the page does not tell, before a reader leaves it. */
function WebUnknown({ snapshot }: { snapshot: ReportSnapshot }) {
  const { coverage, gaps } = snapshot;
  const untested = coverage.present - coverage.tested;
  const lines = [
    ...(untested > 0 ? [en.report.web.untested(untested)] : []),
    ...(gaps.length > 0 ? [en.report.web.unproven(gaps.length)] : []),
    ...en.report.web.always,
  ];
  return (
    <section aria-labelledby="unknown" className="border-l-[3px] border-double border-rule pl-4">
      <h2 id="unknown" className="font-serif text-l font-bold">
        {en.report.web.unknown}
      </h2>
      <ul className="mt-2 grid max-w-[62ch] list-disc gap-1 pl-5 font-serif leading-relaxed">
        {lines.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
      <p className="mt-3 flex flex-wrap gap-x-6 gap-y-1 text-s print:hidden">
        <a href="#gaps">{en.report.gaps.title}</a>
        <a href="#not-tested">{en.report.skipped.title}</a>
        <a href="#limits">{en.report.limits.title}</a>
      </p>
    </section>
  );
}
