import { CONFIRM_WITH_REGULATOR, type StateProfile } from './profile';

export const newJersey: StateProfile = {
  code: 'NJ',
  name: 'New Jersey',
  agreement: {
    signedBefore: 'start',
    sendWithinBusinessDays: 1,
    note: 'Sent within one business day after booking, and signed before the start.',
  },
  pages: { licenseNumber: true, sponsorLicense: false, addressOnEachPage: false, clientName: true },
  summary: { required: false, itemParts: [] },
  testAll: { garages: false, exterior: false },
  absentProtection: { wording: 'recommend', sentence: '' },
  consent: { clientConsentToShare: true, note: 'Share with others only after the client agrees.' },
  retention: { years: 5, stated: true, note: 'Agreements are kept five years.' },
  section: 'N.J.A.C. 13:40-15.15',
  confirm: CONFIRM_WITH_REGULATOR,
};
