import { evaluateInspection } from '@/lib/findings';
import type { InspectionFacts, ReadingFacts, ReceptacleFacts } from '@/lib/findings/facts';
import { area, emptyHouse, lamps, receptacle } from '../../tests/support/facts';
import { median, ms, type Measured } from './measure';

const RECEPTACLES = 120;
const ROOMS = 12;
const ROUNDS = 9;
const PATTERNS = ['110', '100', '101', '011', '010', '000', '110', '110', '111', '001'];

/**
 * A whole house against one millisecond for each receptacle: with readings that were not seen before, as on the first
 * look of a process, and with the same readings again, as on each tap after it.
 */
export function engineRows(): Measured[] {
  const houses = Array.from({ length: ROUNDS }, (_, round) => house(round));
  const first = median(houses.map((facts) => timeOf(facts)));
  const again = median(houses.map((facts) => timeOf(facts)));
  return [row('every reading new', first), row('readings seen before', again)];
}

/** Of this process's own core time in ms: the floor is a number, so nothing else would take out what others run beside it. */
function timeOf(facts: InspectionFacts): number {
  const start = process.cpuUsage();
  evaluateInspection(facts);
  const { user, system } = process.cpuUsage(start);
  return (user + system) / 1000;
}

function row(which: string, productMs: number): Measured {
  return {
    what: `evaluateInspection, ${RECEPTACLES} receptacles, core time, ${which}`,
    product: ms(productMs),
    floor: `1 ms a receptacle, ${RECEPTACLES} ms`,
    ratio: productMs / RECEPTACLES,
    bar: 'under 1',
  };
}

function house(round: number): InspectionFacts {
  const rooms = Array.from({ length: ROOMS }, (_, n) => area({ id: `a${n}`, name: `Room ${n}`, order: n }));
  const receptacles = Array.from({ length: RECEPTACLES }, (_, n) =>
    receptacle({ id: `r${n}`, areaId: `a${n % ROOMS}`, label: `point ${n}`, order: n }),
  );
  return emptyHouse({ areas: rooms, receptacles, readings: receptacles.map((one, n) => reading(one, n, round)) });
}

/** Lamps everywhere, and a meter at every other receptacle that no other round has read. */
function reading({ id }: ReceptacleFacts, n: number, round: number): ReadingFacts {
  const bits = PATTERNS[n % PATTERNS.length] ?? '110';
  const volts = 118 + (n * ROUNDS + round) / 1000;
  const trio = { hn: bits[0] === '1' ? volts : 0, hg: bits[1] === '1' ? volts : 0, ng: bits[2] === '1' ? volts : 0 };
  const meter = n % 2 === 0 ? { volts: { ...trio, meter: 'low-impedance' as const } } : {};
  return {
    id: `w${n}`,
    receptacleId: id,
    kind: 'wiring',
    evidence: { lamps: lamps(bits), ...meter },
    order: n,
    by: 'Bench',
    recordedAt: '2026-12-01T15:00:00Z',
  };
}
