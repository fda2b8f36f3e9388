import { Text, View } from '@react-pdf/renderer';
import type { Lamp } from '@/lib/findings/vocabulary';
import type { SnapshotLogRow } from '@/lib/schemas/snapshot';
import { wordsIn, type ReportPrint } from './report-context';
import { Anchor, ReportPage } from './report-page';
import { otherPhotoIds } from './report-order';
import { TableHead } from './report-parts';
import { PhotoRows } from './report-photos';
import { INK, RULE, styles } from './report-styles';

const WIDTHS = { area: 78, number: 24, place: 82, device: 58, lamps: 44, volts: 82, protection: 74, result: 84 };

/** Every receptacle with what was read there, in walking order. */
export function ReportLog({ print }: { print: ReportPrint }) {
  const { messages, snapshot } = print;
  const names = new Map(snapshot.coverage.areas.map((area) => [area.areaId, area.name]));
  const columns = (Object.keys(WIDTHS) as (keyof typeof WIDTHS)[]).map((key) => ({
    head: messages.log[key],
    width: WIDTHS[key],
  }));
  const others = otherPhotoIds(snapshot);
  return (
    <>
      <ReportPage print={print} title={messages.log.title}>
        <Anchor print={print} id="log" />
        <Text style={styles.h1}>{messages.log.title}</Text>
        <Text style={styles.lead}>{messages.log.lead}</Text>
        <TableHead columns={columns} />
        {snapshot.log.map((row, index) => (
          <LogRow
            key={row.receptacleId}
            print={print}
            row={row}
            area={row.areaId === snapshot.log[index - 1]?.areaId ? '' : (names.get(row.areaId) ?? '')}
          />
        ))}
        <Text style={[styles.small, { marginTop: 8 }]}>{messages.log.never}</Text>
      </ReportPage>
      {others.length > 0 && (
        <ReportPage print={print} title={messages.log.photos}>
          <Text style={styles.h1}>{messages.log.photos}</Text>
          <PhotoRows print={print} photoIds={others} />
        </ReportPage>
      )}
    </>
  );
}

function LogRow({ print, row, area }: { print: ReportPrint; row: SnapshotLogRow; area: string }) {
  const { messages, locale } = print;
  const cell = (key: keyof typeof WIDTHS) => ({ width: WIDTHS[key], paddingRight: 5 });
  const device = [row.pattern, messages.device[row.device]].filter(Boolean).join(' ');
  return (
    <View style={[styles.row, styles.line, { paddingVertical: 4, fontSize: 8.5, lineHeight: 1.25 }]} wrap={false}>
      <Text style={[cell('area'), styles.bold]}>{area}</Text>
      <Text style={cell('number')}>{row.number}</Text>
      <Text style={cell('place')}>{row.label}</Text>
      <Text style={cell('device')}>{device}</Text>
      <View style={[cell('lamps'), styles.row, { paddingTop: 1.5 }]}>{row.lamps && <Beads row={row} />}</View>
      <Text style={cell('volts')}>{row.volts ? `${row.volts.hn} / ${row.volts.hg} / ${row.volts.ng}` : ''}</Text>
      <Text style={cell('protection')}>{wordsIn(locale, row.protection)}</Text>
      <Text style={{ width: WIDTHS.result }}>
        {wordsIn(locale, row.result)}
        {row.findings.length > 0 && <Text style={styles.bold}>{` ${messages.log.finding(row.findings)}`}</Text>}
      </Text>
    </View>
  );
}

function Beads({ row }: { row: SnapshotLogRow }) {
  const { hn, hg, ng } = row.lamps ?? {};
  const isTwoSlot = row.pattern === '1-15R';
  return (
    <>
      <Bead lamp={hn} />
      <Bead lamp={isTwoSlot ? undefined : hg} />
      <Bead lamp={isTwoSlot ? undefined : ng} />
    </>
  );
}

/** Filled: lit. Half filled: dim. Open: off. Dotted: there is no such slot. */
function Bead({ lamp }: { lamp?: Lamp }) {
  return (
    <View
      style={{
        width: 7.5,
        height: 7.5,
        marginRight: 3,
        borderRadius: 3.75,
        borderWidth: 0.75,
        borderStyle: lamp ? 'solid' : 'dotted',
        borderColor: lamp ? INK : RULE,
        backgroundColor: lamp === 'lit' ? INK : '#ffffff',
        overflow: 'hidden',
      }}
    >
      {lamp === 'dim' && <View style={{ width: 3.2, height: 6.5, backgroundColor: INK }} />}
    </View>
  );
}
