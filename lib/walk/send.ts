import { SYNC_BATCH, SYNC_FORMAT, type SyncAnswer } from '@/lib/schemas/sync';
import type { WalkAnswer } from '@/lib/schemas/walk';
import { nextBatch, settle, takeServed } from './outbox';
import type { PhoneStore } from './phone-store';

export type SendOutcome =
  | { kind: 'sent' }
  | { kind: 'nothing-to-send' }
  | { kind: 'unreachable' }
  | { kind: 'signed-out' }
  | { kind: 'out-of-date' }
  | { kind: 'slow-down'; seconds: number };

/** Sends what waits, in the order of its numbers, until nothing waits or something stands in the way. Loses nothing. */
export async function sendPending(
  store: PhoneStore,
  userId: string,
  fetcher: typeof fetch = fetch,
): Promise<SendOutcome> {
  let sent = false;
  for (;;) {
    const batch = await nextBatch(store, userId, SYNC_BATCH);
    const client = await store.clients.get(userId);
    if (batch.length === 0 || !client) return { kind: sent ? 'sent' : 'nothing-to-send' };

    const response = await post(fetcher, '/api/sync', {
      format: SYNC_FORMAT,
      clientId: client.clientId,
      operations: batch.map(({ n, operation }) => ({ n, operation })),
    });
    if (response?.status === 401) return { kind: 'signed-out' };
    if (response?.status === 426) return { kind: 'out-of-date' };
    if (response?.status === 429)
      return { kind: 'slow-down', seconds: Number(response.headers.get('retry-after')) || 30 };
    if (!response?.ok) return { kind: 'unreachable' };

    const answer = (await response.json().catch(() => null)) as SyncAnswer | null;
    if (!answer) return { kind: 'unreachable' };
    await settle(store, userId, answer.receipts);
    // No receipt at all would make this loop ask for ever.
    if (answer.receipts.length === 0) return { kind: 'unreachable' };
    sent = true;
  }
}

export type PullOutcome = { kind: 'pulled' } | { kind: 'unreachable' } | { kind: 'signed-out' } | { kind: 'not-found' };

export async function pull(
  store: PhoneStore,
  userId: string,
  inspectionId: string,
  fetcher: typeof fetch = fetch,
): Promise<PullOutcome> {
  const client = await store.clients.get(userId);
  const query = client ? `?client=${client.clientId}` : '';
  const response = await fetcher(`/api/inspections/${inspectionId}/walk${query}`, {
    headers: { accept: 'application/json' },
  }).catch(() => null);
  if (response?.status === 401) return { kind: 'signed-out' };
  if (response?.status === 404) return { kind: 'not-found' };
  if (!response?.ok) return { kind: 'unreachable' };
  const answer = (await response.json().catch(() => null)) as WalkAnswer | null;
  if (!answer) return { kind: 'unreachable' };
  await takeServed(store, userId, answer);
  return { kind: 'pulled' };
}

function post(fetcher: typeof fetch, path: string, body: unknown): Promise<Response | null> {
  return fetcher(path, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(body),
  }).catch(() => null);
}

/** One sender per origin, however many tabs are open. Another tab that is sending makes this one wait. */
function asOneSender<Result>(work: () => Promise<Result>): Promise<Result> {
  return navigator.locks.request('ohmstead-sender', work) as Promise<Result>;
}

/** Calls that come while one waits for its turn share that one, which takes along what they saved. */
export function sharingTurns<Result>(work: () => Promise<Result>): () => Promise<Result> {
  let waiting: Promise<Result> | undefined;
  return () => {
    waiting ??= asOneSender(() => {
      waiting = undefined;
      return work();
    });
    return waiting;
  };
}
