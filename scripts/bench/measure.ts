/** One line of the table. `ratio` is product over floor. */
export type Measured = { what: string; product: string; floor: string; ratio: number; bar: string };
export type Pairs = { floorMs: number; productMs: number; ratio: number };
type Work = () => unknown;

/** Runs floor and product in turn, after one round to warm up. Medians in ms, and the median of the pairs' ratios. */
export async function compare(rounds: number, floor: Work, product: Work): Promise<Pairs> {
  await floor();
  await product();
  const floors: number[] = [];
  const products: number[] = [];
  const ratios: number[] = [];
  for (let round = 0; round < rounds; round += 1) {
    const [floorMs, productMs] = [await timed(floor), await timed(product)];
    floors.push(floorMs);
    products.push(productMs);
    ratios.push(productMs / floorMs);
  }
  return { floorMs: median(floors), productMs: median(products), ratio: median(ratios) };
}

export async function timed(work: Work): Promise<number> {
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
