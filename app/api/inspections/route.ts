import { listInspections } from '@/db/inspections';
import { currentMember } from '@/lib/auth/session';
import { inspectionFilterSchema } from '@/lib/schemas/inspection';

/** One page of the firm's inspections, by filter. */
export async function GET(request: Request) {
  const actor = await currentMember();
  if (!actor) return answer({ error: 'Sign in to see your inspections.' }, 401);
  const filter = inspectionFilterSchema.safeParse(Object.fromEntries(new URL(request.url).searchParams));
  if (!filter.success) return answer({ error: 'This filter is not known. Clear it and try again.' }, 400);
  const page = await listInspections(actor, filter.data);
  if (page.kind === 'unknown-cursor')
    return answer({ error: 'This page is no longer there. Go back to the first one.' }, 400);
  return answer(page.page, 200);
}

function answer(body: unknown, status: number) {
  return Response.json(body, { status, headers: { 'cache-control': 'private, no-store' } });
}
