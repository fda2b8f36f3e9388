import { byOrder } from './evidence';
import { evidenceLines } from './evidence-lines';
import type { EvidenceLine, Finding, FindingSubject } from './facts';
import { compareText, type Point, type World } from './points';
import type { RawFinding } from './rules/rule';
import { SIGNALS, URGENCIES } from './vocabulary';
import { catalogueEntry } from './wording/catalogue/all';
import { joinWords } from './wording/conditions';
import { EMPTY_VALUES } from './wording/variables';

/** Said where the readings themselves name no limit. */
const NOT_OPENED = 'Nothing was opened. What is inside the box or the wall was not seen.';
/** Rows whose cause can leave points downstream dead. */
const CAUSES_OF_DEAD_POINTS = new Set(['W03', 'W04', 'W05', 'W06', 'W16', 'W20', 'G03', 'G16']);
/** As many places as a sentence names before it counts the rest. */
const NAMED_PLACES = 8;

/** Puts raw findings with the same code and group together. Gravest first, then urgency, then walking order. */
export function mergeFindings(raws: readonly RawFinding[], world: World): Finding[] {
  const groups = new Map<string, RawFinding[]>();
  for (const raw of foldDeadPoints(raws, world)) {
    const id = `${raw.code}:${raw.group}`;
    groups.set(id, [...(groups.get(id) ?? []), raw]);
  }
  const position = new Map(world.points.map((point, index) => [point.receptacle.id, index]));
  return [...groups]
    .map(([id, members]) =>
      mergeGroup(
        id,
        members.toSorted((a, b) => firstPosition(a, position) - firstPosition(b, position)),
        world,
      ),
    )
    .sort(
      (a, b) =>
        SIGNALS.indexOf(a.signal) - SIGNALS.indexOf(b.signal) ||
        URGENCIES.indexOf(a.urgency) - URGENCIES.indexOf(b.urgency) ||
        subjectPosition(a.subject, position) - subjectPosition(b.subject, position) ||
        compareText(a.id, b.id),
    );
}

function firstPosition(raw: RawFinding, position: Map<string, number>): number {
  return Math.min(...raw.receptacleIds.map((id) => position.get(id) ?? Infinity), Infinity);
}

function subjectPosition(subject: FindingSubject, position: Map<string, number>): number {
  if (!('receptacleIds' in subject)) return -1;
  const first = Math.min(...subject.receptacleIds.map((id) => position.get(id) ?? Infinity), Number.MAX_SAFE_INTEGER);
  return first;
}

/** A point that is dead because of a fault upstream belongs to that fault, and is not told a second time. */
function foldDeadPoints(raws: readonly RawFinding[], world: World): RawFinding[] {
  const kept = raws.map((raw) => ({ ...raw }));
  const folded = new Set<RawFinding>();
  for (const dead of kept.filter((raw) => raw.code === 'W05')) {
    const cause = causeOf(dead, kept, world);
    if (!cause) continue;
    folded.add(dead);
    cause.receptacleIds = [...cause.receptacleIds, ...dead.receptacleIds];
    cause.readingIds = [...cause.readingIds, ...dead.readingIds];
  }
  return kept.filter((raw) => !folded.has(raw));
}

function causeOf(dead: RawFinding, raws: RawFinding[], world: World): RawFinding | undefined {
  const [receptacleId] = dead.receptacleIds;
  let found: RawFinding | undefined;
  const seen = new Set([receptacleId]);
  let upstream = world.byId.get(receptacleId ?? '')?.receptacle.fedFromReceptacleId;
  while (upstream && !seen.has(upstream)) {
    seen.add(upstream);
    const device = upstream;
    // The farthest fault upstream explains the rest.
    found = raws.find((raw) => CAUSES_OF_DEAD_POINTS.has(raw.code) && raw.group === device) ?? found;
    upstream = world.byId.get(device)?.receptacle.fedFromReceptacleId;
  }
  if (found) return found;
  const killer = world.standing.find(
    (reading) =>
      (reading.kind === 'gfci' || reading.kind === 'afci') && reading.evidence.wentDead?.includes(receptacleId ?? ''),
  );
  return raws.find((raw) => raw.code === 'G03' && killer !== undefined && raw.readingIds.includes(killer.id));
}

