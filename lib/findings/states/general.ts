import { CONFIRM_WITH_REGULATOR, DEFAULT_RETENTION_YEARS, type StateProfile } from './profile';

export const general: StateProfile = {
  code: 'general',
  name: 'Other states',
  agreement: { signedBefore: 'start', note: 'Have it signed before the inspection starts.' },
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
  section: 'No state rule; common practice',
  confirm: CONFIRM_WITH_REGULATOR,
};
