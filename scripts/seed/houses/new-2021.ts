import type { HousePlan } from '../plan';

/** Washington, 2021: AFCI and GFCI throughout, a detached garage with its own panel; the walk is under way. */
export const newHouse: HousePlan = {
  booking: {
    address: { street: '9 Tidewater Loop', city: 'Fern Harbor', county: 'Skell', state: 'WA', zip: '98599' },
    timeZone: 'America/Los_Angeles',
    stateProfile: 'WA',
    yearBuilt: 2021,
    wiringMethod: 'grounded-cable',
    buyerName: 'Soren Achterberg',
    buyerEmail: 'soren@achterberg.example',
    agentName: 'Leilani Moss',
    agentEmail: 'leilani@tidewater-homes.example',
    occupied: true,
    utilitiesOn: true,
  },
  visit: { days: 0, at: '10:00' },
  codeEdition: { edition: 2017, source: 'Skell County, permit record' },
  serviceAmps: 200,
  upTo: 'on-site',
  panels: [
    {
      name: 'Main',
      kind: 'main',
      place: 'Utility room',
      circuits: [
        { breaker: '2', amps: 15, wireAwg: 14, label: 'Bed 1', protection: 'afci' },
        { breaker: '4', amps: 20, wireAwg: 12, label: 'Kitchen', protection: 'dual-function' },
        { breaker: '6', amps: 20, wireAwg: 12, label: 'Laundry', protection: 'dual-function' },
        { breaker: '8/10', amps: 100, poles: 2, wireAwg: 3, label: 'Garage', protection: 'none' },
      ],
    },
    {
      name: 'Garage',
      kind: 'sub',
      place: 'Detached garage',
      fedFrom: 'Main/8/10',
      circuits: [{ breaker: '1', amps: 20, wireAwg: 12, label: 'Walls', protection: 'none' }],
    },
  ],
  areas: [
    {
      name: 'Detached garage',
      place: 'garage',
      floor: 1,
      points: [
        {
          label: 'left wall',
          device: 'gfci-receptacle',
          marks: ['tamper-resistant'],
          lamps: '110',
          circuit: 'Garage/1',
          gfci: {
            device: 'receptacle',
            button: 'trips',
            faceDead: true,
            tester: 'trips',
            resets: true,
            downstreamDead: true,
            wentDead: ['right wall'],
          },
        },
        {
          label: 'right wall',
          marks: ['tamper-resistant'],
          lamps: '110',
          circuit: 'Garage/1',
          gfci: {
            device: 'downstream',
            button: 'trips',
            faceDead: true,
            tester: 'trips',
            resets: true,
            upstream: 'left wall',
          },
        },
      ],
    },
    {
      name: 'Kitchen',
      place: 'kitchen-counter',
      floor: 1,
      points: [
        {
          label: 'left of sink',
          marks: ['tamper-resistant'],
          lamps: '110',
          circuit: 'Main/4',
          sinkFt: 2,
          gfci: {
            device: 'breaker',
            breakerMarking: 'dual-function',
            button: 'trips',
            faceDead: true,
            tester: 'trips',
            resets: true,
          },
        },
        { label: 'island end', marks: ['tamper-resistant'], lamps: '110', circuit: 'Main/4', sinkFt: 6 },
      ],
    },
    {
      name: 'Bedroom 1',
      place: 'bedroom',
      floor: 2,
      points: [
        {
          label: 'bed, left',
          marks: ['tamper-resistant'],
          lamps: '110',
          circuit: 'Main/2',
          afci: { button: 'no-trip' },
          photo: 'AFCI breaker 2, handle still on after its button',
        },
        { label: 'bed, right', lamps: '110', circuit: 'Main/2' },
        { label: 'desk' },
      ],
    },
  ],
};
