import { v7 as uuidv7 } from 'uuid';
import { expect, test } from 'vitest';
import { assignInspectors } from '@/db/bookings';
import { listConflicts, resolveConflict } from '@/db/conflicts';
import { listAudit } from '@/db/audit';
import { createFirm, logReceptacle, TestPhone, type Change } from '../support/firm';

/** Two inspectors on one house. Both have seen the receptacle as it was logged; neither has seen what the other does next. */
async function twoPhones() {
  const firm = await createFirm();
  const people = { lead: firm.inspector.membershipId, others: [firm.colleague.membershipId] };
  await assignInspectors(firm.office, firm.inspection.id, people);
  const ann = new TestPhone(firm.inspector, firm.inspection.id);
  const ben = new TestPhone(firm.colleague, firm.inspection.id);
  const places = await logReceptacle(ann, firm.inspection.structureId);
  const seen = (await ben.see()).receptacles[0]?.revisions ?? {};
  const edit = (patch: Extract<Change, { op: 'receptacle.set' }>['patch']): Change => ({
    op: 'receptacle.set',
    id: places.receptacleId,
    patch,
    base: seen,
  });
  const read = (): Change => ({
    op: 'reading.add',
    id: uuidv7(),
    visitId: firm.inspection.visitId,
    receptacleId: places.receptacleId,
    reading: { kind: 'wiring', evidence: { lamps: { hn: 'lit', hg: 'lit', ng: 'off' } } },
  });
  const remove: Change = { op: 'receptacle.remove', id: places.receptacleId, base: seen };
  const outcome = async () => {
    const state = await ann.see();
    const receptacle = state.receptacles.find((row) => row.id === places.receptacleId);
    return { receptacle, conflicts: state.conflicts, state };
  };
  return { firm, ann, ben, ...places, edit, read, remove, outcome };
}

test('two people change different fields: both stand', async () => {
  const { ann, ben, edit, outcome } = await twoPhones();
  await ann.put(edit({ label: 'By the stove' }));
  expect((await ben.put(edit({ pattern: '5-20R' }))).outcome).toBe('applied');
  const { receptacle, conflicts } = await outcome();
  expect(receptacle).toMatchObject({ label: 'By the stove', pattern: '5-20R' });
  expect(conflicts).toEqual([]);
});

test('two people change one field: the first stands, both values are kept and named', async () => {
  const { ann, ben, edit, outcome, firm } = await twoPhones();
  await ann.put(edit({ label: 'By the stove' }));
  const receipt = await ben.put(edit({ label: 'Stove left' }));
  expect(receipt).toMatchObject({
    outcome: 'conflict',
    conflicts: [{ field: 'label', theirs: 'By the stove', yours: 'Stove left', by: 'Ines Cole' }],
  });
  const { receptacle, conflicts } = await outcome();
  expect(receptacle?.label).toBe('By the stove');
  expect(conflicts).toMatchObject([{ entity: 'receptacle', field: 'label', by: 'Ines Cole' }]);
  expect(await listConflicts(firm.inspector, firm.inspection.id)).toMatchObject([
    { theirs: { value: 'By the stove', by: 'Ines Cole' }, yours: { value: 'Stove left', by: 'Cody Marsh' } },
  ]);
});

test('two people set the same value: no conflict', async () => {
  const { ann, ben, edit, outcome } = await twoPhones();
  await ann.put(edit({ marks: ['tamper-resistant'] }));
  expect((await ben.put(edit({ marks: ['tamper-resistant'] }))).outcome).toBe('merged');
  expect((await outcome()).conflicts).toEqual([]);
});

test('one change with an agreed and a disputed field: the agreed one is taken', async () => {
  const { ann, ben, edit, outcome } = await twoPhones();
  await ann.put(edit({ label: 'By the stove' }));
  expect((await ben.put(edit({ label: 'Stove left', cover: 'metal' }))).outcome).toBe('conflict');
  expect((await outcome()).receptacle).toMatchObject({ label: 'By the stove', cover: 'metal' });
});

test('a phone changes a field twice before it hears back: no conflict with itself', async () => {
  const { ann, edit, outcome } = await twoPhones();
  await ann.put(edit({ label: 'one' }));
  expect((await ann.put(edit({ label: 'two' }))).outcome).toBe('merged');
  expect((await outcome()).receptacle?.label).toBe('two');
});

test('a deletion after an edit that was not seen: the receptacle stands until a person chooses', async () => {
  const { ann, ben, edit, remove, outcome, firm } = await twoPhones();
  await ann.put(edit({ label: 'By the stove' }));
  expect((await ben.put(remove)).outcome).toBe('conflict');
  const { receptacle, conflicts } = await outcome();
  expect(receptacle?.deleted).toBe(false);
  expect(conflicts).toMatchObject([{ field: 'deleted', theirs: false, yours: true }]);
  expect(await resolveConflict(firm.inspector, conflicts[0]?.id ?? '', 'yours')).toEqual({ kind: 'resolved' });
  expect((await outcome()).receptacle?.deleted).toBe(true);
});

test('an edit after a deletion that was not seen: the receptacle comes back with the edit', async () => {
  const { ann, ben, edit, remove, outcome } = await twoPhones();
  await ann.put(remove);
  expect((await ben.put(edit({ label: 'Stove left' }))).outcome).toBe('conflict');
  const { receptacle, conflicts } = await outcome();
  expect(receptacle).toMatchObject({ deleted: false, label: 'Stove left' });
  expect(conflicts).toMatchObject([{ field: 'deleted', theirs: false, yours: true, by: 'Cody Marsh' }]);
});

