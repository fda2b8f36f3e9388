import type { InspectionFacts } from '../facts';
import type { Point } from '../points';
import { protectionAsked } from '../protection/asked';
import { editionInForce } from '../protection/edition-in-force';
import { NEC_EDITIONS, type PlaceKind } from '../vocabulary';
import { nominalVoltsOf } from '../evidence';

/**
 * Edition that stands for current safety practice. The list of the edition after it was not seen in full
 * (facts section 13), so nothing is said from it.
 */
export const CURRENT_PRACTICE_EDITION = 2023;

/** Editions that can have stood when the house was built: one that was recorded, or the oldest and newest possible. */
export function houseEditions(facts: InspectionFacts): number[] {
  const { codeEdition, yearBuilt } = facts.inspection;
  if (codeEdition !== undefined) return [codeEdition];
  return yearBuilt === undefined ? [] : editionInForce({ yearBuilt, adoptions: [] }).range;
}

/** What an edition asks at this point. Distances in feet; what was not measured is not passed. */
export function askedHere(point: Point, edition: number): AskedAnswers {
  const known = answers.get(point) ?? new Map<number, AskedAnswers>();
  answers.set(point, known);
  const answer = known.get(edition) ?? ask(point, edition);
  known.set(edition, answer);
  return answer;
}

type AskedAnswers = ReturnType<typeof protectionAsked>;
/** Several rules ask the same of a point; it is worked out once per point and edition. */
const answers = new WeakMap<Point, Map<number, AskedAnswers>>();

function ask(point: Point, edition: number): AskedAnswers {
  const { receptacle, area, circuit } = point;
  return protectionAsked({
    place: placesOf(point),
    edition,
    volts: nominalVoltsOf(receptacle),
    ...given('amps', circuit?.amps),
    ...given('finished', area.finished),
    ...given('gradeAccess', area.gradeAccess),
    ...given('heightFt', receptacle.heightFt),
    ...given('dedicatedAppliance', receptacle.dedicatedAppliance),
    ...given('sinkFt', receptacle.sinkFt),
    ...given('sinkKind', receptacle.sinkKind),
    ...given('tubOrShowerFt', receptacle.tubOrShowerFt),
    ...given('poolFt', receptacle.poolFt),
    ...given('measuredTo', receptacle.measuredTo),
  });
}

/** The earliest edition that plainly asked it at this point; absent where none did. Source: the rows of facts section 5. */
export function firstAsked(point: Point, what: 'gfci' | 'afci'): number | undefined {
  return NEC_EDITIONS.find((edition) => askedHere(point, edition)[what].asked === 'yes');
}

export function placesOf(point: Point): PlaceKind[] {
  return point.area.alsoPlace ? [point.area.place, point.area.alsoPlace] : [point.area.place];
}

function given<Key extends string, Value>(key: Key, value: Value | undefined): { [key in Key]?: Value } {
  return value === undefined ? {} : ({ [key]: value } as { [key in Key]: Value });
}
