import NextAuth from 'next-auth';
import type { NextRequest } from 'next/server';
import { authOptions } from './options';

type Context = RouteContext<'/api/auth/[...nextauth]'>;

/** Answers next-auth's own requests. The settings are read at the request: a build has none. */
export function answerAuth(request: NextRequest, context: Context): Promise<Response> {
  return NextAuth(request as never, context as never, authOptions()) as unknown as Promise<Response>;
}
