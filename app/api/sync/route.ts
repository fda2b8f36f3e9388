import { applyOperations } from '@/db/sync';
import { isSameOrigin } from '@/lib/auth/same-origin';
import { currentMember } from '@/lib/auth/session';
import { syncRequestSchema } from '@/lib/schemas/sync';

const MOST_BYTES = 512 * 1024;

/** The phone sends operations; each gets its own receipt. */
export async function POST(request: Request) {
  if (!isSameOrigin(request))
    return answer({ error: 'This request came from another site. Open the program and try again.' }, 403);
  const actor = await currentMember();
  if (!actor) return answer({ error: 'Sign in to send your readings. They are kept on this phone.' }, 401);

  const text = await request.text();
  if (text.length > MOST_BYTES)
    return answer({ error: 'Too much at once. Send fewer changes; they are kept on this phone.' }, 413);
  const body = syncRequestSchema.safeParse(parse(text));
  if (!body.success) return answer({ error: 'This app is out of date. Reload it; your readings are kept.' }, 426);

  return answer(await applyOperations(actor, body.data), 200);
}

function parse(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch {
    return null;
  }
}

function answer(body: unknown, status: number) {
  return Response.json(body, { status, headers: { 'cache-control': 'private, no-store' } });
}
