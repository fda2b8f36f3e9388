import { CONFIRM_WITH_REGULATOR, DEFAULT_RETENTION_YEARS, type StateProfile } from './profile';

export const northCarolina: StateProfile = {
  code: 'NC',
  name: 'North Carolina',
  agreement: { signedBefore: 'start', note: 'A signed contract comes before the inspection.' },
  pages: { licenseNumber: true, sponsorLicense: false, addressOnEachPage: false, clientName: true },
  summary: {
    required: true,
    itemParts: ['what it is', 'how it is defective', 'what follows from it', 'what to do'],
  },
  testAll: { nearPlumbingFt: 6, garages: true, exterior: true },
  absentProtection: { wording: 'recommend', sentence: '' },
  consent: { clientConsentToShare: true, note: 'Share with others only after the client agrees.' },
  retention: {
    years: DEFAULT_RETENTION_YEARS,
    stated: false,
    note: 'No figure was seen; five years is kept by default.',
  },
  section: '21 NCAC 08 .1103 and .1110',
  confirm: CONFIRM_WITH_REGULATOR,
};
