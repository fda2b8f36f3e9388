import 'server-only';

import { randomUUID } from 'node:crypto';
import { rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { Readable } from 'node:stream';
import type { ReadableStream } from 'node:stream/web';
import multer from 'multer';

export type Received =
  | { kind: 'received'; path: string; bytes: number; remove: () => Promise<void> }
  | { kind: 'refused'; status: 400 | 413 | 415; says: string };

/** One file out of a multipart body, streamed to a temporary file that the caller removes. */
export async function receiveFile(request: Request, field: string, mostBytes: number): Promise<Received> {
  const type = request.headers.get('content-type') ?? '';
  if (!type.startsWith('multipart/form-data'))
    return { kind: 'refused', status: 415, says: 'Send the file as a form upload.' };
  if (!request.body) return { kind: 'refused', status: 400, says: 'No file arrived. Choose it again.' };

  const stream = Readable.fromWeb(request.body as ReadableStream<Uint8Array>);
  // multer reads its length from the headers and silently skips a body that names neither length nor encoding.
  const headers: Record<string, string> = Object.fromEntries(request.headers);
  if (!headers['content-length']) headers['transfer-encoding'] = 'chunked';
  const incoming = Object.assign(stream, { headers, method: 'POST' });

  const storage = multer.diskStorage({
    destination: tmpdir(),
    filename: (_request, _file, done) => done(null, `ohmstead-${randomUUID()}`),
  });
  const receive = multer({
    storage,
    limits: { fileSize: mostBytes, files: 1, fields: 10, fieldSize: 10_000, parts: 12, headerPairs: 50 },
  }).single(field);
  const problem = await new Promise<unknown>((resolve) => receive(incoming as never, {} as never, resolve));
  const file = (incoming as { file?: Express.Multer.File }).file;
  const remove = async () => {
    if (file) await rm(file.path, { force: true });
  };

  if (problem) {
    await remove();
    const tooLarge = problem instanceof multer.MulterError && problem.code === 'LIMIT_FILE_SIZE';
    if (tooLarge)
      return {
        kind: 'refused',
        status: 413,
        says: `This file is over ${Math.round(mostBytes / 1024 / 1024)} MB. Choose a smaller one.`,
      };
    return { kind: 'refused', status: 400, says: 'The file did not arrive whole. Send it again.' };
  }
  if (!file || file.size === 0) {
    await remove();
    return { kind: 'refused', status: 400, says: 'No file arrived. Choose it again.' };
  }
  return { kind: 'received', path: file.path, bytes: file.size, remove };
}
