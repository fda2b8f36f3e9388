import { execFile, execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { promisify } from 'node:util';
import { build } from 'esbuild';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { findForbiddenWords } from '@/lib/findings/wording/forbidden-words';
import { en } from '@/lib/messages/en';
import { renderReportPdf } from '@/lib/reports/render-pdf';
import { goldenSnapshot, hash } from '../support/snapshot';

const run = promisify(execFile);
const folder = mkdtempSync(path.join(tmpdir(), 'ohmstead-pdf-'));
const file = path.join(folder, 'report.pdf');
let golden: Awaited<ReturnType<typeof goldenSnapshot>>;
let pdf: Buffer;
let pages: number;
/** In the order of writing, so that letters in a drawing do not fall between the words beside it; one space between words. */
let text: string;

beforeAll(async () => {
  golden = await goldenSnapshot();
  ({ pdf, pages } = await renderReportPdf(golden.snapshot, golden.sha256, 'en', { photos: golden.photos }));
  writeFileSync(file, pdf);
  text = readText();
}, 120_000);
afterAll(() => rmSync(folder, { recursive: true }));

function readText(...range: string[]): string {
  return flat(execFileSync('pdftotext', ['-raw', ...range, file, '-'], { encoding: 'utf8' }));
}
const flat = (words: string) => words.replaceAll(/\s+/g, ' ').normalize('NFC');
const onPage = (page: number) => readText('-f', String(page), '-l', String(page));

describe('the printed report says what the snapshot says', () => {
  test('every finding with its parts, its evidence and its limits', () => {
    for (const { text: words, evidence, place } of golden.snapshot.findings) {
      const { observed, means, plain, doNext, who, hazard, unproven } = words.en;
      const lines = [place, observed, means, doNext, who, hazard.type, hazard.consequence, hazard.avoid, ...unproven];
      for (const line of lines) expect(text).toContain(flat(line));
      for (const line of evidence) expect(text).toContain(flat(line.showed));
      expect(text).toContain(flat(words.en.title).slice(1));
      if (hazard.signal === 'DANGER' || hazard.signal === 'WARNING') expect(onPage(2)).toContain(flat(plain));
    }
  });

  test('every receptacle, every gap, every reason, every limit, the hash and who signed', () => {
    const { log, gaps, notTested, limits, signature, overrides, coverage } = golden.snapshot;
    const bare = text.replaceAll(' ', '');
    for (const row of log) expect(text).toContain(row.label);
    for (const line of [...gaps, ...notTested]) expect(text).toContain(flat(line.says.en));
    for (const line of [...limits.en, ...coverage.leftOff]) expect(text).toContain(flat(line));
    expect(text).toContain(overrides[0]?.reason);
    expect(text).toContain(
      en.report.signature.signed(`${signature.name}, license 5550`, 'December 1, 2026, 5:05 PM EST'),
    );
    expect(bare).toContain(golden.sha256);
  });

  test('names in Vietnamese, Polish and Turkish letters are those letters', () => {
    expect(text).toContain('Nguyễn Thị Łódź-Şahin');
    expect(text).toContain('José Peñalver');
  });

  test('nothing that the program never says of a finding', () => {
    expect(findForbiddenWords(text).map((found) => found.word)).toEqual([]);
  });
});

describe('its pages', () => {
  test('are Letter, each with firm, address, license, version and its number', async () => {
    const { stdout } = await run('pdfinfo', [file]);
    expect(stdout).toMatch(new RegExp(`Pages:\\s+${pages}\\b`));
    expect(stdout).toContain('612 x 792 pts (letter)');
    expect(stdout).toContain(en.report.title('418 Penstemon Road, Alder Falls, NY 12000'));
    for (let page = 1; page <= pages; page++) {
      const words = onPage(page);
      expect(words).toContain('Harrow Lane Home Inspection · 12 Harrow Lane, Alder Falls, NY 12000');
      expect(words).toContain('Ruth Okafor, license 5550');
      expect(words).toContain(`version 2 · 418 Penstemon Road, Alder Falls, NY 12000`);
      expect(words).toContain(`${page} of ${pages}`);
    }
  });

  test('start with what to do first, and each link there prints the page it goes to', () => {
    const first = onPage(2);
    expect(first).toContain(en.report.first.title);
    const numbers = [...first.matchAll(/page (\d+)/g)].map(([, number]) => Number(number));
    expect(numbers).toHaveLength(golden.snapshot.findings.length + 3);
    golden.snapshot.findings.forEach((finding, index) => {
      expect(onPage(numbers[index] ?? 0)).toContain(en.report.finding.heading(finding.number));
    });
    expect(onPage(numbers[4] ?? 0)).toContain(en.report.gaps.title);
    expect(onPage(numbers[6] ?? 0)).toContain(en.report.limits.title);
  });

  test('begin anew for each DANGER and WARNING, and never split a finding', () => {
    const starts = golden.snapshot.findings.map(({ number }) =>
      Array.from({ length: pages }, (_, index) => index + 1).find((page) =>
        onPage(page).includes(en.report.finding.heading(number)),
      ),
    );
    expect(new Set(starts.slice(0, 2)).size).toBe(2);
    golden.snapshot.findings.forEach(({ text: words }, index) => {
      const page = onPage(starts[index] ?? 0);
      for (const part of [words.en.hazard.avoid, words.en.doNext, words.en.unproven[0] ?? ''])
        expect(page).toContain(flat(part));
    });
  });

  test('carry bookmarks, a language, and pass qpdf', async () => {
    const { stdout } = await run('qpdf', ['--check', file]);
    expect(stdout).toContain('No syntax or stream encoding errors found');
    const { stdout: json } = await run('qpdf', ['--json', '--json-key=outlines', file]);
    const titles = (JSON.parse(json) as { outlines: { title: string }[] }).outlines.map((entry) => entry.title);
    expect(titles).toContain(en.report.first.title);
    expect(titles).toContain('Garage, bench left');
    expect(titles).toContain(en.report.log.title);
    expect(pdf.toString('latin1')).toContain('/Lang (en-US)');
  });
});

test(
  'the same snapshot gives the same bytes again, here and in other processes of other time zones',
  { timeout: 180_000 },
  async () => {
    const again = await renderReportPdf(golden.snapshot, golden.sha256, 'en', { photos: golden.photos });
    expect(hash(again.pdf)).toBe(hash(pdf));

    const root = process.cwd();
    const script = path.join(root, 'node_modules', `.render-golden-${process.pid}.mjs`);
    await build({
      absWorkingDir: root,
      entryPoints: ['tests/support/render-golden.ts'],
      outfile: script,
      bundle: true,
      platform: 'node',
      format: 'esm',
      jsx: 'automatic',
      packages: 'external',
      alias: { '@': root, 'server-only': './scripts/empty.ts' },
      logLevel: 'error',
    });
    try {
      for (const TZ of ['UTC', 'Asia/Tokyo']) {
        const env = { ...process.env, TZ, LANG: TZ === 'UTC' ? 'C' : 'ja_JP.UTF-8' };
        const { stdout } = await run(process.execPath, [script], { env });
        expect(stdout).toBe(hash(pdf));
      }
    } finally {
      rmSync(script, { force: true });
    }
  },
);
