import type { WalkPerson } from '@/lib/schemas/walk';

const KEY = 'ohmstead-person';

/** Who last signed in here, so that Walk opens without a network. Holds a name and two ids, no token. */
export function rememberedPerson(): WalkPerson | null {
  const stored = localStorage.getItem(KEY);
  return stored ? (JSON.parse(stored) as WalkPerson) : null;
}

export type WhoOutcome = { kind: 'person'; person: WalkPerson } | { kind: 'signed-out' } | { kind: 'unreachable' };

export async function askWhoIsSignedIn(): Promise<WhoOutcome> {
  const response = await fetch('/api/me').catch(() => null);
  if (response?.status === 401) return { kind: 'signed-out' };
  if (!response?.ok) return { kind: 'unreachable' };
  const person = (await response.json()) as WalkPerson;
  localStorage.setItem(KEY, JSON.stringify(person));
  return { kind: 'person', person };
}
