import { v7 as uuidv7 } from 'uuid';
import type { Actor, MemberActor } from '@/db/actor';
import { listAudit, verifyAuditChain } from '@/db/audit';
import { listOwnFirms } from '@/db/auth';
import { assignInspectors, cancelInspection, changeBooking, reopenInspection } from '@/db/bookings';
import { listConflicts, resolveConflict } from '@/db/conflicts';
import { addAdoption, listAdoptions, loadFirm, removeAdoption, saveFirm, saveLogo } from '@/db/firms';
import { createInspection, findInspection, listInspections, loadInspectionFacts, loadWalk } from '@/db/inspections';
import { listParties, removeParty, saveParty } from '@/db/parties';
import * as people from '@/db/people';
import { findPhoto, listPhotos, recordRefused, recordStored } from '@/db/photos';
import { applyFromDesk, applyOperations } from '@/db/sync';
import { listGrants, revokeGrant, sendReport } from '@/db/grants';
import { findReportFile, retryRender } from '@/db/report-files';
import { loadFindings } from '@/db/report-findings';
import { findNewestVersion, findVersion, listVersions, releaseReport, reviewInspection } from '@/db/reports';
import { inspectionFilterSchema } from '@/lib/schemas/inspection';
import type { Operation } from '@/lib/schemas/operations';

/** Ids in one firm that another firm has no business with. */
export type Target = {
  inspectionId: string;
  areaId: string;
  receptacleId: string;
  photoId: string;
  photoSha256: string;
  conflictId: string;
  partyId: string;
  membershipId: string;
  invitedId: string;
  adoptionId: string;
  /** Of another inspection of that firm, which is released. */
  releasedId: string;
  versionId: string;
  grantId: string;
};

/** How a function of db/ refuses a stranger. */
export type Entry =
  /** Answers about another firm's row as about one that is not there. `own` is false where it answers all alike. */
  | { asks: (actor: MemberActor, of: Target) => Promise<unknown>; own?: false }
  /** Takes no id: what it answers a stranger names nothing of the firm. */
  | { firmOf: (actor: MemberActor) => Promise<unknown> }
  /** Reaches no row of a firm by itself. */
  | { because: string };

const INSIDE = 'Runs inside the transaction of one of the others, under its row security.';
const DOOR = 'A door before sign-in: tests/db/auth.test.ts tries it with wrong, used and foreign secrets.';
const JOB = 'A job of the worker: its actor is in one firm, and row security shows it no other.';
const WORDS = 'Works on values, not on rows.';
const JUST_OWN = 'Takes the acting person from the actor and no id.';

const address = { street: '1 Oak St', city: 'Salem', state: 'OR', zip: '97000' };
const booking = {
  address,
  scheduledLocal: '2026-05-04T09:30',
  timeZone: 'America/Los_Angeles',
  stateProfile: 'general' as const,
};
const person = { kind: 'agent' as const, name: 'Zed', email: null, phone: null };
const settings = {
  name: 'Renamed',
  address: null,
  phone: null,
  email: null,
  licenseNumber: null,
  timeZone: 'UTC',
  stateProfile: 'general' as const,
  sharedDrafts: false,
};
const link = { tokenHash: Buffer.from('t'), codeHash: Buffer.from('c'), address: 'https://x.example', code: '1' };
const mint = () => ({ ...link, tokenHash: Buffer.from(uuidv7()), codeHash: Buffer.from(uuidv7()) });
const stored = { width: 1, height: 1, sha256Of1600: 'c'.repeat(64), sha256Of480: 'd'.repeat(64) };

function edit(of: Target): Operation {
  const capturedAt = '2026-05-04T17:00:00.000Z';
  const { inspectionId, areaId } = of;
  return { op: 'area.set', inspectionId, capturedAt, id: areaId, patch: { name: 'Theirs' }, base: {} };
}

