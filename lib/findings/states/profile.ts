import type { StateProfileCode } from '../vocabulary';

/** Time by which the report is due. Counted in the inspection's own time zone. */
export type ReportDeadline = {
  amount: number;
  unit: 'business-days' | 'days';
  from: 'inspection' | 'payment-or-inspection';
  /** Whether client and inspector may agree otherwise in writing. */
  mayAgreeOtherwise: boolean;
};

/** Rules of one state that the program can keep. Sections and our own words only; a regulator confirms them. */
export type StateProfile = {
  code: StateProfileCode;
  name: string;
  agreement: {
    /** When the signed agreement has to be there. */
    signedBefore: 'start' | 'report' | 'not-stated';
    /** Business days after booking within which it is to be sent. */
    sendWithinBusinessDays?: number;
    note: string;
  };
  /** Absent where the state's rule was not seen to name one. */
  reportDeadline?: ReportDeadline;
  pages: { licenseNumber: boolean; sponsorLicense: boolean; addressOnEachPage: boolean; clientName: boolean };
  summary: { required: boolean; itemParts: string[] };
  /** Receptacles that must all be tested; a representative sample is not enough there. */
  testAll: { nearPlumbingFt?: number; garages: boolean; exterior: boolean };
  absentProtection: {
    /** How the state wants absent GFCI or AFCI protection told. */
    wording: 'recommend' | 'must-recommend' | 'deficient';
    /** Printed with the finding; empty where the state adds nothing. */
    sentence: string;
  };
  consent: { clientConsentToShare: boolean; note: string };
  /** Years that reports and agreements are kept. `stated` is false where the figure is our own default. */
  retention: { years: number; stated: boolean; note: string };
  section: string;
  confirm: string;
};

/** Kept where no state rule was seen: common practice, with legal hold. */
export const DEFAULT_RETENTION_YEARS = 5;
export const CONFIRM_WITH_REGULATOR = 'Confirm with your regulator: rules change, and this is not legal advice.';
