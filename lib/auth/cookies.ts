import { env } from '@/lib/env';

export const SESSION_SECONDS = 30 * 24 * 60 * 60;

export function sessionCookieName(): string {
  return `${prefix()}ohmstead.session`;
}

/** Holds the secret of a mailed link between its landing page and the button that uses it up. */
export function linkCookieName(): string {
  return `${prefix()}ohmstead.link`;
}

export function cookieAttributes() {
  return { httpOnly: true, sameSite: 'lax', secure: isHttps(), path: '/' } as const;
}

/** A browser accepts a `__Host-` cookie only over HTTPS, for this host and the whole site. */
function prefix(): '__Host-' | '' {
  return isHttps() ? '__Host-' : '';
}

function isHttps(): boolean {
  return env.APP_URL.startsWith('https://');
}
