import 'server-only';
import { takeInMark } from './mark-intake';
import { receiveFile } from './receive-file';
import { readObject, storage } from './storage';

const MOST_BYTES = 5 * 1024 * 1024;

export type MarkRefusal = 'no-picture' | 'picture-too-large' | 'picture-unusable';

/** Takes a logo or signature out of a posted form and stores it under the key that `keyOf` makes of its hash. */
export async function receiveMark(
  request: Request,
  keyOf: (sha256: string) => string,
): Promise<{ kind: 'stored'; key: string } | { kind: 'refused'; because: MarkRefusal }> {
  const received = await receiveFile(request, 'picture', MOST_BYTES);
  if (received.kind === 'refused') {
    return { kind: 'refused', because: received.status === 413 ? 'picture-too-large' : 'no-picture' };
  }
  const mark = await takeInMark(received.path).finally(received.remove);
  if (mark.kind === 'refused') return { kind: 'refused', because: 'picture-unusable' };
  const key = keyOf(mark.sha256);
  await storage().putIfAbsent(key, mark.png);
  return { kind: 'stored', key };
}

/** The bytes of a stored logo or signature as an answer, for its own firm. */
export async function sendMark(key: string | null): Promise<Response> {
  const png = key === null ? null : await readObject(key);
  if (!png) return Response.json({ error: 'There is no picture.' }, { status: 404 });
  return new Response(new Uint8Array(png), {
    headers: {
      'content-type': 'image/png',
      'cache-control': 'private, no-cache',
      'content-security-policy': 'sandbox',
      'x-content-type-options': 'nosniff',
    },
  });
}
