import { loadOwnMember, saveOwnSignature } from '@/db/people';
import { isSameOrigin, refuseOtherOrigin } from '@/lib/auth/same-origin';
import { currentMember } from '@/lib/auth/session';
import { env } from '@/lib/env';
import { signatureKey } from '@/lib/storage/keys';
import { receiveMark, sendMark } from '@/lib/storage/receive-mark';

export async function GET(): Promise<Response> {
  const actor = await currentMember();
  if (!actor) return Response.json({ error: 'Sign in to see this.' }, { status: 401 });
  return sendMark((await loadOwnMember(actor)).signatureKey);
}

/** A plain form post, so that it works without script: the answer is the page again. */
export async function POST(request: Request): Promise<Response> {
  if (!isSameOrigin(request)) return refuseOtherOrigin();
  const actor = await currentMember();
  if (!actor) return Response.json({ error: 'Sign in to go on.' }, { status: 401 });
  const outcome = await receiveMark(request, (sha256) => signatureKey(actor.firmId, actor.membershipId, sha256));
  if (outcome.kind === 'stored') await saveOwnSignature(actor, outcome.key);
  const notice = outcome.kind === 'stored' ? 'signature-saved' : outcome.because;
  return Response.redirect(new URL(`/people/me?notice=${notice}#signature`, env.APP_URL), 303);
}
