import { StyleSheet } from '@react-pdf/renderer';

/** Points. 0.6 inches around, on Letter. */
export const MARGIN = 43.2;
export const LETTER_WIDTH = 612;
export const SERIF = [
  'Merriweather',
  'Merriweather ext',
  'Merriweather vietnamese',
  'Atkinson Hyperlegible',
  'Atkinson Hyperlegible ext',
];
export const SANS = [
  'Atkinson Hyperlegible',
  'Atkinson Hyperlegible ext',
  'Merriweather vietnamese',
  'Merriweather',
  'Merriweather ext',
];

export const INK = '#1d1a15';
export const INK_2 = '#5c5548';
export const HAIRLINE = '#d5cbb8';
export const RULE = '#8a806e';

const row = { flexDirection: 'row' } as const;

export const styles = StyleSheet.create({
  page: {
    paddingTop: 74,
    paddingBottom: 58,
    paddingHorizontal: MARGIN,
    fontFamily: SANS,
    fontSize: 9.5,
    color: INK,
  },
  header: {
    position: 'absolute',
    top: 36,
    left: MARGIN,
    right: MARGIN,
    ...row,
    justifyContent: 'space-between',
    borderBottomWidth: 0.75,
    borderBottomColor: INK,
    paddingBottom: 7,
    fontSize: 8,
    color: INK_2,
  },
  footer: {
    position: 'absolute',
    top: 740,
    left: MARGIN,
    right: MARGIN,
    ...row,
    justifyContent: 'space-between',
    borderTopWidth: 0.5,
    borderTopColor: HAIRLINE,
    paddingTop: 7,
    fontSize: 8,
    color: INK_2,
  },
  folio: { width: 70, textAlign: 'right' },
  h1: { fontFamily: SERIF, fontWeight: 700, fontSize: 18, lineHeight: 1.2, marginBottom: 6 },
  h1Small: { fontFamily: SERIF, fontWeight: 700, fontSize: 14, lineHeight: 1.3, marginBottom: 6 },
  h2: { fontFamily: SERIF, fontWeight: 700, fontSize: 12, lineHeight: 1.3 },
  section: { borderBottomWidth: 1.5, borderBottomColor: INK, paddingBottom: 4, marginTop: 20, marginBottom: 2 },
  h3: { fontWeight: 700, fontSize: 9.5, marginBottom: 3 },
  read: { fontFamily: SERIF, fontSize: 9.2, lineHeight: 1.45 },
  lead: { fontFamily: SERIF, fontSize: 10, lineHeight: 1.6, maxWidth: 430, marginBottom: 8 },
  doing: { fontFamily: SERIF, fontWeight: 700, fontSize: 11, lineHeight: 1.4 },
  row,
  text: { lineHeight: 1.4 },
  between: { ...row, justifyContent: 'space-between', alignItems: 'center' },
  line: { borderBottomWidth: 0.5, borderBottomColor: HAIRLINE, paddingVertical: 5 },
  bold: { fontWeight: 700 },
  quiet: { color: INK_2 },
  small: { fontSize: 8, color: INK_2 },
  link: { color: INK, textDecoration: 'underline' },
  limits: { borderLeftWidth: 0.75, borderLeftColor: RULE, paddingLeft: 2 },
  limitsInner: { borderLeftWidth: 0.75, borderLeftColor: RULE, paddingLeft: 10 },
  refer: { borderWidth: 0.75, borderColor: INK, padding: 7, marginTop: 7 },
  fact: { ...row, borderBottomWidth: 0.5, borderBottomColor: HAIRLINE, paddingVertical: 6.5 },
  term: { width: 112, paddingRight: 10, color: INK_2 },
  grow: { flex: 1 },
});
