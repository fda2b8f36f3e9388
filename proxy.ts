import { randomBytes } from 'node:crypto';
import { NextResponse, type NextRequest } from 'next/server';
import { sessionCookieName } from '@/lib/auth/cookies';
import { env } from '@/lib/env';
import { contentPolicy, securityHeaders } from '@/lib/auth/security-headers';

/** Pages that anybody may open. The phone's shell holds no data and must open without signal. */
const PUBLIC =
  /^\/(?:$|sign-in|sign-up|forgot-password|reset-password|invitation|open|shared|work|walk|api|manifest\.webmanifest)(?:\/|$)/;

/** Saves a redirect and sets the headers of every page. Who may see what is decided where the data is read. */
export function proxy(request: NextRequest): NextResponse {
  const { pathname, search } = request.nextUrl;
  const nonce = randomBytes(16).toString('base64');
  const policy = contentPolicy(nonce);

  const isPublic = pathname === '/' || PUBLIC.test(pathname);
  if (!isPublic && !request.cookies.has(sessionCookieName())) {
    const signIn = new URL('/sign-in', request.url);
    signIn.searchParams.set('next', `${pathname}${search}`);
    return withHeaders(NextResponse.redirect(signIn, 303), policy, pathname);
  }

  const headers = new Headers(request.headers);
  if (isOwnFormWithoutReferrer(request)) headers.set('origin', new URL(env.APP_URL).origin);
  headers.set('x-nonce', nonce);
  headers.set('x-path', `${pathname}${search}`);
  headers.set('content-security-policy', policy);
  return withHeaders(NextResponse.next({ request: { headers } }), policy, pathname);
}

/**
 * A form without script on a page that sends no referrer posts the origin "null", which Next.js refuses. The browser's
 * own word that the request comes from the same site stands in for it; no other site can make a browser say that.
 */
function isOwnFormWithoutReferrer({ headers }: NextRequest): boolean {
  return headers.get('origin') === 'null' && headers.get('sec-fetch-site') === 'same-origin';
}

function withHeaders(response: NextResponse, policy: string, pathname: string): NextResponse {
  for (const [name, value] of Object.entries(securityHeaders(pathname))) response.headers.set(name, value);
  response.headers.set('content-security-policy', policy);
  return response;
}

export const config = {
  // Routes that carry bytes stay out: the proxy would pass on a body cut at 10 MB. They set their own headers.
  matcher: [
    '/((?!api/photos|api/sync|api/webhooks|_next/static|_next/image|sw\\.js|icons/|favicon\\.ico|.*\\.(?:png|svg|woff2?)$).*)',
  ],
};
