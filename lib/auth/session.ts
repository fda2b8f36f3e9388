import 'server-only';
import { createHash, randomBytes } from 'node:crypto';
import { decode, encode } from 'next-auth/jwt';
import { cookies, headers } from 'next/headers';
import { notFound, redirect } from 'next/navigation';
import { cache } from 'react';
import { VISITOR, type MemberActor } from '@/db/actor';
import { endSession, findSessionMember, openSession } from '@/db/auth';
import type { Role } from '@/db/roles';
import { env } from '@/lib/env';
import { cookieAttributes, SESSION_SECONDS, sessionCookieName } from './cookies';

/**
 * Who is signed in, or null. The cookie only names a session; its row decides at each request, once, so that a person
 * disabled, signed out elsewhere or given other roles feels it at the next request.
 */
export const currentMember = cache(async (): Promise<MemberActor | null> => {
  const sessionId = await readSessionId();
  return sessionId === null ? null : findSessionMember(VISITOR, hashSessionId(sessionId));
});

/** The member, for a page or an action. Nobody signed in goes to sign-in; a member with none of the roles finds no page. */
export async function requireMember(roles?: Role[]): Promise<MemberActor> {
  const member = await currentMember();
  if (!member) redirect(await signInAddress());
  if (roles && !roles.some((role) => member.roles.includes(role))) notFound();
  return member;
}

/** Opens a session under a new random id and gives its cookie to the browser. False where the person may enter no firm. */
export async function startSession(userId: string, firmId: string | null = null): Promise<boolean> {
  const earlier = await readSessionId();
  const sessionId = await createSession(userId, firmId, (await headers()).get('user-agent') ?? '');
  if (sessionId === null) return false;

  if (earlier !== null) await endSession(VISITOR, hashSessionId(earlier));
  const token = await encode({ token: { sid: sessionId }, secret: env.AUTH_SECRET, maxAge: SESSION_SECONDS });
  (await cookies()).set(sessionCookieName(), token, { ...cookieAttributes(), maxAge: SESSION_SECONDS });
  return true;
}

/** The row of a new session. Answers its id, which only the cookie holds. */
export async function createSession(userId: string, firmId: string | null, userAgent: string): Promise<string | null> {
  const sessionId = randomBytes(32).toString('base64url');
  const opened = await openSession(VISITOR, { idHash: hashSessionId(sessionId), userId, firmId, userAgent });
  return opened === null ? null : sessionId;
}

export async function endCurrentSession(): Promise<void> {
  const sessionId = await readSessionId();
  if (sessionId !== null) await endSession(VISITOR, hashSessionId(sessionId));
  (await cookies()).set(sessionCookieName(), '', { ...cookieAttributes(), maxAge: 0 });
}

/** The hash of this browser's session, to keep it while others end. */
export async function currentSessionHash(): Promise<Buffer | null> {
  const sessionId = await readSessionId();
  return sessionId === null ? null : hashSessionId(sessionId);
}

export function hashSessionId(sessionId: string): Buffer {
  return createHash('sha256').update(sessionId).digest();
}

/**
 * Read from the cookie itself: next-auth's own session look-up would need the id in its session object, which its
 * session address shows to scripts.
 */
async function readSessionId(): Promise<string | null> {
  const token = (await cookies()).get(sessionCookieName())?.value;
  if (!token) return null;
  const payload = await decode({ token, secret: env.AUTH_SECRET }).catch(() => null);
  return typeof payload?.sid === 'string' ? payload.sid : null;
}

async function signInAddress(): Promise<`/sign-in?next=${string}` | '/sign-in'> {
  const path = (await headers()).get('x-path');
  return path?.startsWith('/') ? `/sign-in?next=${encodeURIComponent(path)}` : '/sign-in';
}
