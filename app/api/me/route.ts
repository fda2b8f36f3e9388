import { currentMember } from '@/lib/auth/session';
import type { WalkPerson } from '@/lib/schemas/walk';

/** Who is signed in, for the phone. */
export async function GET() {
  const actor = await currentMember();
  if (!actor) return Response.json({ error: 'Sign in to go on.' }, { status: 401, headers: noStore });
  const person: WalkPerson = { userId: actor.userId, membershipId: actor.membershipId, name: actor.name };
  return Response.json(person, { headers: noStore });
}

const noStore = { 'cache-control': 'private, no-store' };
