import { Image as PdfImage, Text, View } from '@react-pdf/renderer';
import { dayIn } from '@/lib/messages/dates';
import { coverFacts, grouped } from './report-facts';
import type { ReportPrint } from './report-context';
import { ReportPage } from './report-page';
import { EmptyRing } from './report-drawing';
import { pictureSource } from './report-photos';
import { styles, SERIF } from './report-styles';

/** Whose report, of which house, by whom, and which version. */
export function ReportCover({ print }: { print: ReportPrint }) {
  const { snapshot, messages, logo, sha256 } = print;
  const { inspection, firm } = snapshot;
  return (
    <ReportPage print={print} title={inspection.street}>
      <View style={[styles.row, { alignItems: 'center', marginBottom: 14 }]}>
        {logo && <PdfImage src={pictureSource(logo)} style={{ maxWidth: 110, maxHeight: 44, marginRight: 12 }} />}
        <Text style={styles.h2}>{firm.name}</Text>
      </View>
      <EmptyRing width={190} />
      <Text style={{ fontFamily: SERIF, fontWeight: 700, fontSize: 29, lineHeight: 1.2, marginTop: 26 }}>
        {inspection.street}
      </Text>
      <Text style={{ fontFamily: SERIF, fontWeight: 700, fontSize: 17, lineHeight: 1.3, marginBottom: 16 }}>
        {inspection.cityLine}
      </Text>
      <Text style={styles.lead}>
        {messages.cover.lead(dayIn(inspection.timeZone, inspection.walkedAt?.first ?? inspection.scheduledAt))}
      </Text>
      <View style={{ borderTopWidth: 0.75, borderTopColor: '#1d1a15', marginTop: 8 }}>
        {coverFacts(snapshot, messages).map(([term, value]) => (
          <View key={term} style={styles.fact}>
            <Text style={styles.term}>{term}</Text>
            <Text style={styles.grow}>{value}</Text>
          </View>
        ))}
      </View>
      <Text style={[styles.small, { marginTop: 12 }]}>
        {messages.cover.hash}: {grouped(sha256)}
      </Text>
    </ReportPage>
  );
}
