import { Facts } from '@/components/ui/facts';
import { dateTimeIn } from '@/lib/messages/dates';
import { en } from '@/lib/messages/en';
import type { ReportSnapshot } from '@/lib/schemas/snapshot';
import { signatureFacts } from './report-facts';
import { WebHeading } from './web-heading';

type Part = { snapshot: ReportSnapshot };

/** What the readings leave open. */
export function WebGaps({ snapshot: { gaps } }: Part) {
  return (
    <section aria-labelledby="gaps">
      <WebHeading id="gaps">{en.report.gaps.title}</WebHeading>
      <p className="mb-2 max-w-[62ch] font-serif leading-relaxed">
        {gaps.length > 0 ? en.report.gaps.lead : en.report.gaps.none}
      </p>
      <Facts facts={gaps.map(({ place, says }) => ({ term: place, value: says.en }))} />
    </section>
  );
}

export function WebNotTested({ snapshot: { notTested } }: Part) {
  return (
    <section aria-labelledby="not-tested">
      <WebHeading id="not-tested">{en.report.skipped.title}</WebHeading>
      {notTested.length === 0 && <p>{en.report.skipped.none}</p>}
      <Facts facts={notTested.map(({ place, says, note }) => ({ term: place, value: says.en, source: note }))} />
    </section>
  );
}

export function WebCoverage({ snapshot: { coverage } }: Part) {
  const { skipped } = en.report;
  return (
    <section aria-labelledby="coverage">
      <WebHeading id="coverage">{skipped.coverage}</WebHeading>
      {coverage.leftOff.length > 0 && (
        <>
          <h3 className="mt-3 font-bold">{skipped.leftOff}</h3>
          <ul className="mb-3 list-disc pl-5">
            {coverage.leftOff.map((line) => (
              <li key={line}>{line}</li>
            ))}
          </ul>
        </>
      )}
      <Facts
        facts={coverage.areas.map((area) => ({
          term: area.name,
          value: skipped.areaLine(area.tested, area.present, area.skipped),
          source: area.structure,
        }))}
      />
    </section>
  );
}

export function WebLimits({ snapshot: { limits } }: Part) {
  return (
    <section aria-labelledby="limits">
      <WebHeading id="limits">{en.report.limits.title}</WebHeading>
      <ul className="grid max-w-[62ch] list-disc gap-2 pl-5 font-serif leading-relaxed">
        {limits.en.map((line) => (
          <li key={line}>{line}</li>
        ))}
      </ul>
    </section>
  );
}

export function WebSignature({ snapshot, sha256 }: Part & { sha256: string }) {
  const { signature, inspection } = snapshot;
  const license = signature.licenseNumber ? `, ${en.report.license(signature.licenseNumber)}` : '';
  const when = dateTimeIn(inspection.timeZone, signature.signedAt);
  return (
    <section aria-labelledby="signature">
      <WebHeading id="signature">{en.report.signature.title}</WebHeading>
      <p className="my-3 font-serif text-xl italic">{signature.name}</p>
      <p className="mb-3 text-ink-2">{en.report.signature.signed(`${signature.name}${license}`, when)}</p>
      <Facts facts={signatureFacts(snapshot, sha256, en.report).map(([term, value]) => ({ term, value }))} />
      <p className="mt-2 text-s text-ink-2">{en.report.signature.record}</p>
    </section>
  );
}