test('a deletion after a reading that was not seen: the receptacle and its reading stand', async () => {
  const { ann, ben, read, remove, outcome } = await twoPhones();
  await ann.put(read());
  expect((await ben.put(remove)).outcome).toBe('conflict');
  const { receptacle, state } = await outcome();
  expect([receptacle?.deleted, state.readings.length]).toEqual([false, 1]);
});

test('a reading after a deletion of the whole area: area, receptacle and reading stand', async () => {
  const { ann, ben, areaId, remove, read, outcome } = await twoPhones();
  await ann.put(remove);
  await ann.put({ op: 'area.remove', id: areaId, base: (await ann.see()).areas[0]?.revisions ?? {} });
  const receipt = await ben.put(read());
  expect(receipt.outcome).toBe('conflict');
  const { receptacle, state, conflicts } = await outcome();
  expect([state.areas[0]?.deleted, receptacle?.deleted, state.readings.length]).toEqual([false, false, 1]);
  expect(conflicts.map((conflict) => conflict.entity).toSorted()).toEqual(['area', 'receptacle']);
});

test('an area deleted by one who had not seen the receptacle that another added there stands', async () => {
  const { ann, ben, areaId } = await twoPhones();
  const base = (await ann.see()).areas[0]?.revisions ?? {};
  await ben.put({ op: 'receptacle.add', id: uuidv7(), fields: { areaId } });
  expect((await ann.put({ op: 'area.remove', id: areaId, base })).outcome).toBe('conflict');
  expect((await ann.see()).areas[0]?.deleted).toBe(false);
});

test('two deletions agree', async () => {
  const { ann, ben, remove, outcome } = await twoPhones();
  await ann.put(remove);
  expect((await ben.put(remove)).outcome).toBe('merged');
  const { receptacle, conflicts } = await outcome();
  expect([receptacle?.deleted, conflicts.length]).toEqual([true, 0]);
});

test('two people read one receptacle: both readings stand, in the server’s order', async () => {
  const { ann, ben, read, outcome } = await twoPhones();
  await ann.put(read());
  expect((await ben.put(read())).outcome).toBe('applied');
  const { state, conflicts } = await outcome();
  expect(state.readings.map((row) => [row.order, row.by])).toEqual([
    [2, 'Ines Cole'],
    [3, 'Cody Marsh'],
  ]);
  expect(conflicts).toEqual([]);
});

test('a photo for a receptacle that was deleted unseen brings it back', async () => {
  const { ann, ben, receptacleId, remove, outcome } = await twoPhones();
  await ann.put(remove);
  const id = uuidv7();
  const photo = { op: 'photo.add', id, receptacleId, sha256: 'b'.repeat(64), bytes: 9, type: 'image/png', order: 1 };
  expect((await ben.put(photo as Change)).outcome).toBe('conflict');
  expect((await outcome()).receptacle?.deleted).toBe(false);
});

test('two new records under one number: the second is refused and the first stands', async () => {
  const { ann, ben, areaId } = await twoPhones();
  const id = uuidv7();
  await ann.put({ op: 'receptacle.add', id, fields: { areaId, label: 'first' } });
  const second = await ben.send({ op: 'receptacle.add', id, fields: { areaId, label: 'second' } });
  expect(second.outcome).toBe('rejected');
  expect((await ann.see()).receptacles.find((row) => row.id === id)?.label).toBe('first');
});

test('three people change one field: one value stands and two are kept', async () => {
  const { firm, ann, ben, edit, outcome } = await twoPhones();
  const cat = new TestPhone(firm.actor, firm.inspection.id);
  await ann.put(edit({ label: 'one' }));
  await ben.put(edit({ label: 'two' }));
  await cat.put(edit({ label: 'three' }));
  const { receptacle, conflicts } = await outcome();
  expect(receptacle?.label).toBe('one');
  expect(conflicts.map((conflict) => conflict.yours).toSorted()).toEqual(['three', 'two']);
});

test('a conflict is settled once, with the chosen value, and the record names both', async () => {
  const { firm, ann, ben, edit, outcome } = await twoPhones();
  await ann.put(edit({ label: 'By the stove' }));
  await ben.put(edit({ label: 'Stove left' }));
  const id = (await outcome()).conflicts[0]?.id ?? '';
  expect(await resolveConflict(firm.office, id, 'yours')).toEqual({ kind: 'not-found' });
  expect(await resolveConflict(firm.colleague, id, 'yours')).toEqual({ kind: 'resolved' });
  expect(await resolveConflict(firm.inspector, id, 'theirs')).toEqual({ kind: 'already-resolved' });
  const { receptacle, conflicts } = await outcome();
  expect([receptacle?.label, conflicts]).toEqual(['Stove left', []]);
  const settled = (await listAudit(firm.owner, firm.inspection.id)).at(-1);
  expect(settled).toMatchObject({
    kind: 'conflict.resolved',
    who: 'Cody Marsh',
    detail: { theirs: 'By the stove', yours: 'Stove left', keep: 'yours' },
  });
});

test('facts of the house that office and inspector both changed are kept twice', async () => {
  const { firm, ann } = await twoPhones();
  const desk = new TestPhone(firm.office, firm.inspection.id);
  await desk.put({ op: 'inspection.set', patch: { yearBuilt: 1950 }, base: {} });
  const receipt = await ann.put({ op: 'inspection.set', patch: { yearBuilt: 1962 }, base: {} });
  expect(receipt).toMatchObject({ outcome: 'conflict', conflicts: [{ theirs: 1950, yours: 1962, by: 'Opal Reyes' }] });
  const { conflicts } = await ann.see();
  await resolveConflict(firm.inspector, conflicts[0]?.id ?? '', 'yours');
  expect((await ann.see()).inspection.yearBuilt).toBe(1962);
});
