import type { InspectionFacts } from '@/lib/findings/facts';
import { area, circuit, emptyHouse, lamps, notice, read, readings, receptacle } from './facts';

/** The twelve receptacles of a house of 1962 with two-wire cable. */
export function houseOf1962(): InspectionFacts {
  return emptyHouse({
    inspection: {
      id: 'inspection-1962',
      yearBuilt: 1962,
      wiringMethod: 'two-wire',
      codeEdition: 1959,
      stateProfile: 'NY',
    },
    areas: [
      area({ id: 'living', name: 'Living room', order: 1 }),
      area({ id: 'kitchen', name: 'Kitchen', place: 'kitchen-counter', order: 2 }),
      area({ id: 'bath', name: 'Bathroom', place: 'bathroom', order: 3 }),
      area({ id: 'bed', name: 'Bedroom', place: 'bedroom', order: 4 }),
      area({ id: 'garage', name: 'Garage', place: 'garage', order: 5 }),
    ],
    circuits: [circuit({ id: 'c1', breaker: '3' }), circuit({ id: 'c2', breaker: '9', amps: 20 })],
    receptacles: [
      receptacle({ id: 'sofa', label: 'by the sofa', order: 1, circuitId: 'c1' }),
      receptacle({ id: 'window', label: 'under the window', order: 2, circuitId: 'c1' }),
      receptacle({ id: 'door', label: 'by the door', order: 3, circuitId: 'c1', pattern: '1-15R' }),
      receptacle({ id: 'stove', label: 'right of the stove', areaId: 'kitchen', order: 1, circuitId: 'c2' }),
      receptacle({
        id: 'sink',
        label: 'left of the sink',
        areaId: 'kitchen',
        order: 2,
        circuitId: 'c2',
        device: 'gfci-receptacle',
        marksChecked: true,
      }),
      receptacle({
        id: 'basin',
        label: 'beside the basin',
        areaId: 'bath',
        order: 1,
        circuitId: 'c2',
        device: 'gfci-receptacle',
        marksChecked: true,
      }),
      receptacle({ id: 'shaver', label: 'above the mirror', areaId: 'bath', order: 2, circuitId: 'c2' }),
      receptacle({ id: 'bed-left', label: 'left of the bed', areaId: 'bed', order: 1, circuitId: 'c1' }),
      receptacle({ id: 'bed-right', label: 'right of the bed', areaId: 'bed', order: 2, circuitId: 'c1' }),
      receptacle({ id: 'closet', label: 'by the closet', areaId: 'bed', order: 3, circuitId: 'c1' }),
      receptacle({ id: 'bench', label: 'over the bench', areaId: 'garage', order: 1, circuitId: 'c2' }),
      receptacle({
        id: 'freezer',
        label: 'behind the freezer',
        areaId: 'garage',
        order: 2,
        circuitId: 'c2',
        doNotTrip: 'freezer',
      }),
    ],
    readings: readings([
      read('sofa', '100'),
      read('window', '110'),
      { kind: 'wiring', receptacleId: 'door', evidence: { lamps: lamps('100') } },
      read('stove', '101'),
      read('sink', '100'),
      {
        kind: 'gfci',
        receptacleId: 'sink',
        evidence: {
          device: 'receptacle',
          lamps: lamps('100'),
          button: 'trips',
          faceDead: true,
          tester: 'no-trip',
          resets: true,
        },
      },
      read('basin', '110'),
      {
        kind: 'gfci',
        receptacleId: 'basin',
        evidence: { device: 'receptacle', lamps: lamps('110'), button: 'trips', faceDead: false, resets: true },
      },
      read('shaver', '100'),
      {
        kind: 'gfci',
        receptacleId: 'shaver',
        evidence: { device: 'downstream', lamps: lamps('100'), tester: 'no-trip', deviceFound: false },
      },
      read('bed-left', '011'),
      read('bed-right', '100'),
      read('bench', '000'),
    ]),
    skips: [
      { id: 's1', receptacleId: 'freezer', reason: 'freezer-or-sump' },
      { id: 's2', receptacleId: 'closet', reason: 'blocked', note: 'wardrobe' },
    ],
    notices: [
      notice({ id: 'n1', kind: 'danger-told', receptacleId: 'bed-left', whom: 'Dell Arden', note: 'Breaker 3 off' }),
    ],
  });
}

