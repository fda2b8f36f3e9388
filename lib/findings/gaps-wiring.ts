import { bitsOf } from './evidence';
import type { Finding, Gap } from './facts';
import { gapAt } from './gap-at';
import type { Point } from './points';
import { assessLoad } from './rules/supply';
import { leadingConditions } from './rules/wiring';
import { conditionList } from './wording/conditions';

/** Readings, diagnosis and trial that cannot all be right. */
export function conflicts(point: Point): Gap[] {
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

/** Lamps that read correct prove no ground: where something else leads or stands beside, it is said here. */
export function wiringUnproven(point: Point, findings: readonly Finding[]): Gap[] {
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
  else if (evidence.lamps && bitsOf(evidence.lamps).includes('d') && !toldByFinding)
    gaps.push(
      gapAt(
        point,
        'unproven',
        'dim',
        `A lamp is dim: it may count as lit or as off, so the wiring is unproven.${check}`,
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
export function missingGround(point: Point): Gap[] {
  if (point.protection.state !== 'yes' || point.ground !== 'none' || point.receptacle.pattern === '1-15R') return [];
  const says =
    'A GFCI reduces shock here; it gives no ground. Not for refrigerators, washers or anything that needs a ground. A plug-in tester needs a ground to trip a GFCI, so here its result says nothing.';
  return [gapAt(point, 'unproven', 'no-ground', says, [...point.evidence.readingIds, ...point.protection.readingIds])];
}

function asSentence(text: string): string {
  return text.endsWith('.') ? text : `${text}.`;
}
