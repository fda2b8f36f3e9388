import { env } from '@/lib/env';

const SECURE = env.APP_URL.startsWith('https://');
/** A browser accepts a `__Host-` cookie only over HTTPS, for this host and the whole site. */
const PREFIX = SECURE ? '__Host-' : '';

export const SESSION_SECONDS = 30 * 24 * 60 * 60;
export const SESSION_COOKIE = `${PREFIX}ohmstead.session`;
/** Holds the secret of a mailed link between its landing page and the button that uses it up. */
export const LINK_COOKIE = `${PREFIX}ohmstead.link`;

export const COOKIE_ATTRIBUTES = { httpOnly: true, sameSite: 'lax', secure: SECURE, path: '/' } as const;