export const ENTRIES: Record<string, Entry> = {
  'audit.recordAudit': { because: INSIDE },
  'audit.listAudit': { asks: (actor, of) => listAudit(actor, of.inspectionId) },
  'audit.verifyAuditChain': { firmOf: verifyAuditChain },
  'auth.findAccount': { because: DOOR },
  'auth.takeAttempt': { because: DOOR },
  'auth.clearAttempts': { because: DOOR },
  'auth.giveBackAttempt': { because: DOOR },
  'auth.openSession': { because: DOOR },
  'auth.findSessionMember': { because: DOOR },
  'auth.endSession': { because: DOOR },
  'auth.endOwnSessions': { because: JUST_OWN },
  'auth.changeOwnPassword': { because: JUST_OWN },
  'auth.createFirm': { because: DOOR },
  'auth.sweepSignIn': { because: 'Names no row: it deletes what ended two days to two months ago.' },
  'auth.listOwnFirms': { firmOf: listOwnFirms },
  'booking-rules.isTimeZone': { because: WORDS },
  'booking-rules.isWallTime': { because: WORDS },
  'booking-rules.inspects': { because: INSIDE },
  'bookings.assignInspectors': {
    asks: (actor, of) => assignInspectors(actor, of.inspectionId, { lead: actor.membershipId, others: [] }),
  },
  'bookings.cancelInspection': { asks: (actor, of) => cancelInspection(actor, of.inspectionId, 'x') },
  'bookings.reopenInspection': { asks: (actor, of) => reopenInspection(actor, of.inspectionId) },
  'bookings.changeBooking': { asks: (actor, of) => changeBooking(actor, of.inspectionId, booking) },
  'client.database': { because: 'The pool itself: row security shows it nothing without an actor, see rls.test.ts.' },
  'client.closeDatabase': { because: WORDS },
  'conflicts.listConflicts': { asks: (actor, of) => listConflicts(actor, of.inspectionId) },
  'conflicts.resolveConflict': { asks: (actor, of) => resolveConflict(actor, of.conflictId, 'yours') },
  'firms.loadFirm': { firmOf: loadFirm },
  'firms.saveFirm': { firmOf: (actor) => saveFirm(actor, settings) },
  'firms.saveLogo': { firmOf: (actor) => saveLogo(actor, null) },
  'firms.listAdoptions': { firmOf: listAdoptions },
  'firms.addAdoption': {
    firmOf: (actor) => addAdoption(actor, { place: 'x', edition: 2020, from: '2021-01-01', source: 'x' }),
  },
  'firms.removeAdoption': { asks: (actor, of) => removeAdoption(actor, of.adoptionId), own: false },
  'grants.sendReport': { asks: (actor, of) => sendReport(actor, of.inspectionId, of.partyId, mint) },
  'grants.listGrants': { asks: (actor, of) => listGrants(actor, of.releasedId) },
  'grants.revokeGrant': { asks: (actor, of) => revokeGrant(actor, of.grantId) },
  'grants.findGrantBySecret': { because: 'A door: the hash of a mailed secret alone finds it.' },
  'grants.findOpenGrant': { because: 'A door: the caller compares the cookie with the hash it answers.' },
  'grants.recordOpening': { because: JUST_OWN },
  'grants.replaceExpiredGrant': { because: 'A door: the hash of a mailed secret alone finds it.' },
  'health.checkHealth': { because: 'Counts no row of a firm.' },
  'inspection-list.readCursor': { because: WORDS },
  'inspection-list.writeCursor': { because: WORDS },
  'inspection-list.listRows': { because: INSIDE },
  'inspections.createInspection': {
    asks: (actor, of) =>
      createInspection(actor, {
        ...booking,
        leadMembershipId: of.membershipId,
        wiringMethod: 'unknown',
        buyerName: 'B',
        buyerEmail: '',
        agentEmail: '',
      }),
  },
  'inspections.listInspections': { firmOf: (actor) => listInspections(actor, inspectionFilterSchema.parse({})) },
  'inspections.findInspection': { asks: (actor, of) => findInspection(actor, of.inspectionId) },
  'inspections.loadWalk': { asks: (actor, of) => loadWalk(actor, of.inspectionId) },
  'inspections.loadInspectionFacts': { asks: (actor, of) => loadInspectionFacts(actor, of.inspectionId) },
  'jobs.enqueueJob': { because: INSIDE },
  'links.findLink': { because: DOOR },
  'links.requestLink': { because: DOOR },
  'links.replaceExpiredLink': { because: DOOR },
  'links.resetPassword': { because: DOOR },
  'links.redeemSignInLink': { because: DOOR },
  'links.acceptInvitation': { because: DOOR },
  'links.enqueueLinkMail': { because: INSIDE },
  'messages.beginSending': { because: JOB },
  'messages.recordSent': { because: JOB },
  'messages.recordSendFailure': { because: JOB },
  'operations.applyOperation': { because: INSIDE },
  'parties.listParties': { asks: (actor, of) => listParties(actor, of.inspectionId) },
  'parties.saveParty': { asks: (actor, of) => saveParty(actor, of.inspectionId, { ...person, id: of.partyId }) },
  'parties.removeParty': { asks: (actor, of) => removeParty(actor, of.inspectionId, of.partyId) },
  'query-error.withoutValues': { because: WORDS },
  'people.listMembers': { firmOf: people.listMembers },
  'people.loadOwnMember': { firmOf: people.loadOwnMember },
  'people.inviteMember': {
    firmOf: (actor) =>
      people.inviteMember(actor, { email: `${uuidv7()}@x.example`, name: 'X', roles: ['office'] }, mint(), 60),
  },
  'people.renewInvitation': { asks: (actor, of) => people.renewInvitation(actor, of.invitedId, mint, 60) },
  'people.setMemberRoles': { asks: (actor, of) => people.setMemberRoles(actor, of.membershipId, ['office']) },
  'people.setMemberDisabled': { asks: (actor, of) => people.setMemberDisabled(actor, of.membershipId, true) },
  'people.signOutMember': { asks: (actor, of) => people.signOutMember(actor, of.membershipId) },
  'people.saveOwnProfile': { because: JUST_OWN },
  'people.saveOwnSignature': { because: JUST_OWN },
  'photos.findPhoto': { asks: (actor, of) => findPhoto(actor, of.photoId) },
  'photos.listPhotos': { asks: (actor, of) => listPhotos(actor, of.inspectionId) },
  'photos.recordStored': {
    asks: (actor, of) => recordStored(actor, of.photoId, { ...stored, sha256: of.photoSha256 }),
  },
  'photos.recordRefused': { asks: (actor, of) => recordRefused(actor, of.photoId, 'x') },
  'report-files.findReportFile': { asks: (actor, of) => findReportFile(actor, of.versionId, 'en') },
  'report-files.beginRender': { because: JOB },
  'report-files.recordReportFile': { because: JOB },
  'report-files.recordRenderFailure': { because: JOB },
  'report-files.retryRender': { asks: (actor, of) => retryRender(actor, of.versionId) },
  'report-findings.loadFindings': { asks: (actor, of) => loadFindings(actor, of.inspectionId) },
  'reports.reviewInspection': { asks: (actor, of) => reviewInspection(actor, of.inspectionId) },
  'reports.releaseReport': { asks: (actor, of) => releaseReport(actor, of.inspectionId) },
  'reports.enqueueRender': { because: INSIDE },
  'reports.listVersions': { asks: (actor, of) => listVersions(actor, of.releasedId) },
  'reports.findVersion': { asks: (actor, of) => findVersion(actor, of.versionId) },
  'reports.findNewestVersion': { asks: (actor, of) => findNewestVersion(actor, of.releasedId) },
  'report-findings.decideFindings': { because: WORDS },
  'report-log.reportLog': { because: WORDS },
  'report-review.reviewSources': { because: WORDS },
  'report-snapshot.buildSnapshot': { because: WORDS },
  'report-sources.loadReportSources': { because: INSIDE },
  'scope.inspectionsVisibleTo': { because: WORDS },
  'scope.holds': { because: WORDS },
  'scope.seesAll': { because: WORDS },
  'scope.walkedBy': { because: WORDS },
  'search-words.searchWords': { because: WORDS },
  'search-words.searchQuery': { because: WORDS },
  'search-words.searchText': { because: WORDS },
  'storable.storable': { because: WORDS },
  'storable.keepable': { because: WORDS },
  'sync.applyOperations': {
    asks: (actor, of) =>
      applyOperations(actor, { format: 1, clientId: uuidv7(), operations: [{ n: 1, operation: edit(of) }] }),
  },
  'sync.applyFromDesk': {
    asks: async (actor, of) => ({ ...(await applyFromDesk(actor, edit(of))), n: 0 }),
  },
  'walk-rows.walkState': { because: INSIDE },
  'walk-rows.openConflicts': { because: INSIDE },
  'walk-rows.memberNames': { because: INSIDE },
  'walk-rows.addressLine': { because: WORDS },
  'with-actor.withActor': { because: 'Sets the actor; rls.test.ts tries it.' },
};

/** What a recipient of another inspection may ask for, with the same answer as for what is not there. */
export const RECIPIENT_ENTRIES: Record<string, (actor: Actor, of: Target) => Promise<unknown>> = {
  'inspections.findInspection': (actor, of) => findInspection(actor, of.inspectionId),
  'photos.findPhoto': (actor, of) => findPhoto(actor, of.photoId),
  'audit.listAudit': (actor, of) => listAudit(actor, of.inspectionId),
  'reports.listVersions': (actor, of) => listVersions(actor, of.releasedId),
  'reports.findVersion': (actor, of) => findVersion(actor, of.versionId),
  'reports.findNewestVersion': (actor, of) => findNewestVersion(actor, of.releasedId),
  'report-files.findReportFile': (actor, of) => findReportFile(actor, of.versionId, 'en'),
};
