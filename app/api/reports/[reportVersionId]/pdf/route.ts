import { Readable } from 'node:stream';
import type { Actor } from '@/db/actor';
import { findReportFile } from '@/db/report-files';
import { currentRecipient } from '@/lib/auth/recipient';
import { currentMember } from '@/lib/auth/session';
import { idSchema } from '@/lib/schemas/id';
import { storage } from '@/lib/storage/storage';

const HEADERS = { 'cache-control': 'private, no-store', 'x-content-type-options': 'nosniff' };

/** The PDF of a released version, to a member who may see it or, with `grant`, to the reader of that grant. */
export async function GET(
  request: Request,
  context: RouteContext<'/api/reports/[reportVersionId]/pdf'>,
): Promise<Response> {
  const { reportVersionId } = await context.params;
  const actor = await actorOf(request);
  if (!actor) return says(401, 'Open your report from the link in the mail, or sign in.');
  if (!idSchema.safeParse(reportVersionId).success) return says(404, 'There is no such report.');

  const file = await findReportFile(actor, reportVersionId, 'en');
  const object = file && (await storage().open(file.key));
  if (!file || !object) return says(404, 'There is no such PDF, or it is not ready yet.');
  const name = `${file.street.replaceAll(/[^\w ]/g, '')} report version ${file.number}.pdf`.trim();
  return new Response(Readable.toWeb(object.body) as ReadableStream<Uint8Array>, {
    headers: {
      ...HEADERS,
      'content-type': 'application/pdf',
      'content-length': String(object.bytes),
      'content-disposition': `inline; filename="${name}"`,
    },
  });
}

async function actorOf(request: Request): Promise<Actor | null> {
  const grantId = new URL(request.url).searchParams.get('grant');
  return grantId ? currentRecipient(grantId) : currentMember();
}

function says(status: number, error: string): Response {
  return Response.json({ error }, { status, headers: HEADERS });
}
