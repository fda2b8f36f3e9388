/**
 * npm start: installs what is missing and runs the whole program until it is told to stop.
 *   npm start -- --empty     the first run without the demo
 *   npm start -- --dev       the same with Next's development server (npm run dev)
 */
import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';
import { parseArgs } from 'node:util';
import { bringUp } from './bring-up.mjs';
import { ensureNpmPackages } from './packages.mjs';
import { say, Stop } from './say.mjs';
import { planStart } from './settings.mjs';
import { withStack } from './stack.mjs';

const root = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '');
const PORTS = { web: 3000, smtp: 2525, mail: 8025, payments: 8026 };

await withStack(async (stack) => {
  const { empty: isEmpty, dev: isDev } = readArguments();
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 12))
    throw new Stop(`Node.js ${process.versions.node} is too old: install version 20.12 or later.`);
  if (existsSync(path.join(root, '.env'))) process.loadEnvFile(path.join(root, '.env'));
  const plan = planStart(process.env);
  await ensureNpmPackages(root);
  const folder = '.ohmstead';
  const settings = await bringUp(stack, {
    root,
    plan,
    folder,
    buildDir: '.next',
    ports: PORTS,
    given: process.env,
    isEmpty,
    isDev,
  });
  if (!stack.isStopping) announce(settings, stack.home);
  const { code, why } = await stack.ended;
  say(why ? `\n${why}\nStopping the rest …` : '\nStopping …');
  return code;
});

function readArguments() {
  const options = { empty: { type: 'boolean', default: false }, dev: { type: 'boolean', default: false } };
  try {
    return parseArgs({ options }).values;
  } catch (error) {
    throw new Stop(`${error.message} "npm start" takes --empty and nothing else.`);
  }
}

function announce(settings, home) {
  say(`\nOhmstead runs at  ${settings.APP_URL}`);
  if (settings.MAIL_SINK_URL) say(`Mail shows at     ${settings.MAIL_SINK_URL}`);
  if (settings.DEMO) for (const line of demoSignIns()) say(line);
  say(`Logs are in       ${path.join(home, 'logs')}`);
  say('Ctrl-C stops all of it.\n');
}

/** lib/demo.ts is the one place that has them, and plain Node.js 20 reads no TypeScript. */
function demoSignIns() {
  const text = readFileSync(path.join(root, 'lib/demo.ts'), 'utf8');
  const password = /DEMO_PASSWORD = '([^']+)'/.exec(text)?.[1] ?? '';
  const people = [...text.matchAll(/label: '([^']+)'.*?email: '([^']+)'/g)];
  return ['Demo sign-ins', ...people.map(([, label, email]) => `  ${label.padEnd(10)} ${email}   ${password}`)];
}
