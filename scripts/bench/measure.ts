/** One line of the table. `ratio` is product over floor. */
export type Measured = { what: string; product: string; floor: string; ratio: number; bar: string };
export type Pairs = { floorMs: number; productMs: number; ratio: number };
type Work = () => unknown;

/** Runs floor and product in turn, after one round to warm up. Medians in ms, and the median of the pairs' ratios. */
export async function compare(rounds: number, floor: Work, product: Work): Promise<Pairs> {
  const [pairs] = await compareAll(rounds, [floor], product);
  if (!pairs) throw new Error('nothing was compared');
  return pairs;
}

/** The same for several floors, with one run of the product for all of them in each round. */
export async function compareAll(rounds: number, floors: Work[], product: Work): Promise<Pairs[]> {
  const taken: { product: number; floors: number[] }[] = [];
  for (let round = 0; round <= rounds; round += 1) {
    const times: number[] = [];
    for (const work of floors) times.push(await timed(work));
    const row = { product: await timed(product), floors: times };
    if (round > 0) taken.push(row);
  }
  return floors.map((_, index) => ({
    floorMs: median(taken.map((row) => row.floors[index] ?? NaN)),
    productMs: median(taken.map((row) => row.product)),
    ratio: median(taken.map((row) => row.product / (row.floors[index] ?? NaN))),
  }));
}

async function timed(work: Work): Promise<number> {
  const start = performance.now();
  await work();
  return performance.now() - start;
}

export function median(values: number[]): number {
  const sorted = values.toSorted((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? NaN;
}

export function ms(value: number): string {
  return `${value.toFixed(value < 10 ? 2 : 0)} ms`;
}
