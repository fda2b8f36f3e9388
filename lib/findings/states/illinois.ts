import { CONFIRM_WITH_REGULATOR, type StateProfile } from './profile';

export const illinois: StateProfile = {
  code: 'IL',
  name: 'Illinois',
  agreement: { signedBefore: 'start', note: 'Have it signed before the inspection starts.' },
  pages: { licenseNumber: true, sponsorLicense: false, addressOnEachPage: false, clientName: true },
  summary: { required: false, itemParts: [] },
  testAll: { garages: false, exterior: false },
  absentProtection: { wording: 'recommend', sentence: '' },
  consent: { clientConsentToShare: true, note: 'Share with others only after the client agrees.' },
  retention: {
    years: 5,
    stated: true,
    note: 'Contract, report, supplements and data: five years, or two years after the final disposition of a dispute.',
  },
  section: '68 Ill. Adm. Code 1410.240',
  confirm: CONFIRM_WITH_REGULATOR,
};
