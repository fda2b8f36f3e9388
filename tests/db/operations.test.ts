import { v7 as uuidv7 } from 'uuid';
import { describe, expect, test } from 'vitest';
import { cancelInspection, reopenInspection } from '@/db/bookings';
import { listAudit, verifyAuditChain } from '@/db/audit';
import { loadInspectionFacts } from '@/db/inspections';
import { operationSchema } from '@/lib/schemas/operations';
import { createFirm, logReceptacle, TestPhone, type Change } from '../support/firm';

const LAMPS = { hn: 'lit', hg: 'lit', ng: 'off' } as const;

async function onSite() {
  const firm = await createFirm();
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  const places = await logReceptacle(phone, firm.inspection.structureId);
  const readLamps = (id: string, extra: { supersedes?: string } = {}): Change => ({
    op: 'reading.add',
    id,
    visitId: firm.inspection.visitId,
    receptacleId: places.receptacleId,
    reading: { kind: 'wiring', evidence: { lamps: LAMPS } },
    ...extra,
  });
  return { firm, phone, ...places, readLamps };
}

test('every kind of operation is taken, changes what the phone sees next and leaves a line in the record', async () => {
  const { firm, phone, areaId, receptacleId, readLamps } = await onSite();
  const id = Object.fromEntries(
    [
      'visit',
      'panel',
      'circuit',
      'reading',
      'skip',
      'notice',
      'photo',
      'decision',
      'spare',
      'shed',
      'unused',
      'hall',
      'extra',
    ].map((name) => [name, uuidv7()]),
  ) as Record<string, string>;
  const named = (name: string) => id[name] ?? '';
  const done: Change[] = [
    { op: 'inspection.set', patch: { yearBuilt: 1962, wiringMethod: 'two-wire' }, base: {} },
    { op: 'structure.add', id: named('shed'), fields: { name: 'Shed', kind: 'accessory', order: 2 } },
    { op: 'structure.set', id: named('shed'), patch: { name: 'Workshop' }, base: {} },
    { op: 'structure.remove', id: named('shed'), base: {} },
    { op: 'area.set', id: areaId, patch: { closed: true }, base: {} },
    { op: 'panel.add', id: named('panel'), fields: { name: 'Main', kind: 'main' } },
    { op: 'panel.set', id: named('panel'), patch: { place: 'Garage' }, base: {} },
    { op: 'circuit.add', id: named('circuit'), fields: { panelId: named('panel'), breaker: '7' } },
    { op: 'circuit.set', id: named('circuit'), patch: { amps: 20 }, base: {} },
    { op: 'receptacle.set', id: receptacleId, patch: { circuitId: named('circuit') }, base: {} },
    readLamps(named('reading')),
    { op: 'skip.add', id: named('skip'), areaId, reason: 'locked' },
    { op: 'skip.remove', id: named('skip'), base: {} },
    { op: 'notice.add', id: named('notice'), kind: 'danger-told', receptacleId, whom: 'Seller' },
    {
      op: 'photo.add',
      id: named('photo'),
      receptacleId,
      sha256: 'a'.repeat(64),
      bytes: 10,
      type: 'image/jpeg',
      order: 1,
    },
    { op: 'photo.set', id: named('photo'), patch: { caption: 'Face' }, base: {} },
    { op: 'photo.remove', id: named('photo'), base: {} },
    { op: 'photo.restore', id: named('photo') },
    {
      op: 'finding.decide',
      id: named('decision'),
      findingId: 'W01@kitchen',
      decision: 'dismissed',
      reason: 'Seen',
      sawReadingIds: [named('reading')],
    },
    { op: 'visit.add', id: named('visit'), kind: 'return' },
    { op: 'panel.add', id: named('spare'), fields: { name: 'Spare', kind: 'sub', fedFromCircuitId: named('circuit') } },
    { op: 'panel.remove', id: named('spare'), base: {} },
    { op: 'circuit.add', id: named('unused'), fields: { panelId: named('panel'), breaker: '9' } },
    { op: 'circuit.remove', id: named('unused'), base: {} },
    { op: 'reading.withdraw', id: named('reading') },
    { op: 'area.add', id: named('hall'), fields: { structureId: firm.inspection.structureId, name: 'Hall' } },
    { op: 'receptacle.add', id: named('extra'), fields: { areaId: named('hall') } },
    { op: 'receptacle.remove', id: named('extra'), base: {} },
    { op: 'receptacle.restore', id: named('extra') },
    { op: 'area.remove', id: named('hall'), base: {} },
    { op: 'area.restore', id: named('hall') },
    { op: 'inspection.advance', to: 'in-review' },
  ];
  const known = operationSchema.options.map((option) => option.shape.op.value);
  expect(known.filter((name) => !done.some((change) => change.op === name))).toEqual([]);
  for (const change of done) {
    const receipt = await phone.put(change);
    expect([change.op, receipt.outcome]).toEqual([change.op, 'applied']);
  }
  const state = await phone.see();
  expect(state.inspection).toMatchObject({ yearBuilt: 1962, wiringMethod: 'two-wire', state: 'in-review' });
  expect(state.inspection.visitId).toBe(id.visit);
  expect(state.structures.find((row) => row.id === id.shed)).toMatchObject({ name: 'Workshop', deleted: true });
  expect(state.areas).toMatchObject([
    { id: areaId, closed: true, deleted: false },
    { name: 'Hall', deleted: false },
  ]);
  expect(state.circuits).toMatchObject([{ amps: 20, panelId: id.panel }, { deleted: true }]);
  expect(state.receptacles).toMatchObject([{ id: receptacleId, circuitId: id.circuit }, { deleted: false }]);
  expect(state.readings).toMatchObject([{ id: id.reading, by: 'Ines Cole', order: 2, withdrawn: true }]);
  expect(state.skips).toMatchObject([{ reason: 'locked', deleted: true }]);
  expect(state.notices).toMatchObject([{ kind: 'danger-told', whom: 'Seller' }]);
  expect(state.photos).toMatchObject([{ caption: 'Face', state: 'announced', deleted: false }]);
  expect(state.decisions).toMatchObject([{ decision: 'dismissed', by: 'Ines Cole', sawReadingIds: [id.reading] }]);
  expect(state.inspection.version).toBe(1 + 2 + done.length);
  const lines = await listAudit(firm.owner, firm.inspection.id);
  expect(lines).toHaveLength(1 + 2 + done.length);
  expect(await verifyAuditChain(firm.owner)).toMatchObject({ kind: 'whole' });
});

