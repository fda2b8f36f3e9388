import { CONFIRM_WITH_REGULATOR, DEFAULT_RETENTION_YEARS, type StateProfile } from './profile';

export const massachusetts: StateProfile = {
  code: 'MA',
  name: 'Massachusetts',
  agreement: { signedBefore: 'start', note: 'Have it signed before the inspection starts.' },
  pages: { licenseNumber: true, sponsorLicense: false, addressOnEachPage: false, clientName: true },
  summary: { required: false, itemParts: [] },
  testAll: { garages: false, exterior: false },
  absentProtection: { wording: 'recommend', sentence: '' },
  consent: {
    clientConsentToShare: true,
    note: 'The written report is confidential and goes to the client only.',
  },
  retention: {
    years: DEFAULT_RETENTION_YEARS,
    stated: false,
    note: 'No figure was seen; five years is kept by default.',
  },
  section: '266 CMR 6.01',
  confirm: CONFIRM_WITH_REGULATOR,
};
