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

/** More lines of evidence, or more letters of what is unproven, take the whole width; evidence then runs on over pages. */
const MOST_LINES_BESIDE = 6;
const MOST_LETTERS_BESIDE = 260;

/** One finding: what was read, what it most often means, what the danger is, and what none of it proves. */
export function ReportFinding({ print, finding }: { print: ReportPrint; finding: SnapshotFinding }) {
  const [firstPhoto, ...morePhotos] = finding.photoIds;
  const lines = evidenceOf(print, finding);
  const letters = textOf(print, finding).unproven.join('').length;
  const isBeside = lines.length <= MOST_LINES_BESIDE && letters <= MOST_LETTERS_BESIDE;
  return (
    <View style={{ paddingBottom: startsPage(finding) ? 0 : 18 }}>
      <Statement print={print} finding={finding} photoId={firstPhoto} />
      {!isBeside && <Evidence print={print} lines={lines} />}
      <View style={{ marginTop: 8 }} wrap={false}>
        <View style={styles.row}>
          {isBeside && (
            <View style={{ width: 290, paddingRight: 18 }}>
              <Evidence print={print} lines={lines} />
            </View>
          )}
          <View style={styles.grow}>
            <Unproven print={print} finding={finding} />
          </View>
        </View>
        <Referral print={print} finding={finding} />
      </View>
      <PhotoRows print={print} photoIds={morePhotos} />
    </View>
  );
}

type Part = { print: ReportPrint; finding: SnapshotFinding };

function textOf({ locale }: ReportPrint, { text }: SnapshotFinding) {
  return (locale === 'es' ? text.es : undefined) ?? text.en;
}

/** Head, drawings, the four parts of the caution and the words: never split. */
function Statement({ print, finding, photoId }: Part & { photoId?: string }) {
  const { messages } = print;
  const text = textOf(print, finding);
  const isGrave = startsPage(finding);
  return (
    <View wrap={false}>
      <Anchor print={print} id={finding.id} />
      <View
        style={[styles.row, { alignItems: 'center', marginBottom: 6 }]}
        {...bookmark(headline(finding, text.title))}
      >
        <HazardTag signal={finding.signal} word={messages.signal[finding.signal]} large={isGrave} />
        <Text style={[styles.doing, styles.grow, { marginLeft: 9 }]}>{messages.urgency[finding.urgency]}</Text>
        <Text style={styles.small}>{messages.finding.heading(finding.number)}</Text>
      </View>
      <Text style={isGrave ? styles.h1 : styles.h1Small}>{headline(finding, text.title)}</Text>
      <Figures print={print} finding={finding} photoId={photoId} />
      <HazardParts print={print} hazard={text.hazard} who={text.who} />
      <Text style={[styles.read, { marginTop: 8 }]}>{text.observed}</Text>
      <Text style={[styles.read, { marginTop: 4 }]}>{text.means}</Text>
    </View>
  );
}

function Unproven({ print, finding }: Part) {
  return (
    <Limits>
      <Text style={styles.h3}>{print.messages.finding.unproven}</Text>
      {textOf(print, finding).unproven.map((line) => (
        <Text key={line} style={{ fontSize: 8.8, marginBottom: 2 }}>
          {line}
        </Text>
      ))}
    </Limits>
  );
}

function Referral({ print, finding }: Part) {
  const { finding: words } = print.messages;
  return (
    <View>
      <View style={styles.refer}>
        <Text>
          <Text style={styles.bold}>{words.referral} </Text>
          {textOf(print, finding).doNext}
        </Text>
      </View>
      {finding.hook && (
        <Text style={[styles.small, { marginTop: 6 }]}>{words.hook(finding.hook.section, finding.hook.since)}</Text>
      )}
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
          <ReadingDrawing drawing={drawing} width={112} />
        </Figure>
      )}
      {drawing?.condition && (
        <Figure caption={messages.finding.means} says={wiresWords(drawing, messages)}>
          <WiresDrawing drawing={drawing} width={112} />
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

type EvidenceLine = { at?: string; instrument: string; showed: string };

function evidenceOf({ messages }: ReportPrint, { evidence, told }: SnapshotFinding): EvidenceLine[] {
  const toldLines = told.map(({ at, whom, note }) => ({
    at,
    instrument: messages.finding.told,
    showed: [whom, note].filter(Boolean).join('. '),
  }));
  return [...evidence, ...toldLines];
}

function Evidence({ print, lines }: { print: ReportPrint; lines: EvidenceLine[] }) {
  const { messages, snapshot } = print;
  const { timeZone } = snapshot.inspection;
  return (
    <View style={{ marginTop: 6 }}>
      <Text style={styles.h3} minPresenceAhead={30}>
        {messages.finding.evidence}
      </Text>
      {lines.map((line, index) => (
        <View key={index} style={[styles.row, styles.line, { paddingVertical: 3, fontSize: 8.5 }]} wrap={false}>
          <Text style={{ width: 46 }}>{line.at ? timeIn(timeZone, line.at) : ''}</Text>
          <Text style={{ width: 92, paddingRight: 4 }}>{line.instrument}</Text>
          <Text style={styles.grow}>{line.showed}</Text>
        </View>
      ))}
    </View>
  );
}
