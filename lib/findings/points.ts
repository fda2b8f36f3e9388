import { assessAfci } from './protection/afci';
import { assessGfci } from './protection/gfci';
import { bitsOf, byOrder, receptacleEvidence, standingReadings, type ReceptacleEvidence } from './evidence';
import type {
  AfciAssessment,
  AreaFacts,
  CircuitFacts,
  GfciTrial,
  InspectionFacts,
  LampPattern,
  PhysicalReadingEvidence,
  ReadingFacts,
  ReceptacleFacts,
  SkipFacts,
  WiringDiagnosis,
  WiringEvidence,
} from './facts';
import { stillOffPoints, type StillOffPoint } from './still-off';
import type { PhysicalSign, Protects } from './vocabulary';
import { diagnoseWiring } from './wiring/diagnose';

export type GfciResult = {
  reading: Extract<ReadingFacts, { kind: 'gfci' }>;
  trial: GfciTrial;
  assessment: ReturnType<typeof assessGfci>;
};
export type AfciResult = { reading: Extract<ReadingFacts, { kind: 'afci' }>; assessment: AfciAssessment };
export type Ground = 'shown' | 'none' | 'unknown';

/** What is known of the shock protection of one point, its own trial or another device's. */
export type Protection = { state: Protects | 'none-found' | 'unknown'; readingIds: string[]; by: string };

/** One receptacle with everything that was read there. */
export type Point = {
  receptacle: ReceptacleFacts;
  area: AreaFacts;
  circuit?: CircuitFacts;
  /** "bench left", or "receptacle 3" where nobody wrote a label. */
  name: string;
  /** "Garage, bench left" */
  place: string;
  readings: ReadingFacts[];
  evidence: ReceptacleEvidence;
  /** One per variant of the evidence. */
  diagnoses: { evidence: WiringEvidence; diagnosis: WiringDiagnosis }[];
  ground: Ground;
  gfci: GfciResult[];
  afci: AfciResult[];
  signs: { sign: PhysicalSign; readingId: string; evidence: PhysicalReadingEvidence }[];
  skip?: SkipFacts;
  protection: Protection;
};

export type World = {
  facts: InspectionFacts;
  standing: ReadingFacts[];
  /** In walking order. */
  points: Point[];
  byId: Map<string, Point>;
  /** Trials at a breaker, which have a circuit and no receptacle. */
  breakerGfci: GfciResult[];
  breakerAfci: AfciResult[];
  stillOff: StillOffPoint[];
};

/** Everything the rules look at, put together once. The order of the facts' rows changes nothing. */
export function buildWorld(facts: InspectionFacts): World {
  const standing = standingReadings(facts.readings);
  const diagnose = diagnoseOnce();
  const points = facts.receptacles
    .filter((receptacle) => receptacle.presence === 'present')
    .flatMap((receptacle) => buildPoint(facts, receptacle, standing, diagnose))
    .sort(inWalkingOrder);
  const byId = new Map(points.map((point) => [point.receptacle.id, point]));
  const atBreaker = standing.filter((reading) => !reading.receptacleId);
  const world: World = {
    facts,
    standing,
    points,
    byId,
    breakerGfci: atBreaker.flatMap((reading) => (reading.kind === 'gfci' ? gfciResult(reading, undefined) : [])),
    breakerAfci: atBreaker.flatMap((reading) => (reading.kind === 'afci' ? afciResult(reading) : [])),
    stillOff: stillOffPoints(facts),
  };
  const trials = [...points.flatMap((point) => point.gfci), ...world.breakerGfci];
  const proofs = trials.filter(({ assessment, trial }) => assessment.protects === 'yes' && trial.button === 'trips');
  for (const point of points) point.protection = protectionOf(point, world, proofs);
  return world;
}

/** Most receptacles of a house read the same, and each kind of evidence is diagnosed once. */
function diagnoseOnce(): (evidence: WiringEvidence) => WiringDiagnosis {
  const known = new Map<string, WiringDiagnosis>();
  return (evidence) => {
    const key = JSON.stringify(evidence);
    const diagnosis = known.get(key) ?? diagnoseWiring(evidence);
    known.set(key, diagnosis);
    return diagnosis;
  };
}

function buildPoint(
  facts: InspectionFacts,
  receptacle: ReceptacleFacts,
  standing: ReadingFacts[],
  diagnose: (evidence: WiringEvidence) => WiringDiagnosis,
): Point[] {
  const area = facts.areas.find((row) => row.id === receptacle.areaId);
  if (!area) return [];
  const readings = standing.filter((reading) => reading.receptacleId === receptacle.id);
  const evidence = receptacleEvidence(facts, receptacle, standing);
  const lamps = evidence.variants[0]?.lamps;
  let diagnosed: Point['diagnoses'] | undefined;
  const name = receptacle.label.trim() || `receptacle ${numberInArea(facts, receptacle)}`;
  return [
    {
      receptacle,
      area,
      circuit: facts.circuits.find((row) => row.id === receptacle.circuitId),
      name,
      place: `${area.name}, ${name}`,
      readings,
      evidence,
      get diagnoses() {
        return (diagnosed ??= evidence.variants.map((variant) => ({
          evidence: variant,
          diagnosis: diagnose(variant),
        })));
      },
      ground: groundOf(lamps ?? trialLamps(readings)),
      gfci: readings.flatMap((reading) => (reading.kind === 'gfci' ? gfciResult(reading, lamps) : [])),
      afci: readings.flatMap((reading) => (reading.kind === 'afci' ? afciResult(reading) : [])),
      signs: readings.flatMap((reading) =>
        reading.kind === 'physical'
          ? reading.evidence.signs.map((sign) => ({ sign, readingId: reading.id, evidence: reading.evidence }))
          : [],
      ),
      skip: skipOf(facts, receptacle),
      protection: { state: 'unknown', readingIds: [], by: '' },
    },
  ];
}

