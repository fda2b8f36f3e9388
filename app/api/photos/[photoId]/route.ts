import { createHash } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { Readable } from 'node:stream';
import type { Actor, MemberActor } from '@/db/actor';
import { findPhoto, recordRefused, recordStored, type Photo } from '@/db/photos';
import { holds } from '@/db/scope';
import { currentRecipient } from '@/lib/auth/recipient';
import { isSameOrigin } from '@/lib/auth/same-origin';
import { currentMember } from '@/lib/auth/session';
import { idSchema } from '@/lib/schemas/id';
import { photoKey } from '@/lib/storage/keys';
import { takeInPhoto, type TakenIn } from '@/lib/storage/photo-intake';
import { receiveFile } from '@/lib/storage/receive-file';
import { storage } from '@/lib/storage/storage';

const MOST_BYTES = 25 * 1024 * 1024;
const HEADERS = {
  'cache-control': 'private, no-store',
  'x-content-type-options': 'nosniff',
  'content-security-policy': "default-src 'none'; sandbox",
};
const GONE = 'This photo was removed, or its inspection is no longer yours.';
const CHANGED = 'The photo arrived changed on the way. It is kept on this phone and sent again.';
type Context = RouteContext<'/api/photos/[photoId]'>;

/** Bytes of a photo. Recipients get the shared copies only; the original is the firm's. */
export async function GET(request: Request, context: Context): Promise<Response> {
  const { searchParams } = new URL(request.url);
  const grantId = searchParams.get('grant');
  const actor: Actor | null = grantId ? await currentRecipient(grantId) : await currentMember();
  if (!actor) return says(401, 'Sign in, or open your report from the link in the mail.');
  const asked = searchParams.get('size') ?? '1600';
  const size = asked === '480' || (asked === 'original' && actor.kind === 'member') ? asked : '1600';

  const { photoId } = await context.params;
  const photo = idSchema.safeParse(photoId).success ? await findPhoto(actor, photoId) : null;
  const object = photo?.state === 'stored' ? await storage().open(photoKey(actor.firmId, photo.id, size)) : null;
  if (!photo || !object) return says(404, 'This photo is not here.');
  return new Response(Readable.toWeb(object.body) as ReadableStream<Uint8Array>, {
    headers: {
      ...HEADERS,
      'content-type': size === 'original' ? photo.type : 'image/jpeg',
      'content-length': String(object.bytes),
      ...(size === 'original' ? { 'content-disposition': 'attachment' } : {}),
    },
  });
}

/** Takes the bytes of an announced photo: checked by content and by hash, copies made, original kept. */
export async function POST(request: Request, context: Context): Promise<Response> {
  if (!isSameOrigin(request)) return says(403, 'This request came from another site. Open the program and try again.');
  const actor = await currentMember();
  if (!actor) return says(401, 'Sign in to send your photos. They are kept on this phone.');
  const { photoId } = await context.params;
  const mayTake = holds(actor, 'owner', 'inspector') && idSchema.safeParse(photoId).success;
  const photo = mayTake ? await findPhoto(actor, photoId) : null;
  if (!photo) return says(404, GONE);
  if (photo.state === 'stored') return Response.json({ state: 'stored', sha256: photo.sha256 }, { headers: HEADERS });

  const received = await receiveFile(request, 'photo', MOST_BYTES);
  if (received.kind === 'refused') return says(received.status, received.says);
  try {
    return await keep(actor, photo, received.path);
  } finally {
    await received.remove();
  }
}

async function keep(actor: MemberActor, photo: Photo, path: string): Promise<Response> {
  const taken = await takeInPhoto(path);
  if (taken.kind === 'refused') {
    await recordRefused(actor, photo.id, taken.says);
    return says(415, taken.says);
  }
  // The store keeps the first bytes under a name for good: wrong ones would stand there for the right ones.
  if (taken.sha256 !== photo.sha256) return says(409, CHANGED);
  await storeCopies(actor, photo.id, path, taken);
  const outcome = await recordStored(actor, photo.id, {
    sha256: taken.sha256,
    width: taken.width,
    height: taken.height,
    sha256Of1600: sha256Of(taken.wide),
    sha256Of480: sha256Of(taken.small),
  });
  switch (outcome.kind) {
    case 'recorded':
      return Response.json({ state: 'stored', sha256: taken.sha256 }, { status: 201, headers: HEADERS });
    case 'other-bytes':
      return says(409, CHANGED);
    case 'not-found':
      return says(404, GONE);
  }
}

async function storeCopies(actor: MemberActor, photoId: string, path: string, taken: TakenIn): Promise<void> {
  const key = (size: 'original' | '1600' | '480') => photoKey(actor.firmId, photoId, size);
  await storage().putIfAbsent(key('original'), createReadStream(path));
  await storage().putIfAbsent(key('1600'), taken.wide);
  await storage().putIfAbsent(key('480'), taken.small);
}

function sha256Of(bytes: Buffer): string {
  return createHash('sha256').update(bytes).digest('hex');
}

function says(status: number, error: string): Response {
  return Response.json({ error }, { status, headers: HEADERS });
}
