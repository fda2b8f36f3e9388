import type { Route } from 'next';

const OURS = 'http://ours.invalid';

/** Where to go after sign-in: a page of ours, or the inspections. An address of another site is not followed. */
export function nextPage(next: unknown): Route {
  if (typeof next !== 'string' || !next.startsWith('/') || !URL.canParse(next, OURS)) return '/inspections';
  const url = new URL(next, OURS);
  return url.origin === OURS ? (`${url.pathname}${url.search}` as Route) : '/inspections';
}
