import { execFile } from 'node:child_process';
import { cpSync, mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { promisify } from 'node:util';
import { ESLint } from 'eslint';
import { afterAll, beforeAll, expect, test } from 'vitest';

const root = fileURLToPath(new URL('../..', import.meta.url));
let folder: string;

/** Each file breaks the one rule it is listed under. */
const LINT: Record<string, { file: string; code: string }[]> = {
  'no-restricted-globals': ['Date', 'fetch', 'process', 'crypto', 'console'].map((name) => ({
    file: `lib/findings/probe/uses-${name.toLowerCase()}.ts`,
    code: `export const probe: unknown = ${name};\n`,
  })),
  'no-restricted-syntax': [
    { file: 'lib/findings/probe/random.ts', code: 'export const chance = Math.random();\n' },
    { file: 'lib/mail/probe.ts', code: 'export const secret = process.env.AUTH_SECRET;\n' },
    { file: 'app/probe/page.ts', code: 'export const secret = process.env.AUTH_SECRET;\n' },
  ],
  '@typescript-eslint/switch-exhaustiveness-check': [
    {
      file: 'lib/schemas/probe.ts',
      code: `export function name(lamp: 'lit' | 'off') {\n  switch (lamp) {\n    case 'lit':\n      return 1;\n  }\n  return 2;\n}\n`,
    },
  ],
  '@typescript-eslint/no-floating-promises': [
    { file: 'db/probe-floating.ts', code: 'export function save() {\n  Promise.resolve(1);\n}\n' },
  ],
  '@typescript-eslint/no-explicit-any': [{ file: 'db/probe-any.ts', code: 'export type Row = any;\n' }],
  'max-lines': [{ file: 'components/walk/probe.ts', code: 'export {};\n'.repeat(301) }],
};

const IMPORTS: Record<string, { file: string; imports: string }[]> = {
  'findings-is-pure': [
    { file: 'lib/findings/probe/reaches-out.ts', imports: 'node:fs' },
    { file: 'lib/findings/probe/reads-schema.ts', imports: '../../schemas/target' },
    { file: 'lib/findings/probe/draws.ts', imports: 'react' },
  ],
  'only-db-touches-the-database': [
    { file: 'app/probe/queries.ts', imports: 'drizzle-orm' },
    { file: 'lib/reports/tables.ts', imports: '@/db/schema' },
    { file: 'worker.ts', imports: '@/db/with-actor' },
  ],
  'only-db-and-the-worker-connect': [
    { file: 'lib/jobs/queries.ts', imports: 'pg' },
    { file: 'app/probe/connects.ts', imports: '@/db/client' },
  ],
  'nothing-imports-app': [{ file: 'lib/mail/page.ts', imports: '@/app/target' }],
  'ui-knows-no-domain': [
    { file: 'components/ui/knows.ts', imports: '@/lib/findings/target' },
    { file: 'components/ui/draws.ts', imports: '../walk/target' },
  ],
  'browser-takes-types-from-db-only': [
    { file: 'components/walk/queries.ts', imports: '@/db/target' },
    { file: 'lib/walk/queries.ts', imports: '../../db/target' },
  ],
  'schemas-stand-low': [{ file: 'lib/schemas/asks.ts', imports: '@/lib/auth/target' }],
  'db-stands-below-the-rest': [{ file: 'db/sends.ts', imports: '@/lib/mail/target' }],
  'lib-draws-nothing': [{ file: 'lib/mail/draws.ts', imports: '@/components/report/target' }],
  'reports-draw-with-report-parts': [{ file: 'lib/reports/walks.ts', imports: '@/components/walk/target' }],
  'components-take-what-they-show': [{ file: 'components/report/signs-in.ts', imports: '@/lib/auth/target' }],
  'only-auth-knows-next-auth': [{ file: 'app/probe/session.ts', imports: 'next-auth' }],
  'no-unlisted-package': [{ file: 'lib/mail/lost.ts', imports: './nowhere' }],
  'product-needs-no-dev-package': [{ file: 'lib/mail/tests.ts', imports: 'fast-check' }],
};

const ALLOWED = [
  { file: 'lib/findings/probe/allowed.ts', imports: 'zod' },
  { file: 'db/allowed.ts', imports: 'drizzle-orm' },
  { file: 'lib/auth/allowed.ts', imports: 'next-auth' },
  { file: 'lib/reports/allowed.ts', imports: '@/components/report/target' },
  { file: 'lib/reports/draws.ts', imports: '@/components/drawings/target' },
  { file: 'components/walk/allowed.ts', imports: '@/lib/findings/target' },
  { file: 'app/probe/allowed.ts', imports: '@/db/target' },
];

const TARGETS = [
  'app',
  'components/walk',
  'components/report',
  'components/drawings',
  'db',
  'db/schema',
  'lib/auth',
  'lib/findings',
  'lib/mail',
  'lib/schemas',
];

beforeAll(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'ohmstead-boundaries-'));
  for (const name of ['eslint.config.mjs', '.dependency-cruiser.mjs', 'tsconfig.json', 'package.json']) {
    cpSync(path.join(root, name), path.join(folder, name));
  }
  symlinkSync(path.join(root, 'node_modules'), path.join(folder, 'node_modules'));
  for (const { file, code } of Object.values(LINT).flat()) write(file, code);
  for (const { file, imports } of [...Object.values(IMPORTS).flat(), ...ALLOWED]) write(file, `import '${imports}';\n`);
  for (const target of TARGETS) write(`${target}/target.ts`, 'export const target = 1;\n');
  write('db/schema/index.ts', 'export const tables = {};\n');
  write('db/client.ts', 'export const client = 1;\n');
  write('db/with-actor.ts', 'export const withActor = 1;\n');
  write('lib/walk/one.ts', "import './two';\nexport const one = 1;\n");
  write('lib/walk/two.ts', "import './one';\nexport const two = 2;\n");
});

