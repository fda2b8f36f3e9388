import { bitsOf } from './evidence';
import { isTested } from './coverage';
import type { Gap } from './facts';
import type { Point, World } from './points';
import { pointsAskingAfci, pointsAskingGfci } from './rules/absent';
import { askedHere, CURRENT_PRACTICE_EDITION } from './rules/asked-here';
import { SKIP_WORDS } from './wording/skip-words';

/** Grounding wires came into branch circuits about 1962 to 1975 (facts 5.3 gr3, gr4; published histories differ). */
const GROUND_COMMON_SINCE = 1975;

/** Gaps of an area or the whole house, told once and not at every receptacle. */
export function houseGaps(world: World): Gap[] {
  return [
    ...skippedAreas(world),
    ...protectionNotShown(world),
    ...distancesMissing(world),
    ...arcProtectionUnknown(world),
    ...groundOfOldHouse(world),
  ];
}

function skippedAreas(world: World): Gap[] {
  return world.facts.areas
    .filter((area) => !world.points.some((point) => point.area.id === area.id))
    .toSorted((a, b) => a.order - b.order || (a.id < b.id ? -1 : 1))
    .flatMap((area): Gap[] => {
      const skip = world.facts.skips
        .filter((row) => row.areaId === area.id && !row.receptacleId)
        .toSorted((a, b) => (a.id < b.id ? -1 : 1))[0];
      if (!skip) return [];
      const note = skip.note ? ` (${skip.note})` : '';
      return [
        {
          id: `not-tested:area:${area.id}`,
          kind: 'not-tested',
          areaId: area.id,
          place: area.name,
          says: `This area was not tested: ${SKIP_WORDS[skip.reason]}${note}.`,
          readingIds: [],
        },
      ];
    });
}

/** Places that ask for a GFCI and have neither a result nor "no device found". */
function protectionNotShown(world: World): Gap[] {
  const open = pointsAskingGfci(world)
    .map(({ point }) => point)
    .filter((point) => isTested(point) && point.gfci.length === 0 && point.protection.state === 'unknown')
    .filter((point) => point.receptacle.device === 'receptacle');
  return byArea(open).map(([areaId, points]) => ({
    id: `unproven:gfci-area:${areaId}`,
    kind: 'unproven',
    areaId,
    place: points[0]?.area.name ?? '',
    says: `Shock protection was not tried at: ${labels(points)}. Whether a GFCI protects it is not known.`,
    readingIds: [],
  }));
}

function byArea(points: Point[]): [string, Point[]][] {
  const areas = new Map<string, Point[]>();
  for (const point of points) areas.set(point.area.id, [...(areas.get(point.area.id) ?? []), point]);
  return [...areas];
}

function labels(points: Point[]): string {
  return points.map((point) => point.name).join('; ');
}

function distancesMissing(world: World): Gap[] {
  const open = world.points.filter(
    (point) => point.protection.state !== 'yes' && askedHere(point, CURRENT_PRACTICE_EDITION).gfci.asked === 'depends',
  );
  if (open.length === 0) return [];
  const areas = [...new Set(open.map((point) => point.area.name))];
  return [
    {
      id: 'unproven:distances:house',
      kind: 'unproven',
      place: 'Whole house',
      says: `Distances or exposure were not recorded in: ${areas.join('; ')}. Whether a GFCI is asked for there depends on them.`,
      readingIds: [],
    },
  ];
}

function arcProtectionUnknown(world: World): Gap[] {
  const open = pointsAskingAfci(world).filter(({ state }) => state === 'unknown');
  if (open.length === 0) return [];
  const areas = [...new Set(open.map(({ point }) => point.area.name))];
  return [
    {
      id: 'unproven:afci:house',
      kind: 'unproven',
      place: 'Whole house',
      says: `Arc protection (AFCI) was not traced for: ${areas.join('; ')}. Whether it is there is not known.`,
      readingIds: [],
    },
  ];
}

/** An old house whose cable nobody saw: a ground that reads present may be a jumper. */
function groundOfOldHouse(world: World): Gap[] {
  const { wiringMethod, yearBuilt } = world.facts.inspection;
  if (wiringMethod !== 'unknown' || yearBuilt === undefined || yearBuilt >= GROUND_COMMON_SINCE) return [];
  const read = world.points.filter((point) =>
    point.evidence.variants.some((evidence) => evidence.lamps && bitsOf(evidence.lamps) === '110'),
  );
  if (read.length === 0) return [];
  return [
    {
      id: 'unproven:old-ground:house',
      kind: 'unproven',
      place: 'Whole house',
      says: `Houses built before about ${GROUND_COMMON_SINCE} often have cable without a ground wire, and the cable was not seen here. A receptacle that reads correct may have a jumper in place of a ground.`,
      readingIds: read.flatMap((point) => point.evidence.readingIds),
    },
  ];
}
