import { bitsOf } from './evidence';
import { isTested, needsTrial } from './coverage';
import type { Finding, Gap, SkipFacts } from './facts';
import { houseGaps } from './gaps-house';
import type { AfciResult, GfciResult, Point, World } from './points';
import { assessLoad } from './rules/supply';
import { leadingConditions } from './rules/wiring';
import { stillOffCircuits } from './still-off';
import { conditionList } from './wording/conditions';
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

type Kind = Gap['kind'];

function gapAt(point: Point, kind: Kind, about: string, says: string, readingIds: string[] = []): Gap {
  const { id, areaId } = point.receptacle;
  return { id: `${kind}:${about}:${id}`, kind, receptacleId: id, areaId, place: point.place, says, readingIds };
}

function offPoint(point: Point, world: World): Gap[] {
  const off = world.stillOff.find((row) => row.receptacleId === point.receptacle.id);
  if (!off) return [];
  const says =
    'A trip test put this out, and nothing recorded shows that it is back on. Turn it back on, or hand it over.';
  return [gapAt(point, 'still-off', 'trial', says, [off.readingId])];
}

function conflicts(point: Point): Gap[] {
  const fromReadings = point.evidence.conflicts;
  const fromDiagnosis = point.diagnoses.flatMap(({ diagnosis }) => diagnosis.conflict ?? []);
  const trial = point.gfci.at(-1);
  const missedGround = trial?.assessment.conflict ? [trial.assessment.conflict] : [];
  const trialLamps = lampsChanged(point);
  const all = [...new Set([...fromReadings, ...fromDiagnosis, ...missedGround, ...trialLamps])];
  if (all.length === 0) return [];
  const says = `${all.map(asSentence).join(' ')} Both cannot be right. Read it again and correct the one that is wrong.`;
  const readingIds = [...point.evidence.readingIds, ...(missedGround.length > 0 && trial ? [trial.reading.id] : [])];
  return [gapAt(point, 'conflict', 'readings', says, readingIds)];
}

/** A trial carries the lamps as they were before it; they have to be those that were read then. */
function lampsChanged(point: Point): string[] {
  const trial = point.gfci.at(-1)?.reading;
  const wiring = point.readings.findLast((reading) => reading.kind === 'wiring' && reading.evidence.lamps);
  if (!trial?.evidence.lamps || wiring?.kind !== 'wiring' || !wiring.evidence.lamps) return [];
  if (wiring.order > trial.order || bitsOf(wiring.evidence.lamps) === bitsOf(trial.evidence.lamps)) return [];
  return ['The lamps noted with the trip test differ from the lamps read before it'];
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

/** Lamps that read correct prove no ground: where something else leads or stands beside, it is said here. */
function wiringUnproven(point: Point, findings: readonly Finding[]): Gap[] {
  const told = (code: string) =>
    findings.some(
      (finding) =>
        finding.code === code &&
        'receptacleIds' in finding.subject &&
        finding.subject.receptacleIds.includes(point.receptacle.id),
    );
  const read = point.diagnoses[0];
  if (!read) return [];
  const { evidence, diagnosis } = read;
  const leading = leadingConditions(diagnosis);
  const check = diagnosis.nextCheck ? ` Next check: ${diagnosis.nextCheck.instruction}` : '';
  const ids = point.evidence.readingIds;
  const gaps: Gap[] = [];

  const suspected = leading.filter((condition) => condition !== 'correct');
  const readsCorrect = evidence.lamps !== undefined && bitsOf(evidence.lamps) === '110';
  const toldByFinding = findings.some(
    (finding) =>
      /^W(?!07:house)/.test(finding.id) &&
      'receptacleIds' in finding.subject &&
      finding.subject.receptacleIds.includes(point.receptacle.id),
  );
  if (readsCorrect && suspected.length > 0 && !toldByFinding)
    gaps.push(
      gapAt(
        point,
        'unproven',
        'ground',
        `${groundOpening(evidence.wiringMethod)}: ${conditionList(suspected)}.${check}`,
        ids,
      ),
    );
  else if (leading.includes('correct') && suspected.length > 0)
    gaps.push(gapAt(point, 'unproven', 'wiring', `Also as likely: ${conditionList(suspected)}.${check}`, ids));

  if (evidence.loadTest && !told('W07')) {
    const ground = assessLoad(point, evidence.loadTest)?.ground;
    if (ground === 'undecided')
      gaps.push(
        gapAt(
          point,
          'unproven',
          'load-test',
          'The load test does not decide whether the ground is a wire of its own or a jumper.',
          ids,
        ),
      );
    if (ground === 'suspected')
      gaps.push(
        gapAt(
          point,
          'unproven',
          'load-test',
          'The load test points to a jumper between neutral and ground, if the receptacle is not near the panel.',
          ids,
        ),
      );
  }
  return gaps;
}

function groundOpening(wiring: string | undefined): string {
  return wiring === 'two-wire'
    ? 'The lamps read correct, and the house has two-wire cable. The ground is unproven. Most often a reading like this means'
    : 'The lamps read correct. That is unproven: the evidence points to';
}

/** Protected, marked and without a ground: nothing to repair, and still no ground. */
function missingGround(point: Point): Gap[] {
  if (point.protection.state !== 'yes' || point.ground !== 'none' || point.receptacle.pattern === '1-15R') return [];
  const says =
    'A GFCI reduces shock here; it gives no ground. Not for refrigerators, washers or anything that needs a ground. A plug-in tester needs a ground to trip a GFCI, so here its result says nothing.';
  return [gapAt(point, 'unproven', 'no-ground', says, [...point.evidence.readingIds, ...point.protection.readingIds])];
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

function gfciKind(result: GfciResult, point: Point, findings: readonly Finding[]): Kind | null {
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

function afciKind({ assessment }: AfciResult): Kind | null {
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

function asSentence(text: string): string {
  return text.endsWith('.') ? text : `${text}.`;
}
