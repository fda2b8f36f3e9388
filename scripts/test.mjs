/**
 * npm test: brings up a copy of the program of its own and checks everything against it. Its last line is the count.
 *   node scripts/test.mjs --check         types, lint, import rule, format, migrations (npm run check)
 *   node scripts/test.mjs --only routes   one of: unit, db, routes, journeys, types, lint
 *   node scripts/test.mjs --serve         the program as the tests have it, until Ctrl-C, with its variables printed
 */
import { existsSync, readdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { bringUp } from './bring-up.mjs';
import { checks, missingMigration } from './checks.mjs';
import { ensureDebianPackages, ensureNpmPackages, findProgram } from './packages.mjs';
import { run } from './processes.mjs';
import { explain, Interrupted, say, step, Stop } from './say.mjs';
import { planStart } from './settings.mjs';
import { withStack } from './stack.mjs';
import { countJourneys, countVitest, Tally } from './tally.mjs';

const root = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '');
const PORTS = { web: 3400, smtp: 2625, mail: 8125, payments: 8126 };
const BUILD_DIR = '.next-test';
const REFEREES = {
  chromium: 'chromium',
  ngspice: 'ngspice',
  'poppler-utils': 'pdftotext',
  qpdf: 'qpdf',
  'libimage-exiftool-perl': 'exiftool',
};
const OWN_SETTINGS =
  /^(APP_URL|DATABASE_\w+|AUTH_SECRET|NEXTAUTH_\w+|NEXT_SERVER_ACTIONS_ENCRYPTION_KEY|SMTP_URL|MAIL_\w+|SIGN_UP|DEMO|STORAGE_DIR|UPLOADTHING_TOKEN|STRIPE_\w+|HOST|PORT|TRUSTED_PROXIES|LOG_LEVEL|OHMSTEAD_\w+)$/;
const KINDS = ['unit', 'db', 'routes', 'journeys', 'types', 'lint'];
const tally = new Tally();

await withStack(async (stack) => {
  const { only, serve, check } = readArguments();
  const wants = (...kinds) => (only === undefined ? !serve && !check : kinds.includes(only));
  await ensureNpmPackages(root);
  if (serve) return serveUntilStopped(stack);
  if (check || wants('types', 'lint')) await runChecks(check ? '.next' : BUILD_DIR, only);
  if (wants('unit', 'db', 'routes', 'journeys')) {
    const referees = Object.entries(REFEREES).map(([name, program]) => [name, () => findProgram(program) !== null]);
    await ensureDebianPackages(Object.fromEntries(referees));
    await runTests(stack, only, wants);
  }
  if (stack.isStopping) return (await stack.ended).code || 1;
  return tally.print();
});

function readArguments() {
  const flag = { type: 'boolean', default: false };
  const { values } = parseArgs({ options: { only: { type: 'string' }, serve: flag, check: flag } });
  if (values.only !== undefined && !KINDS.includes(values.only))
    throw new Stop(`--only takes one of ${KINDS.join(', ')}.`);
  return values;
}

/** Types beside lint: two lines of work, as the machine has two cores. */
async function runChecks(buildDir, only) {
  const all = checks(root, buildDir);
  const lines = ['types', 'lint'].filter((kind) => only === undefined || only === kind);
  await Promise.all(lines.map((kind) => runInTurn(all.filter(({ name }) => name === kind))));
  if (lines.includes('lint')) {
    const missing = await step('Comparing the schema with its migrations', () => missingMigration(root));
    tally.check('the migrations hold the whole schema', missing === '', missing);
  }
}

async function runInTurn(list) {
  for (const { title, command, env } of list) {
    const { code, output } = await step(`Checking: ${title}`, () => run(...command, { cwd: root, env }));
    tally.check(title, code === 0, output);
  }
}

async function runTests(stack, only, wants) {
  // A tool that breaks off writes no result, and an earlier one must not stand in for it.
  rmSync(path.join(root, 'test-results'), { recursive: true, force: true });
  const settings = only === 'unit' ? cleanVariables() : await comeUp(stack, only);
  if (settings === null) return;
  const env = { ...settings, NODE_ENV: 'test', NO_COLOR: '1' };
  if (wants('unit', 'db', 'routes')) await runVitest(env, only);
  if (wants('journeys')) await runJourneys(env);
}

async function comeUp(stack, only) {
  try {
    const settings = await bringUpForTests(stack, only === 'db');
    tally.check('the program comes up', true);
    return settings;
  } catch (error) {
    if (error instanceof Interrupted || stack.isStopping) throw error;
    tally.check('the program comes up', false, explain(error));
    return null;
  }
}

function bringUpForTests(stack, isDatabaseOnly = false) {
  const given = cleanVariables();
  const plan = planStart(given);
  return bringUp(stack, {
    root,
    plan,
    folder: '.ohmstead-test',
    buildDir: BUILD_DIR,
    ports: PORTS,
    given,
    isTest: true,
    isDatabaseOnly,
  });
}

/** What a shell or an .env file has set must not reach the tests; Next reads .env by itself, but not over an empty one. */
function cleanVariables() {
  const empty = [
    'UPLOADTHING_TOKEN',
    'SIGN_UP',
    'TRUSTED_PROXIES',
    'MAIL_FROM',
    'SMTP_URL',
    'STRIPE_SECRET_KEY',
    'LOG_LEVEL',
  ];
  const kept = Object.entries(process.env).filter(([name]) => !OWN_SETTINGS.test(name));
  return Object.fromEntries([...kept, ...empty.map((name) => [name, ''])]);
}

async function runVitest(env, only) {
  const result = path.join(root, 'test-results/vitest.json');
  const folders = { db: ['tests/db'], routes: ['tests/routes', 'tests/faults'] }[only] ?? [];
  const left = only === 'unit' ? ['db', 'routes', 'faults'].flatMap((name) => ['--exclude', `tests/${name}/**`]) : [];
  const vitest = path.join(root, 'node_modules/vitest/vitest.mjs');
  const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${result}`];
  const { code } = await run(process.execPath, [vitest, 'run', ...folders, ...left, ...reporters], {
    cwd: root,
    env,
    echo: true,
  });
  tally.add('vitest', countVitest(result, code));
}

async function runJourneys(env) {
  const result = path.join(root, 'test-results/journeys.json');
  const folder = path.join(root, 'tests/journeys');
  if (!existsSync(folder) || !readdirSync(folder).some((name) => name.endsWith('.spec.ts'))) return;
  const playwright = path.join(root, 'node_modules/@playwright/test/cli.js');
  const { code } = await run(process.execPath, [playwright, 'test'], {
    cwd: root,
    env: { ...env, JOURNEYS_RESULT: result },
    echo: true,
  });
  tally.add('journeys', countJourneys(result, code));
}

async function serveUntilStopped(stack) {
  const settings = await bringUpForTests(stack);
  for (const [name, value] of Object.entries(settings)) {
    if (OWN_SETTINGS.test(name) && value) process.stdout.write(`export ${name}='${value}'\n`);
  }
  say('Ctrl-C stops all of it.');
  const { code, why } = await stack.ended;
  if (why) say(why);
  return code;
}
