import { v7 as uuidv7 } from 'uuid';
import { expect, test } from 'vitest';
import { applyFromDesk, applyOperations } from '@/db/sync';
import { loadWalk } from '@/db/inspections';
import type { Operation } from '@/lib/schemas/operations';
import { createFirm, logReceptacle, TestPhone, walk, type Change, type TestFirm } from '../support/firm';
import { asOwner } from '../support/owner';

function areaAdd(firm: TestFirm, name = 'Hall', id = uuidv7()): Change {
  return { op: 'area.add', id, fields: { structureId: firm.inspection.structureId, name } };
}

function request(phone: TestPhone, numbered: [number, unknown][]) {
  const operations = numbered.map(([n, operation]) => ({ n, operation }));
  return { format: 1 as const, clientId: phone.clientId, operations };
}

test('a batch sent again gets the same receipts and changes nothing', async () => {
  const firm = await createFirm();
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  const batch = request(phone, [
    [1, phone.operation(areaAdd(firm))],
    [2, { op: 'nonsense' }],
    [3, phone.operation({ op: 'inspection.set', patch: { yearBuilt: 1962 }, base: {} })],
  ]);
  const first = await applyOperations(firm.inspector, batch);
  const before = await walk(firm.inspector, firm.inspection.id);
  expect(await applyOperations(firm.inspector, batch)).toEqual(first);
  expect(await walk(firm.inspector, firm.inspection.id)).toEqual(before);
  expect(first.receipts.map((receipt) => receipt.outcome)).toEqual(['applied', 'rejected', 'applied']);
});

test('a number too far ahead stops the batch and names the one awaited', async () => {
  const firm = await createFirm();
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  const answer = await applyOperations(
    firm.inspector,
    request(phone, [
      [1, phone.operation(areaAdd(firm))],
      [3, phone.operation(areaAdd(firm))],
      [4, phone.operation(areaAdd(firm))],
    ]),
  );
  expect(answer.receipts).toHaveLength(1);
  expect(answer.gap).toEqual({ expected: 2 });
});

test('what cannot be read or stored is refused with a reason and holds up nothing', async () => {
  const firm = await createFirm();
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  const nested = JSON.parse('['.repeat(3000) + ']'.repeat(3000)) as unknown;
  const bad = [
    null,
    'text',
    nested,
    { op: 'area.add' },
    { ...(phone.operation(areaAdd(firm)) as object), firmId: uuidv7() },
    phone.operation(areaAdd(firm, 'nul \u0000')),
    phone.operation(areaAdd(firm, 'half \ud800')),
    phone.operation({ op: 'receptacle.add', id: uuidv7(), fields: { areaId: uuidv7() } }),
    phone.operation({ op: 'inspection.set', patch: { yearBuilt: 99999 }, base: {} }),
  ];
  const numbered = bad.map((operation, index): [number, unknown] => [index + 1, operation]);
  const last: [number, unknown] = [bad.length + 1, phone.operation(areaAdd(firm))];
  const { receipts, gap } = await applyOperations(firm.inspector, request(phone, [...numbered, last]));
  expect(gap).toBeUndefined();
  expect(receipts.map((receipt) => receipt.outcome)).toEqual([...bad.map(() => 'rejected'), 'applied']);
  const kept = await asOwner('select n, operation from mutation_log where firm_id = $1 and client_id = $2', [
    firm.firmId,
    phone.clientId,
  ]);
  expect(kept).toHaveLength(bad.length + 1);
});

test('another person cannot send through a phone’s numbers, nor read its receipts', async () => {
  const firm = await createFirm();
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  await phone.put(areaAdd(firm));
  const batch = request(phone, [
    [1, phone.operation(areaAdd(firm))],
    [2, phone.operation(areaAdd(firm))],
  ]);
  const { receipts } = await applyOperations(firm.actor, batch);
  expect(receipts.map((receipt) => receipt.outcome)).toEqual(['rejected', 'rejected']);
  expect((await walk(firm.inspector, firm.inspection.id)).areas).toHaveLength(1);
  expect((await phone.put(areaAdd(firm))).n).toBe(2);
});

