import type { InspectionFacts } from '@/lib/findings/facts';
import { area, circuit, emptyHouse, lamps, read, readings, receptacle } from './facts';

/** A house of 2021 in which nearly everything answers as it should. */
export function houseOf2021(): InspectionFacts {
  return emptyHouse({
    inspection: {
      id: 'inspection-2021',
      yearBuilt: 2021,
      codeEdition: 2020,
      codeEditionSource: 'Town office',
      stateProfile: 'TX',
    },
    areas: [
      area({ id: 'kitchen', name: 'Kitchen', place: 'kitchen-counter', order: 1 }),
      area({ id: 'bath', name: 'Bathroom', place: 'bathroom', order: 2 }),
      area({ id: 'bed', name: 'Bedroom', place: 'bedroom', order: 3 }),
      area({ id: 'garage', name: 'Garage', place: 'garage', order: 4 }),
    ],
    circuits: [
      circuit({ id: 'k1', breaker: '2', amps: 20, protection: 'dual-function' }),
      circuit({ id: 'b1', breaker: '4', amps: 20 }),
      circuit({ id: 'bed', breaker: '6', protection: 'afci' }),
      circuit({ id: 'g1', breaker: '8', amps: 20 }),
    ],
    receptacles: [
      receptacle({
        id: 'k-1',
        label: 'left of the sink',
        areaId: 'kitchen',
        order: 1,
        circuitId: 'k1',
        marks: ['tamper-resistant'],
        marksChecked: true,
      }),
      receptacle({
        id: 'bath-1',
        label: 'beside the basin',
        areaId: 'bath',
        order: 1,
        circuitId: 'b1',
        device: 'gfci-receptacle',
        marks: ['tamper-resistant'],
        marksChecked: true,
      }),
      receptacle({
        id: 'bed-1',
        label: 'left of the bed',
        areaId: 'bed',
        order: 1,
        circuitId: 'bed',
        marks: ['tamper-resistant'],
        marksChecked: true,
      }),
      receptacle({
        id: 'bed-2',
        label: 'right of the bed',
        areaId: 'bed',
        order: 2,
        circuitId: 'bed',
        marksChecked: true,
      }),
      receptacle({ id: 'g-1', label: 'by the car', areaId: 'garage', order: 1, circuitId: 'g1' }),
    ],
    readings: readings([
      read('k-1', '110'),
      {
        kind: 'gfci',
        circuitId: 'k1',
        evidence: {
          device: 'breaker',
          button: 'trips',
          faceDead: true,
          resets: true,
          breakerMarking: 'dual-function',
          wentDead: ['k-1'],
        },
      },
      read('bath-1', '110'),
      {
        kind: 'gfci',
        receptacleId: 'bath-1',
        evidence: {
          device: 'receptacle',
          lamps: lamps('110'),
          button: 'trips',
          faceDead: true,
          tester: 'trips',
          resets: true,
        },
      },
      read('bed-1', '110'),
      read('bed-2', '110'),
      {
        kind: 'afci',
        circuitId: 'bed',
        evidence: { button: 'trips', circuitDead: true, resets: true, wentDead: ['bed-1', 'bed-2'] },
      },
      read('g-1', '110'),
      {
        kind: 'gfci',
        receptacleId: 'g-1',
        evidence: { device: 'downstream', lamps: lamps('110'), tester: 'no-trip', deviceFound: false },
      },
      { kind: 'physical', receptacleId: 'g-1', evidence: { signs: ['loose-in-box'] } },
    ]),
  });
}
