import { Link, Text, View } from '@react-pdf/renderer';
import type { ReactNode } from 'react';
import type { ReportPrint } from './report-context';
import { styles } from './report-styles';

/** The double rule beside what limits a statement. */
export function Limits({ children }: { children: ReactNode }) {
  return (
    <View style={styles.limits}>
      <View style={styles.limitsInner}>{children}</View>
    </View>
  );
}

/** A link inside the PDF that prints as the page it goes to. */
export function PageLink({ print, anchor, label }: { print: ReportPrint; anchor: string; label?: string }) {
  const width = label ? 160 : 52;
  // Before the pages are known a figure stands in: a text that was empty once stays so.
  const pageOf = () => print.messages.page(print.pages.get(anchor) ?? 0);
  return (
    <Link src={`#${anchor}`} style={{ width }}>
      <Text
        style={[styles.link, { fontSize: 9, width, textAlign: label ? 'left' : 'right' }]}
        render={() => (label ? `${label}, ${pageOf()}` : pageOf())}
      />
    </Link>
  );
}

export function Section({ title, id, children }: { title: string; id?: string; children: ReactNode }) {
  return (
    <View>
      <View style={styles.section} id={id} wrap={false} minPresenceAhead={60}>
        <Text style={styles.h2}>{title}</Text>
      </View>
      {children}
    </View>
  );
}

export type Column = { head: string; width: number | string };

/** The head of a ruled table; it stands again on every page that the table runs to. */
export function TableHead({ columns }: { columns: Column[] }) {
  return (
    <View
      style={[styles.row, { borderBottomWidth: 0.75, borderBottomColor: '#1d1a15', paddingBottom: 4, marginTop: 6 }]}
      fixed
    >
      {columns.map(({ head, width }) => (
        <Text key={head} style={{ width, fontWeight: 700, fontSize: 8, color: '#5c5548', paddingRight: 5 }}>
          {head}
        </Text>
      ))}
    </View>
  );
}
