import { isTested, needsTrial } from './coverage';
import type { Finding, Gap, SkipFacts } from './facts';
import { gapAt, type GapKind } from './gap-at';
import { houseGaps } from './gaps-house';
import { conflicts, missingGround, wiringUnproven } from './gaps-wiring';
import type { AfciResult, GfciResult, Point, World } from './points';
import { stillOffCircuits } from './still-off';
import { SKIP_WORDS } from './wording/skip-words';

/** What stays unproven, incomplete, in conflict, off or untold, in walking order. Each says what would settle it. */
export function collectGaps(world: World, findings: readonly Finding[]): Gap[] {
  return [
    ...world.points.flatMap((point) => [
      ...offPoint(point, world),
      ...conflicts(point),
      ...notTested(point),
      ...wiringUnproven(point, findings),
      ...missingGround(point),
      ...gfciGaps(point, findings),
      ...afciGaps(point),
    ]),
    ...breakerGaps(world),
    ...houseGaps(world),
    ...notTold(world, findings),
  ];
}

function offPoint(point: Point, world: World): Gap[] {
  const off = world.stillOff.find((row) => row.receptacleId === point.receptacle.id);
  if (!off) return [];
  const says =
    'A trip test put this out, and nothing recorded shows that it is back on. Turn it back on, or hand it over.';
  return [gapAt(point, 'still-off', 'trial', says, [off.readingId])];
}

function notTested(point: Point): Gap[] {
  if (isTested(point)) return [];
  if (!point.skip) {
    const says = 'Not tested, and no reason was recorded. Nothing is known of it.';
    return [gapAt(point, 'not-tested', 'wiring', says)];
  }
  return [gapAt(point, 'not-tested', 'wiring', `Not tested: ${reasonOf(point.skip)}. Nothing is known of it.`)];
}

/** The reason of a skip in words, with the inspector's note. */
export function reasonOf(skip: SkipFacts): string {
  return skip.note ? `${SKIP_WORDS[skip.reason]} (${skip.note})` : SKIP_WORDS[skip.reason];
}

const UNTESTED_VERDICTS = new Set(['not-tested', 'reason-required']);
const INCOMPLETE_VERDICTS = new Set(['incomplete', 'tester-only', 'no-power']);
const UNPROVEN_VERDICTS = new Set([
  'hold',
  'unconfirmed-tester-invalid',
  'unconfirmed',
  'breaker-type-unproven',
  'works-local-only',
  'works-upstream-tripped-first',
]);

function gfciGaps(point: Point, findings: readonly Finding[]): Gap[] {
  const result = point.gfci.at(-1);
  if (!result)
    return needsTrial(point, 'gfci')
      ? [gapAt(point, 'not-tested', 'gfci', 'The GFCI was not tried by its own button, and no reason was recorded.')]
      : doNotTrip(point);
  const kind = gfciKind(result, point, findings);
  return kind ? [gapAt(point, kind, 'gfci', result.assessment.says, [result.reading.id])] : [];
}

function doNotTrip(point: Point): Gap[] {
  const { device, doNotTrip: reason } = point.receptacle;
  if (!reason || (device !== 'gfci-receptacle' && device !== 'dual-function-receptacle')) return [];
  const says = `The GFCI was not tried: marked not to be tripped (${reason.replaceAll('-', ' ')}). Whether it works is not known.`;
  return [gapAt(point, 'not-tested', 'gfci', says)];
}

function gfciKind(result: GfciResult, point: Point, findings: readonly Finding[]): GapKind | null {
  const { verdict } = result.assessment;
  if (UNTESTED_VERDICTS.has(verdict)) return 'not-tested';
  if (INCOMPLETE_VERDICTS.has(verdict)) return 'incomplete';
  const reported = findings.some(
    (finding) =>
      finding.code.startsWith('G') &&
      finding.readingIds.includes(result.reading.id) &&
      point.protection.state === 'none-found',
  );
  return UNPROVEN_VERDICTS.has(verdict) && !reported ? 'unproven' : null;
}

