import type { Point, World } from '../points';
import { askedHere, CURRENT_PRACTICE_EDITION, houseEditions } from './asked-here';
import type { RawFinding, Rule } from './rule';

/** T01, T03–T05, T07 and X04: what the device and its circuit are, seen without an instrument. */
export const deviceTypeRule: Rule = {
  codes: ['T01', 'T03', 'T04', 'T05', 'T07', 'X04'],
  find: (world) => [...world.points.flatMap((point) => findAt(point, world)), ...sharedNeutrals(world)],
};

function findAt(point: Point, world: World): RawFinding[] {
  const { receptacle } = point;
  const now = askedHere(point, CURRENT_PRACTICE_EDITION);
  const editions = houseEditions(world.facts);
  const tamperAsked =
    editions.length > 0 && editions.every((edition) => askedHere(point, edition).tamperResistant.asked === 'yes');
  const lacks = (mark: 'tamper-resistant' | 'weather-resistant') =>
    receptacle.marksChecked === true && !receptacle.marks.includes(mark);
  const outdoors = point.area.place === 'outdoors' || point.area.alsoPlace === 'outdoors';
  const rows: RawFinding[] = [];

  if (receptacle.pattern === '1-15R')
    rows.push(row(point, 'T01', { outOf: all(world, point), ...seen('a face with two slots') }));
  if (lacks('tamper-resistant') && tamperAsked && receptacle.pattern !== '1-15R')
    rows.push(row(point, 'T03', { outOf: all(world, point), ...seen('marks looked for, none for tamper resistance') }));
  if (lacks('weather-resistant') && now.weatherResistant.asked === 'yes')
    rows.push(
      row(point, 'T04', { outOf: all(world, point), ...seen('marks looked for, none for weather resistance') }),
    );
  if (receptacle.cover === 'flap' && outdoors && now.inUseCover.asked === 'yes')
    rows.push(row(point, 'T05', { group: receptacle.id, ...seen('a flap cover') }));
  if (receptacle.pattern === '5-20R' && point.circuit?.amps === 15)
    rows.push(row(point, 'T07', { group: receptacle.id, ...seen('a 20 ampere face on a 15 ampere breaker') }));
  return rows;
}

function row(point: Point, code: string, rest: Partial<RawFinding>): RawFinding {
  return {
    code,
    group: point.area.structureId,
    receptacleIds: [point.receptacle.id],
    readingIds: code === 'T01' ? point.evidence.readingIds : [],
    drawing: { pattern: point.receptacle.pattern, device: point.receptacle.device },
    ...rest,
  };
}

function seen(showed: string): Pick<RawFinding, 'evidence'> {
  return { evidence: [{ instrument: 'Seen', showed }] };
}

function all(world: World, point: Point): RawFinding['outOf'] {
  return {
    count: world.points.filter((other) => other.area.structureId === point.area.structureId).length,
    noun: 'receptacles',
  };
}

function sharedNeutrals(world: World): RawFinding[] {
  return world.facts.circuits
    .filter((circuit) => circuit.sharedNeutral === 'yes' && circuit.poles === 1)
    .map((circuit) => ({
      code: 'X04',
      group: circuit.panelId,
      circuitId: circuit.id,
      byBreaker: true,
      receptacleIds: world.points
        .filter((point) => point.receptacle.circuitId === circuit.id)
        .map((point) => point.receptacle.id),
      readingIds: [],
      evidence: [{ instrument: 'Panel', showed: `breaker ${circuit.breaker}: single pole, neutral shared` }],
    }));
}
