import 'server-only';
import { createHmac, timingSafeEqual } from 'node:crypto';
import { cookies } from 'next/headers';
import { env } from '@/lib/env';
import { cookieAttributes, sessionCookieName } from './cookies';

const GRANT_SECONDS = 90 * 24 * 60 * 60;

/** Gives this browser the cookie of one grant. It names nothing by itself: the grant's row is asked at each request. */
export async function keepGrant(grantId: string, tokenHash: Buffer): Promise<void> {
  (await cookies()).set(nameOf(grantId), valueOf(grantId, tokenHash), { ...cookieAttributes(), maxAge: GRANT_SECONDS });
}

/** Whether this browser was given the cookie of that grant. */
export async function holdsGrant(grantId: string, tokenHash: Buffer): Promise<boolean> {
  const held = Buffer.from((await cookies()).get(nameOf(grantId))?.value ?? '');
  const wanted = Buffer.from(valueOf(grantId, tokenHash));
  return held.length === wanted.length && timingSafeEqual(held, wanted);
}

function nameOf(grantId: string): string {
  return sessionCookieName().replace('session', `grant.${grantId}`);
}

function valueOf(grantId: string, tokenHash: Buffer): string {
  return createHmac('sha256', env.AUTH_SECRET).update(`grant\n${grantId}\n`).update(tokenHash).digest('base64url');
}
