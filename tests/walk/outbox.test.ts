import 'fake-indexeddb/auto';
import { beforeEach, expect, test } from 'vitest';
import { v7 as uuidv7 } from 'uuid';
import type { Operation } from '@/lib/schemas/operations';
import type { Receipt } from '@/lib/schemas/sync';
import { RECEPTACLE_DEFAULTS } from '@/lib/schemas/defaults';
import type { WalkAnswer, WalkState } from '@/lib/schemas/walk';
import { discardRejected, presentState, record, takeServed } from '@/lib/walk/outbox';
import { openPhoneStore, type PhoneStore } from '@/lib/walk/phone-store';
import { sendPending } from '@/lib/walk/send';

const USER = uuidv7();
const INSPECTION = uuidv7();
let store: PhoneStore;

beforeEach(() => {
  store = openPhoneStore(`walk-${uuidv7()}`);
});

function addReceptacle(): Operation {
  return {
    op: 'receptacle.add',
    inspectionId: INSPECTION,
    capturedAt: '2026-12-01T15:00:00Z',
    id: uuidv7(),
    fields: { label: 'by the door', order: 1 },
  };
}

type Sent = { clientId: string; operations: { n: number }[] };

/** A server of one answer per operation; `answer` says which. */
function server(answer: (n: number) => Receipt, log: Sent[] = []): typeof fetch {
  return async (_path, init) => {
    const body = JSON.parse(String(init?.body)) as Sent;
    log.push(body);
    return Response.json({ receipts: body.operations.map(({ n }) => answer(n)) });
  };
}

const applied = (n: number): Receipt => ({ n, outcome: 'applied', version: n });

test('operations are numbered from one without a gap and sent in that order', async () => {
  const log: Sent[] = [];
  await record(store, USER, [addReceptacle(), addReceptacle()]);
  await record(store, USER, [addReceptacle()]);
  await sendPending(store, USER, server(applied, log));
  expect(log.flatMap((sent) => sent.operations.map(({ n }) => n))).toEqual([1, 2, 3]);
});

test('an answer lost on the way is sent again under the same number and the same client', async () => {
  const log: Sent[] = [];
  await record(store, USER, [addReceptacle()]);
  const lost: typeof fetch = async (_path, init) => {
    log.push(JSON.parse(String(init?.body)) as Sent);
    throw new TypeError('network');
  };
  expect(await sendPending(store, USER, lost)).toEqual({ kind: 'unreachable' });
  expect(await sendPending(store, USER, server(applied, log))).toEqual({ kind: 'sent' });
  expect(log[0]).toEqual(log[1]);
});

test('signed out pauses and keeps everything', async () => {
  await record(store, USER, [addReceptacle(), addReceptacle()]);
  const outcome = await sendPending(store, USER, async () => new Response(null, { status: 401 }));
  expect(outcome).toEqual({ kind: 'signed-out' });
  expect(await store.outbox.where({ inspectionId: INSPECTION }).count()).toBe(2);
});

test('a program too old to be understood keeps everything', async () => {
  await record(store, USER, [addReceptacle()]);
  expect(await sendPending(store, USER, async () => new Response(null, { status: 426 }))).toEqual({
    kind: 'out-of-date',
  });
  expect(await store.outbox.count()).toBe(1);
});

test('a refused operation stays, with its reason, and does not hold up the next', async () => {
  await record(store, USER, [addReceptacle(), addReceptacle()]);
  await sendPending(
    store,
    USER,
    server((n) => (n === 1 ? { n, outcome: 'rejected', reason: 'This area was removed.' } : applied(n))),
  );
  const [first, second] = await store.outbox.orderBy('key').toArray();
  expect(first).toMatchObject({ state: 'rejected', reason: 'This area was removed.' });
  expect(second).toMatchObject({ state: 'counted' });
});

test('only a refused operation can be discarded', async () => {
  await record(store, USER, [addReceptacle()]);
  await discardRejected(store, `${USER}:1`);
  expect(await store.outbox.count()).toBe(1);
});

test('another person on the same phone sends nothing of the first', async () => {
  const log: Sent[] = [];
  await record(store, USER, [addReceptacle()]);
  expect(await sendPending(store, uuidv7(), server(applied, log))).toEqual({ kind: 'nothing-to-send' });
  expect(log).toEqual([]);
});

test('a server that answers nothing at all is not asked for ever', async () => {
  await record(store, USER, [addReceptacle()]);
  let asked = 0;
  const silent: typeof fetch = async () => {
    asked += 1;
    return Response.json({ receipts: [] });
  };
  expect(await sendPending(store, USER, silent)).toEqual({ kind: 'unreachable' });
  expect(asked).toBe(1);
});

function answerOf(version: number, lastMutation: number, receptacles: WalkState['receptacles']): WalkAnswer {
  const empty = {
    structures: [],
    areas: [],
    panels: [],
    circuits: [],
    readings: [],
    skips: [],
    photos: [],
    notices: [],
    decisions: [],
    conflicts: [],
  };
  const inspection = { id: INSPECTION, version } as WalkState['inspection'];
  return {
    state: { inspection, receptacles, ...empty },
    me: { userId: USER, membershipId: uuidv7(), name: 'T. Brandt' },
    lastMutation,
  };
}

test('what was done is on the screen before, between and after the server has it, and is there once', async () => {
  const operation = addReceptacle();
  const id = operation.op === 'receptacle.add' ? operation.id : '';
  await record(store, USER, [operation]);
  await takeServed(store, USER, answerOf(1, 0, []));
  const shown = async () => {
    const served = await store.served.get(`${USER}:${INSPECTION}`);
    if (!served) throw new Error('nothing served');
    return presentState(served.state, await store.outbox.toArray(), 'T. Brandt').receptacles.map((row) => row.id);
  };
  expect(await shown()).toEqual([id]);
  await sendPending(store, USER, server(applied));
  expect(await shown()).toEqual([id]);
  await takeServed(
    store,
    USER,
    answerOf(2, 1, [{ ...RECEPTACLE_DEFAULTS, id, revisions: {}, version: 2, deleted: false }]),
  );
  expect(await shown()).toEqual([id]);
  expect(await store.outbox.count()).toBe(0);
});

test('a slow answer of an older version does not replace a newer one', async () => {
  await takeServed(store, USER, answerOf(7, 0, []));
  await takeServed(
    store,
    USER,
    answerOf(5, 0, [{ ...RECEPTACLE_DEFAULTS, id: uuidv7(), revisions: {}, version: 5, deleted: false }]),
  );
  const served = await store.served.get(`${USER}:${INSPECTION}`);
  expect(served?.state.inspection.version).toBe(7);
});

test('photos are on the phone as soon as the operation that announces them is', async () => {
  const photoId = uuidv7();
  const blob = new Blob(['bytes'], { type: 'image/jpeg' });
  await record(store, USER, [addReceptacle()], [{ id: photoId, inspectionId: INSPECTION, blob, type: 'image/jpeg' }]);
  expect(await store.photos.get(photoId)).toMatchObject({ state: 'waiting', userId: USER });
});
