import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';
import { feedDrawing } from '@/components/drawings/feed';
import { FeedDrawing } from '@/components/drawings/feed-drawing';
import type { FeedNode } from '@/components/drawings/feed-symbols';
import type { Shape } from '@/components/drawings/shapes';
import { PdfReceptacle } from '@/components/report/pdf-receptacle';
import { feedTrees, feedWords } from '@/components/report/report-feed';
import { en } from '@/lib/messages/en';
import type { ReportSnapshot } from '@/lib/schemas/snapshot';
import { pathPoints } from '../support/path-points';
import { goldenSnapshot } from '../support/snapshot';

const WORDS = { title: 'What feeds what', off: 'STILL OFF', through: (name: string) => `Fed through ${name}` };
const outlet = (name: string, more: Partial<FeedNode> = {}): FeedNode => ({
  kind: 'receptacle',
  name,
  note: '5-15R',
  pattern: '5-15R',
  device: 'receptacle',
  feeds: [],
  ...more,
});
const breaker = (name: string, feeds: FeedNode[], more: Partial<FeedNode> = {}): FeedNode => ({
  kind: 'breaker',
  name,
  note: '',
  feeds,
  ...more,
});
const panel = (...feeds: FeedNode[]): FeedNode => ({ kind: 'panel', name: 'Panel A', note: '', feeds });
const BATHS = outlet('Garage, door', {
  device: 'gfci-receptacle',
  feeds: [outlet('Bath 1'), outlet('Patio', { off: true })],
});
const HOUSE = panel(
  breaker('5', [BATHS]),
  breaker('9', [outlet('Bench', { off: true })], { off: true }),
  breaker('7', [outlet('Hall'), outlet('Alarms', { kind: 'hardwired' })]),
);
const FLOWS = [
  ['columns', 720],
  ['columns', 1180],
  ['rows', 340],
] as const;

describe.each(FLOWS)('the feed drawing in %s, %i wide', (flow, width) => {
  const { box, shapes, label } = feedDrawing(HOUSE, flow, width, WORDS);

  test('names everything, and stays inside its box', () => {
    const words = textsOf(shapes);
    for (const name of ['Panel A', '5', 'Garage, door', 'Bath 1', 'Patio', '9', 'Bench', '7', 'Hall', 'Alarms'])
      expect(words).toContain(name);
    expect(label).toBe('What feeds what');
    for (const shape of shapes) {
      const points = shape.kind === 'path' ? pathPoints(shape.d) : 'x' in shape ? [{ x: shape.x, y: shape.y }] : [];
      for (const { x, y } of points) {
        expect(x).toBeGreaterThanOrEqual(0);
        expect(x).toBeLessThanOrEqual(box[2]);
        expect(y).toBeGreaterThanOrEqual(0);
        expect(y).toBeLessThanOrEqual(box[3]);
      }
    }
  });

  test('flags what is off, and only that', () => {
    expect(textsOf(shapes).filter((words) => words === 'STILL OFF')).toHaveLength(3);
    const { shapes: allOn } = feedDrawing(panel(breaker('7', [outlet('Hall')])), flow, width, WORDS);
    expect(textsOf(allOn)).not.toContain('STILL OFF');
    expect(allOn.some((shape) => shape.kind === 'path' && shape.role === 'wire-off')).toBe(false);
  });

  test('draws a double line only to what a GFCI feeds', () => {
    const loads = (tree: FeedNode) =>
      feedDrawing(tree, flow, width, WORDS).shapes.filter((s) => s.kind === 'path' && s.role === 'wire-load').length;
    expect(loads(HOUSE)).toBeGreaterThan(0);
    expect(loads(panel(breaker('7', [outlet('Hall'), outlet('Den')])))).toBe(0);
    expect(loads(panel(breaker('5', [outlet('Garage', { device: 'gfci-receptacle' })])))).toBe(0);
  });
});

