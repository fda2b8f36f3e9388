import Dexie, { type EntityTable } from 'dexie';
import type { Operation } from '@/lib/schemas/operations';
import type { FieldConflict } from '@/lib/schemas/sync';
import type { WalkAnswer, WalkState } from '@/lib/schemas/walk';

/** One operation on its way. `n` is given at writing and never again; the server counts by it. */
export type OutboxEntry = {
  key: string;
  userId: string;
  n: number;
  inspectionId: string;
  operation: Operation;
  state: 'pending' | 'counted' | 'conflict' | 'rejected';
  reason?: string;
  conflicts?: FieldConflict[];
};

/** What the server last said of an inspection, and how far it had counted this browser then. */
export type ServedInspection = {
  key: string;
  userId: string;
  inspectionId: string;
  state: WalkState;
  me: WalkAnswer['me'];
};

/** This browser's name to the server for one person. */
export type PhoneClient = { userId: string; clientId: string; lastN: number };

export type PhonePhoto = {
  id: string;
  userId: string;
  inspectionId: string;
  blob: Blob;
  type: string;
  state: 'waiting' | 'sending' | 'stored' | 'refused';
  sentBytes: number;
  reason?: string;
};

export type PhoneStore = Dexie & {
  outbox: EntityTable<OutboxEntry, 'key'>;
  served: EntityTable<ServedInspection, 'key'>;
  clients: EntityTable<PhoneClient, 'userId'>;
  photos: EntityTable<PhonePhoto, 'id'>;
};

export function openPhoneStore(name = 'ohmstead-walk'): PhoneStore {
  // Strict: the browser answers only when the bytes are on the disk, so that "saved" survives a dead battery.
  const store = new Dexie(name, { chromeTransactionDurability: 'strict' }) as PhoneStore;
  store.version(1).stores({
    outbox: 'key, [userId+n], [userId+state+n], inspectionId',
    served: 'key',
    clients: 'userId',
    photos: 'id, [userId+state], inspectionId',
  });
  return store;
}
