import type { SlotPattern, WiringCondition } from '@/lib/findings/vocabulary';
import { outlineShape, slotShapes } from './face';
import { FACES, WIRINGS, type Screw, type Supply, type Wiring } from './geometry';
import { mm, type Drawing, type Role, type Shape } from './shapes';

type Point = [number, number];
type Metal = 'hot' | 'neutral' | 'ground';
const SUPPLY_X: Record<Supply, number> = { N: -15.5, G: 0, H: 15.5, X: -15.5, S: -15.5 };
const SUPPLY_WORD: Record<Supply, string> = { N: 'NEUTRAL', G: 'GROUND', H: 'HOT', X: 'OTHER LEG', S: 'SAME LEG' };
const METAL: Record<Supply, Metal> = { N: 'neutral', G: 'ground', H: 'hot', X: 'hot', S: 'hot' };
const SCREW_AT: Record<Screw, Point> = { N: [-20.8, 1], H: [20.8, 1], G: [0, 23.4] };
const STEPS = 12;
const FLOOR = 47;

/** What the reading most often means: the wires behind the face. Inference only. */
export function wiringDrawing(pattern: SlotPattern, condition: WiringCondition): Drawing {
  // The wires are drawn for a three-slot face; the other patterns show only what was read.
  const face = FACES[pattern].outline === 'flat-round' ? FACES[pattern] : FACES['5-15R'];
  const wiring = WIRINGS[condition];
  const wires = (['G', 'N', 'H'] as const).flatMap((screw) => wireShapes(wiring, screw));
  const marks = (['G', 'N', 'H'] as const).flatMap((screw) => faultMarks(wiring, screw));
  return {
    box: [-34, -20, 68, 80],
    shapes: [
      { kind: 'rect', role: 'body', x: -18.4, y: -16.4, width: 36.8, height: 33.6, rx: 1.6 },
      { kind: 'path', role: 'body', d: 'M18.4 -7h5.4v9h-5.4M-18.4 -7h-5.4v9h5.4M-4.4 17.2v6.6h8.8v-6.6' },
      ...wires,
      ...screws(),
      ...jumperShapes(wiring),
      ...bridgeShapes(wiring),
      outlineShape(face),
      { kind: 'path', role: 'strip', d: `M-18.5 -2H-7M18.5 -2H7${wiring.jumper || wiring.wires.G ? 'M0 18V9' : ''}` },
      ...slotShapes(face),
      { kind: 'path', role: 'jacket', d: `M-20 ${FLOOR}h40v2.6h-40z` },
      ...supplyWords(wiring),
      ...marks,
      ...(wiring.live ?? []).flatMap((slot) =>
        slot === 'G' ? flag(9.4, 8.6, 'LIVE') : flag(slot === 'N' ? -8.6 : 8.6, 2.4, 'LIVE'),
      ),
    ],
    label: wiring.says,
  };
}

type Route = { points: [Point, Point, Point, Point]; tail?: number };

function route(from: Supply, to: Screw): Route {
  const x = SUPPLY_X[from];
  const [tx, ty] = SCREW_AT[to];
  if (to === 'G')
    return {
      points: [
        [x, FLOOR],
        [x, 36],
        [tx, 38],
        [tx, ty],
      ],
    };
  const crosses = from === 'G' || Math.sign(x) !== Math.sign(tx);
  return {
    points: [
      [x, FLOOR],
      [x, crosses ? 33 : 37],
      [tx, crosses ? 39 : 36],
      [tx, 20],
    ],
    tail: ty,
  };
}

function at({ points }: Route, t: number): Point {
  const u = 1 - t;
  const along = (i: 0 | 1) =>
    u ** 3 * points[0][i] + 3 * u * u * t * points[1][i] + 3 * u * t * t * points[2][i] + t ** 3 * points[3][i];
  return [mm(along(0)), mm(along(1))];
}

function stretch(path: Route, from: number, to: number): string {
  const points = Array.from({ length: STEPS + 1 }, (_, i) => at(path, from + ((to - from) * i) / STEPS).join(' '));
  return `M${points.join('L')}${to === 1 && path.tail !== undefined ? `V${path.tail}` : ''}`;
}

function wire(metal: Metal, d: string): Shape[] {
  const layers: Role[] = ['gap', 'casing', metal];
  if (metal === 'neutral') layers.push('neutral-core');
  if (metal === 'ground') layers.push('ground-band');
  return layers.map((role) => ({ kind: 'path', role, d }));
}

