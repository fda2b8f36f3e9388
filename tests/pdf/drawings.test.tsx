import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, test } from 'vitest';
import { WIRINGS } from '@/components/drawings/geometry';
import { drawingOf, ReceptacleDrawing } from '@/components/drawings/receptacle-drawing';
import type { Drawing, Shape } from '@/components/drawings/shapes';
import { PdfReceptacle } from '@/components/report/pdf-receptacle';
import { SLOT_PATTERNS, WIRING_CONDITIONS } from '@/lib/findings/vocabulary';
import { pathPoints, type Point } from '../support/path-points';

const LAMPS = { hn: 'lit', hg: 'dim', ng: 'off' } as const;
const VOLTS = { hn: 121.4, hg: 121.2, ng: 0.2 };
/** Half of 3.5 mm, the width of a conductor with its casing. */
const HALF_A_WIRE = 1.75;
const drawings: [string, Drawing][] = [
  ...SLOT_PATTERNS.flatMap((pattern): [string, Drawing][] => [
    [`${pattern} face`, drawingOf({ view: 'face', pattern })],
    [`${pattern} face, dead`, drawingOf({ view: 'face', pattern, dead: true })],
    [`${pattern} lamps`, drawingOf({ view: 'reading', pattern, lamps: LAMPS })],
    [`${pattern} lamps, small`, drawingOf({ view: 'reading', pattern, lamps: LAMPS }, 60)],
    [`${pattern} volts`, drawingOf({ view: 'reading', pattern, volts: VOLTS })],
    [`${pattern} pad`, drawingOf({ view: 'pad', pattern, lamps: LAMPS })],
  ]),
  ['GFCI', drawingOf({ view: 'face', pattern: '5-15R', device: 'gfci-receptacle', pressed: 'test' })],
  ['GFCI lamps', drawingOf({ view: 'reading', pattern: '5-20R', device: 'gfci-receptacle', lamps: LAMPS })],
  ...WIRING_CONDITIONS.map((condition): [string, Drawing] => [
    condition,
    drawingOf({ view: 'wiring', pattern: '5-15R', condition }),
  ]),
];

test.each(drawings)('%s stays inside its box and says what it shows', (_, { box, shapes, label }) => {
  const [x, y, width, height] = box;
  expect(label).not.toBe('');
  expect(shapes.length).toBeGreaterThan(1);
  for (const point of shapes.flatMap(corners)) {
    expect(point.x).toBeGreaterThanOrEqual(x);
    expect(point.x).toBeLessThanOrEqual(x + width);
    expect(point.y).toBeGreaterThanOrEqual(y);
    expect(point.y).toBeLessThanOrEqual(y + height);
  }
});

test.each(WIRING_CONDITIONS)('page and PDF draw %s from the same paths', (condition) => {
  const drawing = drawingOf({ view: 'wiring', pattern: '5-15R', condition });
  const page = renderToStaticMarkup(
    <ReceptacleDrawing view="wiring" pattern="5-15R" condition={condition} size={200} />,
  );
  const print = renderToStaticMarkup(<PdfReceptacle drawing={drawing} width={120} />);
  expect(paths(page).length).toBeGreaterThan(10);
  expect(paths(print)).toEqual(paths(page));
});

describe('the wires', () => {
  test('every condition has a sentence of its own', () => {
    const sentences = WIRING_CONDITIONS.map((condition) => WIRINGS[condition].says);
    expect(new Set(sentences).size).toBe(WIRING_CONDITIONS.length);
    for (const says of sentences) expect(says).toMatch(/^[A-Z].+\.$/);
  });

  test.each(WIRING_CONDITIONS)('%s has one flag for each break, poor joint and live slot', (condition) => {
    const { open = [], poor = [], live = [] } = WIRINGS[condition];
    const words = flags(drawingOf({ view: 'wiring', pattern: '5-15R', condition }));
    expect(words.filter((word) => word === 'OPEN')).toHaveLength(open.length);
    expect(words.filter((word) => word === 'POOR')).toHaveLength(poor.length);
    expect(words.filter((word) => word === 'LIVE')).toHaveLength(live.length);
  });

  test.each(WIRING_CONDITIONS)('no wire runs through the ring of a break in %s', (condition) => {
    const { shapes } = drawingOf({ view: 'wiring', pattern: '5-15R', condition });
    const wires = shapes.flatMap((shape) => (shape.kind === 'path' && shape.role === 'casing' ? [along(shape.d)] : []));
    for (const ring of shapes)
      if (ring.kind === 'circle' && ring.role === 'open')
        for (const point of wires.flat())
          expect(Math.hypot(point.x - ring.cx, point.y - ring.cy)).toBeGreaterThan(HALF_A_WIRE);
  });
});

