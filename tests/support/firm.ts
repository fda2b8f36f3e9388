import { v7 as uuidv7 } from 'uuid';
import type { MemberActor } from '@/db/actor';
import { createInspection } from '@/db/inspections';
import { loadWalk } from '@/db/inspections';
import type { Role } from '@/db/roles';
import { applyOperations } from '@/db/sync';
import type { NewInspection } from '@/lib/schemas/inspection';
import type { Operation } from '@/lib/schemas/operations';
import type { Receipt } from '@/lib/schemas/sync';
import type { WalkState } from '@/lib/schemas/walk';
import { asOwner } from './owner';

export type TestFirm = {
  firmId: string;
  /** Owner and inspector at once, as in a one-person firm. */
  actor: MemberActor;
  owner: MemberActor;
  office: MemberActor;
  inspector: MemberActor;
  /** A second inspector, who walks none of the firm's inspections. */
  colleague: MemberActor;
  /** Booked for `inspector`, who leads it. */
  inspection: TestInspection;
};
export type TestInspection = { id: string; number: number; visitId: string; structureId: string };

/** A firm of its own with four people and one booked inspection; nothing is cleaned up, so tests run in parallel. */
export async function createFirm(name = 'Test Firm'): Promise<TestFirm> {
  const firmId = uuidv7();
  await asOwner('insert into firms (id, name) values ($1, $2)', [firmId, name]);
  const firm = { firmId, firmName: name };
  const actor = await createMember(firm, 'Olive Ames', ['owner', 'inspector']);
  const owner = await createMember(firm, 'Owen Pratt', ['owner']);
  const office = await createMember(firm, 'Opal Reyes', ['office']);
  const inspector = await createMember(firm, 'Ines Cole', ['inspector']);
  const colleague = await createMember(firm, 'Cody Marsh', ['inspector']);
  const inspection = await bookInspection(office, { leadMembershipId: inspector.membershipId });
  return { firmId, actor, owner, office, inspector, colleague, inspection };
}

export async function createMember(
  firm: { firmId: string; firmName: string },
  name: string,
  roles: Role[],
): Promise<MemberActor> {
  const [userId, membershipId] = [uuidv7(), uuidv7()];
  const email = `${userId}@people.example`;
  await asOwner('insert into users (id, email, name) values ($1, $2, $3)', [userId, email, name]);
  await asOwner('insert into memberships (firm_id, id, user_id, roles) values ($1, $2, $3, $4::role[])', [
    firm.firmId,
    membershipId,
    userId,
    `{${roles.join(',')}}`,
  ]);
  return { kind: 'member', ...firm, userId, membershipId, name, email, roles, sharedDrafts: false };
}

export async function bookInspection(
  actor: MemberActor,
  input: Partial<NewInspection> & Pick<NewInspection, 'leadMembershipId'>,
): Promise<TestInspection> {
  const outcome = await createInspection(actor, {
    address: { street: '41 Juniper Way', city: 'Fairview', state: 'OR', zip: '97000' },
    timeZone: 'America/Los_Angeles',
    stateProfile: 'general',
    scheduledLocal: '2026-05-04T09:30',
    wiringMethod: 'unknown',
    buyerName: 'Bea Winter',
    buyerEmail: 'bea@mail.example',
    agentEmail: '',
    ...input,
  });
  if (outcome.kind !== 'created') throw new Error(outcome.says);
  const state = await walk({ ...actor, roles: ['owner'] }, outcome.inspectionId);
  const [structure] = state.structures;
  if (!structure) throw new Error('the new inspection has no structure');
  return {
    id: outcome.inspectionId,
    number: outcome.number,
    visitId: state.inspection.visitId,
    structureId: structure.id,
  };
}

export async function walk(actor: MemberActor, inspectionId: string): Promise<WalkState> {
  const answer = await loadWalk(actor, inspectionId);
  if (!answer) throw new Error('the inspection is not visible to this actor');
  return answer.state;
}

/** An operation as a phone writes it, without what every one carries. */
export type Change = DistributiveOmit<Operation, 'inspectionId' | 'capturedAt'>;
type DistributiveOmit<Union, Key extends PropertyKey> = Union extends unknown ? Omit<Union, Key> : never;

/** A phone: it numbers its operations and sends them one by one. */
export class TestPhone {
  readonly clientId = uuidv7();
  sent = 0;

  constructor(
    readonly actor: MemberActor,
    readonly inspectionId: string,
  ) {}

  operation(change: Change): unknown {
    return { inspectionId: this.inspectionId, capturedAt: '2026-05-04T17:00:00.000Z', ...change };
  }

  async send(change: Change): Promise<Receipt> {
    const operations = [{ n: ++this.sent, operation: this.operation(change) }];
    const answer = await applyOperations(this.actor, { format: 1, clientId: this.clientId, operations });
    const [receipt] = answer.receipts;
    if (!receipt) throw new Error(`no receipt: the server waits for ${answer.gap?.expected}`);
    return receipt;
  }

  /** Sends what must be taken, and says why when it was not. */
  async put(change: Change): Promise<Receipt> {
    const receipt = await this.send(change);
    if (receipt.outcome === 'rejected') throw new Error(`${change.op}: ${receipt.reason}`);
    return receipt;
  }

  async see(): Promise<WalkState> {
    return walk(this.actor, this.inspectionId);
  }
}

/** An area with one receptacle, made by a phone. */
export async function logReceptacle(phone: TestPhone, structureId: string) {
  const [areaId, receptacleId] = [uuidv7(), uuidv7()];
  await phone.put({ op: 'area.add', id: areaId, fields: { structureId, name: 'Kitchen', place: 'kitchen-counter' } });
  await phone.put({ op: 'receptacle.add', id: receptacleId, fields: { areaId, label: 'Left of sink' } });
  return { areaId, receptacleId };
}
