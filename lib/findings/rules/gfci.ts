import type { GfciResult, Point, World } from '../points';
import type { GfciVerdict } from '../vocabulary';
import type { RawFinding, Rule } from './rule';

type Told = Partial<RawFinding> & { code: string };

/** Verdicts of a trial that are findings of their own. Verdicts without a row are gaps or nothing to report. */
const TOLD: Partial<Record<GfciVerdict, Told>> = {
  replace: { code: 'G16' },
  failed: { code: 'G01', values: { result: 'no-trip' } },
  'button-failed': { code: 'G01', values: { result: 'tester-only' } },
  'line-load-reversed': { code: 'G02', values: { result: 'line-load-reversed' } },
  'face-stays-live': { code: 'G02', values: { result: 'face-stays-live' } },
  'no-reset': { code: 'G03', values: { result: 'no-reset' } },
  'load-side-fault': { code: 'G03', values: { result: 'load-side-fault' } },
  'appliance-suspected': {
    code: 'G03',
    values: { result: 'appliance' },
    signal: 'CAUTION',
    urgency: 'U3',
    who: 'electrician-or-owner',
  },
  'ground-doubtful': { code: 'G04', values: { result: 'here' } },
  'upstream-protects-ground-doubtful': { code: 'G04', values: { result: 'upstream' } },
  slow: { code: 'G18' },
};

/** G01–G06, G14–G19 and G21: what the trials of shock protection showed. */
export const gfciRule: Rule = {
  codes: ['G01', 'G02', 'G03', 'G04', 'G05', 'G06', 'G14', 'G15', 'G16', 'G17', 'G18', 'G19', 'G21'],
  find: (world) => [
    ...world.points.flatMap((point) => [
      ...trials(point),
      ...missingMark(point),
      ...signs(point),
      ...chained(point, world),
    ]),
    ...world.breakerGfci.flatMap(breakerTrial),
    ...leftOff(world),
  ],
};

function trials(point: Point): RawFinding[] {
  const result = point.gfci.at(-1);
  if (!result) return [];
  // A point that stays dead behind a device belongs to that device.
  const device = result.trial.device === 'downstream' ? result.reading.evidence.upstreamReceptacleId : undefined;
  const told = TOLD[result.assessment.verdict];
  const group = told?.code === 'G03' ? (device ?? point.receptacle.id) : point.receptacle.id;
  const base = { group, receptacleIds: [point.receptacle.id], readingIds: [result.reading.id] };
  const rows: RawFinding[] = told ? [{ ...base, ...told, values: { ...trialValues(result), ...told.values } }] : [];
  if (result.assessment.verdict === 'breaker-type-unproven' && knownOtherBreaker(result))
    rows.push({ ...base, code: 'G19', values: trialValues(result) });
  return rows;
}

function breakerTrial(result: GfciResult): RawFinding[] {
  const { circuitId, id } = result.reading;
  if (!circuitId) return [];
  const base = {
    group: circuitId,
    circuitId,
    receptacleIds: result.reading.evidence.wentDead ?? [],
    readingIds: [id],
    values: trialValues(result),
  };
  const told = TOLD[result.assessment.verdict];
  if (told) return [{ ...base, ...told, values: { ...base.values, ...told.values } }];
  const relied = result.assessment.verdict === 'breaker-type-unproven' && knownOtherBreaker(result);
  return relied ? [{ ...base, code: 'G19' }] : [];
}

function knownOtherBreaker(result: GfciResult): boolean {
  return result.trial.breakerMarking === 'afci' || result.trial.breakerMarking === 'other';
}

function trialValues({ trial, assessment }: GfciResult): NonNullable<RawFinding['values']> {
  return {
    verdict: assessment.verdict,
    device: trial.device,
    button: trial.button ?? 'not-pressed',
    tester: trial.tester ?? 'not-used',
    milliamps: trial.measured?.milliamps ?? '',
    seconds: trial.measured?.seconds ?? '',
    breaker_marking: trial.breakerMarking ?? '',
  };
}

/** Shock protection shown and no ground shown: the face or plate has to say so. */
function missingMark(point: Point): RawFinding[] {
  const { receptacle, protection } = point;
  if (protection.state !== 'yes' || point.ground !== 'none' || receptacle.pattern === '1-15R') return [];
  const marks = new Set(receptacle.marks);
  const ownDevice = point.gfci.at(-1)?.assessment.verdict === 'works-no-ground' || isGfciDevice(point);
  const complete = marks.has('no-equipment-ground') && (ownDevice || marks.has('gfci-protected'));
  if (complete) return [];
  return [
    {
      code: ownDevice ? 'G05' : 'G06',
      group: receptacle.id,
      receptacleIds: [receptacle.id],
      readingIds: [...new Set([...point.evidence.readingIds, ...protection.readingIds])],
      values: {
        mark_state: receptacle.marksChecked ? 'missing' : 'not-recorded',
        protected_by: protection.by,
        tester: point.gfci.at(-1)?.trial.tester ?? 'not-used',
      },
      drawing: { pattern: receptacle.pattern, device: receptacle.device, condition: 'open-ground' },
    },
  ];
}

function isGfciDevice(point: Point): boolean {
  return point.receptacle.device === 'gfci-receptacle' || point.receptacle.device === 'dual-function-receptacle';
}

const SIGN_CODES = {
  'hard-to-reach-gfci': 'G14',
  'feeds-freezer-or-sump': 'G15',
  'end-of-life-indicator': 'G16',
} as const;

function signs(point: Point): RawFinding[] {
  const seen = point.signs.flatMap(({ sign, readingId }) => {
    const code = SIGN_CODES[sign as keyof typeof SIGN_CODES];
    if (!code || (code === 'G15' && point.protection.state !== 'yes')) return [];
    return [{ code, group: point.receptacle.id, receptacleIds: [point.receptacle.id], readingIds: [readingId] }];
  });
  return seen;
}

function chained(point: Point, world: World): RawFinding[] {
  const upstream = world.byId.get(point.receptacle.fedFromReceptacleId ?? '');
  const first = point.gfci.find((result) => result.trial.upstreamTrippedFirst);
  const inChain = upstream && isGfciDevice(upstream) && isGfciDevice(point);
  if (!first && !inChain) return [];
  return [
    {
      code: 'G17',
      group: point.receptacle.id,
      receptacleIds: [point.receptacle.id],
      readingIds: first ? [first.reading.id] : [],
      values: { upstream: upstream?.place ?? '' },
    },
  ];
}

/** A freezer, pump, alarm or medical point without power since a trial must be told at once. */
function leftOff(world: World): RawFinding[] {
  return world.stillOff.flatMap(({ receptacleId, readingId }) => {
    const point = world.byId.get(receptacleId);
    const feeds = point?.receptacle.doNotTrip ?? feedsFromSigns(point);
    if (!point || !feeds) return [];
    return [
      {
        code: 'G21',
        group: receptacleId,
        receptacleIds: [receptacleId],
        readingIds: [readingId],
        values: { feeds: FEEDS_WORDS[feeds] },
      },
    ];
  });
}

function feedsFromSigns(point: Point | undefined): 'freezer' | undefined {
  return point?.signs.some(({ sign }) => sign === 'feeds-freezer-or-sump') ? 'freezer' : undefined;
}

const FEEDS_WORDS = {
  'medical-equipment': 'medical equipment',
  freezer: 'a freezer or a pump',
  'sump-pump': 'a sump pump',
  aquarium: 'an aquarium',
  computer: 'a computer',
  alarm: 'an alarm',
  'occupant-asked': 'something that the occupant asked to keep on',
} as const;
