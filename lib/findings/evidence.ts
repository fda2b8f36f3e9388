import type {
  ContactSensor,
  InspectionFacts,
  LampPattern,
  LoadTest,
  ReadingFacts,
  ReceptacleFacts,
  VoltTrio,
  WiringEvidence,
  WiringReadingEvidence,
} from './facts';
import type { YesNoUnknown } from './vocabulary';

/** The readings of one receptacle, put together. `variants` has one entry per lamp pattern where readings disagree. */
export type ReceptacleEvidence = {
  /** What the engine diagnoses: the newest lamp pattern first; empty where nothing about the wiring was read. */
  variants: WiringEvidence[];
  readingIds: string[];
  /** In words, where two readings cannot both be right. */
  conflicts: string[];
};

type WiringReading = Extract<ReadingFacts, { kind: 'wiring' }>;
type Sourced<Value> = { value: Value; unplugged?: YesNoUnknown };

/**
 * Readings that no other reading corrects, in the server's order.
 * A reading that corrects one counts even where the corrected one is not among the facts.
 */
export function standingReadings(readings: readonly ReadingFacts[]): ReadingFacts[] {
  const corrected = new Set(readings.flatMap((reading) => reading.supersedes ?? []));
  return readings.filter((reading) => !corrected.has(reading.id)).sort(byOrder);
}

/** Server order; the id decides between equals, so that the order of input never matters. */
export function byOrder(a: { order: number; id: string }, b: { order: number; id: string }): number {
  return a.order - b.order || (a.id < b.id ? -1 : 1);
}

/** Slots of a face: a two-slot face has no ground slot to read. */
export function slotsOf(receptacle: ReceptacleFacts): 2 | 3 {
  return receptacle.pattern === '1-15R' ? 2 : 3;
}

/** Volts that the pattern of the face is made for. */
export function nominalVoltsOf(receptacle: ReceptacleFacts): 120 | 240 {
  return receptacle.pattern === '1-15R' || receptacle.pattern.startsWith('5-') ? 120 : 240;
}

/**
 * Union of a receptacle's standing readings with what the device, its circuit and the house say.
 * Volts are V rms. Two lamp patterns at the same loads are a conflict; both are then diagnosed.
 */
export function receptacleEvidence(
  facts: InspectionFacts,
  receptacle: ReceptacleFacts,
  standing: readonly ReadingFacts[],
): ReceptacleEvidence {
  const own = standing.filter((reading) => reading.receptacleId === receptacle.id);
  const wiring = own.filter((reading): reading is WiringReading => reading.kind === 'wiring' && hasContent(reading));
  const loads = own.filter((reading) => reading.kind === 'load');
  const readingIds = [...wiring, ...loads].sort(byOrder).map((reading) => reading.id);
  if (readingIds.length === 0) return { variants: [], readingIds, conflicts: [] };

  const evidences = wiring.map((reading) => reading.evidence);
  const lamps = lampsOf(evidences);
  const sensor = sensorOf(evidences);
  const common = { ...houseEvidence(facts, receptacle), ...sharedEvidence(evidences, loads.at(-1)?.evidence) };
  if (sensor.value) common.sensor = sensor.value;

  const variants = (lamps.patterns.length > 0 ? lamps.patterns : [undefined]).map((pattern) => ({
    ...common,
    ...(pattern ? { lamps: pattern.value, loadsUnplugged: pattern.unplugged ?? common.loadsUnplugged } : {}),
  }));
  return { variants, readingIds, conflicts: [...lamps.conflicts, ...sensor.conflicts] };
}

/**
 * What one receptacle's readings say together, for a diagnosis on screen while it is typed; the newest lamps count.
 * Where nothing was read, only what the device and the house say. Throws for a receptacle that is not in the facts.
 */
export function wiringEvidence(facts: InspectionFacts, receptacleId: string): WiringEvidence {
  const receptacle = facts.receptacles.find((row) => row.id === receptacleId);
  if (!receptacle) throw new Error(`the facts have no receptacle ${receptacleId}`);
  const { variants } = receptacleEvidence(facts, receptacle, standingReadings(facts.readings));
  return variants[0] ?? houseEvidence(facts, receptacle);
}

function hasContent(reading: WiringReading): boolean {
  const { lamps, volts, moreVolts, sensor, groundOhms, groundJumperSeen } = reading.evidence;
  return (
    [lamps, volts, sensor, groundOhms, groundJumperSeen].some((value) => value !== undefined) || !!moreVolts?.length
  );
}

function houseEvidence(facts: InspectionFacts, receptacle: ReceptacleFacts): WiringEvidence {
  const circuit = facts.circuits.find((row) => row.id === receptacle.circuitId);
  return {
    slots: slotsOf(receptacle),
    nominalVolts: nominalVoltsOf(receptacle),
    supply: facts.inspection.supply,
    wiringMethod: facts.inspection.wiringMethod,
    ...(circuit?.sharedNeutral ? { sharedNeutral: circuit.sharedNeutral } : {}),
    ...(receptacle.nearBondedPanel === undefined ? {} : { nearBondedPanel: receptacle.nearBondedPanel }),
  };
}