function mergeGroup(id: string, members: RawFinding[], world: World): Finding {
  const [first] = members;
  if (!first) throw new Error(`no finding in group ${id}`);
  const entry = catalogueEntry(first.code);
  const receptacleIds = [...new Set(members.flatMap((raw) => raw.receptacleIds))];
  const points = world.points.filter((point) => receptacleIds.includes(point.receptacle.id));
  const readings = world.standing.filter((row) => members.some((raw) => raw.readingIds.includes(row.id)));
  const readingIds = readings.sort(byOrder).map((row) => row.id);
  const urgency = gravest(
    URGENCIES,
    members.map((raw) => raw.urgency ?? entry.urgency),
  );
  const unproven = [...new Set(members.flatMap((raw) => raw.unproven ?? []))];
  const place = placeWords(first, members, points, world);
  const hook = hookOf(first, members, entry.hook);
  return {
    id,
    code: first.code,
    signal: gravest(
      SIGNALS,
      members.map((raw) => raw.signal ?? entry.signal),
    ),
    urgency,
    who: first.who ?? entry.who,
    subject: subjectOf(first, points),
    place,
    readingIds,
    photoIds: photosOf(first, points, world),
    values: {
      ...EMPTY_VALUES,
      ...houseValues(world),
      ...first.values,
      place,
      where: listPlaces(points),
      count: points.length,
      out_of: first.outOf?.count ?? points.length,
      noun: first.outOf?.noun ?? (points.length === 1 ? 'receptacle' : 'receptacles'),
      section: hook?.section ?? '',
      since: sinceWords(members, hook),
      asked_when_built: agreed(members, 'asked_when_built'),
      breaker: breakersOf(members, points, world).join(', '),
    },
    evidence: [
      ...evidenceLines(readingIds, world),
      ...seenOnce(members.flatMap((raw) => raw.evidence ?? [])),
      ...(urgency === 'U1' ? toldLines(first, points, world) : []),
    ],
    unproven: unproven.length > 0 ? unproven : [NOT_OPENED],
    ...(first.drawing ? { drawing: first.drawing } : {}),
    ...(hook ? { hook } : {}),
  };
}

/** Absent protection and kinds of device, merged over a structure. */
const HOUSE_MATTERS: readonly string[] = ['A02', 'T01', 'T03', 'T04'];

/** Sets are written gravest first. */
function gravest<Value>(order: readonly Value[], values: Value[]): Value {
  const found = order.find((value) => values.includes(value));
  if (found === undefined) throw new Error('a finding without a signal or an urgency');
  return found;
}

function hookOf(raw: RawFinding, members: RawFinding[], row: Finding['hook']): Finding['hook'] {
  if (!row) return undefined;
  const years = members.flatMap((member) => member.hook?.since ?? []);
  return raw.hook ? { ...row, ...raw.hook, section: row.section, since: Math.min(...years) } : row;
}

function subjectOf(raw: RawFinding, points: Point[]): FindingSubject {
  const receptacleIds = points.map((point) => point.receptacle.id);
  if (raw.wholeHouse) return { kind: 'inspection' };
  if (raw.byBreaker && receptacleIds.length === 0) return { kind: 'panel', panelId: raw.group };
  if (raw.circuitId && !raw.byBreaker) return { kind: 'circuit', circuitId: raw.circuitId, receptacleIds };
  return { kind: 'receptacles', receptacleIds };
}

function breakerPlace(members: RawFinding[], world: World): string {
  const breakers = breakersOf(members, [], world);
  return `${breakers.length === 1 ? 'Breaker' : 'Breakers'} ${joinWords(breakers, 'and')}`;
}