test('the same phone id in another firm is another phone', async () => {
  const [here, there] = await Promise.all([createFirm(), createFirm()]);
  const phone = new TestPhone(here.inspector, here.inspection.id);
  await phone.put(areaAdd(here));
  const other = { format: 1 as const, clientId: phone.clientId };
  const operation = { ...areaAdd(there), inspectionId: there.inspection.id, capturedAt: '2026-05-04T17:00:00.000Z' };
  const answer = await applyOperations(there.inspector, { ...other, operations: [{ n: 1, operation }] });
  expect(answer.receipts).toMatchObject([{ outcome: 'applied' }]);
});

test('an id that another firm uses is free here, and nothing is lost in silence', async () => {
  const [here, there] = await Promise.all([createFirm(), createFirm()]);
  const id = uuidv7();
  await new TestPhone(here.inspector, here.inspection.id).put(areaAdd(here, 'Ours', id));
  await new TestPhone(there.inspector, there.inspection.id).put(areaAdd(there, 'Theirs', id));
  expect((await walk(there.inspector, there.inspection.id)).areas).toMatchObject([{ id, name: 'Theirs' }]);
  expect((await walk(here.inspector, here.inspection.id)).areas).toMatchObject([{ id, name: 'Ours' }]);
});

test('one batch sent eight times at once has one effect each and one answer', async () => {
  const firm = await createFirm();
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  const batch = request(
    phone,
    Array.from({ length: 10 }, (_, index) => [index + 1, phone.operation(areaAdd(firm, `Area ${index}`))]),
  );
  const answers = await Promise.all(Array.from({ length: 8 }, () => applyOperations(firm.inspector, batch)));
  for (const answer of answers) expect(answer).toEqual(answers[0]);
  const state = await walk(firm.inspector, firm.inspection.id);
  expect(state.areas.map((area) => area.name).toSorted()).toEqual(
    Array.from({ length: 10 }, (_, index) => `Area ${index}`),
  );
  expect(state.inspection.version).toBe(11);
});

test('eight phones write at once: every reading stands, each with its own order, and the record follows itself', async () => {
  const firm = await createFirm();
  const first = new TestPhone(firm.inspector, firm.inspection.id);
  const { receptacleId } = await logReceptacle(first, firm.inspection.structureId);
  const phones = Array.from({ length: 8 }, () => new TestPhone(firm.inspector, firm.inspection.id));
  const read = (): Change => ({
    op: 'reading.add',
    id: uuidv7(),
    visitId: firm.inspection.visitId,
    receptacleId,
    reading: { kind: 'wiring', evidence: { lamps: { hn: 'lit', hg: 'lit', ng: 'off' } } },
  });
  await Promise.all(
    phones.map(async (phone) => {
      for (let n = 0; n < 5; n++) await phone.put(read());
    }),
  );
  const state = await walk(firm.inspector, firm.inspection.id);
  expect(state.readings.map((reading) => reading.order)).toEqual(Array.from({ length: 40 }, (_, index) => index + 2));
  expect(state.inspection.version).toBe(3 + 40);
});

test('what a phone is told of its last number is of the same moment as the state', async () => {
  const firm = await createFirm();
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  const sending = (async () => {
    for (let n = 0; n < 25; n++) await phone.put(areaAdd(firm, `Area ${n}`));
  })();
  for (let look = 0; look < 25; look++) {
    const answer = await loadWalk(firm.inspector, firm.inspection.id, phone.clientId);
    expect(answer?.state.areas).toHaveLength(answer?.lastMutation ?? -1);
  }
  await sending;
});

test('a change from the desk is numbered, answered and kept like one from a phone', async () => {
  const firm = await createFirm();
  const change: Change = { op: 'inspection.set', patch: { yearBuilt: 1962 }, base: {} };
  const operation = {
    ...change,
    inspectionId: firm.inspection.id,
    capturedAt: '2026-05-04T17:00:00.000Z',
  } as Operation;
  expect(await applyFromDesk(firm.office, operation)).toMatchObject({ n: 1, outcome: 'applied' });
  expect(await applyFromDesk(firm.office, operation)).toMatchObject({ n: 2, outcome: 'merged' });
  const kept = await asOwner('select outcome from mutation_log where firm_id = $1 order by n', [firm.firmId]);
  expect(kept.map((row) => row.outcome)).toEqual(['applied', 'merged']);
});
