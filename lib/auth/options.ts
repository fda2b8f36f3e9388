import 'server-only';
import type { NextAuthOptions } from 'next-auth';
import { decode } from 'next-auth/jwt';
import CredentialsProvider from 'next-auth/providers/credentials';
import { VISITOR } from '@/db/actor';
import { endSession } from '@/db/auth';
import { env } from '@/lib/env';
import { log } from '@/lib/log';
import { cookieAttributes, SESSION_SECONDS, sessionCookieName } from './cookies';
import { checkPassword, visitorOf } from './sign-in';
import { createSession, hashSessionId } from './session';

/** The token holds the random id of a session row and nothing else; the page of sign-in is ours. */
export function authOptions(): NextAuthOptions {
  return {
    secret: env.AUTH_SECRET,
    useSecureCookies: env.APP_URL.startsWith('https://'),
    logger: { error: (code) => log.error({ code }, 'next-auth failed'), warn: () => undefined, debug: () => undefined },
    session: { strategy: 'jwt', maxAge: SESSION_SECONDS },
    pages: { signIn: '/sign-in', error: '/sign-in' },
    cookies: { sessionToken: { name: sessionCookieName(), options: cookieAttributes() } },
    providers: [
      CredentialsProvider({
        credentials: { email: { type: 'email' }, password: { type: 'password' } },
        async authorize(credentials, request) {
          const visitor = visitorOf(new Headers(request.headers as Record<string, string>));
          const outcome = await checkPassword(credentials?.email ?? '', credentials?.password ?? '', visitor);
          if (outcome.kind !== 'signed-in') return null;
          const sid = await createSession(outcome.userId, null, visitor.userAgent);
          return sid === null ? null : { id: outcome.userId, sid };
        },
      }),
    ],
    callbacks: {
      jwt: ({ token, user }) => ({ sid: user?.sid ?? token.sid }),
      // The session address answers with no name, no e-mail and no id.
      session: ({ session }) => ({ expires: session.expires }),
    },
    events: {
      async signOut({ token }) {
        if (token?.sid) await endSession(VISITOR, hashSessionId(token.sid));
      },
    },
    jwt: { decode: (params) => decode(params).catch(() => null) },
  };
}