afterAll(() => rmSync(folder, { recursive: true, force: true }));

function write(file: string, text: string): void {
  mkdirSync(path.dirname(path.join(folder, file)), { recursive: true });
  writeFileSync(path.join(folder, file), text);
}

test('every lint rule of the house refuses the code it is there for, as an error', async () => {
  const eslint = new ESLint({ cwd: folder });
  for (const [rule, probes] of Object.entries(LINT)) {
    const results = await eslint.lintFiles(probes.map(({ file }) => file));
    for (const { filePath, messages } of results) {
      const found = messages.filter(({ ruleId, severity }) => ruleId === rule && severity === 2);
      expect(
        found.length,
        `${rule} in ${path.relative(folder, filePath)}: ${JSON.stringify(messages)}`,
      ).toBeGreaterThan(0);
    }
    expect(results).toHaveLength(probes.length);
  }
}, 120_000);

test('settings may be read in lib/env.ts', async () => {
  write('lib/env.ts', 'export const secret = process.env.AUTH_SECRET;\n');
  const [result] = await new ESLint({ cwd: folder }).lintFiles(['lib/env.ts']);
  expect(result?.messages).toEqual([]);
}, 60_000);

test('every import rule refuses what it is there for, and lets the rest be', async () => {
  const violations = await cruise();
  const rulesOf = (file: string) => violations.filter(({ from }) => from === file).map(({ rule }) => rule.name);
  for (const [rule, probes] of Object.entries(IMPORTS)) {
    for (const { file } of probes) expect(rulesOf(file), `${file} breaks ${rule}`).toContain(rule);
  }
  expect(rulesOf('lib/walk/one.ts')).toEqual(['no-circular']);
  for (const { file } of ALLOWED) expect(rulesOf(file), file).toEqual([]);
  expect(violations.filter(({ rule }) => rule.severity !== 'error')).toEqual([]);
}, 120_000);

test('each import rule of the table has a probe here', async () => {
  const { default: config } = (await import('../../.dependency-cruiser.mjs')) as {
    default: { forbidden: { name: string }[] };
  };
  expect(config.forbidden.map(({ name }) => name).toSorted()).toEqual(
    [...Object.keys(IMPORTS), 'no-circular'].toSorted(),
  );
});

type Violation = { from: string; rule: { name: string; severity: string } };

async function cruise(): Promise<Violation[]> {
  const program = path.join(root, 'node_modules/dependency-cruiser/bin/dependency-cruise.mjs');
  const how = ['--config', '.dependency-cruiser.mjs', '--preserve-symlinks', '--output-type', 'json'];
  const args = [program, ...how, 'app', 'components', 'db', 'lib', 'worker.ts'];
  const ended = await promisify(execFile)(process.execPath, args, { cwd: folder, maxBuffer: 2 ** 26 }).catch(
    (error: { stdout: string }) => error,
  );
  return (JSON.parse(ended.stdout) as { summary: { violations: Violation[] } }).summary.violations;
}
