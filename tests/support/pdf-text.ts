import { execFileSync } from 'node:child_process';
import { writeFileSync } from 'node:fs';

/** The text of each page as a reader sees it; `qpdf --check` first, so that a broken file cannot pass. */
export function pdfPages(bytes: Buffer, file: string): string[] {
  writeFileSync(file, bytes);
  execFileSync('qpdf', ['--check', file], { stdio: 'pipe' });
  const text = execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' });
  return text.split('\f').slice(0, -1);
}
