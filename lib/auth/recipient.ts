import 'server-only';
import { cache } from 'react';
import type { RecipientActor } from '@/db/actor';
import { findOpenGrant } from '@/db/grants';
import { idSchema } from '@/lib/schemas/id';
import { holdsGrant } from './grant-cookie';

/**
 * The person whom a grant lets in, or null: no cookie of that grant in this browser, or the grant was revoked or has run
 * out. Asked at each request, so that revoking takes effect at once.
 */
export const currentRecipient = cache(async (grantId: string): Promise<RecipientActor | null> => {
  if (!idSchema.safeParse(grantId).success) return null;
  const open = await findOpenGrant(grantId);
  return open && (await holdsGrant(grantId, open.tokenHash)) ? open.recipient : null;
});
