import { env } from '@/lib/env';

/**
 * Whether a writing request came from a page of ours. Browsers send Origin with every POST, PUT, PATCH and DELETE;
 * a request without one is refused, and so is a form of another site that rides on the cookie.
 */
export function isSameOrigin(request: Request): boolean {
  const site = request.headers.get('sec-fetch-site');
  if (site !== null && site !== 'same-origin') return false;
  return request.headers.get('origin') === new URL(env.APP_URL).origin;
}

/** The answer to a writing request from elsewhere. */
export function refuseOtherOrigin(): Response {
  return Response.json({ error: 'Open this page in Ohmstead and try again.' }, { status: 403 });
}
