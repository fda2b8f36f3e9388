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
    box: [-37, -20, 74, 80],
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
  return `M${points.join('L')}`;
}

function wire(metal: Metal, d: string): Shape[] {
  const layers: Role[] = ['gap', 'casing', metal];
  if (metal === 'neutral') layers.push('neutral-core');
  if (metal === 'ground') layers.push('ground-band');
  return layers.map((role) => ({ kind: 'path', role, d }));
}

type Break = { below: string; above: string; from: Point; to: Point };

/** The two ends of a broken wire; nearer the supply where a load hangs on the wire's end. */
function breakOf(wiring: Wiring, screw: Screw, path: Route): Break {
  const [sx, sy] = SCREW_AT[screw];
  const tail = path.tail === undefined ? '' : `V${sy}`;
  if (wiring.breakAt === 'screw' && tail) {
    const [lower, upper] = [15, 8];
    return {
      below: `${stretch(path, 0, 1)}V${lower}`,
      above: `M${sx} ${upper}V${sy}`,
      from: [sx, lower],
      to: [sx, upper],
    };
  }
  const [start, end] =
    wiring.breakAt === 'screw' ? [0.72, 0.92] : wiring.bridge?.to === screw ? [0.14, 0.36] : [0.34, 0.6];
  return {
    below: stretch(path, 0, start),
    above: `${stretch(path, end, 1)}${tail}`,
    from: at(path, start),
    to: at(path, end),
  };
}

function wireShapes(wiring: Wiring, screw: Screw): Shape[] {
  const from = wiring.wires[screw];
  if (!from) return [];
  const path = route(from, screw);
  if (!wiring.open?.includes(screw) && !wiring.poor?.includes(screw)) {
    const tail = path.tail === undefined ? '' : `V${path.tail}`;
    return wire(METAL[from], `${stretch(path, 0, 1)}${tail}`);
  }
  const { below, above } = breakOf(wiring, screw, path);
  return [...wire(METAL[from], below), ...wire(METAL[from], above)];
}

/** A broken wire has a ring around nothing; a poor joint has a resistor in it. */
function faultMarks(wiring: Wiring, screw: Screw): Shape[] {
  const from = wiring.wires[screw];
  const isOpen = wiring.open?.includes(screw);
  if (!from || (!isOpen && !wiring.poor?.includes(screw))) return [];
  const gap = breakOf(wiring, screw, route(from, screw));
  const [x, y]: Point = [mm((gap.from[0] + gap.to[0]) / 2), mm((gap.from[1] + gap.to[1]) / 2)];
  const words = isOpen ? 'OPEN' : 'POOR';
  const lift = wiring.breakAt === 'screw' && screw === 'G' ? 3.4 : 0;
  const away = wiring.otherLeg ? 9.8 : 11.2 * (screw === 'N' ? -1 : 1);
  const joint: Shape[] = isOpen
    ? [{ kind: 'circle', role: 'open', cx: x, cy: y, r: 4.1 }]
    : [{ kind: 'path', role: 'bridge', d: resistor(gap.from, gap.to) }];
  return [...joint, ...flag(clampX(x + away, words), mm(y - lift), words)];
}

/** A zigzag from one point to another. */
function resistor([x1, y1]: Point, [x2, y2]: Point): string {
  const length = Math.hypot(x2 - x1, y2 - y1);
  const [ux, uy] = [(x2 - x1) / length, (y2 - y1) / length];
  const corners = Array.from({ length: 6 }, (_, i) => {
    const along = (length * (i + 0.5)) / 6;
    const side = i % 2 === 0 ? 2 : -2;
    return `L${mm(x1 + ux * along - uy * side)} ${mm(y1 + uy * along + ux * side)}`;
  });
  return `M${x1} ${y1}${corners.join('')}L${x2} ${y2}`;
}

function clampX(x: number, words: string): number {
  const half = (words.length * 2.35 + 2.6) / 2;
  return Math.max(-36.4 + half, Math.min(36.4 - half, x));
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

const BRIDGE_Y = 31.5;
const LEG_X = -30;

function bridgeShapes(wiring: Wiring): Shape[] {
  const { bridge, otherLeg } = wiring;
  if (!bridge) return [];
  const left = wireAt(wiring, bridge.to);
  const right = wireAt(wiring, 'H');
  const toGround = bridge.to === 'G';
  const [start, end] = toGround ? [5, 16.6] : [3.4, 15];
  const line = `M${left} ${BRIDGE_Y}H${start}${resistor([start, BRIDGE_Y], [end, BRIDGE_Y]).replace(/^M[^L]*/, '')}H${right}`;
  return [
    { kind: 'path', role: 'bridge', d: line },
    joined(left),
    joined(right),
    ...flag(toGround ? 10.6 : 10, toGround ? 25.8 : 37.8, bridge.word),
    ...(otherLeg ? otherLegShapes(left) : []),
  ];
}

/** The load of the other leg, from its own supply to the neutral that both legs share. */
function otherLegShapes(neutralX: number): Shape[] {
  const y = BRIDGE_Y - 6;
  const zigzag = resistor([LEG_X, y + 3], [LEG_X, y + 14]).replace(/^M[^L]*/, '');
  return [
    { kind: 'path', role: 'bridge', d: `M${mm(neutralX - 0.7)} ${y}H${LEG_X}V${y + 3}${zigzag}V${FLOOR}` },
    { kind: 'circle', role: 'dot', cx: mm(neutralX - 0.7), cy: y, r: 1.1 },
    { kind: 'path', role: 'jacket', d: `M${LEG_X - 3.5} ${FLOOR}h7v2.6h-7z` },
    { kind: 'text', role: 'supply', x: LEG_X, y: 53.6, size: 3.1, words: 'LEG 2' },
  ];
}

function joined(x: number): Shape {
  return { kind: 'circle', role: 'dot', cx: x, cy: BRIDGE_Y, r: 1.1 };
}

/** Where the wire of a screw passes the height of the bridge. */
function wireAt(wiring: Wiring, screw: Screw): number {
  const from = wiring.wires[screw];
  if (!from) return SCREW_AT[screw][0];
  const path = route(from, screw);
  const points = Array.from({ length: 101 }, (_, i) => at(path, i / 100));
  const near = points.reduce((best, point) => (distance(point) < distance(best) ? point : best));
  return near[0];
}

const distance = ([, y]: Point) => Math.abs(y - BRIDGE_Y);

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