function afciGaps(point: Point): Gap[] {
  const result = point.afci.at(-1);
  if (result) {
    const kind = afciKind(result);
    return kind ? [gapAt(point, kind, 'afci', result.assessment.says, [result.reading.id])] : [];
  }
  return needsTrial(point, 'afci')
    ? [gapAt(point, 'not-tested', 'afci', 'The AFCI was not tried by its own button, and no reason was recorded.')]
    : [];
}

function afciKind({ assessment }: AfciResult): GapKind | null {
  if (assessment.verdict === 'not-tested' || assessment.verdict === 'reason-required') return 'not-tested';
  if (assessment.verdict === 'incomplete') return 'incomplete';
  return assessment.verdict === 'indication-only' || assessment.verdict === 'inconclusive' ? 'unproven' : null;
}

function breakerGaps(world: World): Gap[] {
  const breakerName = (circuitId: string) =>
    `Breaker ${world.facts.circuits.find((row) => row.id === circuitId)?.breaker ?? 'not recorded'}`;
  const off = stillOffCircuits(world.facts).map(({ circuitId, readingId }): Gap => {
    const says = 'A trip test put this breaker out, and nothing recorded shows that it is back on.';
    return {
      id: `still-off:trial:${circuitId}`,
      kind: 'still-off',
      circuitId,
      place: breakerName(circuitId),
      says,
      readingIds: [readingId],
    };
  });
  const gfci = world.breakerGfci.flatMap((result): Gap[] => {
    const { circuitId, id } = result.reading;
    const { verdict, says } = result.assessment;
    const unproven = UNPROVEN_VERDICTS.has(verdict) ? 'unproven' : null;
    const kind = UNTESTED_VERDICTS.has(verdict)
      ? 'not-tested'
      : INCOMPLETE_VERDICTS.has(verdict)
        ? 'incomplete'
        : unproven;
    if (!circuitId || !kind) return [];
    return [
      { id: `${kind}:gfci:${circuitId}`, kind, circuitId, place: breakerName(circuitId), says, readingIds: [id] },
    ];
  });
  const afci = world.breakerAfci.flatMap((result): Gap[] => {
    const { circuitId, id } = result.reading;
    const kind = afciKind(result);
    if (!circuitId || !kind) return [];
    return [
      {
        id: `${kind}:afci:${circuitId}`,
        kind,
        circuitId,
        place: breakerName(circuitId),
        says: result.assessment.says,
        readingIds: [id],
      },
    ];
  });
  return [...off, ...gfci, ...afci];
}

/** "Stop using it now" is always told in person as well. */
function notTold(world: World, findings: readonly Finding[]): Gap[] {
  const told = world.facts.notices.filter((notice) => notice.kind === 'danger-told');
  return findings
    .filter((finding) => finding.signal === 'DANGER' || (finding.urgency === 'U1' && finding.signal !== 'NOTICE'))
    .flatMap((finding) => {
      const ids = 'receptacleIds' in finding.subject ? finding.subject.receptacleIds : [];
      const circuitId = finding.subject.kind === 'circuit' ? finding.subject.circuitId : undefined;
      const done = told.some(
        (notice) =>
          ids.includes(notice.receptacleId ?? '') ||
          (notice.circuitId !== undefined && notice.circuitId === circuitId) ||
          finding.readingIds.includes(notice.readingId ?? ''),
      );
      if (done) return [];
      const says =
        'Dangerous to use, and nobody is recorded as told. Tell someone now and record whom, when and what was left off.';
      return [
        {
          id: `not-told:${finding.id}`,
          kind: 'not-told' as const,
          ...(ids[0] ? { receptacleId: ids[0] } : {}),
          ...(circuitId ? { circuitId } : {}),
          place: finding.place,
          says,
          readingIds: finding.readingIds,
        },
      ];
    });
}
