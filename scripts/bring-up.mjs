import { existsSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { bundle, buildIfStale, buildPaths } from './build.mjs';
import { ensureDatabase, openCluster, sql } from './postgres.mjs';
import { answers, freePort, isPortFree, run } from './processes.mjs';
import { say, step, Stop } from './say.mjs';
import { readWhole, writeWhole } from './secrets.mjs';
import { actionsKey } from './settings.mjs';

/**
 * Brings up the whole program: database, migrations, build, demo, mail sink, payment fake, worker and web. Answers the
 * settings it runs with. `plan` is planStart's; `folder` and `buildDir` are where this run keeps its things.
 */
export async function bringUp(
  stack,
  {
    root,
    plan,
    folder,
    buildDir,
    ports,
    given,
    isEmpty = false,
    isTest = false,
    isDev = false,
    isDatabaseOnly = false,
  },
) {
  const base = await openDatabase(stack, { root, plan, folder, given, isTest });
  const { migrate } = await import('./migrate.mjs');
  await step('Migrating the database', () => migrate(base.DATABASE_OWNER_URL));
  const settings = { ...base, ...(await webAddress(plan, given, ports.web)) };
  if (isDatabaseOnly) return settings;
  if (isDev) await bundle(root, 'worker.ts', buildPaths(root, buildDir).worker);
  else await buildIfStale(root, buildDir, settings.NEXT_SERVER_ACTIONS_ENCRYPTION_KEY);
  if (plan.isLocal) await startFakes(stack, root, settings, given, ports);
  if (plan.isLocal) settings.DEMO = await loadDemo(stack, { root, buildDir, settings, isEmpty });
  await startProgram(stack, { root, buildDir, plan, settings, isDev });
  return settings;
}

async function openDatabase(stack, { root, plan, folder, given, isTest }) {
  const common = { ...given, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1', DEMO: '' };
  if (!plan.isPrivate) {
    await stack.claim(path.join(root, folder));
    const key = given.NEXT_SERVER_ACTIONS_ENCRYPTION_KEY || actionsKey(given.AUTH_SECRET);
    return { ...common, NEXTAUTH_SECRET: given.AUTH_SECRET, NEXT_SERVER_ACTIONS_ENCRYPTION_KEY: key };
  }
  const cluster = await openCluster(root, folder, {
    durable: !isTest,
    onHome: (home) => stack.claim(home),
    onServer: (server) => (stack.cluster = server),
  });
  stack.useCluster(cluster);
  if (isTest)
    for (const old of ['uploads', 'mail']) rmSync(path.join(stack.home, old), { recursive: true, force: true });
  const isHalfSeeded = readWhole(path.join(stack.home, 'demo.json'))?.state === 'loading';
  const urls = await ensureDatabase(cluster, 'ohmstead', { fresh: isTest || isHalfSeeded });
  const secret = given.AUTH_SECRET || cluster.secrets.authSecret;
  return {
    ...common,
    ...urls,
    AUTH_SECRET: secret,
    NEXTAUTH_SECRET: secret,
    NEXT_SERVER_ACTIONS_ENCRYPTION_KEY: cluster.secrets.actionsKey,
    ...(isTest ? { STORAGE_DIR: path.join(stack.home, 'uploads'), OHMSTEAD_BUILD_DIR: '.next-test' } : {}),
  };
}

/** A port that was asked for is taken or refused; without one, the first free from the usual one upwards. */
async function webAddress(plan, given, usual) {
  if (plan.port !== null && !(await isPortFree(plan.port, plan.host))) {
    throw new Stop(`Port ${plan.port} is in use: stop what uses it, or set another in PORT.`);
  }
  const port = plan.port ?? (await freePort(usual, plan.host));
  const address = given.APP_URL || `http://127.0.0.1:${port}`;
  return { HOST: plan.host, PORT: String(port), APP_URL: address, NEXTAUTH_URL: address };
}

async function startFakes(stack, root, settings, given, ports) {
  const fake = (name, ...args) =>
    stack.start(name, process.execPath, [path.join(root, `scripts/fakes/${name}.mjs`), ...args.map(String)], {
      cwd: root,
      env: settings,
    });
  const taken = new Set();
  // None of them listens yet, so two could be given the same free port.
  const ownPort = async (usual) => {
    let port = await freePort(usual);
    while (taken.has(port)) port = await freePort(port + 1);
    taken.add(port);
    return port;
  };
  if (!given.SMTP_URL) {
    const [smtp, pages] = [await ownPort(ports.smtp), await ownPort(ports.mail)];
    settings.SMTP_URL = `smtp://127.0.0.1:${smtp}`;
    settings.MAIL_SINK_URL = `http://127.0.0.1:${pages}`;
    fake('mail-sink', smtp, pages, path.join(stack.home, 'mail'));
  }
  if (!given.STRIPE_SECRET_KEY) {
    const port = await ownPort(ports.payments);
    settings.STRIPE_SECRET_KEY = 'sk_test_fake';
    settings.STRIPE_WEBHOOK_SECRET = stack.cluster.secrets.webhookSecret;
    settings.STRIPE_API_BASE = `http://127.0.0.1:${port}`;
    fake(
      'payments',
      port,
      path.join(stack.home, 'payments.json'),
      `http://127.0.0.1:${settings.PORT}/api/webhooks/payments`,
    );
  }
}

/** Loads the demo into an empty database. Answers "1" where the database holds the demo, else "". */
async function loadDemo(stack, { root, buildDir, settings, isEmpty }) {
  const file = path.join(stack.home, 'demo.json');
  const hasFirms = (await sql(stack.cluster, 'select exists (select from firms)', 'ohmstead')).trim() === 't';
  const isLoaded = hasFirms && readWhole(file)?.state === 'loaded';
  if (isLoaded && isEmpty)
    throw new Stop(
      `The database in ${stack.home} already holds the demo: move that folder away for a start without it.`,
    );
  if (isLoaded) return '1';
  if (hasFirms || isEmpty || !existsSync(path.join(root, 'scripts/seed.ts'))) return '';
  writeWhole(file, { state: 'loading' });
  const { seed } = buildPaths(root, buildDir);
  await bundle(root, 'scripts/seed.ts', seed);
  const load = `const { seedDemo } = await import(${JSON.stringify(seed)}); await seedDemo(); process.exit(0);`;
  const env = { ...settings, DEMO: '1' };
  const { code, output } = await step('Loading the demo', () =>
    run(process.execPath, ['--input-type=module', '-e', load], { cwd: root, env }),
  );
  if (code !== 0) {
    say(output.trim());
    throw new Stop('The demo could not be loaded: see the message above. "npm start -- --empty" starts without it.');
  }
  writeWhole(file, { state: 'loaded' });
  return '1';
}

async function startProgram(stack, { root, buildDir, plan, settings, isDev }) {
  const { worker } = buildPaths(root, buildDir);
  const { DATABASE_OWNER_URL: _owner, ...forWorker } = settings;
  const { DATABASE_JOBS_URL: _jobs, ...forWeb } = forWorker;
  if (isDev) forWeb.NODE_ENV = 'development';
  stack.start('worker', process.execPath, ['--enable-source-maps', worker], { cwd: root, env: forWorker });
  const next = path.join(root, 'node_modules/next/dist/bin/next');
  const web = [next, isDev ? 'dev' : 'start', '-H', plan.host, '-p', settings.PORT];
  const part = stack.start('web', process.execPath, web, { cwd: root, env: forWeb });
  const health = `http://${plan.host === '0.0.0.0' ? '127.0.0.1' : plan.host}:${settings.PORT}/api/health`;
  const isUp = await step('Starting the web', () => answers(health, 120_000));
  if (!isUp && !stack.isStopping)
    throw new Stop(
      `The web did not come up. Its last lines, from ${part.log}:\n${readFileSync(part.log, 'utf8').trim().split('\n').slice(-15).join('\n')}`,
    );
  stack.note(settings.APP_URL);
}
