import NextAuth from 'next-auth';
import type { NextRequest } from 'next/server';
import { authOptions } from '@/lib/auth/options';

type Context = RouteContext<'/api/auth/[...nextauth]'>;

// The settings are read at the request: a build has none.
function answer(request: NextRequest, context: Context): Promise<Response> {
  return NextAuth(request as never, context as never, authOptions()) as unknown as Promise<Response>;
}

export { answer as GET, answer as POST };
