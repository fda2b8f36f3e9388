import { v7 as uuidv7 } from 'uuid';
import { reviewInspection } from '@/db/reports';
import { createFirm, TestPhone, type Change, type TestFirm } from './firm';
import { asOwner } from './owner';

export type ReadyFirm = { firm: TestFirm; phone: TestPhone; areaId: string; receptacleId: string };

/** An inspection of two receptacles, one of them without a ground, with every finding kept: nothing holds its release. */
export async function readyToRelease(): Promise<ReadyFirm> {
  const firm = await createFirm('Harrow Lane Home Inspection');
  await sign(firm, 'Ines Cole');
  const phone = new TestPhone(firm.inspector, firm.inspection.id);
  const areaId = uuidv7();
  await phone.put({
    op: 'area.add',
    id: areaId,
    fields: { structureId: firm.inspection.structureId, name: 'Living room', place: 'living-room' },
  });
  const receptacleId = await addReceptacle({ firm, phone, areaId }, 'by the door', 'off');
  await addReceptacle({ firm, phone, areaId }, 'by the window', 'lit');
  const ready = { firm, phone, areaId, receptacleId };
  await keepAll(ready);
  return ready;
}

export async function sign(firm: TestFirm, name: string): Promise<void> {
  await asOwner('update memberships set signature_name = $3, license_number = $4 where firm_id = $1 and id = $2', [
    firm.firmId,
    firm.inspector.membershipId,
    name,
    '5550',
  ]);
}

export async function addReceptacle(
  { firm, phone, areaId }: Pick<ReadyFirm, 'firm' | 'phone' | 'areaId'>,
  label: string,
  ground: 'lit' | 'off' | 'unread',
): Promise<string> {
  const receptacleId = uuidv7();
  await phone.put({ op: 'receptacle.add', id: receptacleId, fields: { areaId, label } });
  if (ground !== 'unread') await phone.put(lampsAt(firm, receptacleId, ground));
  return receptacleId;
}

export function lampsAt(firm: TestFirm, receptacleId: string, ground: 'lit' | 'off'): Change {
  return {
    op: 'reading.add',
    id: uuidv7(),
    visitId: firm.inspection.visitId,
    receptacleId,
    reading: { kind: 'wiring', evidence: { lamps: { hn: 'lit', hg: ground, ng: 'off' } } },
  };
}

/** Keeps every finding as the evidence stands now. */
export async function keepAll({ firm, phone }: Pick<ReadyFirm, 'firm' | 'phone'>): Promise<void> {
  const review = await reviewInspection(firm.inspector, firm.inspection.id);
  const open = review?.lines.filter((line) => line.code === 'undecided' || line.code === 'changed') ?? [];
  const seen = review?.findings ?? [];
  for (const line of open) {
    const finding = seen.find((row) => row.finding.id === line.at);
    if (!finding) throw new Error(`no finding ${line.at}`);
    await phone.put({
      op: 'finding.decide',
      id: uuidv7(),
      findingId: finding.finding.id,
      decision: 'kept',
      sawReadingIds: finding.finding.readingIds,
    });
  }
}
