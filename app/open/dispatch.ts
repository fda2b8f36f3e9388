import 'server-only';
import type { Route } from 'next';
import { findLink, type LinkPurpose } from '@/db/links';
import { hashSecret, keepSecret, type LinkSecret } from '@/lib/auth/link-secret';
import { openSharedPage } from './open-shared-page';

export type Opened = { kind: 'go'; to: Route } | { kind: 'unknown' };

const PAGE_OF: Record<LinkPurpose, Route> = {
  invitation: '/invitation',
  reset: '/reset-password',
  'sign-in': '/sign-in/link',
};

/** Sends a reader with a mailed secret to the page that it opens. One-time links are not used up here; a button does that. */
export async function openSecret(secret: LinkSecret): Promise<Opened> {
  const shared = await openSharedPage(secret);
  if (shared) return shared;

  const link = await findLink(hashSecret(secret));
  if (!link) return { kind: 'unknown' };
  await keepSecret(secret);
  return { kind: 'go', to: link.state === 'ready' ? PAGE_OF[link.purpose] : '/open/expired' };
}
