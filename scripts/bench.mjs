/**
 * npm run bench: brings up the tests' own copy of the program and prints measured ratios, each against its floor in the
 * same run. It says nothing of good or bad: a timing is no test. Its table goes to standard output.
 */
import { spawn } from 'node:child_process';
import path from 'node:path';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import { bundle } from './build.mjs';
import { explain, say, step, Stop } from './say.mjs';

const root = fileURLToPath(new URL('..', import.meta.url)).replace(/\/$/, '');
const bench = path.join(root, '.next-test/bench.mjs');

async function main() {
  const program = spawn(process.execPath, [path.join(root, 'scripts/test.mjs'), '--serve'], {
    cwd: root,
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const ended = new Promise((resolve) => program.once('exit', resolve));
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => program.kill('SIGTERM'));
  try {
    const settings = await step('Bringing up the program', () => settingsOf(program, ended));
    await bundle(root, 'scripts/bench.ts', bench);
    await measure(settings, ended);
  } finally {
    program.kill('SIGTERM');
    await ended;
  }
}

/** The variables that the program prints once it is up; what it says of its progress is passed on. */
async function settingsOf(program, ended) {
  const settings = {};
  createInterface(program.stdout).on('line', (line) => {
    const [, name, value] = /^export (\w+)='(.*)'$/.exec(line) ?? [];
    if (name) settings[name] = value;
  });
  const isUp = new Promise((resolve) => {
    createInterface(program.stderr).on('line', (line) => (line.startsWith('Ctrl-C') ? resolve(true) : say(line)));
  });
  if ((await Promise.race([isUp, ended])) !== true)
    throw new Stop('The program did not come up: see the message above.');
  return settings;
}

async function measure(settings, ended) {
  const load = `const { bench } = await import(${JSON.stringify(bench)}); await bench(); process.exit(0);`;
  const child = spawn(process.execPath, ['--input-type=module', '-e', load], {
    cwd: root,
    env: { ...process.env, ...settings, NODE_ENV: 'production' },
    stdio: ['ignore', 'inherit', 'inherit'],
  });
  ended.then(() => child.kill('SIGTERM'));
  const code = await new Promise((resolve) => child.once('exit', resolve));
  if (code !== 0) throw new Stop('The measurements broke off: see the message above.');
}

main().catch((error) => {
  say(explain(error));
  process.exitCode = 1;
});
