import 'server-only';
import type { Route } from 'next';
import { findGrantBySecret, recordOpening } from '@/db/grants';
import { keepGrant } from '@/lib/auth/grant-cookie';
import { hashSecret, keepSecret, type LinkSecret } from '@/lib/auth/link-secret';
import type { Opened } from './dispatch';

/** Opens the page that a grant shares, with the grant's own cookie. Null where the secret belongs to no grant. */
export async function openSharedPage(secret: LinkSecret): Promise<Opened | null> {
  const found = await findGrantBySecret(hashSecret(secret));
  if (!found) return null;
  if (found.state === 'revoked') return { kind: 'unknown' };
  if (found.state === 'expired') {
    await keepSecret(secret);
    return { kind: 'go', to: '/open/expired' };
  }
  const { grantId } = found.recipient;
  await keepGrant(grantId, found.tokenHash);
  await recordOpening(found.recipient);
  return { kind: 'go', to: `/shared/${grantId}` as Route };
}
