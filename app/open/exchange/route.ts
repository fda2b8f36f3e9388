import { z } from 'zod';
import { isSameOrigin, refuseOtherOrigin } from '@/lib/auth/same-origin';
import { addressAttempt, forgiveAddress, visitorOf } from '@/lib/auth/sign-in';
import { openSecret } from '../dispatch';

const bodySchema = z.object({ token: z.string().regex(/^[\w-]{20,100}$/) });
const NO_STORE = { 'cache-control': 'private, no-store', 'referrer-policy': 'no-referrer' };

/** The landing page posts the token of its address here and learns where to go; the cookie is set on the way. */
export async function POST(request: Request): Promise<Response> {
  if (!isSameOrigin(request)) return refuseOtherOrigin();
  const visitor = visitorOf(request.headers);
  if ((await addressAttempt('open', visitor)) > 0) {
    return Response.json(
      { error: 'Too many links were tried here. Wait a quarter of an hour, then open it again.' },
      { status: 429, headers: NO_STORE },
    );
  }
  const body = bodySchema.safeParse(await request.json().catch(() => null));
  const opened = body.success
    ? await openSecret({ kind: 'token', token: body.data.token })
    : { kind: 'unknown' as const };
  if (opened.kind === 'unknown') {
    return Response.json(
      {
        error:
          'This link is not complete, or it opens nothing any more. Copy it whole from the mail, or type the short code below.',
      },
      { status: 404, headers: NO_STORE },
    );
  }
  await forgiveAddress('open', visitor);
  return Response.json({ to: opened.to }, { headers: NO_STORE });
}
