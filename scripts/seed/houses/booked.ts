import type { HousePlan } from '../plan';

const nothing = { areas: [], upTo: 'booked' as const };

/** New York, 1931: booked for tomorrow, nothing walked yet. */
export const bookedTownhouse: HousePlan = {
  ...nothing,
  booking: {
    address: {
      street: '311 Lark Street',
      unit: 'Unit 4',
      city: 'Hollis Ferry',
      county: 'Dunmore',
      state: 'NY',
      zip: '12999',
    },
    timeZone: 'America/New_York',
    stateProfile: 'NY',
    yearBuilt: 1931,
    wiringMethod: 'unknown',
    buyerName: 'Marguerite van den Oosterkamp-Villalobos',
    buyerEmail: 'marguerite@oosterkamp.example',
    agentEmail: '',
    occupied: true,
    utilitiesOn: true,
  },
  visit: { days: 1, at: '08:30' },
};

/** Massachusetts, 1974: booked for next week. */
export const bookedRanch: HousePlan = {
  ...nothing,
  booking: {
    address: { street: '68 Cutter Hill Road', city: 'North Wenlow', county: 'Barrow', state: 'MA', zip: '01999' },
    timeZone: 'America/New_York',
    stateProfile: 'MA',
    yearBuilt: 1974,
    wiringMethod: 'metal-raceway',
    buyerName: 'Teodoro Quill',
    buyerEmail: 'teo@quill.example',
    agentEmail: '',
    occupied: false,
    utilitiesOn: false,
  },
  visit: { days: 6, at: '11:00' },
};
