/** What a drawing is made of. One list feeds the page and the PDF. */
export type Role =
  | 'face'
  | 'face-dead'
  | 'slot'
  | 'slot-dead'
  | 'strike'
  | 'button'
  | 'button-text'
  | 'button-pressed'
  | 'button-pressed-text'
  | 'pilot'
  | 'pilot-on'
  | 'link-none'
  | 'link-off'
  | 'link-lit'
  | 'tap'
  | 'dot'
  | 'letter'
  | 'lamp-none'
  | 'lamp-off'
  | 'lamp-lit'
  | 'pad-none'
  | 'pad-off'
  | 'pad-lit'
  | 'cross'
  | 'cross-lit'
  | 'rays'
  | 'half'
  | 'tag'
  | 'plate'
  | 'plate-text'
  | 'body'
  | 'gap'
  | 'casing'
  | 'hot'
  | 'neutral'
  | 'neutral-core'
  | 'ground'
  | 'ground-band'
  | 'screw-hot'
  | 'screw-neutral'
  | 'screw-ground'
  | 'screw-slot'
  | 'strip'
  | 'jacket'
  | 'supply'
  | 'supply-none'
  | 'open'
  | 'bridge'
  | 'flag'
  | 'flag-text'
  | 'wire'
  | 'wire-load'
  | 'wire-core'
  | 'wire-off'
  | 'symbol'
  | 'symbol-line'
  | 'band'
  | 'tag-box'
  | 'name'
  | 'note';

export type Shape =
  | { kind: 'path'; role: Role; d: string; turn?: { degrees: number; x: number; y: number } }
  | { kind: 'circle'; role: Role; cx: number; cy: number; r: number }
  | { kind: 'rect'; role: Role; x: number; y: number; width: number; height: number; rx: number }
  | { kind: 'text'; role: Role; x: number; y: number; size: number; words: string; start?: boolean }
  /** Shapes of another drawing, placed and scaled; its lines stay as thick as the rest. */
  | { kind: 'group'; x: number; y: number; scale: number; shapes: Shape[] };

export type Drawing = { box: [x: number, y: number, width: number, height: number]; shapes: Shape[]; label: string };

export type Token =
  | 'ink'
  | 'ink-2'
  | 'paper'
  | 'paper-2'
  | 'sheet'
  | 'rule'
  | 'brass'
  | 'silver'
  | 'green'
  | 'on-metal'
  | 'inverse'
  | 'on-inverse';
/** `line` is a multiple of the drawing's line weight; `mm` is a width in the drawing's own millimetres. Dashes likewise. */
export type Look = {
  fill?: Token;
  stroke?: Token;
  line?: number;
  mm?: number;
  dash?: [number, number];
  butt?: boolean;
  light?: boolean;
};

export const LOOKS: Record<Role, Look> = {
  face: { fill: 'sheet', stroke: 'ink', line: 1 },
  'face-dead': { stroke: 'ink', line: 1, dash: [3, 2.4] },
  slot: { fill: 'ink', stroke: 'ink', line: 0.3 },
  'slot-dead': { fill: 'paper', stroke: 'ink', line: 1 },
  strike: { stroke: 'ink', line: 1.4 },
  button: { fill: 'sheet', stroke: 'ink', line: 1 },
  'button-text': { fill: 'ink' },
  'button-pressed': { fill: 'ink', stroke: 'ink', line: 1 },
  'button-pressed-text': { fill: 'paper' },
  pilot: { stroke: 'ink', line: 1 },
  'pilot-on': { fill: 'ink', stroke: 'ink', line: 1 },
  'link-none': { stroke: 'rule', line: 1, dash: [0.1, 3] },
  'link-off': { stroke: 'rule', line: 1 },
  'link-lit': { stroke: 'ink', line: 2.4 },
  tap: { stroke: 'ink', line: 0.8 },
  dot: { fill: 'ink' },
  letter: { fill: 'ink-2' },
  'lamp-none': { fill: 'paper', stroke: 'rule', line: 1, dash: [2, 2] },
  'lamp-off': { fill: 'paper', stroke: 'ink', line: 1 },
  'lamp-lit': { fill: 'ink', stroke: 'ink', line: 1 },
  'pad-none': { fill: 'sheet', stroke: 'ink', line: 1, dash: [2, 2] },
  'pad-off': { fill: 'sheet', stroke: 'ink', line: 1 },
  'pad-lit': { fill: 'ink', stroke: 'ink', line: 1 },
  cross: { stroke: 'ink', line: 0.7 },
  'cross-lit': { stroke: 'paper', line: 0.7 },
  rays: { stroke: 'ink', line: 1.2 },
  half: { fill: 'ink' },
  tag: { fill: 'ink' },
  plate: { fill: 'paper', stroke: 'ink', line: 1 },
  'plate-text': { fill: 'ink' },
  body: { fill: 'paper-2', stroke: 'rule', line: 1 },
  gap: { stroke: 'paper', mm: 5, butt: true },
  casing: { stroke: 'ink', mm: 3.5, butt: true },
  hot: { stroke: 'brass', mm: 2.6, butt: true },
  neutral: { stroke: 'silver', mm: 2.6, butt: true },
  'neutral-core': { stroke: 'sheet', mm: 1.1, butt: true },
  ground: { stroke: 'green', mm: 2.6, butt: true },
  'ground-band': { stroke: 'sheet', mm: 2.6, dash: [0.7, 1.9], butt: true },
  'screw-hot': { fill: 'brass', stroke: 'ink', line: 1 },
  'screw-neutral': { fill: 'silver', stroke: 'ink', line: 1 },
  'screw-ground': { fill: 'green', stroke: 'ink', line: 1 },
  'screw-slot': { stroke: 'on-metal', line: 1 },
  strip: { stroke: 'rule', line: 1, dash: [2, 3] },
  jacket: { fill: 'ink' },
  supply: { fill: 'ink' },
  'supply-none': { fill: 'ink-2' },
  open: { stroke: 'ink', line: 1, dash: [3, 2.4] },
  bridge: { stroke: 'ink', line: 1 },
  flag: { fill: 'inverse', stroke: 'paper', line: 0.6 },
  'flag-text': { fill: 'on-inverse' },
  wire: { stroke: 'ink', mm: 2 },
  'wire-load': { stroke: 'ink', mm: 6 },
  'wire-core': { stroke: 'paper', mm: 2.4 },
  'wire-off': { stroke: 'ink', mm: 2.5, dash: [5, 6] },
  symbol: { fill: 'sheet', stroke: 'ink', mm: 1.5 },
  'symbol-line': { stroke: 'ink', mm: 2.2 },
  band: { stroke: 'rule', mm: 1.5, dash: [2, 5] },
  'tag-box': { fill: 'paper' },
  name: { fill: 'ink' },
  note: { fill: 'ink-2', light: true },
};

/** Two decimals are a hundredth of a millimetre. */
export function mm(value: number): number {
  return Number(value.toFixed(2));
}
