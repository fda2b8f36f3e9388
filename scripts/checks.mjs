import { cpSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { run } from './processes.mjs';

/** The checks that need no database, each a command; `npm run check` and the first part of `npm test`. */
export function checks(root, buildDir) {
  const tool = (name, ...args) => [process.execPath, [path.join(root, 'node_modules', name), ...args]];
  const env = {
    ...process.env,
    OHMSTEAD_BUILD_DIR: buildDir === '.next' ? '' : buildDir,
    NEXT_TELEMETRY_DISABLED: '1',
  };
  const project = buildDir === '.next' ? 'tsconfig.json' : 'tsconfig.test.json';
  return [
    { name: 'types', title: 'route types', command: tool('next/dist/bin/next', 'typegen'), env },
    { name: 'types', title: 'types', command: tool('typescript/bin/tsc', '--noEmit', '-p', project), env },
    { name: 'lint', title: 'lint', command: tool('eslint/bin/eslint.js', '.', '--max-warnings', '0'), env },
    {
      name: 'lint',
      title: 'import rule',
      command: tool(
        'dependency-cruiser/bin/dependency-cruise.mjs',
        '--config',
        '.dependency-cruiser.mjs',
        ...sources(root),
      ),
      env,
    },
    {
      name: 'lint',
      title: 'format',
      command: tool('prettier/bin/prettier.cjs', '--check', '.', '--log-level', 'warn'),
      env,
    },
    { name: 'lint', title: 'migrations agree', command: tool('drizzle-kit/bin.cjs', 'check'), env },
  ];
}

/** The migrations are whole when generating from the schema would write nothing. Answers what it would, or "". */
export async function missingMigration(root) {
  const draft = mkdtempSync(path.join(tmpdir(), 'ohmstead-drizzle-'));
  try {
    cpSync(path.join(root, 'drizzle'), draft, { recursive: true });
    const before = readdirSync(draft).length;
    const kit = path.join(root, 'node_modules/drizzle-kit/bin.cjs');
    const where = ['--dialect', 'postgresql', '--schema', './db/schema/index.ts', '--out', path.relative(root, draft)];
    const how = ['--casing', 'snake_case', '--prefix', 'timestamp', '--name', 'missing'];
    const { code, output } = await run(process.execPath, [kit, 'generate', ...where, ...how], { cwd: root });
    return code === 0 && readdirSync(draft).length === before ? '' : output.trim();
  } finally {
    rmSync(draft, { recursive: true, force: true });
  }
}

function sources(root) {
  const isSource = (entry) => /^(app|components|db|lib)$|^(worker|proxy|instrumentation)\.ts$/.test(entry);
  return readdirSync(root).filter(isSource);
}