function placeWords(raw: RawFinding, members: RawFinding[], points: Point[], world: World): string {
  const circuit = world.facts.circuits.find((row) => row.id === raw.circuitId);
  if (raw.wholeHouse) return 'Whole house';
  if (raw.byBreaker) return breakerPlace(members, world);
  if (circuit && raw.group === circuit.id) return `Breaker ${circuit.breaker}`;
  const [only] = points;
  if (points.length === 1 && only) return only.place;
  if (raw.outOf) return `${points.length} of ${raw.outOf.count} ${raw.outOf.noun}`;
  const areas = [...new Set(points.map((point) => point.area.name))];
  return `${joinWords(areas.slice(0, 3), 'and')}${areas.length > 3 ? ' and more' : ''}, ${points.length} receptacles`;
}

/** One sentence per room: "Hall: left, right. Bedroom: by the door". The template ends the last one. */
function listPlaces(points: Point[]): string {
  const rooms = new Map<string, string[]>();
  for (const { area, name } of points.slice(0, NAMED_PLACES))
    rooms.set(area.name, [...(rooms.get(area.name) ?? []), name]);
  const sentences = [...rooms].map(([room, labels]) => `${room}: ${joinWords(labels, 'and')}`);
  const more = points.length - NAMED_PLACES;
  return [...sentences, ...(more > 0 ? [`And ${more} more`] : [])].join('. ');
}

function houseValues(world: World): Finding['values'] {
  const { wiringMethod, yearBuilt } = world.facts.inspection;
  return { wiring: wiringMethod, year_built: yearBuilt ?? '' };
}

function breakersOf(members: RawFinding[], points: Point[], world: World): string[] {
  const named = new Set(members.flatMap((raw) => raw.circuitId ?? []));
  const own = world.facts.circuits.filter((row) => named.has(row.id)).map((row) => row.breaker);
  const breakers = own.length > 0 ? own : points.flatMap((point) => point.circuit?.breaker ?? []);
  return [...new Set(breakers)].sort((a, b) => Number.parseInt(a, 10) - Number.parseInt(b, 10) || compareText(a, b));
}

/** Places of one finding can have been asked for in different editions. */
function sinceWords(members: RawFinding[], hook: Finding['hook']): string | number {
  const years = [...new Set(members.flatMap((raw) => raw.hook?.since ?? []))].sort((a, b) => a - b);
  if (years.length > 1) return joinWords(years.map(String), 'or');
  return hook?.since ?? '';
}

function agreed(members: RawFinding[], name: string): string {
  const [value, ...others] = new Set(members.map((raw) => String(raw.values?.[name] ?? '')));
  return others.length > 0 ? 'mixed' : (value ?? '');
}

/** A matter of the whole house shows no photo of one receptacle, which is there for something else. */
function photosOf(raw: RawFinding, points: Point[], world: World): string[] {
  if (raw.wholeHouse || HOUSE_MATTERS.includes(raw.code)) return [];
  const ids = new Set(points.map((point) => point.receptacle.id));
  return [...world.facts.photos]
    .filter((photo) =>
      photo.receptacleId ? ids.has(photo.receptacleId) : !!raw.circuitId && photo.circuitId === raw.circuitId,
    )
    .sort(byOrder)
    .map((photo) => photo.id);
}

function seenOnce(lines: EvidenceLine[]): EvidenceLine[] {
  return [...new Map(lines.map((line) => [`${line.instrument}: ${line.showed}`, line])).values()];
}

function toldLines(raw: RawFinding, points: Point[], world: World): EvidenceLine[] {
  const ids = new Set(points.map((point) => point.receptacle.id));
  return [...world.facts.notices]
    .filter(
      (notice) =>
        notice.kind === 'danger-told' &&
        (ids.has(notice.receptacleId ?? '') || (!!raw.circuitId && notice.circuitId === raw.circuitId)),
    )
    .sort(byOrder)
    .map((notice) => ({
      at: notice.at,
      instrument: 'Told',
      showed: [notice.whom, notice.note].filter(Boolean).join('. '),
      ...(notice.receptacleId ? { receptacleId: notice.receptacleId } : {}),
    }));
}
