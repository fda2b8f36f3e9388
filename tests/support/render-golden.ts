import { createHash } from 'node:crypto';
import { writeFileSync } from 'node:fs';
import { renderReportPdf } from '@/lib/reports/render-pdf';
import { goldenSnapshot } from './snapshot';

/** Renders the golden report in a process of its own and prints the hash of the bytes. */
async function main(): Promise<void> {
  const { snapshot, sha256, photos } = await goldenSnapshot();
  const { pdf } = await renderReportPdf(snapshot, sha256, 'en', { photos });
  const [, , file] = process.argv;
  if (file) writeFileSync(file, pdf);
  process.stdout.write(createHash('sha256').update(pdf).digest('hex'));
}

void main();
