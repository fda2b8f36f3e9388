import type { Point } from '../points';
import type { PhysicalSign } from '../vocabulary';
import type { RawFinding, Rule } from './rule';

const CODE_OF: Partial<Record<PhysicalSign, string>> = {
  cracked: 'P01',
  scorched: 'P02',
  warm: 'P03',
  buzzing: 'P04',
  'weak-grip': 'P05',
  'ground-contact-loose': 'P06',
  'loose-in-box': 'P07',
  'box-recessed': 'P08',
  'cover-missing': 'P09',
  'live-terminals-exposed': 'P09',
  painted: 'P10',
  'water-or-rust': 'P11',
  'object-in-slot': 'P12',
};

/** P01–P12 and P14: what was seen, heard or felt at a receptacle. */
export const physicalRule: Rule = {
  codes: [...new Set([...Object.values(CODE_OF), 'P14'])].sort(),
  find: (world) => world.points.flatMap((point) => [...seenSigns(point), ...coverFacts(point), ...metalPlate(point)]),
};

function at(point: Point, code: string, readingIds: string[], rest: Partial<RawFinding> = {}): RawFinding {
  return { code, group: point.receptacle.id, receptacleIds: [point.receptacle.id], readingIds, ...rest };
}

function seenSigns(point: Point): RawFinding[] {
  return point.signs.flatMap(({ sign, readingId, evidence }) => {
    const code = CODE_OF[sign];
    if (!code) return [];
    const values = {
      note: evidence.note ?? '',
      temperature_rise: evidence.temperatureRiseF ?? '',
      load_amps: evidence.amps ?? '',
    };
    return [at(point, code, [readingId], { values, ...exposed(point, code) })];
  });
}

/** A broken face or a missing cover is DANGER only where live terminals were seen exposed. */
function exposed(point: Point, code: string): Partial<RawFinding> {
  const bare = point.signs.some(({ sign }) => sign === 'live-terminals-exposed');
  return bare && (code === 'P01' || code === 'P09') ? { signal: 'DANGER', urgency: 'U1', who: 'electrician' } : {};
}

function coverFacts(point: Point): RawFinding[] {
  const { cover } = point.receptacle;
  const told = point.signs.some(({ sign }) => sign === 'cover-missing' || sign === 'live-terminals-exposed');
  return (cover === 'missing' || cover === 'broken') && !told
    ? [at(point, 'P09', [], { evidence: [{ instrument: 'Seen', showed: `cover ${cover}` }] })]
    : [];
}

function metalPlate(point: Point): RawFinding[] {
  if (point.receptacle.cover !== 'metal' || point.ground !== 'none') return [];
  return [at(point, 'P14', point.evidence.readingIds)];
}
