import type { AfciResult, Point, World } from '../points';
import type { Asked } from '../protection/asked';
import { stateProfile } from '../states/all';
import type { PlaceKind } from '../vocabulary';
import { askedHere, CURRENT_PRACTICE_EDITION, firstAsked, houseEditions, placesOf } from './asked-here';
import type { RawFinding, Rule } from './rule';

type Row = { code: string; noun: string };

/** Which row of the catalogue a place belongs to, gravest first. Elsewhere the distance to water asks. */
const ROWS: readonly (Row & { places: readonly PlaceKind[] })[] = [
  { code: 'X12', noun: 'pool receptacles', places: ['pool-area'] },
  { code: 'G07', noun: 'bathroom receptacles', places: ['bathroom'] },
  { code: 'G08', noun: 'kitchen receptacles', places: ['kitchen-counter', 'kitchen-wall'] },
  { code: 'G09', noun: 'exterior receptacles', places: ['outdoors'] },
  {
    code: 'G10',
    noun: 'garage and outbuilding receptacles',
    places: ['garage', 'accessory-building', 'boathouse'],
  },
  { code: 'G11', noun: 'basement and crawl-space receptacles', places: ['basement', 'crawl-space'] },
  { code: 'G13', noun: 'laundry and dishwasher receptacles', places: ['laundry-area', 'dishwasher'] },
];
const NEAR_WATER: Row = { code: 'G12', noun: 'receptacles near a sink, tub or shower' };

/** G07–G13, G20, X12 and A02: protection that the place calls for and that was not shown. */
export const absentRule: Rule = {
  codes: ['G07', 'G08', 'G09', 'G10', 'G11', 'G12', 'G13', 'G20', 'X12', 'A02'],
  find: (world) => [...absentGfci(world), ...sumpPumps(world), ...absentAfci(world)],
};

/** Points where current practice asks for shock protection, with the row that says so. */
export function pointsAskingGfci(world: World): { point: Point; row: Row; asked: Asked }[] {
  return world.points.flatMap((point) => {
    const asked = askedHere(point, CURRENT_PRACTICE_EDITION).gfci;
    return asked.asked === 'yes' ? [{ point, row: rowOf(point), asked }] : [];
  });
}

function rowOf(point: Point): Row {
  const places = placesOf(point);
  return ROWS.find((row) => row.places.some((place) => places.includes(place))) ?? NEAR_WATER;
}

function absentGfci(world: World): RawFinding[] {
  const asking = pointsAskingGfci(world);
  return asking
    .filter(({ point }) => point.protection.state === 'none-found')
    .map(({ point, row, asked }) => {
      const sameRow = asking.filter(
        (other) => other.row.code === row.code && other.point.area.structureId === point.area.structureId,
      );
      return absent(world, point, { ...row, asked }, sameRow.length);
    });
}

function absent(world: World, point: Point, row: Row & { asked: Asked }, count: number): RawFinding {
  return {
    code: row.code,
    group: point.area.structureId,
    receptacleIds: [point.receptacle.id],
    readingIds: [...new Set([...point.protection.readingIds, ...point.evidence.readingIds])],
    values: {
      asked_when_built: askedWhenBuilt(world, point, 'gfci'),
      state_note: stateProfile(world.facts.inspection.stateProfile).absentProtection.sentence,
      device_found: point.gfci.at(-1)?.trial.deviceFound === false ? 'no' : 'unknown',
    },
    outOf: { count, noun: row.noun },
    drawing: drawingOf(point),
    ...sinceHook(point, 'gfci', row.asked),
  };
}

function drawingOf(point: Point): RawFinding['drawing'] {
  const evidence = point.evidence.variants[0];
  return {
    pattern: point.receptacle.pattern,
    device: point.receptacle.device,
    ...(evidence?.lamps ? { lamps: evidence.lamps } : {}),
    ...(evidence?.volts ? { volts: evidence.volts } : {}),
  };
}

/** The section stands in the catalogue row; the year comes from the place. */
function sinceHook(point: Point, what: 'gfci' | 'afci', { confidence }: Asked): Pick<RawFinding, 'hook'> {
  const since = firstAsked(point, what);
  return since === undefined ? {} : { hook: { section: '', since, confidence } };
}

export function askedWhenBuilt(world: World, point: Point, what: 'gfci' | 'afci'): 'yes' | 'no' | 'unknown' {
  const answers = new Set(houseEditions(world.facts).map((edition) => askedHere(point, edition)[what].asked));
  const [only] = answers;
  return answers.size === 1 && only !== undefined && only !== 'depends' ? only : 'unknown';
}

function sumpPumps(world: World): RawFinding[] {
  return world.points
    .filter((point) => point.receptacle.doNotTrip === 'sump-pump' && point.protection.state === 'none-found')
    .map((point) => ({
      code: 'G20',
      group: point.receptacle.id,
      receptacleIds: [point.receptacle.id],
      readingIds: point.protection.readingIds,
      values: { state_note: stateProfile(world.facts.inspection.stateProfile).absentProtection.sentence },
    }));
}

/** Points where current practice asks for arc protection, and what is known of it. */
export function pointsAskingAfci(
  world: World,
): { point: Point; state: 'shown' | 'absent' | 'unknown'; asked: Asked }[] {
  const trials = [...world.points.flatMap((point) => point.afci), ...world.breakerAfci];
  return world.points.flatMap((point) => {
    const asked = askedHere(point, CURRENT_PRACTICE_EDITION).afci;
    return asked.asked === 'yes' ? [{ point, state: arcState(point, trials), asked }] : [];
  });
}

function arcState(point: Point, trials: AfciResult[]): 'shown' | 'absent' | 'unknown' {
  const tried = trials.some(
    ({ reading }) =>
      reading.receptacleId === point.receptacle.id ||
      reading.evidence.wentDead?.includes(point.receptacle.id) ||
      (!!reading.circuitId && reading.circuitId === point.receptacle.circuitId),
  );
  if (tried || point.receptacle.device === 'afci-receptacle' || point.receptacle.device === 'dual-function-receptacle')
    return 'shown';
  switch (point.circuit?.protection) {
    case 'afci':
    case 'dual-function':
      return 'shown';
    case 'none':
    case 'gfci':
      return point.receptacle.fedFromReceptacleId ? 'unknown' : 'absent';
    default:
      return 'unknown';
  }
}

function absentAfci(world: World): RawFinding[] {
  const asking = pointsAskingAfci(world);
  return asking
    .filter(({ state }) => state === 'absent')
    .map(({ point, asked }) => ({
      code: 'A02',
      group: point.area.structureId,
      receptacleIds: [point.receptacle.id],
      readingIds: [],
      values: {
        asked_when_built: askedWhenBuilt(world, point, 'afci'),
        state_note: stateProfile(world.facts.inspection.stateProfile).absentProtection.sentence,
      },
      outOf: {
        count: asking.filter((other) => other.point.area.structureId === point.area.structureId).length,
        noun: 'receptacles in rooms that call for it',
      },
      evidence: [
        {
          instrument: 'Panel',
          showed: `breaker ${point.circuit?.breaker ?? 'not recorded'}: no arc protection recorded`,
        },
      ],
      ...sinceHook(point, 'afci', asked),
    }));
}
