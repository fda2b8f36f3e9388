import { spawn } from 'node:child_process';
import { closeSync, existsSync, openSync, readFileSync, renameSync } from 'node:fs';
import { createServer } from 'node:net';
import { setTimeout as wait } from 'node:timers/promises';
import { Interrupted } from './say.mjs';

const running = new Set();
let isInterrupted = false;

/**
 * Runs a command to its end without blocking, with its output captured. Answers { code, output }; rejects only when the
 * person stops the program meanwhile. `echo` also shows the output as it comes. `silent` gives the command no pipe, for
 * one that leaves a server behind which would hold it open. `finish` lets it end, and run at all, whatever happens.
 */
export async function run(command, args, { echo = false, silent = false, finish = false, input, ...options } = {}) {
  if (isInterrupted && !finish) throw new Interrupted();
  const pipes = [input === undefined ? 'ignore' : 'pipe', 'pipe', 'pipe'];
  const child = spawn(command, args, { detached: true, stdio: silent ? 'ignore' : pipes, ...options });
  if (!finish) running.add(child);
  const result = await new Promise((resolve) => collect(child, { echo, input }, resolve));
  running.delete(child);
  if (isInterrupted && !finish) throw new Interrupted();
  return result;
}

function collect(child, { echo, input }, resolve) {
  let output = '';
  for (const stream of [child.stdout, child.stderr]) {
    stream?.setEncoding('utf8').on('data', (text) => {
      output += text;
      if (echo) process.stderr.write(text);
    });
  }
  if (input !== undefined) child.stdin.on('error', () => {}).end(input);
  child.on('error', (error) => resolve({ code: 127, output: error.message }));
  child.on('close', (code) => resolve({ code: code ?? 128, output }));
}

/** Ends the commands that run now and refuses new ones, but for those that must finish. */
export function interruptCommands() {
  isInterrupted = true;
  for (const child of running) signalGroup(child.pid, 'SIGTERM');
}

/** Starts a part of the program in a process group of its own, its output in a log file. */
export function startPart(name, command, args, { log, ...options }) {
  if (existsSync(log)) renameSync(log, `${log}.before`);
  const file = openSync(log, 'a', 0o600);
  const child = spawn(command, args, { detached: true, stdio: ['ignore', file, file], ...options });
  closeSync(file);
  const exited = new Promise((resolve) => {
    child.on('exit', (code, signal) => resolve({ code, signal }));
    child.on('error', (error) => resolve({ code: 127, signal: null, error }));
  });
  return { name, log, pid: child.pid, born: bornAt(child.pid), exited };
}

/** Asks a part's whole group to end, and after the grace ends it. */
export async function stopPart({ pid }, graceMs = 8000) {
  if (pid === undefined) return;
  signalGroup(pid, 'SIGTERM');
  for (let waited = 0; waited < graceMs && isGroupAlive(pid); waited += 50) await wait(50);
  signalGroup(pid, 'SIGKILL');
  for (let waited = 0; waited < 2000 && isGroupAlive(pid); waited += 50) await wait(50);
}

/** Whether the process of that number is still the one that was started, not a later one that took the number. */
export function isSame({ pid, born }) {
  return Boolean(pid && born) && bornAt(pid) === born;
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

/** Waits until an address answers without a server error. False when the time is over first. */
export async function answers(address, timeoutMs) {
  for (const end = Date.now() + timeoutMs; Date.now() < end && !isInterrupted; await wait(100)) {
    try {
      const response = await fetch(address, { redirect: 'manual', signal: AbortSignal.timeout(5000) });
      await response.arrayBuffer();
      if (response.status < 500) return true;
    } catch {
      // Not listening yet.
    }
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
