import { env } from '@/lib/env';

/**
 * Whether a writing request came from a page of ours. Browsers send Origin with every POST, PUT, PATCH and DELETE; a form
 * on a page without referrer sends "null", and then the browser's own word that the sites are the same must stand in.
 */
export function isSameOrigin(request: Request): boolean {
  const origin = request.headers.get('origin');
  const site = request.headers.get('sec-fetch-site');
  if (origin === null || origin === 'null') return origin === 'null' && site === 'same-origin';
  return origin === new URL(env.APP_URL).origin && (site === null || site === 'same-origin');
}

/** The answer to a writing request from elsewhere. */
export function refuseOtherOrigin(): Response {
  return Response.json({ error: 'Open this page in Ohmstead and try again.' }, { status: 403 });
}
