import { Page, Text, View } from '@react-pdf/renderer';
import type { ReactNode } from 'react';
import { bookmark, type ReportPrint } from './report-context';
import { styles } from './report-styles';

/** A Letter page, or several, with the firm's line on top and the record's line at the foot of each. */
export function ReportPage({ print, title, children }: { print: ReportPrint; title: string; children: ReactNode }) {
  return (
    <Page size="LETTER" style={styles.page} {...bookmark(title)}>
      <PageHeader print={print} />
      <PageFooter print={print} />
      {children}
    </Page>
  );
}

function PageHeader({ print: { snapshot, messages } }: { print: ReportPrint }) {
  const { firm, inspectors } = snapshot;
  const left = [firm.name, firm.address, firm.phone].filter(Boolean).join(' · ');
  const firmLicense = firm.licenseNumber ? [`Firm ${messages.license(firm.licenseNumber)}`] : [];
  const people = inspectors.map(({ name, licenseNumber }) =>
    licenseNumber ? `${name}, ${messages.license(licenseNumber)}` : name,
  );
  return (
    <View style={styles.header} fixed>
      <Text style={{ maxWidth: 310 }}>{left}</Text>
      <Text style={{ maxWidth: 205, textAlign: 'right' }}>{[...people, ...firmLicense].join(' · ')}</Text>
    </View>
  );
}

function PageFooter({ print: { snapshot, messages } }: { print: ReportPrint }) {
  const { inspection, number } = snapshot;
  return (
    <View style={styles.footer} fixed>
      <Text>{messages.footer(inspection.number, number, `${inspection.street}, ${inspection.cityLine}`)}</Text>
      <Text
        style={styles.folio}
        render={({ pageNumber, totalPages }) => (totalPages ? messages.pageOf(pageNumber, totalPages) : ' ')}
      />
    </View>
  );
}

/** Remembers on which page it came to stand, so that links can print the number. */
export function Anchor({ print, id }: { print: ReportPrint; id: string }) {
  return (
    <Text
      id={id}
      style={{ height: 0.1, fontSize: 1 }}
      render={({ pageNumber }) => {
        print.pages.set(id, pageNumber);
        return ' ';
      }}
    />
  );
}
