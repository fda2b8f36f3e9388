import { expect } from 'vitest';
import { encode } from 'next-auth/jwt';
import type { MemberActor } from '@/db/actor';
import { createSession } from '@/lib/auth/session';

/** Address of the program that the tests brought up; empty where it is not up. */
export const app = process.env.TEST_APP_URL ?? '';
export const at = (path: string) => new URL(path, app);
export const NO_SUCH_ID = '0192f0aa-0000-7000-8000-00000000dead';

/** The cookie of a new session of a member of a test's firm. */
export async function cookieOf(actor: MemberActor): Promise<string> {
  const sid = await createSession(actor.userId, actor.firmId, 'a test');
  if (sid === null) throw new Error(`${actor.name} may enter no firm`);
  return `ohmstead.session=${await encode({ token: { sid }, secret: process.env.AUTH_SECRET ?? '' })}`;
}

export function get(path: string, cookie = '', headers: Record<string, string> = {}): Promise<Response> {
  return fetch(at(path), { headers: { cookie, ...headers }, redirect: 'manual' });
}

/** A request that changes something, as a page of ours sends it, except where `headers` say otherwise. */
export function post(path: string, cookie: string, body: BodyInit, headers: Record<string, string> = {}) {
  const given = Object.entries({ cookie, origin: at('/').origin, ...headers }).filter(([, value]) => value !== '');
  return fetch(at(path), { method: 'POST', body, headers: Object.fromEntries(given), redirect: 'manual' });
}

/** Origin headers of requests that no page of ours sends. */
export const ELSEWHERE: Record<string, string>[] = [
  { origin: '' },
  { origin: 'null' },
  { origin: 'https://elsewhere.example' },
  { origin: 'https://elsewhere.example', 'sec-fetch-site': 'cross-site' },
  { origin: 'null', 'sec-fetch-site': 'cross-site' },
];

/** What an answer shows of itself, without what differs at every answer. */
export async function shown(response: Response) {
  const {
    date: _date,
    'keep-alive': _alive,
    connection: _connection,
    ...headers
  } = Object.fromEntries(response.headers);
  return { status: response.status, headers, body: await response.text() };
}

/** One sentence or more that a person can read, and nothing of the machine. */
export function expectSentence(text: unknown): void {
  expect(text).toMatch(/^[A-Z][^{}<>]{15,}\.$/);
  expect(text).not.toMatch(/error:|stack|undefined|null|\/tmp|node_modules|sharp|vips/i);
}
