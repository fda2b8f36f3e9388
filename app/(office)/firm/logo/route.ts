import { loadFirm, saveLogo } from '@/db/firms';
import { isSameOrigin, refuseOtherOrigin } from '@/lib/auth/same-origin';
import { currentMember } from '@/lib/auth/session';
import { env } from '@/lib/env';
import { logoKey } from '@/lib/storage/keys';
import { receiveMark, sendMark } from '@/lib/storage/receive-mark';

export async function GET(): Promise<Response> {
  const actor = await currentMember();
  if (!actor) return Response.json({ error: 'Sign in to see this.' }, { status: 401 });
  return sendMark((await loadFirm(actor)).logoKey);
}

/** A plain form post, so that it works without script: the answer is the page again. */
export async function POST(request: Request): Promise<Response> {
  if (!isSameOrigin(request)) return refuseOtherOrigin();
  const actor = await currentMember();
  if (!actor?.roles.includes('owner')) return Response.json({ error: 'Sign in as an owner.' }, { status: 401 });
  const outcome = await receiveMark(request, (sha256) => logoKey(actor.firmId, sha256));
  if (outcome.kind === 'stored') await saveLogo(actor, outcome.key);
  const notice = outcome.kind === 'stored' ? 'logo-saved' : outcome.because;
  return Response.redirect(new URL(`/firm?notice=${notice}#logo`, env.APP_URL), 303);
}
