import { Text, View } from '@react-pdf/renderer';
import type { SnapshotCircuit } from '@/lib/schemas/snapshot';
import { PdfFeed } from './pdf-feed';
import type { ReportPrint } from './report-context';
import { feedTrees, feedWords } from './report-feed';
import { Anchor, ReportPage } from './report-page';
import { TableHead } from './report-parts';
import { styles } from './report-styles';

const WIDTHS = [96, 116, 216, 97] as const;

/** What hangs from which breaker, and how the panel's own labels name it. */
export function ReportCircuits({ print }: { print: ReportPrint }) {
  const { messages, snapshot } = print;
  const { breaker, label, feeds, protection } = messages.circuits;
  const columns = [breaker, label, feeds, protection].map((head, index) => ({ head, width: WIDTHS[index] ?? 0 }));
  return (
    <ReportPage print={print} title={messages.circuits.title}>
      <Anchor print={print} id="circuits" />
      <Text style={styles.h1}>{messages.circuits.title}</Text>
      <Text style={styles.lead}>{`${messages.circuits.lead} ${messages.circuits.key}`}</Text>
      {snapshot.panels.map((panel) => (
        <View key={panel.id}>
          <View style={styles.section} wrap={false} minPresenceAhead={60}>
            <Text style={styles.h2}>{[panel.name, panel.place].filter(Boolean).join(', ')}</Text>
            {panel.fedFromCircuitId && <Text style={styles.small}>{fedFrom(print, panel.fedFromCircuitId)}</Text>}
          </View>
          {/* Its own box, so that the head is repeated only beside rows. */}
          <View>
            <TableHead columns={columns} />
            {snapshot.circuits
              .filter((circuit) => circuit.panelId === panel.id)
              .map((circuit) => (
                <CircuitRow key={circuit.id} print={print} circuit={circuit} />
              ))}
          </View>
          {feedTrees(snapshot, panel, messages).map((tree, index) => (
            <PdfFeed key={index} tree={tree} words={feedWords(panel, messages)} />
          ))}
        </View>
      ))}
    </ReportPage>
  );
}

function fedFrom({ snapshot, messages }: ReportPrint, circuitId: string): string {
  const circuit = snapshot.circuits.find((row) => row.id === circuitId);
  const panel = snapshot.panels.find((row) => row.id === circuit?.panelId);
  return circuit && panel ? messages.circuits.fedFrom(`${panel.name}, ${circuit.breaker}`) : '';
}

function CircuitRow({ print, circuit }: { print: ReportPrint; circuit: SnapshotCircuit }) {
  const { messages } = print;
  const size = [
    circuit.amps ? `${circuit.amps} A` : '',
    circuit.wireAwg ? `${circuit.wireAwg} AWG` : '',
    circuit.poles === 2 ? messages.circuits.poles : '',
  ];
  return (
    <View style={[styles.row, styles.line, { fontSize: 8.5 }]} wrap={false}>
      <View style={{ width: WIDTHS[0], paddingRight: 5 }}>
        <Text style={styles.bold}>{circuit.breaker}</Text>
        <Text style={styles.quiet}>{size.filter(Boolean).join(', ')}</Text>
      </View>
      <Text style={{ width: WIDTHS[1], paddingRight: 5 }}>{circuit.labelAsFound || messages.circuits.blank}</Text>
      <View style={{ width: WIDTHS[2], paddingRight: 5 }}>
        {circuit.feeds.length === 0 && <Text style={styles.quiet}>{messages.circuits.nothing}</Text>}
        {circuit.feeds.map((feed) => (
          <Text key={feed.receptacleId}>
            {[feed.place, feed.pattern, messages.device[feed.device]].filter(Boolean).join(', ')}
            {feed.off && <Text style={styles.bold}>{`. ${messages.circuits.off}`}</Text>}
          </Text>
        ))}
      </View>
      <Text style={{ width: WIDTHS[3] }}>{messages.breaker[circuit.protection]}</Text>
    </View>
  );
}
