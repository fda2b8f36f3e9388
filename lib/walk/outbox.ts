import type { Operation } from '@/lib/schemas/operations';
import type { Receipt } from '@/lib/schemas/sync';
import type { WalkAnswer, WalkState } from '@/lib/schemas/walk';
import { applyLocally } from './apply';
import type { OutboxEntry, PhonePhoto, PhoneStore } from './phone-store';
import { v7 as uuidv7 } from 'uuid';

const entryKey = (userId: string, n: number) => `${userId}:${n}`;
export const servedKey = (userId: string, inspectionId: string) => `${userId}:${inspectionId}`;

/** Writes operations, and the photos they announce, in one transaction. When this resolves they are saved on this phone. */
export async function record(
  store: PhoneStore,
  userId: string,
  operations: Operation[],
  photos: Pick<PhonePhoto, 'id' | 'inspectionId' | 'blob' | 'type'>[] = [],
): Promise<void> {
  await store.transaction('rw', store.outbox, store.clients, store.photos, async () => {
    const client = (await store.clients.get(userId)) ?? { userId, clientId: uuidv7(), lastN: 0 };
    const entries: OutboxEntry[] = operations.map((operation, index) => {
      const n = client.lastN + index + 1;
      return { key: entryKey(userId, n), userId, n, inspectionId: operation.inspectionId, operation, state: 'pending' };
    });
    await store.outbox.bulkAdd(entries);
    await store.photos.bulkAdd(photos.map((photo) => ({ ...photo, userId, state: 'waiting', sentBytes: 0 })));
    await store.clients.put({ ...client, lastN: client.lastN + operations.length });
  });
}

export async function nextBatch(store: PhoneStore, userId: string, most: number): Promise<OutboxEntry[]> {
  const entries = await store.outbox
    .where('[userId+state+n]')
    .between([userId, 'pending', 0], [userId, 'pending', Infinity])
    .toArray();
  return entries.slice(0, most);
}

/** An operation leaves the outbox only on a receipt with its own number; conflicts and refusals stay, with the reason. */
export async function settle(store: PhoneStore, userId: string, receipts: Receipt[]): Promise<void> {
  await store.transaction('rw', store.outbox, async () => {
    for (const receipt of receipts) {
      const key = entryKey(userId, receipt.n);
      switch (receipt.outcome) {
        case 'applied':
        case 'merged':
          await store.outbox.update(key, { state: 'counted' });
          break;
        case 'conflict':
          await store.outbox.update(key, { state: 'conflict', conflicts: receipt.conflicts });
          break;
        case 'rejected':
          await store.outbox.update(key, { state: 'rejected', reason: receipt.reason });
          break;
      }
    }
  });
}

/** Takes the server's state; what it has counted is in it and leaves the outbox. */
export async function takeServed(store: PhoneStore, userId: string, answer: WalkAnswer): Promise<void> {
  const inspectionId = answer.state.inspection.id;
  await store.transaction('rw', store.outbox, store.served, async () => {
    const held = await store.served.get(servedKey(userId, inspectionId));
    // A slow answer must not put an older state over a newer one.
    if (held && held.state.inspection.version > answer.state.inspection.version) return;
    await store.served.put({
      key: servedKey(userId, inspectionId),
      userId,
      inspectionId,
      state: answer.state,
      me: answer.me,
    });
    const counted = await store.outbox
      .where('[userId+state+n]')
      .between([userId, 'counted', 0], [userId, 'counted', answer.lastMutation], true, true)
      .toArray();
    await store.outbox.bulkDelete(
      counted.filter((entry) => entry.inspectionId === inspectionId).map((entry) => entry.key),
    );
    const open = new Set(answer.state.conflicts.map((conflict) => conflict.id));
    const settled = await store.outbox
      .where('[userId+state+n]')
      .between([userId, 'conflict', 0], [userId, 'conflict', Infinity])
      .toArray();
    const over = settled.filter(
      (entry) => entry.inspectionId === inspectionId && !entry.conflicts?.some((conflict) => open.has(conflict.id)),
    );
    await store.outbox.bulkDelete(over.map((entry) => entry.key));
  });
}

/** Server state with everything replayed on it that the server's state does not hold yet. */
export function presentState(served: WalkState, entries: OutboxEntry[], by: string): WalkState {
  return entries
    .filter((entry) => entry.state === 'pending' || entry.state === 'counted')
    .toSorted((a, b) => a.n - b.n)
    .reduce((state, entry) => applyLocally(state, entry.operation, by), served);
}

/** A refused operation is the only copy of what a person saw: it goes only when that person says so. */
export async function discardRejected(store: PhoneStore, key: string): Promise<void> {
  await store.outbox
    .where('key')
    .equals(key)
    .and((entry) => entry.state === 'rejected')
    .delete();
}
