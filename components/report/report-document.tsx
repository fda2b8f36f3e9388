import { Document } from '@react-pdf/renderer';
import { ReportCircuits } from './report-circuits';
import type { ReportPrint } from './report-context';
import { ReportCover } from './report-cover';
import { ReportFinding } from './report-finding';
import { ReportFirst } from './report-first';
import { ReportEnd, ReportGaps } from './report-limits';
import { ReportLog } from './report-log';
import { startsPage } from './report-order';
import { ReportPage } from './report-page';

/** The whole report. It prints the snapshot and nothing else; equal snapshots give equal bytes. */
export function ReportDocument({ print }: { print: ReportPrint }) {
  const { snapshot, messages } = print;
  const released = new Date(snapshot.releasedAt);
  const address = `${snapshot.inspection.street}, ${snapshot.inspection.cityLine}`;
  const alone = snapshot.findings.filter(startsPage);
  const together = snapshot.findings.filter((finding) => !startsPage(finding));
  return (
    <Document
      title={messages.title(address)}
      author={`${snapshot.signature.name}, ${snapshot.firm.name}`}
      subject={`SHA-256 ${print.sha256}`}
      creator="Ohmstead"
      producer={snapshot.renderer}
      language={print.locale === 'es' ? 'es-US' : 'en-US'}
      creationDate={released}
      modificationDate={released}
      pageMode="useOutlines"
    >
      <ReportCover print={print} />
      <ReportFirst print={print} />
      {alone.map((finding) => (
        <ReportPage key={finding.id} print={print} title={finding.place}>
          <ReportFinding print={print} finding={finding} />
        </ReportPage>
      ))}
      {together.length > 0 && (
        <ReportPage print={print} title={messages.first.later}>
          {together.map((finding) => (
            <ReportFinding key={finding.id} print={print} finding={finding} />
          ))}
        </ReportPage>
      )}
      <ReportGaps print={print} />
      <ReportLog print={print} />
      {snapshot.circuits.length > 0 && <ReportCircuits print={print} />}
      <ReportEnd print={print} />
    </Document>
  );
}