describe('a reading', () => {
  test('is spoken with its lamps in words', () => {
    const { label } = drawingOf({ view: 'reading', pattern: '5-15R', lamps: LAMPS });
    expect(label).toBe('5-15R: hot to neutral lit, hot to ground dim, neutral to ground off');
  });

  test('that was not made is dotted, and is spoken as not read', () => {
    const { label, shapes } = drawingOf({ view: 'reading', pattern: '5-15R' });
    expect(label).toContain('hot to neutral not read');
    expect(rolesOf(shapes).filter((role) => role === 'link-none')).toHaveLength(3);
    expect(rolesOf(shapes)).not.toContain('link-lit');
    expect(rolesOf(shapes)).not.toContain('lamp-lit');
  });

  test('of a two-slot receptacle has one lamp', () => {
    const { label, shapes } = drawingOf({ view: 'reading', pattern: '1-15R', lamps: LAMPS });
    expect(label).toBe('1-15R: hot to neutral lit');
    expect(rolesOf(shapes).filter((role) => role.startsWith('lamp-'))).toHaveLength(1);
  });

  test('leaves out letters that would be too small to read', () => {
    const letters = (size: number) =>
      rolesOf(drawingOf({ view: 'reading', pattern: '5-15R', lamps: LAMPS }, size).shapes).filter(
        (role) => role === 'letter',
      );
    expect(letters(176)).toHaveLength(3);
    expect(letters(88)).toHaveLength(0);
  });
});

test('the blades of 5-15R stand half an inch apart, the neutral one the longer', () => {
  const [neutral, hot, ground] = drawingOf({ view: 'face', pattern: '5-15R' }).shapes.flatMap((shape) =>
    shape.kind === 'path' && shape.role === 'slot' ? [extent(pathPoints(shape.d))] : [],
  );
  expect((hot?.middle.x ?? 0) - (neutral?.middle.x ?? 0)).toBeCloseTo(12.7, 2);
  expect(neutral?.height).toBeGreaterThan(hot?.height ?? Infinity);
  expect(ground?.middle.y).toBeGreaterThan(neutral?.middle.y ?? Infinity);
});

function corners(shape: Shape): Point[] {
  switch (shape.kind) {
    case 'path':
      return pathPoints(shape.d);
    case 'circle':
      return [
        { x: shape.cx - shape.r, y: shape.cy - shape.r },
        { x: shape.cx + shape.r, y: shape.cy + shape.r },
      ];
    case 'rect':
      return [
        { x: shape.x, y: shape.y },
        { x: shape.x + shape.width, y: shape.y + shape.height },
      ];
    case 'group':
      return [{ x: shape.x, y: shape.y }];
    case 'text': {
      const half = (shape.words.length * shape.size * 0.62) / 2;
      const left = shape.start ? shape.x : shape.x - half;
      return [
        { x: left, y: shape.y - shape.size },
        { x: left + 2 * half, y: shape.y },
      ];
    }
  }
}

function rolesOf(shapes: Shape[]): string[] {
  return shapes.flatMap((shape) => (shape.kind === 'group' ? rolesOf(shape.shapes) : [shape.role]));
}

function paths(markup: string): string[] {
  return [...markup.matchAll(/ d="([^"]+)"/g)].map(([, d = '']) => d);
}

function flags({ shapes }: Drawing): string[] {
  return shapes.flatMap((shape) => (shape.kind === 'text' && shape.role === 'flag-text' ? [shape.words] : []));
}

/** Ten points on each straight stretch, so that a wire cannot slip through a ring between two corners. */
function along(d: string): Point[] {
  const ends = d.includes('C') ? [] : pathPoints(d);
  return ends.flatMap((end, i) => {
    const start = ends[i - 1] ?? end;
    return Array.from({ length: 11 }, (_, step) => ({
      x: start.x + ((end.x - start.x) * step) / 10,
      y: start.y + ((end.y - start.y) * step) / 10,
    }));
  });
}

function extent(points: Point[]) {
  const [xs, ys] = [points.map(({ x }) => x), points.map(({ y }) => y)];
  const [left, right, top, bottom] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)];
  return { middle: { x: (left + right) / 2, y: (top + bottom) / 2 }, height: bottom - top };
}
