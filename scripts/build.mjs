import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { run } from './processes.mjs';
import { explain, say, step, Stop } from './say.mjs';

const SOURCES = ['app', 'components', 'db', 'lib', 'public', 'worker.ts', 'proxy.ts', 'instrumentation.ts'];
const SETTINGS = ['next.config.mjs', 'postcss.config.mjs', 'package.json', 'package-lock.json', 'scripts/build.mjs'];

/** Where a build's parts are. The tests build into a folder of their own. */
export function buildPaths(root, buildDir) {
  const isOwn = buildDir !== '.next';
  return {
    stamp: path.join(root, buildDir, 'ohmstead-sources'),
    worker: path.join(root, isOwn ? buildDir : 'dist', 'worker.mjs'),
    seed: path.join(root, isOwn ? buildDir : 'dist', 'seed.mjs'),
  };
}

/** Builds the web and the worker when a source has changed since the last whole build. */
export async function buildIfStale(root, buildDir, actionsKey) {
  const { stamp, worker } = buildPaths(root, buildDir);
  const wanted = hashSources(root, actionsKey);
  if (existsSync(stamp) && existsSync(worker) && readFileSync(stamp, 'utf8') === wanted) return;
  rmSync(stamp, { force: true });
  const env = {
    ...process.env,
    NODE_ENV: 'production',
    NEXT_TELEMETRY_DISABLED: '1',
    OHMSTEAD_BUILD_DIR: buildDir === '.next' ? '' : buildDir,
    NEXT_SERVER_ACTIONS_ENCRYPTION_KEY: actionsKey,
  };
  const next = path.join(root, 'node_modules/next/dist/bin/next');
  const { code, output } = await step('Building the application', () =>
    run(process.execPath, [next, 'build'], { cwd: root, env }),
  );
  if (code !== 0) {
    say(output.trim());
    throw new Stop('The application could not be built: see the message above.');
  }
  await bundle(root, 'worker.ts', worker);
  writeFileSync(stamp, wanted);
}

/** Bundles a program that runs in plain Node.js. The marker package `server-only` throws there, hence the empty file. */
export async function bundle(root, entry, outfile) {
  const { build, stop } = await import('esbuild');
  await build({
    absWorkingDir: root,
    entryPoints: [entry],
    outfile,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    jsx: 'automatic',
    packages: 'external',
    sourcemap: true,
    alias: { 'server-only': './scripts/empty.ts', '@': root },
    logLevel: 'error',
  });
  await stop();
}

function hashSources(root, actionsKey) {
  const hash = createHash('sha256').update(`${process.version}\0${actionsKey}\0`);
  for (const name of [...SOURCES, ...SETTINGS].flatMap((source) => filesUnder(root, source))) {
    hash.update(`${name}\0`).update(readFileSync(path.join(root, name)));
  }
  return hash.digest('hex');
}

function filesUnder(root, source) {
  if (!existsSync(path.join(root, source))) return [];
  const entries = path.extname(source)
    ? null
    : readdirSync(path.join(root, source), { recursive: true, withFileTypes: true });
  if (!entries) return [source];
  const names = entries
    .filter((entry) => entry.isFile())
    .map((entry) => path.join(entry.parentPath ?? entry.path, entry.name));
  return names.map((name) => path.relative(root, name)).sort();
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const root = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '');
  buildIfStale(root, '.next', process.env.NEXT_SERVER_ACTIONS_ENCRYPTION_KEY ?? '').catch((error) => {
    say(explain(error));
    process.exitCode = 1;
  });
}
