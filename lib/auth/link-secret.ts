import 'server-only';
import { cookies } from 'next/headers';
import { cookieAttributes, linkCookieName } from './cookies';
import { hashCode, hashToken } from './link-token';

/** What a reader brings from a mail: the token of its link, or the short code with the address it went to. */
export type LinkSecret = { kind: 'token'; token: string } | { kind: 'code'; email: string; code: string };

const LINK_COOKIE_SECONDS = 60 * 60;

export function hashSecret(secret: LinkSecret): Buffer {
  return secret.kind === 'token' ? hashToken(secret.token) : hashCode(secret.email, secret.code);
}

/** Carries the secret from the landing page to the page whose button uses it up; no address ever holds it. */
export async function keepSecret(secret: LinkSecret): Promise<void> {
  const text = secret.kind === 'token' ? `token ${secret.token}` : `code ${secret.email} ${secret.code}`;
  (await cookies()).set(linkCookieName(), text, { ...cookieAttributes(), maxAge: LINK_COOKIE_SECONDS });
}

export async function keptSecret(): Promise<LinkSecret | null> {
  const [kind, first, second] = ((await cookies()).get(linkCookieName())?.value ?? '').split(' ');
  if (kind === 'token' && first) return { kind, token: first };
  if (kind === 'code' && first && second) return { kind, email: first, code: second };
  return null;
}

export async function dropSecret(): Promise<void> {
  (await cookies()).set(linkCookieName(), '', { ...cookieAttributes(), maxAge: 0 });
}