test('names stand neither on each other nor on a symbol', () => {
  const long = 'Second floor, the large bathroom, left of the basin';
  const tree = panel(
    ...['1', '2', '3', '4'].map((name) => breaker(name, [outlet(long, { off: true }), outlet(long)])),
    breaker('5', [], { note: 'Spare' }),
    breaker('6', [BATHS]),
  );
  for (const [flow, width] of FLOWS) {
    const { shapes } = feedDrawing(tree, flow, width, WORDS);
    const lines = shapes.flatMap((shape) => (shape.kind === 'text' && shape.start ? [shape] : []));
    const symbols = shapes.flatMap((shape) => (shape.kind === 'group' ? [shape] : []));
    for (const { x, y } of lines)
      for (const symbol of symbols)
        expect(Math.abs(x - symbol.x) < 25 && y > symbol.y - 14 && y - 12 < symbol.y + 14).toBe(false);
    for (const [i, a] of lines.entries())
      for (const b of lines.slice(i + 1)) expect(a.x !== b.x || Math.abs(a.y - b.y) > 12).toBe(true);
  }
});

test('page and PDF draw the feed from the same paths', () => {
  const drawing = feedDrawing(HOUSE, 'columns', 720, WORDS);
  const page = renderToStaticMarkup(<FeedDrawing tree={HOUSE} words={WORDS} />).split('</svg>')[0] ?? '';
  const print = renderToStaticMarkup(<PdfReceptacle drawing={drawing} width={525} />);
  const paths = (markup: string) => [...markup.matchAll(/ d="([^"]+)"/g)].map(([, d]) => d);
  expect(paths(print).length).toBeGreaterThan(10);
  expect(paths(print)).toEqual(paths(page));
});

describe('a report', () => {
  test('draws every receptacle that was traced once, under its breaker and behind its GFCI', async () => {
    const { snapshot, first } = await houseWith([
      { id: 'a', device: 'gfci-receptacle' },
      { id: 'b', from: 'a' },
      { id: 'c', from: 'elsewhere' },
    ]);
    const [tree] = feedTrees(snapshot, first, en.report);
    expect(tree && namesOf(tree)).toEqual([first.name, '5 · 20 A', 'Place a', 'Place b', 'Place c']);
    expect(feedWords(first, en.report).title).toContain(first.name);
  });

  test('shows two receptacles that name each other, without running in a circle', async () => {
    const { snapshot, first } = await houseWith([{ id: 'a', from: 'b' }, { id: 'b', from: 'a' }, { id: 'c' }]);
    const [tree] = feedTrees(snapshot, first, en.report);
    expect(tree && namesOf(tree)).toEqual([first.name, '5 · 20 A', 'Place c', 'Place a', 'Place b']);
  });

  test('breaks a long panel into drawings that fit a page', async () => {
    const { snapshot, first } = await houseWith([{ id: 'a' }, { id: 'b' }, { id: 'c' }, { id: 'd' }], 6);
    expect(feedTrees(snapshot, first, en.report).map(({ feeds }) => feeds.length)).toEqual([2, 2, 2]);
  });
});

type Fed = { id: string; from?: string; device?: 'receptacle' | 'gfci-receptacle' };

async function houseWith(fed: Fed[], circuits = 1) {
  const { snapshot } = await goldenSnapshot();
  const [first] = snapshot.panels;
  if (!first) throw new Error('the golden house has a panel');
  const feeds = fed.map(({ id, from, device = 'receptacle' }) => ({
    receptacleId: id,
    place: `Place ${id}`,
    pattern: '5-15R' as const,
    device,
    off: false,
    ...(from ? { fedFromReceptacleId: from } : {}),
  }));
  const circuit = { panelId: first.id, breaker: '5', poles: 1 as const, amps: 20, protection: 'none' as const, feeds };
  const changed: ReportSnapshot = {
    ...snapshot,
    circuits: Array.from({ length: circuits }, (_, i) => ({ ...circuit, id: `circuit-${i}` })),
  };
  return { snapshot: changed, first };
}

function namesOf(node: FeedNode): string[] {
  return [node.name, ...node.feeds.flatMap(namesOf)];
}

function textsOf(shapes: Shape[]): string[] {
  return shapes.flatMap((shape) => (shape.kind === 'text' ? [shape.words] : []));
}
