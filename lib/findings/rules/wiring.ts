import type { WiringDiagnosis, WiringEvidence } from '../facts';
import type { Point, World } from '../points';
import { bitsOf, lampsInWords, sensorInWords, voltsInWords } from '../evidence';
import type { Signal, Urgency, WiringCondition } from '../vocabulary';
import { conditionList } from '../wording/conditions';
import type { RawFinding, Rule } from './rule';

/** The row of the catalogue that a leading condition belongs to. "correct" has none. */
const CODE_OF: Record<Exclude<WiringCondition, 'correct'>, string> = {
  'open-ground': 'W01',
  'open-ground-hot-neutral-reversed': 'W01',
  'hot-neutral-reversed': 'W02',
  'open-neutral-with-load': 'W03',
  'hot-ground-reversed': 'W03',
  'same-leg-on-both': 'W03',
  'open-neutral': 'W04',
  'neutral-on-hot-hot-on-ground-neutral-open': 'W04',
  'open-hot': 'W05',
  'no-power': 'W05',
  'open-neutral-and-ground': 'W05',
  'bootleg-ground-open-neutral': 'W16',
  'hot-on-neutral-hot-open': 'W06',
  'hot-on-ground-hot-open': 'W06',
  'bootleg-ground': 'W07',
  'reversed-bootleg-ground': 'W08',
  'neutral-ground-swapped': 'W09',
  'line-to-line-240': 'W11',
  'high-resistance-ground': 'W13',
  'open-ground-energized': 'W17',
  'service-neutral-open': 'W19',
  'shared-neutral-open': 'W20',
  'high-resistance-neutral': 'W21',
  'high-resistance-hot': 'W21',
};

type Gravity = { signal?: Signal; urgency?: Urgency };
const LIVE_NOW: Gravity = { signal: 'DANGER', urgency: 'U1' };

/** W01–W09, W11, W13, W16, W17, W19–W21: what the readings at a receptacle most often mean. */
export const wiringRule: Rule = {
  codes: [...new Set(Object.values(CODE_OF))].sort(),
  find: (world) => world.points.flatMap((point) => point.diagnoses.flatMap((read) => findAt(point, read, world))),
};

type Read = { evidence: WiringEvidence; diagnosis: WiringDiagnosis };

function findAt(point: Point, read: Read, world: World): RawFinding[] {
  const { evidence, diagnosis } = read;
  const code = codeOf(evidence, diagnosis);
  if (!code || (evidence.nominalVolts === 240 && code !== 'W05')) return [];
  // With shock protection shown, the missing ground is told once, by the row about the mark (G05, G06).
  if (code === 'W01' && point.protection.state === 'yes' && !anyLive(evidence)) return [];
  if (code === 'W05' && world.stillOff.some((off) => off.receptacleId === point.receptacle.id)) return [];

  const gravity = gravityOf(code, evidence, diagnosis);
  const leading = leadingConditions(diagnosis);
  const possible = possibleConditions(diagnosis);
  const drawn = leading.find((condition) => condition !== 'correct' && CODE_OF[condition] === code) ?? leading[0];
  return [
    {
      code,
      group: groupOf(code, point, evidence),
      receptacleIds: [point.receptacle.id],
      ...(code === 'W20' && point.circuit ? { circuitId: point.circuit.id, byBreaker: true } : {}),
      wholeHouse: code === 'W19',
      readingIds: point.evidence.readingIds,
      ...gravity,
      values: wiringValues(point, read, code),
      unproven: [...diagnosis.notProven, ...notRuledOut(possible)],
      drawing: {
        pattern: point.receptacle.pattern,
        device: point.receptacle.device,
        ...(evidence.lamps ? { lamps: evidence.lamps } : {}),
        ...(evidence.volts ? { volts: evidence.volts } : {}),
        ...(drawn ? { condition: drawn } : {}),
      },
      ...(code === 'W01'
        ? { outOf: { count: countThreeSlots(point, world), noun: 'three-slot receptacles that were read' } }
        : {}),
    },
  ];
}

/** Conditions that the diagnosis puts first. */
export function leadingConditions(diagnosis: WiringDiagnosis): WiringCondition[] {
  return diagnosis.candidates.filter((row) => row.standing === 'leading').map((row) => row.condition);
}

function possibleConditions(diagnosis: WiringDiagnosis): WiringCondition[] {
  return diagnosis.candidates
    .filter((row) => row.standing === 'possible' && row.condition !== 'correct')
    .map((row) => row.condition);
}

/** Conditions that hide behind almost any reading without a load. A sentence names the others. */
const HIDDEN_WITHOUT_LOAD = new Set<WiringCondition>([
  'high-resistance-ground',
  'high-resistance-hot',
  'high-resistance-neutral',
  'shared-neutral-open',
  'service-neutral-open',
]);
const NAMED_CONDITIONS = 3;

function alsoPossible(possible: WiringCondition[]): string {
  if (possible.length <= NAMED_CONDITIONS) return conditionList(possible);
  const named = possible.filter((condition) => !HIDDEN_WITHOUT_LOAD.has(condition));
  return named.length > 0 ? conditionList(named) : 'faults that show only under load';
}

