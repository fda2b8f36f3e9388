import type { LampPattern, VoltTrio } from '@/lib/findings/facts';
import type { DeviceKind, Lamp, SlotPattern } from '@/lib/findings/vocabulary';
import { hasButtons, outlineShape, RECTANGLE, slotShapes } from './face';
import { FACES, type Face, type Slot, type Terminal } from './geometry';
import { mm, type Drawing, type Role, type Shape } from './shapes';

type State = Lamp | 'none' | 'volts';
export type Ring = {
  pattern: SlotPattern;
  lamps?: Partial<LampPattern>;
  volts?: Pick<VoltTrio, 'hn' | 'hg' | 'ng'>;
  pad?: boolean;
  device?: DeviceKind;
  /** Height on screen in pixels, or in print in points; what would be too small to read is left out. */
  size?: number;
};
const KEYS = ['hn', 'hg', 'ng'] as const;
const SPOKEN: Record<State, string> = { lit: 'lit', dim: 'dim', off: 'off', none: 'not read', volts: '' };
const TERMINAL_NAME: Record<Terminal, string> = {
  H: 'hot',
  N: 'neutral',
  G: 'ground',
  X: 'one hot',
  Y: 'the other hot',
};

/** What was read: three lamps or three voltages on a ring around the face. Evidence only. */
export function readingDrawing(ring: Ring): Drawing {
  const { pattern, lamps, volts, pad = false, device, size = FULL_SIZE } = ring;
  const face = FACES[pattern];
  const k = face.outline === 'round' ? 27 / 17.05 : 1;
  const radius = (pad ? 25.5 : 23.5) * k;
  const links = face.slots.length === 2 ? KEYS.slice(0, 1) : KEYS;
  const names = terminalNames(face, pattern);
  const states = links.map((key): State => (volts ? 'volts' : (lamps?.[key] ?? 'none')));
  const level = face.slots[0]?.y ?? 0;
  const at = markPoints(radius);
  const margin = (pad ? 37 : size < LINES_FROM ? 30.5 : 33) * k;
  const lampRadius = (pad ? 7 : size < LINES_FROM ? 5.6 : 4.6) * k;

  const shapes: Shape[] = [
    ...arcs(radius, level)
      .slice(0, links.length)
      .map((d, i): Shape => ({ kind: 'path', role: linkRole(states[i] ?? 'none'), d })),
    hasButtons(device) && k === 1 ? RECTANGLE : outlineShape(face),
    ...slotShapes(face),
    ...(size < LINES_FROM ? [] : tapShapes(face, { radius, level, k, names, letters: size >= LETTERS_FROM })),
    ...links.flatMap((key, i) => {
      const [x, y] = at[i] ?? [0, 0];
      if (volts) return plate(x, y, k, voltWords(volts[key]));
      return lamp(x, y, {
        r: lampRadius,
        state: states[i] ?? 'none',
        tag: pad || size >= LETTERS_FROM ? names.pairs[i] : undefined,
        pad,
        size,
      });
    }),
  ];
  const said = links.map(
    (key, i) => `${names.spoken[i]} ${volts ? `${voltWords(volts[key])} volts` : SPOKEN[states[i] ?? 'none']}`,
  );
  return { box: [-margin, -margin, 2 * margin, 2 * margin], shapes, label: `${pattern}: ${said.join(', ')}` };
}

const FULL_SIZE = 400;
const LINES_FROM = 80;
const CROSSES_FROM = 110;
const LETTERS_FROM = 140;

type Names = { left: Terminal; right: Terminal; low: Terminal; pairs: string[]; spoken: string[] };

function terminalNames(face: Face, pattern: SlotPattern): Names {
  const [left, right, low]: [Terminal, Terminal, Terminal] =
    face.volts === 240 ? ['X', 'Y', pattern.startsWith('6') ? 'G' : 'N'] : ['N', 'H', 'G'];
  const pairs = [
    [right, left],
    [right, low],
    [left, low],
  ] as const;
  return {
    left,
    right,
    low,
    pairs: pairs.map((pair) => pair.join('–')),
    spoken: pairs.map(([a, b]) => `${TERMINAL_NAME[a]} to ${TERMINAL_NAME[b]}`),
  };
}

function markPoints(radius: number): [number, number][] {
  const x = mm(Math.cos((39 * Math.PI) / 180) * radius);
  const y = mm(Math.sin((39 * Math.PI) / 180) * radius);
  return [
    [0, -radius],
    [x, y],
    [-x, y],
  ];
}

function arcs(radius: number, level: number): string[] {
  const x = mm(Math.sqrt(radius ** 2 - level ** 2));
  const r = mm(radius);
  return [
    `M${-x} ${level}A${r} ${r} 0 0 1 ${x} ${level}`,
    `M${x} ${level}A${r} ${r} 0 0 1 0 ${r}`,
    `M0 ${r}A${r} ${r} 0 0 1 ${-x} ${level}`,
  ];
}

