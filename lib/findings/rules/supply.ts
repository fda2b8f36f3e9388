import type { LoadTest } from '../facts';
import type { Point, World } from '../points';
import { voltsInWords } from '../evidence';
import { assessLoadTest } from '../supply/load-test';
import { assessVoltage } from '../supply/voltage';
import type { RawFinding, Rule } from './rule';
import { leadingConditions } from './wiring';

/** V rms at a 120 volt receptacle. Below the first a leg counts as low, above the second as high (facts 4, tool bands). */
const LOW_VOLTS = 104;
const HIGH_VOLTS = 132;
/** Less than this between hot and neutral is a dead point, not a low one. */
const DEAD_VOLTS = 20;
/** Ohms of the ground path; a rule of thumb of instrument manuals (facts 4). */
const GROUND_OHMS = 1;

/** W10, W12, W13, W14, W18, W22: voltage, drop under load, the ground path, and what was seen about the supply. */
export const supplyRule: Rule = {
  codes: ['W10', 'W12', 'W13', 'W14', 'W18', 'W22'],
  find: (world) =>
    world.points.flatMap((point) => [
      ...offVoltage(point, world),
      ...voltageDrop(point),
      ...groundPath(point),
      ...signs(point),
      ...halfProven240(point),
    ]),
};

function at(point: Point, code: string, rest: Partial<RawFinding> = {}): RawFinding {
  return {
    code,
    group: point.receptacle.id,
    receptacleIds: [point.receptacle.id],
    readingIds: point.evidence.readingIds,
    ...rest,
  };
}

function legVolts(point: Point): number | undefined {
  const evidence = point.evidence.variants[0];
  return evidence?.nominalVolts === 120 ? evidence.volts?.hn : undefined;
}

function offVoltage(point: Point, world: World): RawFinding[] {
  const volts = legVolts(point);
  const explained = point.diagnoses.some(({ diagnosis }) =>
    leadingConditions(diagnosis).some((condition) => condition !== 'correct' && condition !== 'bootleg-ground'),
  );
  if (volts === undefined || explained) return [];
  const low = volts > DEAD_VOLTS && volts < LOW_VOLTS;
  const high = volts > HIGH_VOLTS;
  if (!low && !high) return [];

  const opposite = world.points.filter((other) => {
    const elsewhere = legVolts(other);
    return elsewhere !== undefined && (low ? elsewhere > 126 : elsewhere > DEAD_VOLTS && elsewhere < 114);
  });
  const trio = point.evidence.variants[0]?.volts;
  return [
    at(point, 'W10', {
      urgency: opposite.length > 0 || high ? 'U1' : 'U2',
      values: {
        volts: trio ? voltsInWords(trio) : '',
        leg_volts: volts,
        leg_state: low ? 'low' : 'high',
        opposite_leg: opposite[0]?.place ?? '',
        band: assessVoltage(volts, 120).band,
      },
    }),
  ];
}

function voltageDrop(point: Point): RawFinding[] {
  const test = point.evidence.variants[0]?.loadTest;
  const poorJoint = point.diagnoses.some(({ diagnosis }) =>
    leadingConditions(diagnosis).some((condition) => condition.startsWith('high-resistance-')),
  );
  if (!test || poorJoint) return [];
  const assessed = assessLoad(point, test);
  if (!assessed || (assessed.band !== 'above-5' && assessed.band !== 'above-8')) return [];
  const { dropPercent, dropVolts, band } = assessed;
  return [
    at(point, 'W12', {
      urgency: band === 'above-8' ? 'U2' : 'U3',
      signal: band === 'above-8' ? 'WARNING' : 'CAUTION',
      values: { drop_percent: round(dropPercent, 1), drop_volts: round(dropVolts, 1), load_amps: test.amps },
    }),
  ];
}

/** The load test with what the circuit says about it; null without a load or a voltage. Drop in V rms and percent. */
export function assessLoad(point: Point, test: LoadTest): ReturnType<typeof assessLoadTest> | null {
  if (test.amps <= 0 || test.noLoadHn <= 0) return null;
  const evidence = point.evidence.variants[0];
  const amps = point.circuit?.amps;
  return assessLoadTest(test, {
    ...(amps === 15 || amps === 20 ? { breakerAmps: amps } : {}),
    ...(evidence?.nearBondedPanel === undefined ? {} : { nearBondedPanel: evidence.nearBondedPanel }),
    sharedNeutral: evidence?.sharedNeutral ?? 'unknown',
  });
}

function groundPath(point: Point): RawFinding[] {
  const ohms = point.evidence.variants[0]?.groundOhms;
  const told = point.diagnoses.some(({ diagnosis }) => leadingConditions(diagnosis).includes('high-resistance-ground'));
  if (ohms === undefined || ohms <= GROUND_OHMS || point.ground === 'none' || told) return [];
  return [at(point, 'W13', { values: { ground_ohms: ohms } })];
}

function signs(point: Point): RawFinding[] {
  return point.signs.flatMap(({ sign, readingId, evidence }) => {
    if (sign !== 'half-not-working' && sign !== 'live-plate-or-plumbing') return [];
    const code = sign === 'half-not-working' ? 'W14' : 'W18';
    return [at(point, code, { readingIds: [readingId], values: { note: evidence.note ?? '' } })];
  });
}

function halfProven240(point: Point): RawFinding[] {
  const evidence = point.evidence.variants[0];
  if (!evidence || evidence.nominalVolts !== 240) return [];
  const { volts } = evidence;
  const bothLegs = volts && volts.hn > 190 && volts.hg > 100 && volts.hg < 140 && volts.ng > 100 && volts.ng < 140;
  return bothLegs ? [] : [at(point, 'W22', { values: { volts: volts ? voltsInWords(volts) : '' } })];
}

function round(value: number, places: number): number {
  return Number(value.toFixed(places));
}
