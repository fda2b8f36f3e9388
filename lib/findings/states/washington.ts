import { CONFIRM_WITH_REGULATOR, DEFAULT_RETENTION_YEARS, type StateProfile } from './profile';

export const washington: StateProfile = {
  code: 'WA',
  name: 'Washington',
  agreement: {
    signedBefore: 'start',
    note: 'Conflicts of interest are told in writing before the agreement. No paid repair for one year.',
  },
  pages: { licenseNumber: true, sponsorLicense: false, addressOnEachPage: false, clientName: true },
  summary: { required: false, itemParts: [] },
  testAll: { garages: false, exterior: false },
  absentProtection: {
    wording: 'must-recommend',
    sentence: 'Washington inspectors list this by place and advise adding the protection.',
  },
  consent: { clientConsentToShare: true, note: 'Share with others only after the client agrees.' },
  retention: {
    years: DEFAULT_RETENTION_YEARS,
    stated: false,
    note: 'No figure was seen; five years is kept by default.',
  },
  section: 'WAC 308-408C-020 and 308-408C-110',
  confirm: CONFIRM_WITH_REGULATOR,
};
