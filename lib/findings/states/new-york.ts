import { CONFIRM_WITH_REGULATOR, DEFAULT_RETENTION_YEARS, type StateProfile } from './profile';

export const newYork: StateProfile = {
  code: 'NY',
  name: 'New York',
  agreement: {
    signedBefore: 'start',
    note: 'A written agreement with a set clause in at least 6-point type comes before the inspection.',
  },
  reportDeadline: { amount: 5, unit: 'business-days', from: 'inspection', mayAgreeOtherwise: false },
  pages: { licenseNumber: true, sponsorLicense: false, addressOnEachPage: false, clientName: true },
  summary: { required: false, itemParts: [] },
  testAll: { garages: false, exterior: false },
  absentProtection: { wording: 'recommend', sentence: '' },
  consent: {
    clientConsentToShare: true,
    note: 'Confidential unless the client expressly consents.',
  },
  retention: {
    years: DEFAULT_RETENTION_YEARS,
    stated: false,
    note: 'No figure was seen; five years is kept by default.',
  },
  section: 'Real Property Law 444-g; 19 NYCRR 197-4.2 and 197-4.3',
  confirm: CONFIRM_WITH_REGULATOR,
};
