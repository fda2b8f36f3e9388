import { accessSync, constants, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { run } from './processes.mjs';
import { say, step, Stop } from './say.mjs';

export const isRoot = process.getuid?.() === 0;

/** Installs the npm packages when those in node_modules are not the ones of package-lock.json. */
export async function ensureNpmPackages(root) {
  if (areNpmPackagesCurrent(root)) return;
  const { code, output } = await step('Installing npm packages', () =>
    run('npm', ['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'], { cwd: root }),
  );
  if (code === 0 && areNpmPackagesCurrent(root)) return;
  say(output.trim());
  throw new Stop('npm could not install the packages: see its message above, then start again.');
}

/** npm writes its own copy of the lock at the end of an install, so a broken-off one has none. */
function areNpmPackagesCurrent(root) {
  const hidden = path.join(root, 'node_modules/.package-lock.json');
  if (!existsSync(hidden)) return false;
  const wanted = JSON.parse(readFileSync(path.join(root, 'package-lock.json'), 'utf8')).packages;
  const present = JSON.parse(readFileSync(hidden, 'utf8')).packages;
  const isMissing = ([name, entry]) => name && !entry.optional && present[name]?.version !== entry.version;
  const isForeign = ([name, entry]) => wanted[name]?.version !== entry.version;
  return !Object.entries(wanted).some(isMissing) && !Object.entries(present).some(isForeign);
}

/** Where a program is, looked for as a shell would, or null. */
export function findProgram(name, folders = (process.env.PATH ?? '').split(path.delimiter)) {
  for (const folder of [...folders, '/usr/local/bin', '/usr/bin', '/bin', '/usr/sbin', '/sbin']) {
    const file = path.join(folder, name);
    try {
      accessSync(file, constants.X_OK);
      return file;
    } catch {
      // Not in this folder.
    }
  }
  return null;
}

/** Installs the Debian packages of the programs that are missing; without the right to, says what to install. */
export async function ensureDebianPackages(wanted) {
  const missing = Object.entries(wanted).filter(([, isThere]) => !isThere());
  if (missing.length === 0) return;
  const names = missing.map(([name]) => name);
  const command = `apt-get install ${names.join(' ')}`;
  if (!isRoot) throw new Stop(`Missing: ${names.join(', ')}. Install with: sudo ${command}`);
  if (!findProgram('apt-get'))
    throw new Stop(`Missing: ${names.join(', ')}. Install them with this system's package tool.`);
  await step(`Installing ${names.join(', ')}`, () => aptInstall(names));
  const still = missing.filter(([, isThere]) => !isThere()).map(([name]) => name);
  if (still.length > 0)
    throw new Stop(`Debian's packages could not be installed. Run "${command}" to see why, then start again.`);
}

async function aptInstall(names) {
  // A broken-off dpkg leaves the machine's packages half set up.
  const options = { finish: true, env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive', LC_ALL: 'C.UTF-8' } };
  const install = ['install', '-y', '-q', '--no-install-recommends', '-o', 'Dpkg::Options::=--force-confold', ...names];
  if ((await run('apt-get', install, options)).code === 0) return;
  await run('apt-get', ['update', '-q'], options);
  const { code, output } = await run('apt-get', install, options);
  if (code !== 0) say(output.trim().split('\n').slice(-8).join('\n'));
}

/** Keeps Debian's package from making and starting a cluster of its own. */
export function refuseMainCluster() {
  if (!isRoot) return;
  const file = '/etc/postgresql-common/createcluster.conf';
  const text = existsSync(file) ? readFileSync(file, 'utf8') : '';
  if (/^create_main_cluster\s*=\s*false/m.test(text)) return;
  mkdirSync(path.dirname(file), { recursive: true });
  writeFileSync(file, `${text.replace(/^create_main_cluster\s*=.*$/m, '')}\ncreate_main_cluster = false\n`);
}
