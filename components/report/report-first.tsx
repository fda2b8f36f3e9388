import { Text, View } from '@react-pdf/renderer';
import { wordsIn, type ReportPrint } from './report-context';
import { ReadingDrawing } from './report-drawing';
import { HazardTag } from './report-hazard';
import { Limits, PageLink } from './report-parts';
import { ReportPage } from './report-page';
import { styles } from './report-styles';
import { inFirstList, leadCounts } from './report-order';
import type { SnapshotFinding } from '@/lib/schemas/snapshot';

/** Page one for the buyer: what to leave alone, what to have repaired, and what can wait, in plain words. */
export function ReportFirst({ print }: { print: ReportPrint }) {
  const { messages, snapshot } = print;
  const first = snapshot.findings.filter(inFirstList);
  const later = snapshot.findings.filter((finding) => !inFirstList(finding));
  const { now, days, rest } = leadCounts(snapshot.findings);
  return (
    <ReportPage print={print} title={messages.first.title}>
      <Text style={styles.h1}>{messages.first.title}</Text>
      <Text style={styles.lead}>
        {snapshot.findings.length > 0 ? messages.first.lead(now, days, rest) : messages.first.nothing}
      </Text>
      {first.map((finding) => (
        <FirstItem key={finding.id} print={print} finding={finding} />
      ))}
      {later.length > 0 && (
        <View style={styles.section} wrap={false} minPresenceAhead={40}>
          <Text style={styles.h2}>{messages.first.later}</Text>
        </View>
      )}
      {later.map((finding) => (
        <LaterItem key={finding.id} print={print} finding={finding} />
      ))}
      <View style={{ marginTop: 14 }} wrap={false}>
        <Limits>
          <Text>{messages.first.limits}</Text>
        </Limits>
        <View style={[styles.row, { marginTop: 6, marginLeft: 14 }]}>
          <PageLink print={print} anchor="gaps" label={messages.gaps.title} />
          <PageLink print={print} anchor="not-tested" label={messages.skipped.title} />
          <PageLink print={print} anchor="limits" label={messages.limits.title} />
        </View>
      </View>
    </ReportPage>
  );
}

function FirstItem({ print, finding }: { print: ReportPrint; finding: SnapshotFinding }) {
  const { messages, locale } = print;
  const text = (locale === 'es' ? finding.text.es : undefined) ?? finding.text.en;
  return (
    <View style={[styles.row, styles.line, { paddingVertical: 10 }]} wrap={false}>
      <View style={{ width: 70 }}>{finding.drawing && <ReadingDrawing drawing={finding.drawing} width={56} />}</View>
      <View style={styles.grow}>
        <View style={styles.between}>
          <View style={[styles.row, styles.grow, { alignItems: 'center' }]}>
            <HazardTag signal={finding.signal} word={messages.signal[finding.signal]} />
            <Text style={[styles.bold, styles.grow, { marginLeft: 8 }]}>{finding.place}</Text>
          </View>
          <PageLink print={print} anchor={finding.id} />
        </View>
        <Text style={[styles.doing, { marginTop: 4 }]}>{messages.urgency[finding.urgency]}</Text>
        <Text style={styles.read}>{text.plain}</Text>
      </View>
    </View>
  );
}

function LaterItem({ print, finding }: { print: ReportPrint; finding: SnapshotFinding }) {
  const { messages, locale } = print;
  return (
    <View style={[styles.row, styles.line, { alignItems: 'center' }]} wrap={false}>
      <View style={{ width: 82 }}>
        <HazardTag signal={finding.signal} word={messages.signal[finding.signal]} />
      </View>
      <Text style={[styles.grow, { marginHorizontal: 8 }]}>
        <Text style={styles.bold}>{messages.urgency[finding.urgency]}. </Text>
        {finding.place}: {wordsIn(locale, { en: finding.text.en.title, es: finding.text.es?.title })}
      </Text>
      <PageLink print={print} anchor={finding.id} />
    </View>
  );
}
