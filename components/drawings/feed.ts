import { dropOf, isTall, reachOf, symbolShapes, type FeedNode } from './feed-symbols';
import { mm, type Drawing, type Shape } from './shapes';

/** What the drawing says itself, in the language of the page. */
export type FeedWords = { title: string; off: string; through: (name: string) => string };
type Placed = FeedNode & { x: number; y: number; guarded: boolean; kids: Placed[] };

const COLUMNS_NARROW = [24, 130, 268, 446];
const COLUMNS_WIDE = [34, 200, 420, 690, 950];
const NAME = 16;
const NOTE = 14;
/** Mean width of a letter, as a part of its height, in the bold cut. */
const LETTER = 0.56;

/**
 * Panel, breakers and what hangs from each, in pixels. A single line is fed, a double line comes through a GFCI, a
 * broken line is off; a dotted enclosure holds what one GFCI feeds. Columns that a deep tree would leave become rows.
 */
export function feedDrawing(tree: FeedNode, flow: 'columns' | 'rows', width: number, words: FeedWords): Drawing {
  const columns = width < 1000 ? COLUMNS_NARROW : COLUMNS_WIDE;
  const drawn =
    flow === 'columns' && depthOf(tree) <= columns.length ? inColumns(tree, columns, width) : inRows(tree, width);
  const nodes = allOf(drawn.root);
  return {
    box: [0, 0, width, drawn.height],
    shapes: [
      ...(drawn.under ? nodes.flatMap((node) => bandShapes(node, width, words)) : []),
      ...drawn.wires,
      ...nodes.flatMap((node) => nodeShapes(node, { size: drawn.size, under: drawn.under, width, words })),
    ],
    label: words.title,
  };
}

type Layout = { root: Placed; wires: Shape[]; height: number; size: number; under: boolean };

function inColumns(tree: FeedNode, columns: readonly number[], width: number): Layout {
  const size = 46;
  const lowest = new Map<number, number>();
  let cursor = 56;
  function place(node: FeedNode, depth: number, guarded: boolean): Placed {
    if (hasNameBelow(node)) cursor = Math.max(cursor, (lowest.get(depth) ?? -Infinity) + 100);
    const start = cursor;
    const isGuard = isTall(node);
    if (isGuard && node.feeds.length > 0) cursor += 12;
    const kids = node.feeds.map((kid) => place(kid, depth + 1, guarded || isGuard));
    const y = kids[0]?.y ?? start;
    const x = columns[depth] ?? 0;
    if (kids.length === 0) cursor = start + 62 + moreFor(node, width - x - 38);
    else if (isGuard) cursor += 28;
    if (hasNameBelow(node)) lowest.set(depth, y);
    return { ...node, x, y, guarded, kids };
  }
  const root = place(tree, 0, false);
  const bottom = Math.max(cursor, ...allOf(root).map((node) => node.y + (hasNameBelow(node) ? 100 : 62)));
  const wires = allOf(root).flatMap((node) =>
    node.kids.flatMap((kid, i) => {
      const end = mm(kid.x - reachOf(kid, size));
      const before = node.kids[i - 1];
      if (!before) return wireShapes(kid, Boolean(kid.off), `M${mm(node.x + reachOf(node, size))} ${node.y}H${end}`);
      const turn = kid.x - 44;
      return [
        ...wireShapes(kid, Boolean(node.off), `M${turn} ${before.y}V${kid.y}`),
        ...wireShapes(kid, Boolean(kid.off), `M${turn} ${kid.y}H${end}`),
      ];
    }),
  );
  return { root, wires, height: bottom, size, under: true };
}

function inRows(tree: FeedNode, width: number): Layout {
  const size = 36;
  let cursor = 34;
  function place(node: FeedNode, depth: number, guarded: boolean): Placed {
    const y = cursor;
    const x = 24 + depth * 26;
    cursor += 56 + moreFor(node, width - x - 34);
    const kids = node.feeds.map((kid) => place(kid, depth + 1, guarded || isTall(node)));
    return { ...node, x, y, guarded, kids };
  }
  const root = place(tree, 0, false);
  const wires = allOf(root).flatMap((node) =>
    node.kids.flatMap((kid, i) => {
      const from = node.kids[i - 1]?.y ?? node.y + dropOf(node, size);
      return [
        ...wireShapes(kid, Boolean(node.off), `M${node.x} ${mm(from)}V${kid.y}`),
        ...wireShapes(kid, Boolean(kid.off), `M${node.x} ${kid.y}H${mm(kid.x - reachOf(kid, size))}`),
      ];
    }),
  );
  return { root, wires, height: cursor, size, under: false };
}

