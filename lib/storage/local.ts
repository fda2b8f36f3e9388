import 'server-only';
import { randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { link, mkdir, open, rm, stat, type FileHandle } from 'node:fs/promises';
import path from 'node:path';
import type { Readable } from 'node:stream';
import { requireKey } from './keys';
import type { ByteRange, PutOutcome, Storage } from './storage';

/** Files of one folder. A file appears under its name whole or not at all, after its bytes are on the disk. */
export function localStorage(folder: string): Storage {
  const root = path.resolve(/* turbopackIgnore: true */ folder);
  const pathOf = (key: string) => path.join(root, ...requireKey(key).split('/'));
  return {
    putIfAbsent: (key, body) => put(root, pathOf(key), body),
    stat: (key) => sizeOf(pathOf(key)),
    open: (key, range) => read(pathOf(key), range),
    remove: (key) => rm(pathOf(key), { force: true }),
  };
}

async function put(root: string, target: string, body: Buffer | Readable): Promise<PutOutcome> {
  const present = await sizeOf(target);
  if (present) return { kind: 'present', ...present };

  const waiting = path.join(root, 'incoming');
  await mkdir(waiting, { recursive: true });
  await mkdir(path.dirname(target), { recursive: true });
  const temporary = path.join(waiting, randomUUID());
  try {
    const bytes = await writeThrough(temporary, body);
    // A hard link fails where the name is taken, which a rename would not.
    const isFirst = await link(temporary, target).then(
      () => true,
      (error: NodeJS.ErrnoException) => {
        if (error.code === 'EEXIST') return false;
        throw error;
      },
    );
    if (!isFirst) return { kind: 'present', bytes: (await stat(target)).size };
    await syncFolder(path.dirname(target));
    return { kind: 'stored', bytes };
  } finally {
    await rm(temporary, { force: true });
  }
}

async function writeThrough(file: string, body: Buffer | Readable): Promise<number> {
  const handle = await open(file, 'wx', 0o600);
  try {
    if (Buffer.isBuffer(body)) await handle.writeFile(body);
    else await writeStream(handle, body);
    await handle.sync();
    return (await handle.stat()).size;
  } finally {
    await handle.close();
  }
}

async function writeStream(handle: FileHandle, body: Readable): Promise<void> {
  for await (const piece of body) await handle.writeFile(piece as Buffer);
}

async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r');
  await handle.sync().finally(() => handle.close());
}

async function sizeOf(file: string): Promise<{ bytes: number } | null> {
  const found = await stat(file).catch(missing);
  return found?.isFile() ? { bytes: found.size } : null;
}

async function read(file: string, range?: ByteRange): Promise<{ bytes: number; body: Readable } | null> {
  const handle = await open(file, 'r').catch(missing);
  if (!handle) return null;
  const { size } = await handle.stat();
  await handle.close();
  const within = range ? { start: range.start, end: Math.min(range.end, size - 1) } : undefined;
  return { bytes: size, body: createReadStream(file, within) };
}

function missing(error: NodeJS.ErrnoException): null {
  if (error.code === 'ENOENT' || error.code === 'ENOTDIR') return null;
  throw error;
}
