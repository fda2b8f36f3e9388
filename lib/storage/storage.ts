import 'server-only';
import type { Readable } from 'node:stream';
import { env } from '@/lib/env';
import { localStorage } from './local';

export type StoredObject = { bytes: number };
/** `end` is the last byte wanted, as in an HTTP range. */
export type ByteRange = { start: number; end: number };
export type PutOutcome = { kind: 'stored'; bytes: number } | { kind: 'present'; bytes: number };

/** Write-once objects under slash-separated keys. What is stored never changes; it can only be removed whole. */
export type Storage = {
  /** Keeps the first of two writers: the second is told that it is present and changes nothing. */
  putIfAbsent(key: string, body: Buffer | Readable): Promise<PutOutcome>;
  /** Null where there is none. */
  stat(key: string): Promise<StoredObject | null>;
  /** Null where there is none. */
  open(key: string, range?: ByteRange): Promise<{ bytes: number; body: Readable } | null>;
  /** Removing what is gone changes nothing. */
  remove(key: string): Promise<void>;
};

let opened: Storage | undefined;

/** The object store of this process. */
export function storage(): Storage {
  opened ??= localStorage(env.STORAGE_DIR);
  return opened;
}

/** A whole object in memory, for pictures and PDFs. Null where there is none. */
export async function readObject(key: string, store: Storage = storage()): Promise<Buffer | null> {
  const found = await store.open(key);
  if (!found) return null;
  const pieces: Buffer[] = [];
  for await (const piece of found.body) pieces.push(piece as Buffer);
  return Buffer.concat(pieces);
}
