import { createHash } from 'node:crypto';
import { writeFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { v7 as uuidv7 } from 'uuid';
import type { MemberActor } from '@/db/actor';
import type { Role } from '@/db/roles';
import { createFirm } from '@/db/auth';
import { addAdoption, loadFirm, saveFirm } from '@/db/firms';
import { createInspection, findInspection, loadWalk } from '@/db/inspections';
import { acceptInvitation } from '@/db/links';
import { inviteMember, listMembers, saveOwnProfile } from '@/db/people';
import { recordStored } from '@/db/photos';
import { loadFindings } from '@/db/report-findings';
import { releaseReport, reviewInspection } from '@/db/reports';
import { sendReport } from '@/db/grants';
import { applyFromDesk } from '@/db/sync';
import { INVITATION_SECONDS, mintMailedLink } from '@/lib/auth/link-token';
import { hashPassword } from '@/lib/auth/password';
import { DEMO_FIRM_NAME, DEMO_SIGN_INS } from '@/lib/demo';
import { operationSchema, type Operation } from '@/lib/schemas/operations';
import { photoKey } from '@/lib/storage/keys';
import { takeInPhoto } from '@/lib/storage/photo-intake';
import { storage } from '@/lib/storage/storage';
import { bookedRanch, bookedTownhouse } from './seed/houses/booked';
import { newHouse } from './seed/houses/new-2021';
import { sharedNeutralHouse } from './seed/houses/shared-neutrals-1988';
import { twoWireHouse } from './seed/houses/two-wire-1962';
import { drawIllustration } from './seed/illustration';
import { houseOperations, type PlannedPhoto } from './seed/operations';
import type { HousePlan } from './seed/plan';

const HOUSES: HousePlan[] = [sharedNeutralHouse, twoWireHouse, newHouse, bookedTownhouse, bookedRanch];
const DAY_MS = 24 * 60 * 60 * 1000;

/** Loads the invented firm into an empty database, through the same functions that people use. */
export async function seedDemo(): Promise<void> {
  const { owner, inspector } = await seedPeople();
  for (const house of HOUSES) await seedHouse(owner, inspector, house);
}

async function seedPeople(): Promise<{ owner: MemberActor; inspector: MemberActor }> {
  const [dana, priscilla, tomas] = DEMO_SIGN_INS;
  const firm = await createFirm({
    firmName: DEMO_FIRM_NAME,
    timeZone: 'America/New_York',
    stateProfile: 'general',
    name: dana.name,
    email: dana.email,
    passwordHash: await hashPassword(dana.password),
  });
  if (firm.kind !== 'created') throw new Error('the demo firm is there already');
  const base = { kind: 'member' as const, firmId: firm.firmId, firmName: DEMO_FIRM_NAME, sharedDrafts: true };
  const owner: MemberActor = {
    ...base,
    userId: firm.userId,
    membershipId: firm.membershipId,
    name: dana.name,
    email: dana.email,
    roles: ['owner', 'inspector'],
  };
  await saveFirm(owner, {
    ...(await loadFirm(owner)),
    address: { street: '40 Harrow Lane', city: 'Penlow', county: 'Penlow', state: 'NC', zip: '28199' },
    phone: '555-0108',
    email: 'office@harrow-lane.example',
    licenseNumber: 'HI-5508',
    sharedDrafts: true,
  });
  await addAdoption(owner, {
    place: 'Penlow County',
    edition: 2020,
    from: '2021-11-01',
    source: 'Invented for the demo',
  });
  await saveOwnProfile(owner, {
    name: dana.name,
    licenseNumber: '4417',
    licenseState: 'NC',
    licenseExpires: '2028-09-30',
    signatureName: dana.name,
  });
  await join(owner, priscilla, ['office']);
  const membership = await join(owner, tomas, ['inspector']);
  const inspector: MemberActor = { ...base, ...membership, name: tomas.name, email: tomas.email, roles: ['inspector'] };
  await saveOwnProfile(inspector, {
    name: tomas.name,
    licenseNumber: '5550',
    licenseState: 'NC',
    licenseExpires: '2027-06-30',
    signatureName: tomas.name,
  });
  return { owner, inspector };
}

/** Invited and joined, as anybody is. */
async function join(
  owner: MemberActor,
  person: (typeof DEMO_SIGN_INS)[number],
  roles: Role[],
): Promise<{ userId: string; membershipId: string }> {
  const { name, email, password } = person;
  const link = mintMailedLink(email);
  await inviteMember(owner, { name, email, roles }, link, INVITATION_SECONDS);
  await acceptInvitation(link.tokenHash, { name, passwordHash: await hashPassword(password) });
  const member = (await listMembers(owner)).find((one) => one.email === email);
  if (!member) throw new Error(`${email} did not join the demo firm`);
  return member;
}

async function seedHouse(owner: MemberActor, inspector: MemberActor, house: HousePlan): Promise<void> {
  const booked = await createInspection(owner, {
    ...house.booking,
    leadMembershipId: inspector.membershipId,
    scheduledLocal: localDay(house),
  });
  if (booked.kind !== 'created') throw new Error(booked.says);
  const walk = await loadWalk(inspector, booked.inspectionId);
  const structureId = walk?.state.structures[0]?.id;
  if (!walk || !structureId) throw new Error('the booked inspection has no main house');

  const { operations, photos } = houseOperations(house, { structureId, visitId: walk.state.inspection.visitId });
  const apply = applier(inspector, booked.inspectionId, visitStart(house));
  for (const operation of operations) await apply(operation);
  for (const [index, photo] of photos.entries()) await seedPhoto(inspector, apply, photo, index);
  if (house.upTo === 'booked') return;
  await apply({ op: 'inspection.advance', to: 'on-site' });
  if (house.upTo === 'on-site') return;
  await apply({ op: 'inspection.advance', to: 'in-review' });
  if (house.upTo === 'released') await seedRelease(inspector, booked.inspectionId, apply);
}

type Draft = Parameters<ReturnType<typeof applier>>[0];

/** Applies operations one after the other, a minute apart, as on a walk. */
function applier(actor: MemberActor, inspectionId: string, start: Date) {
  let minute = 0;
  return async (draft: object): Promise<void> => {
    const capturedAt = new Date(start.getTime() + 60_000 * minute++).toISOString();
    const operation: Operation = operationSchema.parse({ ...draft, inspectionId, capturedAt });
    const receipt = await applyFromDesk(actor, operation);
    if (receipt.outcome === 'rejected') throw new Error(`${operation.op}: ${receipt.reason}`);
  };
}

async function seedPhoto(
  actor: MemberActor,
  apply: (draft: Draft) => Promise<void>,
  photo: PlannedPhoto,
  index: number,
): Promise<void> {
  const bytes = await drawIllustration(photo.caption, index);
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  const { photoId: id, receptacleId, caption, order } = photo;
  await apply({
    op: 'photo.add',
    id,
    receptacleId,
    sha256,
    bytes: bytes.length,
    type: 'image/jpeg',
    caption: `${caption} (illustration)`,
    order,
  });
  const file = path.join(tmpdir(), `ohmstead-seed-${uuidv7()}.jpg`);
  await writeFile(file, bytes);
  try {
    const taken = await takeInPhoto(file);
    if (taken.kind === 'refused') throw new Error(taken.says);
    await storage().putIfAbsent(photoKey(actor.firmId, id, 'original'), bytes);
    await storage().putIfAbsent(photoKey(actor.firmId, id, '1600'), taken.wide);
    await storage().putIfAbsent(photoKey(actor.firmId, id, '480'), taken.small);
    const hash = (copy: Buffer) => createHash('sha256').update(copy).digest('hex');
    await recordStored(actor, id, {
      sha256,
      width: taken.width,
      height: taken.height,
      sha256Of1600: hash(taken.wide),
      sha256Of480: hash(taken.small),
    });
  } finally {
    await rm(file, { force: true });
  }
}

/** Keeps every finding, settles what is still off, releases, and mails the buyer. */
async function seedRelease(
  actor: MemberActor,
  inspectionId: string,
  apply: (draft: Draft) => Promise<void>,
): Promise<void> {
  const loaded = await loadFindings(actor, inspectionId);
  for (const { finding } of loaded?.findings ?? []) {
    await apply({
      op: 'finding.decide',
      id: uuidv7(),
      findingId: finding.id,
      decision: 'kept',
      sawReadingIds: finding.readingIds,
    });
  }
  const review = await reviewInspection(actor, inspectionId);
  const overrides = Object.fromEntries(
    (review?.lines ?? [])
      .filter((line) => line.overridable)
      .map((line) => [line.code, 'Settled with the buyer on site (demo)']),
  );
  const outcome = await releaseReport(actor, inspectionId, { overrides });
  if (outcome.kind !== 'released') throw new Error(`the demo report was not released: ${JSON.stringify(outcome)}`);
  const inspection = await findInspection(actor, inspectionId);
  const buyer = inspection?.parties.find((party) => party.kind === 'buyer');
  if (buyer) await sendReport(actor, inspectionId, buyer.id, mintMailedLink);
}

/** The day of the visit at the house, as a date-time field gives it. */
function localDay({ visit, booking }: HousePlan): string {
  const day = new Date(Date.now() + visit.days * DAY_MS);
  const date = new Intl.DateTimeFormat('en-CA', { timeZone: booking.timeZone, dateStyle: 'short' }).format(day);
  return `${date}T${visit.at}`;
}

/** Near enough for an invented walk: some hours before now, never in the future. */
function visitStart({ visit }: HousePlan): Date {
  return new Date(Date.now() + Math.min(visit.days, 0) * DAY_MS - 5 * 60 * 60 * 1000);
}