/** Height of a row beyond one line of name and one of note. */
function moreFor(node: FeedNode, room: number): number {
  return (node.off ? 22 : 0) + (wrapped(node.name, room, NAME).length > 1 ? 10 : 0);
}

/** A stretch that several hang on is as its own end is; the branch to one of them is as that one is. */
function wireShapes(to: Placed, off: boolean, d: string): Shape[] {
  if (off) return [{ kind: 'path', role: 'wire-off', d }];
  if (!to.guarded) return [{ kind: 'path', role: 'wire', d }];
  return [
    { kind: 'path', role: 'wire-load', d },
    { kind: 'path', role: 'wire-core', d },
  ];
}

/** Panels, breakers and GFCIs that feed something have their names below, since their wire goes on to the right. */
function hasNameBelow(node: FeedNode): boolean {
  return node.kind === 'panel' || node.kind === 'breaker' || (isTall(node) && node.feeds.length > 0);
}

type Look = { size: number; under: boolean; width: number; words: FeedWords };

function nodeShapes(node: Placed, { size, under, width, words }: Look): Shape[] {
  const below = under && hasNameBelow(node);
  const x = below ? node.x - 22 : node.x + (under ? 32 : 28);
  const room = below ? roomBelow(node) : width - x - 6;
  const names = wrapped(node.name, room, NAME);
  const top = below ? node.y + 48 : node.y - 3 - (names.length - 1) * 9;
  const last = top + (names.length - 1) * 18;
  const note = below ? wrapped(node.note, room, NOTE) : oneLine(node.note, room, NOTE);
  return [
    { kind: 'group', x: node.x, y: node.y, scale: 1, shapes: symbolShapes(node, size) },
    ...names.map((line, i): Shape => text('name', x, top + i * 18, NAME, line)),
    ...note.map((line, i): Shape => text('note', x, last + 18 + i * 16, NOTE, line)),
    ...(node.off ? offFlag(x, below ? node.y - 40 : last + (node.note ? 25 : 7), words.off) : []),
  ];
}

/** As far as the name of a panel, breaker or GFCI may reach under its wire. */
function roomBelow(node: Placed): number {
  const next = node.kids[0]?.x;
  return next === undefined ? 150 : next - node.x - 28;
}

function text(role: 'name' | 'note', x: number, y: number, size: number, words: string): Shape {
  return { kind: 'text', role, x, y, size, words, start: true };
}

function offFlag(x: number, y: number, words: string): Shape[] {
  const width = mm(words.length * 8 + 12);
  return [
    { kind: 'rect', role: 'flag', x, y, width, height: 19, rx: 1.5 },
    { kind: 'text', role: 'flag-text', x: mm(x + width / 2), y: y + 14, size: 12, words },
  ];
}

function bandShapes(node: Placed, width: number, words: FeedWords): Shape[] {
  const [first] = node.kids;
  if (!first || !isTall(node)) return [];
  const inside = node.kids.flatMap(allOf);
  const top = first.y - 42;
  const bottom = Math.max(...inside.map(({ y, off }) => y + (off ? 52 : 34)));
  const x = first.x - 62;
  const [says = ''] = oneLine(words.through(node.name), width - x - 40, NOTE);
  return [
    { kind: 'rect', role: 'band', x, y: top, width: width - x - 4, height: bottom - top, rx: 4 },
    {
      kind: 'rect',
      role: 'tag-box',
      x: x + 14,
      y: top - 10,
      width: mm(says.length * NOTE * LETTER + 12),
      height: 20,
      rx: 0,
    },
    { ...text('name', x + 20, top + 5, NOTE, says) },
  ];
}

/** At most two lines; what does not fit ends in an ellipsis, and stands in full in the table beside the drawing. */
function wrapped(words: string, room: number, size: number): string[] {
  const fit = Math.max(6, Math.floor(room / (size * LETTER)));
  const lines = [''];
  for (const word of words.split(' ')) {
    const line = lines.at(-1) ?? '';
    const longer = line ? `${line} ${word}` : word;
    if (longer.length <= fit || !line) lines[lines.length - 1] = longer;
    else lines.push(word);
  }
  const [first = '', ...rest] = lines;
  return [first, rest.join(' ')].filter(Boolean).map((line) => shortened(line, fit));
}

function oneLine(words: string, room: number, size: number): string[] {
  return words ? [shortened(words, Math.max(6, Math.floor(room / (size * LETTER))))] : [];
}

function shortened(line: string, fit: number): string {
  return line.length > fit ? `${line.slice(0, fit - 1).trimEnd()}…` : line;
}

function allOf(node: Placed): Placed[] {
  return [node, ...node.kids.flatMap(allOf)];
}

function depthOf(node: FeedNode): number {
  return 1 + Math.max(0, ...node.feeds.map(depthOf));
}