function linkRole(state: State): Role {
  if (state === 'lit' || state === 'dim') return 'link-lit';
  return state === 'none' ? 'link-none' : 'link-off';
}

type Taps = { radius: number; level: number; k: number; names: Names; letters: boolean };

/** Lines from the slots to the ring, with the letters of the terminals. */
function tapShapes(face: Face, { radius, level, k, names, letters }: Taps): Shape[] {
  const [left, right] = face.slots;
  if (!left || !right) return [];
  const low = face.slots.find((slot) => slot.y > 4);
  const y = level;
  const x = mm(Math.sqrt(radius ** 2 - y ** 2));
  const r = mm(radius);
  const down = low ? `M0 ${mm(low.y + low.height / 2 + 0.7)}V${r}` : '';
  const dot = (cx: number, cy: number): Shape => ({ kind: 'circle', role: 'dot', cx, cy, r: mm(0.9 * k) });
  const letter = (tx: number, ty: number, words: string): Shape => ({
    kind: 'text',
    role: 'letter',
    x: mm(tx),
    y: mm(ty),
    size: mm(3.9 * k),
    words,
  });
  return [
    { kind: 'path', role: 'tap', d: `M${edge(left, -1)} ${y}H${-x}M${edge(right, 1)} ${y}H${x}${down}` },
    dot(-x, y),
    dot(x, y),
    ...(low ? [dot(0, r)] : []),
    ...(letters ? [letter(-x - 3.6 * k, y + 1.4 * k, names.left), letter(x + 3.6 * k, y + 1.4 * k, names.right)] : []),
    ...(letters && low ? [letter(0, radius + 5.4 * k, names.low)] : []),
  ];
}

function edge({ shape, x, width, height, turn }: Slot, side: -1 | 1): number {
  const reach = turn ? height / 2 : width / 2;
  return mm(x + side * (reach + (shape.startsWith('tee') ? 6 : 0) + 0.7));
}

type LampMark = { r: number; state: State; tag: string | undefined; pad: boolean; size: number };

function lamp(x: number, y: number, { r, state, tag, pad, size }: LampMark): Shape[] {
  const d = r * Math.SQRT1_2;
  const role: Role = `${pad ? 'pad' : 'lamp'}-${state === 'lit' ? 'lit' : state === 'none' ? 'none' : 'off'}`;
  const shapes: Shape[] = [];
  if (state === 'lit' && size >= LINES_FROM) shapes.push({ kind: 'path', role: 'rays', d: rays(x, y, r) });
  shapes.push({ kind: 'circle', role, cx: mm(x), cy: mm(y), r: mm(r) });
  if (state === 'dim')
    shapes.push({ kind: 'path', role: 'half', d: `M${mm(x - r)} ${mm(y)}a${mm(r)} ${mm(r)} 0 0 0 ${mm(2 * r)} 0z` });
  if (state !== 'none' && size >= CROSSES_FROM) {
    const cross = `M${mm(x - d)} ${mm(y - d)}L${mm(x + d)} ${mm(y + d)}M${mm(x + d)} ${mm(y - d)}L${mm(x - d)} ${mm(y + d)}`;
    shapes.push({ kind: 'path', role: state === 'lit' ? 'cross-lit' : 'cross', d: cross });
  }
  if (state === 'none' && tag) {
    const words = pad ? tag : tag.replace('–', '');
    const letters = mm(r * (pad ? 0.53 : 0.8));
    shapes.push({
      kind: 'text',
      role: pad ? 'tag' : 'letter',
      x: mm(x),
      y: mm(y + letters * 0.36),
      size: letters,
      words,
    });
  }
  return shapes;
}

function rays(x: number, y: number, r: number): string {
  return Array.from({ length: 8 }, (_, i) => {
    const [c, s] = [Math.cos((i * Math.PI) / 4), Math.sin((i * Math.PI) / 4)];
    return `M${mm(x + c * (r + 1.3))} ${mm(y + s * (r + 1.3))}L${mm(x + c * (r + 3.1))} ${mm(y + s * (r + 3.1))}`;
  }).join('');
}

function plate(x: number, y: number, k: number, words: string): Shape[] {
  return [
    {
      kind: 'rect',
      role: 'plate',
      x: mm(x - 9 * k),
      y: mm(y - 4 * k),
      width: mm(18 * k),
      height: mm(8 * k),
      rx: mm(0.8 * k),
    },
    { kind: 'text', role: 'plate-text', x: mm(x), y: mm(y + 1.9 * k), size: mm(5.4 * k), words },
  ];
}

function voltWords(volts: number): string {
  return volts >= 100 ? String(Math.round(volts * 10) / 10) : volts.toFixed(1);
}