function sharedEvidence(evidences: WiringReadingEvidence[], loadTest: LoadTest | undefined): Partial<WiringEvidence> {
  const trios = evidences.flatMap(triosOf);
  const shared: Partial<WiringEvidence> = {};
  const last = <Key extends keyof WiringReadingEvidence>(key: Key) =>
    evidences.findLast((evidence) => evidence[key] !== undefined)?.[key];

  if (trios.length > 0) shared.volts = trios.at(-1);
  if (trios.length > 1) shared.moreVolts = trios.slice(0, -1);
  for (const key of ['loadsUnplugged', 'hardWiredLoadsOff', 'sharedNeutral'] as const) {
    const value = last(key);
    if (value) shared[key] = value;
  }
  const near = last('nearBondedPanel');
  if (near !== undefined) shared.nearBondedPanel = near;
  const ohms = evidences.flatMap((evidence) => evidence.groundOhms ?? []);
  if (ohms.length > 0) shared.groundOhms = Math.max(...ohms);
  for (const key of ['groundJumperSeen', 'powerChecked'] as const)
    if (evidences.some((evidence) => evidence[key])) shared[key] = true;
  if (loadTest) shared.loadTest = loadTest;
  return shared;
}

function triosOf(evidence: WiringReadingEvidence): VoltTrio[] {
  return [...(evidence.moreVolts ?? []), ...(evidence.volts ? [evidence.volts] : [])];
}

/** Loads plugged in elsewhere change the lamps, so two patterns disagree only when the loads were the same. */
function lampsOf(evidences: WiringReadingEvidence[]): { patterns: Sourced<LampPattern>[]; conflicts: string[] } {
  const found = new Map<string, Sourced<LampPattern>>();
  for (const { lamps, loadsUnplugged } of evidences) {
    if (!lamps) continue;
    const key = bitsOf(lamps);
    found.delete(key);
    found.set(key, { value: lamps, unplugged: loadsUnplugged });
  }
  const patterns = [...found.values()].reverse();
  const withoutLoads = patterns.filter((pattern) => pattern.unplugged === 'yes');
  const withLoads = patterns.filter((pattern) => pattern.unplugged === 'no');
  if (withoutLoads.length === 1 && withoutLoads.length + withLoads.length === patterns.length && patterns.length === 2)
    return { patterns: withoutLoads, conflicts: [] };
  if (patterns.length < 2) return { patterns, conflicts: [] };
  const shown = patterns.map((pattern) => lampsInWords(pattern.value)).join('; and: ');
  return { patterns, conflicts: [`The lamps were read in two ways: ${shown}`] };
}

function sensorOf(evidences: WiringReadingEvidence[]): { value?: ContactSensor; conflicts: string[] } {
  const sensors = evidences.flatMap((evidence) => evidence.sensor ?? []);
  if (sensors.length === 0) return { conflicts: [] };
  const value: ContactSensor = {};
  const conflicts: string[] = [];
  for (const key of ['hotSlot', 'neutralSlot', 'groundSlot', 'coverScrew'] as const) {
    const answers = sensors.flatMap((sensor) => sensor[key] ?? []);
    if (answers.length === 0) continue;
    // A sensor can miss, so an answer of "live" stands against one of "quiet".
    value[key] = answers.includes(true);
    if (new Set(answers).size > 1)
      conflicts.push(`The live-wire sensor answered at the ${SENSOR_WORDS[key]} once, and not another time`);
  }
  return { value, conflicts };
}

const SENSOR_WORDS = {
  hotSlot: 'hot slot',
  neutralSlot: 'neutral slot',
  groundSlot: 'ground slot',
  coverScrew: 'cover screw',
} as const;

/** Three letters in the order hot–neutral, hot–ground, neutral–ground: 1 lit, d dim, 0 off. */
export function bitsOf(lamps: LampPattern): string {
  return [lamps.hn, lamps.hg, lamps.ng].map((lamp) => ({ lit: '1', dim: 'd', off: '0' })[lamp]).join('');
}

/** The three lamps as a person says them. */
export function lampsInWords(lamps: LampPattern): string {
  return `hot to neutral ${lamps.hn}, hot to ground ${lamps.hg}, neutral to ground ${lamps.ng}`;
}

/** Where the live-wire sensor answered and where it stayed quiet. */
export function sensorInWords(sensor: ContactSensor): string {
  return (Object.keys(SENSOR_WORDS) as (keyof ContactSensor)[])
    .filter((key) => sensor[key] !== undefined)
    .map((key) => `${SENSOR_WORDS[key]} ${sensor[key] ? 'answers' : 'quiet'}`)
    .join(', ');
}

/** A meter trio as a person says it, V rms. */
export function voltsInWords(trio: VoltTrio): string {
  const meter = trio.meter === 'high-impedance' ? 'high-impedance meter' : 'low-impedance meter';
  return `${meter}: hot to neutral ${trio.hn} volts, hot to ground ${trio.hg} volts, neutral to ground ${trio.ng} volts`;
}