describe('readings', () => {
  test('the first reading says that somebody is on site', async () => {
    const { phone, readLamps } = await onSite();
    await phone.put(readLamps(uuidv7()));
    expect((await phone.see()).inspection.state).toBe('on-site');
  });

  test('a correction must be of the same receptacle and kind', async () => {
    const { phone, areaId, receptacleId, readLamps, firm } = await onSite();
    const [first, other, correction] = [uuidv7(), uuidv7(), uuidv7()];
    await phone.put(readLamps(first));
    await phone.put({ op: 'receptacle.add', id: other, fields: { areaId } });
    const elsewhere = await phone.send({
      op: 'reading.add',
      id: uuidv7(),
      visitId: firm.inspection.visitId,
      receptacleId: other,
      supersedes: first,
      reading: { kind: 'wiring', evidence: { lamps: LAMPS } },
    });
    const otherKind = await phone.send({
      op: 'reading.add',
      id: uuidv7(),
      visitId: firm.inspection.visitId,
      receptacleId,
      supersedes: first,
      reading: { kind: 'physical', evidence: { signs: ['warm'] } },
    });
    expect([elsewhere.outcome, otherKind.outcome]).toEqual(['rejected', 'rejected']);
    await phone.put(readLamps(correction, { supersedes: first }));
    expect((await phone.see()).readings.map((row) => row.supersedes)).toEqual([undefined, first]);
  });

  test('undo withdraws a reading once, the record keeps it, and the engine is not given it', async () => {
    const { phone, readLamps, firm } = await onSite();
    const id = uuidv7();
    await phone.put(readLamps(id));
    expect((await phone.put({ op: 'reading.withdraw', id })).outcome).toBe('applied');
    expect((await phone.put({ op: 'reading.withdraw', id })).outcome).toBe('merged');
    expect((await phone.see()).readings).toMatchObject([{ id, withdrawn: true }]);
    expect((await loadInspectionFacts(firm.inspector, firm.inspection.id))?.readings).toEqual([]);
  });

  test('a colleague cannot take back what another inspector read', async () => {
    const { phone, readLamps, firm } = await onSite();
    const id = uuidv7();
    await phone.put(readLamps(id));
    const other = new TestPhone({ ...firm.colleague, sharedDrafts: true }, firm.inspection.id);
    expect((await other.send({ op: 'reading.withdraw', id })).outcome).toBe('rejected');
  });

  test('another reading under the same number is refused, the same one again is no news', async () => {
    const { phone, readLamps, receptacleId, firm } = await onSite();
    const id = uuidv7();
    await phone.put(readLamps(id));
    expect((await phone.send(readLamps(id))).outcome).toBe('merged');
    const other = await phone.send({
      op: 'reading.add',
      id,
      visitId: firm.inspection.visitId,
      receptacleId,
      reading: { kind: 'wiring', evidence: { lamps: { hn: 'off', hg: 'off', ng: 'off' } } },
    });
    expect(other.outcome).toBe('rejected');
  });
});

