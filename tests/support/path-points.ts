export type Point = { x: number; y: number };

const SIZES: Record<string, number> = { M: 2, L: 2, H: 1, V: 1, C: 6, A: 7, Z: 0 };

/** The corners of an SVG path, arcs and curves by their ends; enough to see where a drawing reaches. */
export function pathPoints(d: string): Point[] {
  const points: Point[] = [];
  let at: Point = { x: 0, y: 0 };
  for (const [, letter = '', rest = ''] of d.matchAll(/([MLHVCAZ])([^MLHVCAZ]*)/gi)) {
    const command = letter.toUpperCase();
    const base = letter === command ? { x: 0, y: 0 } : at;
    const numbers = (rest.match(/-?\d*\.?\d+/g) ?? []).map(Number);
    const size = SIZES[command] ?? 0;
    for (let i = 0; size > 0 && i + size <= numbers.length; i += size) {
      const origin = i === 0 || letter === command ? base : at;
      at = landing(command, numbers.slice(i, i + size), origin, at);
      points.push(at);
    }
  }
  return points;
}

function landing(command: string, numbers: number[], base: Point, at: Point): Point {
  const [last = 0, before = 0] = [numbers.at(-1), numbers.at(-2)];
  if (command === 'H') return { x: base.x + last, y: at.y };
  if (command === 'V') return { x: at.x, y: base.y + last };
  return { x: base.x + before, y: base.y + last };
}
