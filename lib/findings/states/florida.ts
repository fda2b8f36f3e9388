import { CONFIRM_WITH_REGULATOR, DEFAULT_RETENTION_YEARS, type StateProfile } from './profile';

export const florida: StateProfile = {
  code: 'FL',
  name: 'Florida',
  agreement: { signedBefore: 'not-stated', note: 'No time was seen; have it signed before the start.' },
  pages: { licenseNumber: true, sponsorLicense: false, addressOnEachPage: false, clientName: true },
  summary: { required: false, itemParts: [] },
  testAll: { garages: false, exterior: false },
  absentProtection: { wording: 'recommend', sentence: '' },
  consent: { clientConsentToShare: true, note: 'Share with others only after the client agrees.' },
  retention: {
    years: DEFAULT_RETENTION_YEARS,
    stated: false,
    note: 'No figure was seen; five years is kept by default.',
  },
  section: 'Rule 61-30.801, F.A.C.',
  confirm: CONFIRM_WITH_REGULATOR,
};
