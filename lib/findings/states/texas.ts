import { CONFIRM_WITH_REGULATOR, DEFAULT_RETENTION_YEARS, type StateProfile } from './profile';

export const texas: StateProfile = {
  code: 'TX',
  name: 'Texas',
  agreement: { signedBefore: 'not-stated', note: 'Another report date needs an agreement in writing.' },
  reportDeadline: { amount: 2, unit: 'days', from: 'payment-or-inspection', mayAgreeOtherwise: true },
  pages: { licenseNumber: true, sponsorLicense: true, addressOnEachPage: true, clientName: true },
  summary: { required: false, itemParts: [] },
  testAll: { garages: false, exterior: false },
  absentProtection: {
    wording: 'deficient',
    sentence: 'Texas inspectors mark this Deficient whatever the age of the house.',
  },
  consent: { clientConsentToShare: true, note: 'Share with others only after the client agrees.' },
  retention: {
    years: DEFAULT_RETENTION_YEARS,
    stated: false,
    note: 'No figure was seen; five years is kept by default.',
  },
  section: '22 TAC 535.222 and 535.229',
  confirm: CONFIRM_WITH_REGULATOR,
};
