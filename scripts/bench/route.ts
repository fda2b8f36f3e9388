import { createHash, randomBytes } from 'node:crypto';
import { encode } from 'next-auth/jwt';
import { VISITOR } from '@/db/actor';
import { openSession } from '@/db/auth';
import { sessionCookieName } from '@/lib/auth/cookies';
import { env } from '@/lib/env';
import type { BenchFirm } from './list';
import { compare, ms, type Measured } from './measure';

const ROUNDS = 201;

/** The list's route against the route that looks up the session in a transaction and answers who is signed in. */
export async function routeRow({ owner }: BenchFirm): Promise<Measured> {
  const cookie = await signedIn(owner.userId, owner.firmId);
  const get = (path: string) => async () => {
    const answer = await fetch(new URL(path, env.APP_URL), { headers: { cookie } });
    await answer.arrayBuffer();
    if (answer.status !== 200) throw new Error(`${path} answered ${answer.status}`);
  };
  const { floorMs, productMs, ratio } = await compare(ROUNDS, get('/api/me'), get('/api/inspections'));
  return {
    what: 'JSON route: a page of 25 inspections',
    product: ms(productMs),
    floor: `/api/me, the session look-up alone, ${ms(floorMs)}`,
    ratio,
    bar: 'at most 1.7',
  };
}

async function signedIn(userId: string, firmId: string): Promise<string> {
  const sid = randomBytes(32).toString('base64url');
  const idHash = createHash('sha256').update(sid).digest();
  if ((await openSession(VISITOR, { idHash, userId, firmId, userAgent: 'bench' })) === null)
    throw new Error('the bench may not sign in');
  return `${sessionCookieName()}=${await encode({ token: { sid }, secret: env.AUTH_SECRET })}`;
}