/** A house of 1988 with shared neutrals and GFCI devices that feed others. */
export function houseOf1988(): InspectionFacts {
  return emptyHouse({
    inspection: { id: 'inspection-1988', yearBuilt: 1988, codeEdition: 1987, stateProfile: 'WA' },
    areas: [
      area({ id: 'kitchen', name: 'Kitchen', place: 'kitchen-counter', order: 1 }),
      area({ id: 'bath', name: 'Bathroom 1', place: 'bathroom', order: 2 }),
      area({ id: 'patio', name: 'Patio', place: 'outdoors', order: 3, gradeAccess: true }),
      area({ id: 'basement', name: 'Basement', place: 'basement', order: 4, finished: false }),
      area({ id: 'bed', name: 'Bedroom 2', place: 'bedroom', order: 5 }),
    ],
    circuits: [
      circuit({ id: 'k1', breaker: '5', amps: 20, sharedNeutral: 'yes' }),
      circuit({ id: 'k2', breaker: '7', amps: 20, sharedNeutral: 'yes' }),
      circuit({ id: 'b1', breaker: '11' }),
    ],
    receptacles: [
      receptacle({ id: 'k-left', label: 'left of the sink', areaId: 'kitchen', order: 1, circuitId: 'k1' }),
      receptacle({ id: 'k-right', label: 'right of the stove', areaId: 'kitchen', order: 2, circuitId: 'k2' }),
      receptacle({
        id: 'basin',
        label: 'right of the basin',
        areaId: 'bath',
        order: 1,
        circuitId: 'b1',
        device: 'gfci-receptacle',
      }),
      receptacle({
        id: 'patio-1',
        label: 'by the door',
        areaId: 'patio',
        order: 1,
        circuitId: 'b1',
        fedFromReceptacleId: 'basin',
        cover: 'flap',
      }),
      receptacle({ id: 'patio-2', label: 'by the grill', areaId: 'patio', order: 2, circuitId: 'b1', cover: 'in-use' }),
      receptacle({
        id: 'sump',
        label: 'at the sump',
        areaId: 'basement',
        order: 1,
        circuitId: 'b1',
        doNotTrip: 'sump-pump',
        fedFromReceptacleId: 'basin',
      }),
      receptacle({ id: 'bed-1', label: 'by the window', areaId: 'bed', order: 1, circuitId: 'b1' }),
      receptacle({ id: 'bed-2', label: 'by the door', areaId: 'bed', order: 2, circuitId: 'b1' }),
    ],
    readings: readings([
      {
        kind: 'wiring',
        receptacleId: 'k-left',
        evidence: { lamps: lamps('110'), volts: { hn: 160, hg: 120, ng: 40, meter: 'high-impedance' } },
      },
      {
        kind: 'wiring',
        receptacleId: 'k-right',
        evidence: { lamps: lamps('110'), volts: { hn: 80, hg: 120, ng: 40, meter: 'high-impedance' } },
      },
      read('basin', '110'),
      {
        kind: 'gfci',
        receptacleId: 'basin',
        evidence: {
          device: 'receptacle',
          lamps: lamps('110'),
          button: 'trips',
          faceDead: true,
          tester: 'trips',
          resets: false,
          wentDead: ['patio-1', 'sump'],
        },
      },
      read('patio-1', '110'),
      read('patio-2', '110'),
      {
        kind: 'gfci',
        receptacleId: 'patio-2',
        evidence: { device: 'downstream', lamps: lamps('110'), tester: 'no-trip', deviceFound: false },
      },
      {
        kind: 'wiring',
        receptacleId: 'bed-1',
        evidence: { lamps: lamps('110'), sensor: { hotSlot: false, groundSlot: true, coverScrew: true } },
      },
      { kind: 'load', receptacleId: 'bed-2', evidence: { amps: 12, noLoadHn: 122, loadedHn: 108 } },
      read('bed-2', '110'),
    ]),
    photos: [{ id: 'p1', receptacleId: 'bed-1', caption: 'Sensor at the cover screw', order: 1 }],
    notices: [
      notice({
        id: 'n1',
        kind: 'danger-told',
        receptacleId: 'bed-1',
        whom: 'Dell Arden',
        note: 'Breaker 11 off and taped',
      }),
      notice({ id: 'n2', kind: 'handed-over', receptacleId: 'patio-1', readingId: 'r4', whom: 'Dell Arden' }),
    ],
  });
}
