import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import path from 'node:path';
import { closeCluster, runningPort } from './postgres.mjs';
import { bornAt, interruptCommands, isSame, startPart, stopPart } from './processes.mjs';
import { explain, say, Stop } from './say.mjs';
import { readWhole, writeWhole } from './secrets.mjs';

/** The parts of a running program: they start together and end together. */
export class Stack {
  parts = [];
  cluster = null;
  home = null;
  watch = null;
  isStopping = false;

  constructor() {
    this.ended = new Promise((resolve) => (this.end = resolve));
    for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => this.interrupt());
    process.on('uncaughtException', (error) => this.fail(explain(error)));
  }

  /** The person wants to stop. */
  interrupt() {
    if (this.isStopping) return;
    this.isStopping = true;
    interruptCommands();
    this.end({ code: 0, why: null });
  }

  /** Takes the folder for this run. What an earlier run left behind when it was killed is ended first. */
  async claim(home) {
    const file = path.join(home, 'running.json');
    const earlier = readWhole(file);
    if (earlier && isSame(earlier)) {
      throw new Stop(
        `Ohmstead already runs from this folder${earlier.address ? ` at ${earlier.address}` : ''} (process ${earlier.pid}): stop that one first.`,
      );
    }
    for (const part of earlier?.parts ?? []) if (isSame(part)) await stopPart(part);
    mkdirSync(path.join(home, 'logs'), { recursive: true, mode: 0o700 });
    this.home = home;
    this.note();
  }

  useCluster(cluster) {
    this.cluster = cluster;
    this.watch = setInterval(() => {
      if (runningPort(cluster.data) === null) this.fail(`PostgreSQL has stopped. Its log: ${cluster.data}/server.log`);
    }, 1000);
  }

  start(name, command, args, options) {
    const part = startPart(name, command, args, { log: path.join(this.home, 'logs', `${name}.log`), ...options });
    this.parts.push(part);
    this.note();
    part.exited.then(({ code, signal }) =>
      this.fail(`${name} has ended (${signal ?? `code ${code}`}).${lastLines(part.log)}`),
    );
    return part;
  }

  fail(why) {
    if (this.isStopping) return;
    this.isStopping = true;
    interruptCommands();
    this.end({ code: 1, why });
  }

  /** Writes down what runs, for the next start to find should this one be killed. */
  note(address) {
    this.address = address ?? this.address;
    const parts = this.parts.map(({ name, pid, born }) => ({ name, pid, born }));
    writeWhole(path.join(this.home, 'running.json'), {
      pid: process.pid,
      born: bornAt(process.pid),
      address: this.address,
      parts,
    });
  }

  async stop() {
    this.isStopping = true;
    clearInterval(this.watch);
    await Promise.all(this.parts.map((part) => stopPart(part)));
    if (this.cluster) await closeCluster(this.cluster);
    if (this.home) rmSync(path.join(this.home, 'running.json'), { force: true });
  }
}

/** Runs `work` with a stack, and stops every part of it whatever comes. Sets the exit code. */
export async function withStack(work) {
  const stack = new Stack();
  try {
    process.exitCode = await work(stack);
  } catch (error) {
    const ended = stack.isStopping ? await stack.ended : null;
    if (ended?.why || !ended) say(`\n${ended?.why ?? explain(error)}`);
    process.exitCode = ended?.code ?? 1;
  } finally {
    await stack.stop();
  }
  process.exit();
}

function lastLines(log) {
  if (!existsSync(log)) return '';
  const lines = readFileSync(log, 'utf8').trim().split('\n').slice(-15).join('\n');
  return ` Its last lines, from ${log}:\n${lines}`;
}
