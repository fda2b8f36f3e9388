import type { Role } from './roles';

/** Who asks. Every function of db/ takes one first. */
export type MemberActor = {
  kind: 'member';
  firmId: string;
  userId: string;
  membershipId: string;
  name: string;
  email: string;
  firmName: string;
  roles: Role[];
  /** The firm lets inspectors see each other's drafts. */
  sharedDrafts: boolean;
};
/** A person with a link and no account: sees what the grant names. */
export type RecipientActor = {
  kind: 'recipient';
  firmId: string;
  grantId: string;
  inspectionId: string;
  partyId: string;
  name: string;
};
/** Nobody yet: may only go through the named doors. */
export type VisitorActor = { kind: 'visitor' };
/** A job of the worker, in one firm. */
export type SystemActor = { kind: 'system'; firmId: string; task: string };

export type Actor = MemberActor | RecipientActor | VisitorActor | SystemActor;
export const VISITOR: VisitorActor = { kind: 'visitor' };
