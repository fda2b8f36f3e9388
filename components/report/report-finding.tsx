import { Text, View } from '@react-pdf/renderer';
import { timeIn } from '@/lib/messages/dates';
import type { SnapshotFinding } from '@/lib/schemas/snapshot';
import { bookmark, type ReportPrint } from './report-context';
import { ReadingDrawing, WiresDrawing } from './report-drawing';
import { readingWords, wiresWords } from './report-drawing-words';
import { headline } from './report-facts';
import { HazardTag } from './report-hazard';
import { startsPage } from './report-order';
import { Anchor } from './report-page';
import { Limits } from './report-parts';
import { FigurePhoto, PhotoRows } from './report-photos';
import { styles } from './report-styles';

/** One finding: what was read, what it most often means, what the danger is, and what none of it proves. */
export function ReportFinding({ print, finding }: { print: ReportPrint; finding: SnapshotFinding }) {
  const { messages, locale } = print;
  const text = (locale === 'es' ? finding.text.es : undefined) ?? finding.text.en;
  const [firstPhoto, ...morePhotos] = finding.photoIds;
  return (
    <View style={{ marginBottom: 22 }}>
      <View wrap={false}>
        <Anchor print={print} id={finding.id} />
        <View
          style={[styles.row, { alignItems: 'center', marginBottom: 6 }]}
          {...bookmark(headline(finding, text.title))}
        >
          <HazardTag signal={finding.signal} word={messages.signal[finding.signal]} large={startsPage(finding)} />
          <Text style={[styles.doing, styles.grow, { marginLeft: 9 }]}>{messages.urgency[finding.urgency]}</Text>
          <Text style={styles.small}>{messages.finding.heading(finding.number)}</Text>
        </View>
        <Text style={startsPage(finding) ? styles.h1 : styles.h1Small}>{headline(finding, text.title)}</Text>
        <Figures print={print} finding={finding} photoId={firstPhoto} />
        <HazardParts print={print} hazard={text.hazard} who={text.who} />
        <Text style={[styles.read, { marginTop: 8 }]}>{text.observed}</Text>
        <Text style={[styles.read, { marginTop: 4, marginBottom: 10 }]}>{text.means}</Text>
        <View style={styles.row}>
          <Evidence print={print} finding={finding} />
          <View style={{ width: 225 }}>
            <Limits>
              <Text style={styles.h3}>{messages.finding.unproven}</Text>
              {text.unproven.map((line) => (
                <Text key={line} style={{ marginBottom: 2 }}>
                  {line}
                </Text>
              ))}
            </Limits>
          </View>
        </View>
        <View style={styles.refer}>
          <Text>
            <Text style={styles.bold}>{messages.finding.referral} </Text>
            {text.doNext}
          </Text>
        </View>
        {finding.hook && (
          <Text style={[styles.small, { marginTop: 6 }]}>
            {messages.finding.hook(finding.hook.section, finding.hook.since)}
          </Text>
        )}
      </View>
      <PhotoRows print={print} photoIds={morePhotos} />
    </View>
  );
}

function Figures({ print, finding, photoId }: { print: ReportPrint; finding: SnapshotFinding; photoId?: string }) {
  const { drawing } = finding;
  if (!drawing && !photoId) return null;
  const { messages } = print;
  return (
    <View style={[styles.row, { alignItems: 'flex-end', marginBottom: 10 }]}>
      {drawing && (
        <Figure caption={messages.finding.read} says={readingWords(drawing)}>
          <ReadingDrawing drawing={drawing} width={130} />
        </Figure>
      )}
      {drawing?.condition && (
        <Figure caption={messages.finding.means} says={wiresWords(drawing, messages)}>
          <WiresDrawing drawing={drawing} width={130} />
        </Figure>
      )}
      {photoId && <FigurePhoto print={print} photoId={photoId} />}
    </View>
  );
}

function Figure({ caption, says, children }: { caption: string; says: string; children: React.ReactNode }) {
  return (
    <View style={{ width: 160, alignItems: 'center', paddingRight: 10 }}>
      {children}
      <Text style={[styles.bold, { fontSize: 8.5, marginTop: 4, textAlign: 'center' }]}>{caption}</Text>
      <Text style={{ fontSize: 8.5, textAlign: 'center' }}>{says}</Text>
    </View>
  );
}

type Hazard = SnapshotFinding['text']['en']['hazard'];

function HazardParts({ print, hazard, who }: { print: ReportPrint; hazard: Hazard; who: string }) {
  const { finding } = print.messages;
  const parts = [
    [finding.danger, hazard.type],
    [finding.does, hazard.consequence],
    [finding.avoid, hazard.avoid],
    [finding.who, who],
  ] as const;
  return (
    <View style={[styles.row, { borderTopWidth: 0.75, borderBottomWidth: 0.75, borderColor: '#1d1a15' }]}>
      {parts.map(([head, says], index) => (
        <View
          key={head}
          style={{
            flex: 1,
            paddingVertical: 6,
            paddingRight: 8,
            paddingLeft: index === 0 ? 0 : 8,
            borderLeftWidth: index === 0 ? 0 : 0.5,
            borderLeftColor: '#d5cbb8',
          }}
        >
          <Text style={styles.h3}>{head}</Text>
          <Text>{says}</Text>
        </View>
      ))}
    </View>
  );
}

function Evidence({ print, finding }: { print: ReportPrint; finding: SnapshotFinding }) {
  const { messages, snapshot } = print;
  const { timeZone } = snapshot.inspection;
  const told = finding.told.map(({ at, whom, note }) => ({
    at,
    instrument: messages.finding.told,
    showed: [whom, note].filter(Boolean).join('. '),
  }));
  return (
    <View style={{ flex: 1, paddingRight: 18 }}>
      <Text style={styles.h3}>{messages.finding.evidence}</Text>
      {[...finding.evidence, ...told].map((line, index) => (
        <View key={index} style={[styles.row, styles.line, { paddingVertical: 3.5, fontSize: 8.5 }]}>
          <Text style={{ width: 46 }}>{line.at ? timeIn(timeZone, line.at) : ''}</Text>
          <Text style={{ width: 92, paddingRight: 4 }}>{line.instrument}</Text>
          <Text style={styles.grow}>{line.showed}</Text>
        </View>
      ))}
    </View>
  );
}