/** The report keeps the whole list, whatever the sentence names. */
function notRuledOut(possible: WiringCondition[]): string[] {
  return possible.length > 0 ? [`Not ruled out: ${conditionList(possible)}.`] : [];
}

function codeOf(evidence: WiringEvidence, diagnosis: WiringDiagnosis): string | null {
  const bits = evidence.lamps && bitsOf(evidence.lamps);
  if (bits === '110' && groundProvenLive(evidence)) return 'W08';
  if (evidence.groundJumperSeen && bits !== '000' && bits !== '011') return 'W07';
  if (bits === '000' && anyLive(evidence)) return 'W16';

  const leading = leadingConditions(diagnosis);
  const first = leading.find((condition) => condition !== 'correct');
  if (!first || leading.includes('correct')) return null;
  const code = CODE_OF[first as keyof typeof CODE_OF];
  // Lamps that are off show no live ground; that takes a sensor.
  if (code === 'W16' && !anyLive(evidence)) return 'W05';
  return code === 'W02' && groundProvenLive(evidence) ? 'W17' : code;
}

/** The sensor spreads half an inch from a hot slot, so the ground slot alone counts only beside a quiet hot slot. */
export function groundProvenLive(evidence: WiringEvidence): boolean {
  const { sensor } = evidence;
  return sensor?.coverScrew === true || (sensor?.groundSlot === true && sensor.hotSlot === false);
}

/** Any answer at the ground slot or the cover. Enough to treat it as live. */
export function anyLive(evidence: WiringEvidence): boolean {
  return evidence.sensor?.coverScrew === true || evidence.sensor?.groundSlot === true;
}

function gravityOf(code: string, evidence: WiringEvidence, diagnosis: WiringDiagnosis): Gravity {
  const live = anyLive(evidence);
  switch (code) {
    case 'W03':
    case 'W04':
    case 'W06':
      return live ? LIVE_NOW : {};
    case 'W01':
      return live ? { signal: 'WARNING', urgency: 'U1' } : {};
    case 'W07':
      return suspicionOf(evidence) === 'house' ? { signal: 'CAUTION', urgency: 'U3' } : {};
    case 'W08':
      return live ? LIVE_NOW : { signal: 'WARNING', urgency: 'U1' };
    case 'W17': {
      const only = leadingConditions(diagnosis).every((condition) => condition === 'open-ground-energized');
      return live || only ? LIVE_NOW : { signal: 'WARNING', urgency: 'U1' };
    }
    default:
      return {};
  }
}

/** What speaks for a jumper: it was seen, a load test, or only the kind of cable the house has. */
function suspicionOf(evidence: WiringEvidence): 'seen' | 'load-test' | 'house' {
  if (evidence.groundJumperSeen) return 'seen';
  return evidence.loadTest?.noLoadNg !== undefined && evidence.loadTest.loadedNg !== undefined ? 'load-test' : 'house';
}

function groupOf(code: string, point: Point, evidence: WiringEvidence): string {
  const { id } = point.receptacle;
  if (code === 'W19') return 'service';
  // Two circuits that share a neutral come from one panel; one open neutral is told once.
  if (code === 'W20') return point.circuit?.panelId ?? id;
  if (code === 'W01' && !anyLive(evidence)) return point.area.structureId;
  if (code === 'W07' && suspicionOf(evidence) === 'house') return `house-${point.area.structureId}`;
  return id;
}

function wiringValues(point: Point, { evidence, diagnosis }: Read, code: string): RawFinding['values'] {
  return {
    lamps: evidence.lamps ? lampsInWords(evidence.lamps) : '',
    volts: evidence.volts ? voltsInWords(evidence.volts) : '',
    sensor: evidence.sensor ? sensorInWords(evidence.sensor) : '',
    live_ground: anyLive(evidence),
    loads_unplugged: evidence.loadsUnplugged ?? 'unknown',
    power_checked: evidence.powerChecked === true,
    most_often: conditionList(leadingConditions(diagnosis)),
    also_possible: alsoPossible(possibleConditions(diagnosis)),
    next_check: diagnosis.nextCheck?.instruction ?? '',
    ground_ohms: evidence.groundOhms ?? '',
    drop_percent: dropPercent(evidence),
    suspicion: code === 'W07' ? suspicionOf(evidence) : '',
    gfci_protected: point.protection.state === 'yes',
  };
}

/** Percent of the no-load voltage that a load test lost, or empty. */
function dropPercent({ loadTest }: WiringEvidence): number | string {
  if (!loadTest || loadTest.noLoadHn <= 0) return '';
  return Number(((100 * (loadTest.noLoadHn - loadTest.loadedHn)) / loadTest.noLoadHn).toFixed(1));
}

/** Without those that have no ground behind a proven GFCI: they are told by the rows about the mark. */
function countThreeSlots(point: Point, world: World): number {
  return world.points.filter(
    (other) =>
      other.area.structureId === point.area.structureId &&
      other.evidence.variants[0]?.slots === 3 &&
      !(other.ground === 'none' && other.protection.state === 'yes'),
  ).length;
}
