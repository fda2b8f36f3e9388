import type { AreaFacts, Coverage, InspectionFacts } from './facts';
import { buildWorld, compareText, type Point, type World } from './points';
import { stateProfile } from './states/all';
import { stillOffCircuits } from './still-off';

/**
 * What was seen, tested or skipped in each area, in walking order. `needs` says in words what is still to do there;
 * `leftOff` holds the ids of receptacles and circuits that a trial put out and that are not known to be back.
 * Complete means that every receptacle was read or has a reason, every GFCI and AFCI device was tried or has a reason,
 * and nothing is off. An inspection without areas is not complete.
 */
export function checkCoverage(facts: InspectionFacts): Coverage {
  return coverageOf(buildWorld(facts));
}

/** The same for facts that are already put together. */
export function coverageOf(world: World): Coverage {
  const areas = [...world.facts.areas]
    .sort((a, b) => a.order - b.order || compareText(a.id, b.id))
    .map((area) => coverArea(area, world));
  const leftOff = [
    ...new Set([
      ...world.stillOff.map((off) => off.receptacleId),
      ...stillOffCircuits(world.facts).map((off) => off.circuitId),
    ]),
  ];
  const complete = areas.length > 0 && leftOff.length === 0 && areas.every((area) => area.needs.length === 0);
  return { complete, areas, leftOff };
}

function coverArea(area: AreaFacts, world: World): Coverage['areas'][number] {
  const points = world.points.filter((point) => point.area.id === area.id);
  const tested = points.filter(isTested).length;
  const skipped = points.filter((point) => !isTested(point) && point.skip).length;
  const needs = points.flatMap((point) => needsOf(point, world));
  if (points.length === 0 && !emptyIsExplained(area, world.facts))
    needs.push(`${area.name}: record its receptacles, or say why there are none`);
  return { areaId: area.id, present: points.length, tested, skipped, needs };
}

/** Lamps or a meter were read. A trip test alone says nothing of polarity or ground. */
export function isTested(point: Point): boolean {
  if (point.receptacle.device === 'hard-wired-outlet')
    return point.evidence.variants.length > 0 || point.gfci.length > 0 || point.afci.length > 0;
  return point.evidence.variants.some((evidence) => evidence.lamps !== undefined || evidence.volts !== undefined);
}

function emptyIsExplained(area: AreaFacts, facts: InspectionFacts): boolean {
  return (
    facts.skips.some((skip) => skip.areaId === area.id && !skip.receptacleId) ||
    facts.receptacles.some((receptacle) => receptacle.areaId === area.id && receptacle.presence !== 'present')
  );
}

function needsOf(point: Point, world: World): string[] {
  const needs: string[] = [];
  const label = point.place;
  if (!isTested(point)) {
    if (!point.skip) needs.push(`${label}: not tested, and no reason given`);
    else if (point.skip.reason === 'representative-sample' && mustTestAll(point, world))
      needs.push(`${label}: this state asks for every receptacle here; a sample is not enough`);
  }
  if (needsTrial(point, 'gfci')) needs.push(`${label}: GFCI not tried by its own button, and no reason given`);
  if (needsTrial(point, 'afci')) needs.push(`${label}: AFCI not tried by its own button, and no reason given`);
  if (point.gfci.at(-1)?.assessment.verdict === 'incomplete' || point.afci.at(-1)?.assessment.verdict === 'incomplete')
    needs.push(`${label}: the trip test is not complete`);
  if (world.stillOff.some((off) => off.receptacleId === point.receptacle.id)) needs.push(`${label}: still off`);
  return needs;
}

const TRIAL_DEVICES = {
  gfci: ['gfci-receptacle', 'dual-function-receptacle'],
  afci: ['afci-receptacle', 'dual-function-receptacle'],
} as const;

/** A device that was neither tried nor excused. */
export function needsTrial(point: Point, kind: 'gfci' | 'afci'): boolean {
  const verdict = point[kind].at(-1)?.assessment.verdict;
  if (verdict === 'reason-required') return !point.receptacle.doNotTrip && !point.skip;
  if (verdict !== undefined) return false;
  const devices: readonly string[] = TRIAL_DEVICES[kind];
  return devices.includes(point.receptacle.device) && !point.receptacle.doNotTrip && !point.skip;
}

function mustTestAll(point: Point, world: World): boolean {
  const { testAll } = stateProfile(world.facts.inspection.stateProfile);
  const places = [point.area.place, point.area.alsoPlace];
  if (testAll.garages && places.includes('garage')) return true;
  if (testAll.exterior && places.includes('outdoors')) return true;
  if (testAll.nearPlumbingFt === undefined) return false;
  const within = testAll.nearPlumbingFt;
  const { sinkFt, tubOrShowerFt } = point.receptacle;
  if ([sinkFt, tubOrShowerFt].some((feet) => typeof feet === 'number' && feet <= within)) return true;
  // Where no distance was measured, a room with plumbing is taken as near it.
  const unmeasured = sinkFt === undefined && tubOrShowerFt === undefined;
  return unmeasured && places.some((place) => place !== undefined && ROOMS_WITH_PLUMBING.has(place));
}

const ROOMS_WITH_PLUMBING = new Set([
  'bathroom',
  'kitchen-counter',
  'kitchen-wall',
  'dishwasher',
  'laundry-area',
  'wet-bar',
]);
