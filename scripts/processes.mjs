import { spawn } from 'node:child_process';
import { closeSync, openSync, readFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { setTimeout as wait } from 'node:timers/promises';

/**
 * Runs a command to its end without blocking, with its output captured. Answers { code, output }; never rejects for a
 * code other than 0. `echo` also shows the output as it comes; `silent` gives the command no pipe, for one that leaves a
 * server behind which would hold it open.
 */
export function run(command, args, { echo = false, silent = false, input, ...options } = {}) {
  return new Promise((resolve) => {
    const pipes = [input === undefined ? 'ignore' : 'pipe', 'pipe', 'pipe'];
    const child = spawn(command, args, { stdio: silent ? 'ignore' : pipes, ...options });
    let output = '';
    for (const stream of [child.stdout, child.stderr]) {
      stream?.setEncoding('utf8').on('data', (text) => {
        output += text;
        if (echo) process.stderr.write(text);
      });
    }
    if (input !== undefined) child.stdin.end(input);
    child.on('error', (error) => resolve({ code: 127, output: error.message }));
    child.on('close', (code, signal) => resolve({ code: code ?? 128, signal, output }));
  });
}

/** Starts a part of the program in a process group of its own, its output in a log file. */
export function startPart(name, command, args, { log, ...options }) {
  const file = openSync(log, 'a');
  const child = spawn(command, args, { detached: true, stdio: ['ignore', file, file], ...options });
  closeSync(file);
  const exited = new Promise((resolve) => {
    child.on('exit', (code, signal) => resolve({ name, log, code, signal }));
    child.on('error', () => resolve({ name, log, code: 127, signal: null }));
  });
  return { name, log, pid: child.pid, born: bornAt(child.pid), exited };
}

/** Asks a part's whole group to end, and after the grace ends it. */
export async function stopPart(part, graceMs = 8000) {
  if (!isSame(part)) return;
  signalGroup(part.pid, 'SIGTERM');
  for (let waited = 0; waited < graceMs && isGroupAlive(part.pid); waited += 50) await wait(50);
  if (isGroupAlive(part.pid)) signalGroup(part.pid, 'SIGKILL');
  for (let waited = 0; waited < 2000 && isGroupAlive(part.pid); waited += 50) await wait(50);
}

/** Whether the process of that number is still the one that was started, not a later one that took the number. */
export function isSame({ pid, born }) {
  return pid !== undefined && born !== null && bornAt(pid) === born;
}

/** When the kernel says that a process began, in its own ticks. Null where there is none. */
export function bornAt(pid) {
  try {
    const stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
    return fields[0] === 'Z' ? null : fields[19];
  } catch {
    return null;
  }
}

export async function isPortFree(port, host = '127.0.0.1') {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', () => resolve(false));
    server.listen({ port, host, exclusive: true }, () => server.close(() => resolve(true)));
  });
}

/** The first free port from `from` upwards. */
export async function freePort(from, host) {
  for (let port = from; port < from + 200; port += 1) if (await isPortFree(port, host)) return port;
  throw new Error(`no free port from ${from} to ${from + 199}`);
}

/** Waits until an address answers. Answers false when `gone()` turns true or the time is over. */
export async function answers(address, { timeoutMs = 60_000, gone = () => false } = {}) {
  for (const end = Date.now() + timeoutMs; Date.now() < end && !gone();) {
    try {
      const response = await fetch(address, { redirect: 'manual', signal: AbortSignal.timeout(5000) });
      await response.arrayBuffer();
      if (response.status < 500) return true;
    } catch {
      // Not listening yet.
    }
    await wait(100);
  }
  return false;
}

function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch {
    // The group has ended by itself.
  }
}

function isGroupAlive(pid) {
  try {
    process.kill(-pid, 0);
    return true;
  } catch {
    return false;
  }
}
