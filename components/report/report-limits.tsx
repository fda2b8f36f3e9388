import { Image as PdfImage, Text, View } from '@react-pdf/renderer';
import { dateTimeIn } from '@/lib/messages/dates';
import { wordsIn, type ReportPrint } from './report-context';
import { signatureFacts } from './report-facts';
import { Anchor, ReportPage } from './report-page';
import { Limits, Section } from './report-parts';
import { pictureSource } from './report-photos';
import { SERIF, styles } from './report-styles';

/** What the readings leave open. */
export function ReportGaps({ print }: { print: ReportPrint }) {
  const { messages, snapshot, locale } = print;
  return (
    <ReportPage print={print} title={messages.gaps.title}>
      <Anchor print={print} id="gaps" />
      <Text style={styles.h1}>{messages.gaps.title}</Text>
      <Text style={styles.lead}>{snapshot.gaps.length > 0 ? messages.gaps.lead : messages.gaps.none}</Text>
      {snapshot.gaps.map((gap) => (
        <PlaceLine key={gap.id} place={gap.place} says={wordsIn(locale, gap.says)} />
      ))}
    </ReportPage>
  );
}

/** What was covered and what was not, with the reason; what these tests cannot see; who signs for it. */
export function ReportEnd({ print }: { print: ReportPrint }) {
  const { messages, snapshot, locale } = print;
  return (
    <ReportPage print={print} title={messages.skipped.title}>
      <Anchor print={print} id="not-tested" />
      <Text style={styles.h1}>{messages.skipped.title}</Text>
      {snapshot.notTested.length === 0 && <Text style={styles.lead}>{messages.skipped.none}</Text>}
      {snapshot.notTested.map((row, index) => (
        <PlaceLine
          key={index}
          place={row.place}
          says={[wordsIn(locale, row.says), row.note].filter(Boolean).join(' ')}
        />
      ))}
      {snapshot.coverage.leftOff.length > 0 && (
        <Section title={messages.skipped.leftOff}>
          {snapshot.coverage.leftOff.map((line) => (
            <Text key={line} style={styles.line}>
              {line}
            </Text>
          ))}
        </Section>
      )}
      <Section title={messages.skipped.coverage}>
        {snapshot.coverage.areas.map((area) => (
          <PlaceLine
            key={area.areaId}
            place={`${area.name}, ${area.structure}`}
            says={messages.skipped.areaLine(area.tested, area.present, area.skipped)}
          />
        ))}
      </Section>
      <LimitLines print={print} />
      <Signature print={print} />
    </ReportPage>
  );
}

function PlaceLine({ place, says }: { place: string; says: string }) {
  return (
    <View style={[styles.row, styles.line]} wrap={false}>
      <Text style={[styles.bold, { width: 150, paddingRight: 8 }]}>{place}</Text>
      <Text style={styles.grow}>{says}</Text>
    </View>
  );
}

function LimitLines({ print }: { print: ReportPrint }) {
  const { messages, snapshot } = print;
  const lines = (print.locale === 'es' ? snapshot.limits.es : undefined) ?? snapshot.limits.en;
  return (
    <Section title={messages.limits.title}>
      <Anchor print={print} id="limits" />
      <Limits>
        {lines.map((line) => (
          <Text key={line} style={[styles.read, { marginTop: 5, maxWidth: 470 }]}>
            {line}
          </Text>
        ))}
      </Limits>
    </Section>
  );
}

function Signature({ print }: { print: ReportPrint }) {
  const { messages, snapshot, sha256, signatureImage } = print;
  const { signature, inspection } = snapshot;
  const license = signature.licenseNumber ? `, ${messages.license(signature.licenseNumber)}` : '';
  return (
    <View wrap={false}>
      <Section title={messages.signature.title}>
        <View style={{ marginVertical: 10 }}>
          {signatureImage ? (
            <PdfImage
              src={pictureSource(signatureImage)}
              style={{ height: 40, objectFit: 'contain', objectPosition: '0 0' }}
            />
          ) : (
            <Text style={{ fontFamily: SERIF, fontStyle: 'italic', fontSize: 17 }}>{signature.name}</Text>
          )}
          <Text style={styles.quiet}>
            {messages.signature.signed(
              `${signature.name}${license}`,
              dateTimeIn(inspection.timeZone, signature.signedAt),
            )}
          </Text>
        </View>
        {signatureFacts(snapshot, sha256, messages).map(([term, value]) => (
          <View key={term} style={styles.fact}>
            <Text style={styles.term}>{term}</Text>
            <Text style={styles.grow}>{value}</Text>
          </View>
        ))}
        <Text style={[styles.small, { marginTop: 8 }]}>{messages.signature.record}</Text>
      </Section>
    </View>
  );
}
