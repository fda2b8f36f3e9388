import 'server-only';
import { takeInMark, type MarkOutcome } from './mark-intake';
import { receiveFile } from './receive-file';
import { storage } from './storage';

const MOST_BYTES = 5 * 1024 * 1024;

/** Takes a logo or signature out of a posted form and stores it under the key that `keyOf` makes of its hash. */
export async function receiveMark(
  request: Request,
  keyOf: (sha256: string) => string,
): Promise<{ kind: 'stored'; key: string } | Extract<MarkOutcome, { kind: 'refused' }>> {
  const received = await receiveFile(request, 'picture', MOST_BYTES);
  if (received.kind === 'refused') return { kind: 'refused', says: received.says };
  const mark = await takeInMark(received.path).finally(received.remove);
  if (mark.kind === 'refused') return mark;
  const key = keyOf(mark.sha256);
  await storage().putIfAbsent(key, mark.png);
  return { kind: 'stored', key };
}

/** The bytes of a stored logo or signature as an answer, for its own firm. */
export async function sendMark(key: string | null): Promise<Response> {
  const found = key === null ? null : await storage().open(key);
  if (!found) return Response.json({ error: 'There is no picture.' }, { status: 404 });
  const pieces: Buffer[] = [];
  for await (const piece of found.body) pieces.push(piece as Buffer);
  return new Response(new Uint8Array(Buffer.concat(pieces)), {
    headers: {
      'content-type': 'image/png',
      'cache-control': 'private, no-cache',
      'content-security-policy': 'sandbox',
    },
  });
}
