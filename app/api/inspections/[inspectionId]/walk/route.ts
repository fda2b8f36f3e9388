import { loadWalk } from '@/db/inspections';
import { currentMember } from '@/lib/auth/session';
import { idSchema } from '@/lib/schemas/id';

/** What a phone needs to work on one inspection. */
export async function GET(request: Request, context: RouteContext<'/api/inspections/[inspectionId]/walk'>) {
  const actor = await currentMember();
  if (!actor) return answer({ error: 'Sign in to open this inspection.' }, 401);
  const { inspectionId } = await context.params;
  const id = idSchema.safeParse(inspectionId);
  const client = idSchema.safeParse(new URL(request.url).searchParams.get('client'));
  const walk = id.success ? await loadWalk(actor, id.data, client.success ? client.data : undefined) : null;
  if (!walk) return answer({ error: 'This inspection no longer exists. Go back to your inspections.' }, 404);
  return answer(walk, 200);
}

function answer(body: unknown, status: number) {
  return Response.json(body, { status, headers: { 'cache-control': 'private, no-store' } });
}
