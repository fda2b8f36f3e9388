import { cpus, loadavg } from 'node:os';
import { engineRows } from './bench/engine';
import { firstLoadRow } from './bench/first-load';
import { listRows, seedLists } from './bench/list';
import type { Measured } from './bench/measure';
import { pdfRows } from './bench/pdf';
import { photoRow } from './bench/photo';
import { routeRow } from './bench/route';
import { step } from './say.mjs';

const NOT_MEASURED = [
  'Delay of the web while a PDF renders: the worker renders it, in a process of its own, so that only the cores are shared.',
  'Taps and the time to the next receptacle in Walk: tests/journeys counts the taps by making them.',
  'Lighthouse: it is not among the packages.',
];

/** Measures everything that runs without a person and prints one table. Needs the program up and its variables set. */
export async function bench(): Promise<void> {
  const before = busy();
  const rows: Measured[] = [];
  const broken: string[] = [];
  const measure = async (name: string, work: () => Measured[] | Promise<Measured[]>) => {
    try {
      rows.push(...(await step(name, async () => work())));
    } catch (error) {
      broken.push(`${name}: broke off. ${String(error)}`);
    }
  };
  await measure('Engine', engineRows);
  await measure('Photo intake', async () => [await photoRow()]);
  await measure('Report PDF', pdfRows);
  const firms = await step('Filling two firms with inspections', seedLists);
  await measure('JSON route', async () => [await routeRow(firms.small)]);
  await measure('Inspections list', () => listRows(firms));
  await measure('First load of Walk', async () => [await firstLoadRow()]);
  print(rows, [...NOT_MEASURED, ...broken], before);
}

function print(rows: Measured[], missing: string[], before: string): void {
  const machine = `${cpus().length} cores (${cpus()[0]?.model.trim() ?? 'unknown'}), Node.js ${process.version}`;
  const table = rows.map(
    ({ what, product, floor, ratio, bar }) => `| ${what} | ${product} | ${floor} | ${ratio.toFixed(2)} | ${bar} |`,
  );
  const lines = [
    `${machine}; busy processes at the start ${before}, at the end ${busy()}`,
    '',
    '| what | product | floor in the same run | ratio | bar |',
    '|---|---|---|---|---|',
    ...table,
    '',
    ...missing.map((line) => `Not measured. ${line}`),
  ];
  process.stdout.write(`${lines.join('\n')}\n`);
}

/** Processes that wanted a core in the last minute. Above the number of cores, times say more of the others than of us. */
function busy(): string {
  return (loadavg()[0] ?? 0).toFixed(1);
}
