/**
 * A database for development: starts the private development cluster (it keeps running), makes or renews a database in
 * it, and prints its addresses for a shell.
 *
 *   eval "$(node scripts/dev-stack.mjs --database ohmstead_dev)"      make it if missing, migrate, set the variables
 *   node scripts/dev-stack.mjs --database ohmstead_dev --fresh        drop it first
 *   node scripts/dev-stack.mjs --stop                                 stop the cluster
 */
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { closeCluster, ensureDatabase, openCluster } from './postgres.mjs';
import { explain, say, step } from './say.mjs';

const root = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '');
const { values } = parseArgs({
  options: {
    database: { type: 'string', default: 'ohmstead_dev' },
    fresh: { type: 'boolean', default: false },
    stop: { type: 'boolean', default: false },
  },
});

async function main() {
  const cluster = await openCluster(root, '.ohmstead-dev', { durable: false });
  if (values.stop) return closeCluster(cluster);
  const urls = await ensureDatabase(cluster, values.database, { fresh: values.fresh });
  const { migrate } = await import('./migrate.mjs');
  await step('Migrating the database', () => migrate(urls.DATABASE_OWNER_URL));
  const settings = {
    ...urls,
    APP_URL: 'http://127.0.0.1:3000',
    AUTH_SECRET: cluster.secrets.authSecret,
    SMTP_URL: 'smtp://127.0.0.1:2525',
  };
  for (const [name, value] of Object.entries(settings)) process.stdout.write(`export ${name}='${value}'\n`);
}

main().catch((error) => {
  say(explain(error));
  process.exitCode = 1;
});