/** From 1, in the area's order, as Walk numbers them. */
function numberInArea(facts: InspectionFacts, receptacle: ReceptacleFacts): number {
  const inArea = facts.receptacles
    .filter((row) => row.areaId === receptacle.areaId && row.presence === 'present')
    .sort(byOrder);
  return inArea.findIndex((row) => row.id === receptacle.id) + 1;
}

function skipOf(facts: InspectionFacts, receptacle: ReceptacleFacts): SkipFacts | undefined {
  const byId = (a: SkipFacts, b: SkipFacts) => (a.id < b.id ? -1 : 1);
  const own = facts.skips.filter((skip) => skip.receptacleId === receptacle.id).sort(byId);
  const ofArea = facts.skips.filter((skip) => !skip.receptacleId && skip.areaId === receptacle.areaId).sort(byId);
  return own[0] ?? ofArea[0];
}

function trialLamps(readings: ReadingFacts[]): LampPattern | undefined {
  return readings.flatMap((reading) => (reading.kind === 'gfci' ? (reading.evidence.lamps ?? []) : [])).at(-1);
}

function groundOf(lamps: LampPattern | undefined): Ground {
  if (!lamps) return 'unknown';
  const bits = bitsOf(lamps);
  if (bits === '110') return 'shown';
  return bits === '100' ? 'none' : 'unknown';
}

/** The trial carries the lamps as they were before it; where they differ from the standing ones, the cautious result counts. */
function gfciResult(
  reading: Extract<ReadingFacts, { kind: 'gfci' }>,
  standingLamps: LampPattern | undefined,
): GfciResult[] {
  const { wentDead: _wentDead, upstreamReceptacleId: _upstream, ...trial } = reading.evidence;
  // Lamps off now only say that the point is dead now.
  const now = standingLamps && trial.lamps && bitsOf(standingLamps) === '000' ? undefined : standingLamps;
  const lampsTried = [trial.lamps, now].filter((lamps) => lamps !== undefined);
  const trials: GfciTrial[] = lampsTried.length > 0 ? lampsTried.map((lamps) => ({ ...trial, lamps })) : [trial];
  const results = trials.map((tried) => ({ reading, trial: tried, assessment: assessGfci(tried) }));
  const [cautious] = results.toSorted((a, b) => rank(a.assessment.protects) - rank(b.assessment.protects));
  return cautious ? [cautious] : [];
}

function rank(protects: Protects): number {
  return ['no', 'unproven', 'yes'].indexOf(protects);
}

function afciResult(reading: Extract<ReadingFacts, { kind: 'afci' }>): AfciResult[] {
  return [{ reading, assessment: assessAfci(reading.evidence) }];
}

/** Own trials first; then devices whose button put this point out. The newest trial of a device counts. */
function protectionOf(point: Point, world: World, proofs: GfciResult[]): Protection {
  const bits = point.evidence.variants[0]?.lamps && bitsOf(point.evidence.variants[0].lamps);
  const cannotJudge = bits !== undefined && ['001', '010', '011', '111'].includes(bits);
  const own = point.gfci.at(-1);
  const upstream = cannotJudge ? undefined : provenUpstream(point, world, proofs);
  if (own?.assessment.protects === 'yes' && !cannotJudge)
    return {
      state: 'yes',
      readingIds: [own.reading.id],
      by: own.trial.device === 'receptacle' ? 'its own button' : 'the device that feeds it',
    };
  if (upstream) return upstream;
  if (own && own.assessment.protects === 'no')
    return { state: 'no', readingIds: [own.reading.id], by: 'its own trial' };
  if (own && (own.trial.deviceFound === false || (own.assessment.verdict === 'unconfirmed' && !cannotJudge)))
    return { state: 'none-found', readingIds: [own.reading.id], by: 'no device found' };
  if (own) return { state: 'unproven', readingIds: [own.reading.id], by: 'its own trial' };
  return { state: 'unknown', readingIds: [], by: '' };
}

function provenUpstream(point: Point, world: World, proofs: GfciResult[]): Protection | undefined {
  const proof = proofs.find(
    ({ reading }) =>
      reading.receptacleId !== point.receptacle.id && reading.evidence.wentDead?.includes(point.receptacle.id),
  );
  if (!proof) return undefined;
  const device = proof.reading.receptacleId ? world.byId.get(proof.reading.receptacleId)?.place : undefined;
  return {
    state: 'yes',
    readingIds: [proof.reading.id],
    by: device ? `the device at ${device}` : 'the device at the panel',
  };
}

/** Area order, then receptacle order; ids decide between equals. */
export function inWalkingOrder(a: Point, b: Point): number {
  return (
    a.area.order - b.area.order ||
    compareText(a.area.id, b.area.id) ||
    a.receptacle.order - b.receptacle.order ||
    compareText(a.receptacle.id, b.receptacle.id)
  );
}

export function compareText(a: string, b: string): number {
  if (a === b) return 0;
  return a < b ? -1 : 1;
}
