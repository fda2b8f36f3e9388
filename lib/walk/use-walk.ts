'use client';

import { liveQuery } from 'dexie';
import { useCallback, useEffect, useMemo, useRef, useState } from 'react';
import type { Operation } from '@/lib/schemas/operations';
import type { WalkPerson, WalkState } from '@/lib/schemas/walk';
import { presentState, record, servedKey } from './outbox';
import { askWhoIsSignedIn, rememberedPerson } from './person';
import {
  openPhoneStore,
  type OutboxEntry,
  type PhonePhoto,
  type PhoneStore,
  type ServedInspection,
} from './phone-store';
import { sendPhotos } from './photo-store';
import { pull, sendPending, sharingTurns } from './send';

const EVERY_MS = 30_000;

export type Link = 'connected' | 'no-signal' | 'signed-out' | 'out-of-date';
/** An operation as the screen writes it; the inspection, the time and an id for new things are added here. */
export type Draft = Operation extends infer One
  ? One extends Operation
    ? Omit<One, 'inspectionId' | 'capturedAt'>
    : never
  : never;
export type NewPhoto = { id: string; blob: Blob; type: string };

export type Walk = {
  state: WalkState | null;
  person: WalkPerson | null;
  link: Link;
  missing: boolean;
  outbox: OutboxEntry[];
  photos: PhonePhoto[];
  /** Saved on this phone when it resolves. */
  save: (drafts: Draft[], photos?: NewPhoto[]) => Promise<void>;
  refresh: () => Promise<void>;
};

let opened: PhoneStore | undefined;
export function phoneStore(): PhoneStore {
  opened ??= openPhoneStore();
  return opened;
}

/** One inspection on this phone: what was served, what waits to go, and the way to add to it. */
export function useWalk(inspectionId: string | null): Walk {
  const [person, setPerson] = useState<WalkPerson | null>(null);
  const [link, setLink] = useState<Link>('connected');
  const [missing, setMissing] = useState(false);
  const userId = person?.userId;

  usePerson(setPerson, setLink);
  const { served, outbox, photos } = useHeld(userId, inspectionId);

  const inTurn = useMemo(
    () => (userId && inspectionId ? sharingTurns(() => exchange(userId, inspectionId)) : null),
    [userId, inspectionId],
  );
  const refresh = useCallback(async () => {
    if (!inTurn) return;
    const reached = await inTurn();
    setLink(reached.link);
    setMissing(reached.missing);
  }, [inTurn]);
  useTriggers(refresh);

  const save = useCallback(
    async (drafts: Draft[], newPhotos: NewPhoto[] = []) => {
      if (!userId || !inspectionId) throw new Error('nothing can be saved before an inspection is open');
      const capturedAt = new Date().toISOString();
      const operations = drafts.map((draft) => ({ ...draft, inspectionId, capturedAt }) as Operation);
      await record(
        phoneStore(),
        userId,
        operations,
        newPhotos.map((photo) => ({ ...photo, inspectionId })),
      );
      void refresh();
    },
    [userId, inspectionId, refresh],
  );

  const state = useMemo(
    () =>
      served && served.inspectionId === inspectionId ? presentState(served.state, outbox, person?.name ?? '') : null,
    [served, outbox, person, inspectionId],
  );
  return { state, person, link, missing, outbox, photos, save, refresh };
}

async function exchange(userId: string, inspectionId: string): Promise<{ link: Link; missing: boolean }> {
  const store = phoneStore();
  const sent = await sendPending(store, userId);
  if (sent.kind === 'signed-out' || sent.kind === 'out-of-date') return { link: sent.kind, missing: false };
  const pulled = await pull(store, userId, inspectionId);
  if (pulled.kind === 'signed-out') return { link: 'signed-out', missing: false };
  if (pulled.kind === 'not-found') return { link: 'connected', missing: true };
  if (pulled.kind === 'unreachable' || sent.kind === 'unreachable') return { link: 'no-signal', missing: false };
  if (await sendPhotos(store, userId)) await pull(store, userId, inspectionId);
  return { link: 'connected', missing: false };
}

function usePerson(setPerson: (person: WalkPerson) => void, setLink: (link: Link) => void) {
  useEffect(() => {
    let left = false;
    async function find() {
      const known = rememberedPerson();
      if (known && !left) setPerson(known);
      const who = await askWhoIsSignedIn();
      if (left) return;
      if (who.kind === 'person') setPerson(who.person);
      if (who.kind === 'signed-out') setLink('signed-out');
      if (who.kind === 'unreachable') setLink('no-signal');
    }
    void find();
    return () => {
      left = true;
    };
  }, [setPerson, setLink]);
}

/** What this phone holds of an inspection, all of one moment: else a row would flicker between the outbox and the served state. */
type Held = { served: ServedInspection | null; outbox: OutboxEntry[]; photos: PhonePhoto[] };
const NOTHING: Held = { served: null, outbox: [], photos: [] };

function useHeld(userId: string | undefined, inspectionId: string | null): Held {
  const [held, setHeld] = useState<Held>(NOTHING);
  useEffect(() => {
    if (!userId || !inspectionId) return;
    const store = phoneStore();
    const own = (row: { userId: string }) => row.userId === userId;
    const read = () =>
      store.transaction('r', store.served, store.outbox, store.photos, async () => ({
        served: (await store.served.get(servedKey(userId, inspectionId))) ?? null,
        outbox: await store.outbox.where('inspectionId').equals(inspectionId).and(own).toArray(),
        photos: await store.photos.where('inspectionId').equals(inspectionId).and(own).toArray(),
      }));
    const watched = liveQuery(read).subscribe(setHeld);
    return () => watched.unsubscribe();
  }, [userId, inspectionId]);
  return held;
}

/** Online again, looked at again, shown again, and every half minute while it is open. */
function useTriggers(refresh: () => Promise<void>) {
  const latest = useRef(refresh);
  useEffect(() => {
    latest.current = refresh;
    void refresh();
  }, [refresh]);
  useEffect(() => {
    const go = () => void latest.current();
    const goIfSeen = () => {
      if (document.visibilityState === 'visible') go();
    };
    window.addEventListener('online', go);
    window.addEventListener('pageshow', go);
    document.addEventListener('visibilitychange', goIfSeen);
    const timer = setInterval(goIfSeen, EVERY_MS);
    return () => {
      window.removeEventListener('online', go);
      window.removeEventListener('pageshow', go);
      document.removeEventListener('visibilitychange', goIfSeen);
      clearInterval(timer);
    };
  }, []);
}