/** A break lies nearer the supply where a load hangs on the wire's end. */
function cutOf(wiring: Wiring, screw: Screw): [number, number] {
  return wiring.bridge?.to === screw ? [0.2, 0.36] : [0.34, 0.6];
}

function wireShapes(wiring: Wiring, screw: Screw): Shape[] {
  const from = wiring.wires[screw];
  if (!from) return [];
  const path = route(from, screw);
  if (!wiring.open?.includes(screw)) return wire(METAL[from], stretch(path, 0, 1));
  const [start, end] = cutOf(wiring, screw);
  return [...wire(METAL[from], stretch(path, 0, start)), ...wire(METAL[from], stretch(path, end, 1))];
}

function faultMarks(wiring: Wiring, screw: Screw): Shape[] {
  const from = wiring.wires[screw];
  const isOpen = wiring.open?.includes(screw);
  if (!from || (!isOpen && !wiring.poor?.includes(screw))) return [];
  const [start, end] = cutOf(wiring, screw);
  const [x, y] = at(route(from, screw), (start + end) / 2);
  const words = isOpen ? 'OPEN' : 'POOR JOINT';
  const away = (isOpen ? 11.2 : 15.5) * (screw === 'N' ? -1 : 1);
  const joint: Shape[] = isOpen
    ? []
    : [{ kind: 'path', role: 'bridge', d: `M${mm(x - 3)} ${mm(y)}l1.2 -2.2 2 4.4 2 -4.4 1.2 2.2` }];
  return [{ kind: 'circle', role: 'open', cx: x, cy: y, r: 4.1 }, ...joint, ...flag(clampX(x + away, words), y, words)];
}

function clampX(x: number, words: string): number {
  const half = (words.length * 2.35 + 2.6) / 2;
  return Math.max(-33.4 + half, Math.min(33.4 - half, x));
}

function flag(x: number, y: number, words: string): Shape[] {
  const width = words.length * 2.35 + 2.6;
  return [
    { kind: 'rect', role: 'flag', x: mm(x - width / 2), y: mm(y - 2.7), width: mm(width), height: 5.4, rx: 0.6 },
    { kind: 'text', role: 'flag-text', x: mm(x), y: mm(y + 1.25), size: 3.4, words },
  ];
}

function jumperShapes({ jumper }: Wiring): Shape[] {
  if (!jumper) return [];
  return [...wire('neutral', 'M-20.8 -2C-19.2 13 -13 20.9 -2 20.9'), ...flag(-10, 28, 'JUMPER')];
}

const ZIGZAG = 'l1.3 -2.4 2.4 4.8 2.4 -4.8 2.4 4.8 2.4 -4.8 1.3 2.4';

function bridgeShapes({ bridge }: Wiring): Shape[] {
  if (!bridge) return [];
  const toGround = bridge.to === 'G';
  const d = toGround ? `M0 31.5H4${ZIGZAG}H20.4` : `M-20.4 31.5H2.6${ZIGZAG}H20.4`;
  return [{ kind: 'path', role: 'bridge', d }, ...flag(toGround ? 10.6 : 10, toGround ? 25.8 : 37.8, bridge.word)];
}

function screws(): Shape[] {
  return [
    { kind: 'circle', role: 'screw-neutral', cx: -20.8, cy: -2, r: 3 },
    { kind: 'path', role: 'screw-slot', d: 'M-22.6 -2h3.6M-20.8 -3.8v3.6' },
    { kind: 'circle', role: 'screw-hot', cx: 20.8, cy: -2, r: 3 },
    { kind: 'path', role: 'screw-slot', d: 'M19 -3.4l3.6 2.8' },
    { kind: 'path', role: 'screw-ground', d: 'M-3.1 20.8l1.55 -2.7h3.1l1.55 2.7 -1.55 2.7h-3.1z' },
    { kind: 'path', role: 'screw-slot', d: 'M-1.5 20.8h3' },
  ];
}

function supplyWords(wiring: Wiring): Shape[] {
  const used = new Set(Object.values(wiring.wires));
  const left: Supply = used.has('X') ? 'X' : used.has('S') ? 'S' : 'N';
  const words = ([left, 'G', 'H'] as const).map((supply): Shape => {
    const none = supply === 'G' && !used.has('G');
    const nudge = supply === 'X' || supply === 'S' ? 2 : 0;
    return {
      kind: 'text',
      role: none ? 'supply-none' : 'supply',
      x: SUPPLY_X[supply] - nudge,
      y: 53.6,
      size: 3.1,
      words: none ? 'NONE' : SUPPLY_WORD[supply],
    };
  });
  return wiring.upstream ? [...words, ...flag(0, 57, wiring.upstream)] : words;
}
