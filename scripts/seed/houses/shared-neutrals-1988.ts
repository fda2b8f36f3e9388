import type { HousePlan } from '../plan';

/** Texas, 1988: grounded cable, a shared neutral in trouble, one GFCI in the garage that feeds the baths. */
export const sharedNeutralHouse: HousePlan = {
  booking: {
    address: { street: '1408 Saddler Court', city: 'Mesa Bluff', county: 'Corran', state: 'TX', zip: '79099' },
    timeZone: 'America/Chicago',
    stateProfile: 'TX',
    yearBuilt: 1988,
    wiringMethod: 'grounded-cable',
    buyerName: 'Nguyễn Thu Hà',
    buyerEmail: 'ha.nguyen@riverlark.example',
    buyerPhone: '555-0171',
    agentName: 'Bettina Łoś',
    agentEmail: 'bettina@sagebrush-homes.example',
    occupied: false,
    utilitiesOn: true,
  },
  visit: { days: -3, at: '13:30' },
  codeEdition: { edition: 1987, source: 'City of Mesa Bluff, building desk, by phone' },
  serviceAmps: 150,
  upTo: 'released',
  panels: [
    {
      name: 'Main',
      kind: 'main',
      place: 'Garage, east wall',
      circuits: [
        { breaker: '1', amps: 20, wireAwg: 12, label: 'Kitchen L', protection: 'none', sharedNeutral: 'yes' },
        { breaker: '3', amps: 20, wireAwg: 12, label: 'Kitchen R', protection: 'none', sharedNeutral: 'yes' },
        { breaker: '5', amps: 15, wireAwg: 14, label: 'Garage, baths', protection: 'none' },
        { breaker: '7', amps: 15, wireAwg: 14, label: 'Bed 1, 2', protection: 'none' },
        { breaker: '10/12', amps: 60, poles: 2, wireAwg: 6, label: 'Shop', protection: 'none' },
      ],
    },
    {
      name: 'Shop',
      kind: 'sub',
      place: 'Shop, by the door',
      fedFrom: 'Main/10/12',
      circuits: [{ breaker: '1', amps: 20, wireAwg: 12, label: 'Bench', protection: 'gfci' }],
    },
  ],
  areas: [
    {
      name: 'Garage',
      place: 'garage',
      floor: 1,
      points: [
        {
          label: 'by the door',
          device: 'gfci-receptacle',
          lamps: '110',
          circuit: 'Main/5',
          gfci: {
            device: 'receptacle',
            button: 'trips',
            faceDead: true,
            tester: 'trips',
            resets: true,
            downstreamDead: true,
            wentDead: ['basin'],
          },
          photo: 'GFCI by the garage door, tripped',
        },
        {
          label: 'freezer',
          lamps: '110',
          circuit: 'Main/5',
          doNotTrip: 'freezer',
          gfci: { device: 'downstream', notTestedReason: 'Feeds the freezer' },
        },
      ],
    },
    {
      name: 'Kitchen',
      place: 'kitchen-counter',
      floor: 1,
      points: [
        {
          label: 'range side',
          lamps: '111',
          circuit: 'Main/1',
          volts: { hn: 231, hg: 120.4, ng: 110.7, meter: 'low-impedance' },
          told: { whom: 'Buyer, by phone', note: 'Breakers 1 and 3 off' },
          photo: 'Meter at the counter, over 230 volts',
        },
        {
          label: 'island',
          lamps: '110',
          circuit: 'Main/3',
          sinkFt: 5,
          load: { amps: 12, noLoadHn: 121.4, loadedHn: 108, noLoadNg: 0.1, loadedNg: 6.2 },
        },
        {
          label: 'left of sink',
          device: 'gfci-receptacle',
          lamps: '110',
          circuit: 'Main/3',
          sinkFt: 1,
          gfci: { device: 'receptacle', button: 'trips', faceDead: true, tester: 'no-trip', resets: true },
        },
      ],
    },
    {
      name: 'Bath 1',
      place: 'bathroom',
      floor: 1,
      points: [
        {
          label: 'basin',
          lamps: '110',
          circuit: 'Main/5',
          sinkFt: 1,
          gfci: {
            device: 'downstream',
            button: 'trips',
            faceDead: true,
            tester: 'trips',
            resets: true,
            upstream: 'by the door',
          },
        },
      ],
    },
    {
      name: 'Bedroom 1',
      place: 'bedroom',
      floor: 2,
      points: [
        {
          label: 'window',
          lamps: '010',
          circuit: 'Main/7',
          volts: { hn: 0, hg: 120.8, ng: 0, meter: 'low-impedance' },
        },
        { label: 'closet wall', lamps: '110', circuit: 'Main/7' },
        {
          label: 'bed',
          lamps: '110',
          circuit: 'Main/7',
          signs: ['scorched'],
          told: { whom: 'Buyer, by phone', note: 'Tagged, breaker 7 off' },
          photo: 'Brown mark beside the left slot',
        },
      ],
    },
    {
      name: 'Shop',
      place: 'accessory-building',
      floor: 1,
      points: [
        {
          label: 'bench',
          lamps: '110',
          circuit: 'Shop/1',
          gfci: { device: 'breaker', breakerMarking: 'class-a-gfci', button: 'trips', faceDead: true, resets: true },
        },
        { label: 'compressor', pattern: '6-20R', skip: { reason: 'in-use', note: 'Compressor plugged in' } },
      ],
    },
    {
      name: 'Outside',
      place: 'outdoors',
      floor: 1,
      gradeAccess: true,
      points: [
        {
          label: 'back door',
          lamps: '110',
          cover: 'flap',
          circuit: 'Main/5',
          gfci: { device: 'downstream', button: 'trips', faceDead: true, resets: true, upstream: 'by the door' },
        },
      ],
    },
  ],
};