describe('who may and when', () => {
  test('the office changes the house and its circuits, never readings, devices or findings', async () => {
    const { firm, readLamps, receptacleId } = await onSite();
    const desk = new TestPhone(firm.office, firm.inspection.id);
    expect((await desk.send({ op: 'inspection.set', patch: { yearBuilt: 1950 }, base: {} })).outcome).toBe('applied');
    const decide: Change = {
      op: 'finding.decide',
      id: uuidv7(),
      findingId: 'x',
      decision: 'kept',
      sawReadingIds: [],
    };
    const device: Change = { op: 'receptacle.set', id: receptacleId, patch: { label: 'x' }, base: {} };
    for (const change of [readLamps(uuidv7()), decide, device]) {
      expect([change.op, (await desk.send(change)).outcome]).toEqual([change.op, 'rejected']);
    }
  });

  test('an inspector who does not walk the inspection changes nothing in it', async () => {
    const { firm, readLamps } = await onSite();
    const stranger = new TestPhone(firm.colleague, firm.inspection.id);
    expect(await stranger.send(readLamps(uuidv7()))).toMatchObject({ outcome: 'rejected' });
  });

  test('a cancelled inspection takes nothing until the office takes it up again', async () => {
    const { firm, phone, readLamps } = await onSite();
    expect(await cancelInspection(firm.office, firm.inspection.id, 'Sale fell through')).toEqual({ kind: 'changed' });
    const refused = await phone.send(readLamps(uuidv7()));
    expect(refused).toMatchObject({ outcome: 'rejected', reason: expect.stringContaining('cancelled') });
    await reopenInspection(firm.office, firm.inspection.id);
    expect((await phone.send(readLamps(uuidv7()))).outcome).toBe('applied');
  });

  test('a dismissal needs its reason, and a decision rests on readings of this inspection', async () => {
    const { phone } = await onSite();
    const decide = { op: 'finding.decide', findingId: 'W01', decision: 'dismissed' } as const;
    expect((await phone.send({ ...decide, id: uuidv7(), sawReadingIds: [] })).outcome).toBe('rejected');
    const invented = await phone.send({ ...decide, id: uuidv7(), reason: 'Seen', sawReadingIds: [uuidv7()] });
    expect(invented.outcome).toBe('rejected');
  });

  test('receptacles cannot feed each other in a circle, nor a panel itself', async () => {
    const { phone, areaId, receptacleId } = await onSite();
    const [second, panel, circuit] = [uuidv7(), uuidv7(), uuidv7()];
    const fields = { areaId, fedFromReceptacleId: receptacleId };
    await phone.put({ op: 'receptacle.add', id: second, fields });
    const circle: Change = {
      op: 'receptacle.set',
      id: receptacleId,
      patch: { fedFromReceptacleId: second },
      base: {},
    };
    expect((await phone.send(circle)).outcome).toBe('rejected');
    await phone.put({ op: 'panel.add', id: panel, fields: { name: 'Sub', kind: 'sub' } });
    await phone.put({ op: 'circuit.add', id: circuit, fields: { panelId: panel, breaker: '1' } });
    const loop = await phone.send({ op: 'panel.set', id: panel, patch: { fedFromCircuitId: circuit }, base: {} });
    expect(loop.outcome).toBe('rejected');
    expect((await phone.send({ op: 'circuit.remove', id: circuit, base: {} })).outcome).toBe('applied');
  });

  test('an area comes back with what stood in it', async () => {
    const { phone, areaId, receptacleId } = await onSite();
    await phone.put({ op: 'receptacle.remove', id: receptacleId, base: {} });
    await phone.put({ op: 'area.remove', id: areaId, base: {} });
    await phone.put({ op: 'area.restore', id: areaId });
    await phone.put({ op: 'receptacle.restore', id: receptacleId });
    const state = await phone.see();
    expect([state.areas[0]?.deleted, state.receptacles[0]?.deleted]).toEqual([false, false]);
  });
});
