import type { ContactSensor, LampPattern, LoadTest, VoltTrio, WiringEvidence } from '../facts';
import { NO_GROUND_CONDITIONS } from './hypotheses';
import { SENSOR_VOLTS, STRIKE_VOLTS, type Prediction, type Trio } from './predict';

/** One piece of evidence, and whether a prediction agrees with it. */
export type Piece = { name: string; agrees: (prediction: Prediction) => boolean };

/** A lamp near its strike voltage may be seen either way, V. */
const STRIKE_DOUBT_VOLTS = 10;
/** Lamps of one tester do not differ by more than this, V. */
const LAMP_SPREAD_VOLTS = 3;
/** A supply may stand this far from nominal. */
const LEAST_SUPPLY = 0.85;
const MOST_SUPPLY = 1.11;
const METER_FLOOR_VOLTS = 4;
const METER_SHARE = 0.06;
/** A floating wire has been seen to read up to 85 % of the line. */
const PHANTOM_SHARE = 0.9;
const NEUTRAL_RISE_VOLTS = 5;
const LOW_GROUND_OHMS = 1;
const NO_GROUND_OHMS = 1_000;
const DOUBT = 1.25;

/** Every piece of the evidence, to be agreed with one by one. */
export function piecesOf(evidence: WiringEvidence): Piece[] {
  const two = evidence.slots === 2;
  const trios = [...(evidence.volts ? [evidence.volts] : []), ...(evidence.moreVolts ?? [])];
  const pieces: Piece[] = trios.map((trio) => ({ name: meterName(trio), agrees: (p) => agreesVolts(p, trio, two) }));
  const { lamps, sensor, loadTest, groundOhms } = evidence;
  if (lamps) pieces.unshift({ name: 'the lamps', agrees: (p) => agreesLamps(p, lamps, two) });
  if (sensor) pieces.push({ name: 'the contact sensor', agrees: (p) => agreesSensor(p, sensor, two) });
  if (loadTest) pieces.push({ name: 'the load test', agrees: (p) => agreesLoad(p, loadTest) });
  if (groundOhms !== undefined && !two)
    pieces.push({ name: 'the ground path reading', agrees: (p) => agreesGround(p, groundOhms) });
  if (evidence.groundJumperSeen)
    pieces.push({ name: 'the jumper that was seen', agrees: ({ condition }) => condition.includes('bootleg') });
  return [...pieces, ...circumstances(evidence)];
}

/** What is known of the circuit beside the readings. */
function circumstances(evidence: WiringEvidence): Piece[] {
  const pieces: Piece[] = [];
  if (evidence.supply)
    pieces.push({
      name: 'the supply',
      agrees: ({ variant }) => variant.only === undefined || variant.only === evidence.supply,
    });
  if (evidence.sharedNeutral === 'no')
    pieces.push({
      name: 'the neutral that is not shared',
      agrees: ({ condition }) => condition !== 'shared-neutral-open',
    });
  if (evidence.powerChecked)
    pieces.push({ name: 'the power that was checked', agrees: ({ condition }) => condition !== 'no-power' });
  if (evidence.loadsUnplugged === 'yes' && evidence.hardWiredLoadsOff === 'yes') {
    pieces.push({ name: 'the loads that are off', agrees: ({ variant }) => !variant.needsLoad });
  }
  return pieces;
}

function meterName({ meter }: VoltTrio): string {
  return meter === 'high-impedance' ? 'the high-impedance meter' : 'the low-impedance meter';
}

/** All three lamps strike at one voltage near the nominal one; dim counts as lit and as off, so it excludes nothing. */
function agreesLamps({ lampVolts }: Prediction, lamps: LampPattern, two: boolean): boolean {
  const shown = (two ? [lamps.hn] : [lamps.hn, lamps.hg, lamps.ng]).map((lamp, i) => ({
    lamp,
    volts: lampVolts[i] ?? 0,
  }));
  const lit = shown.filter(({ lamp }) => lamp === 'lit').map(({ volts }) => volts);
  const off = shown.filter(({ lamp }) => lamp === 'off').map(({ volts }) => volts);
  const dimmest = Math.min(Infinity, ...lit);
  const brightest = Math.max(-Infinity, ...off);
  return (
    dimmest >= STRIKE_VOLTS - STRIKE_DOUBT_VOLTS &&
    brightest <= STRIKE_VOLTS + STRIKE_DOUBT_VOLTS &&
    dimmest - brightest >= LAMP_SPREAD_VOLTS
  );
}

/** Agrees where one supply voltage within the usual range explains all three. */
function agreesVolts(prediction: Prediction, trio: VoltTrio, two: boolean): boolean {
  const read: number[] = two ? [trio.hn] : [trio.hn, trio.hg, trio.ng];
  const expected = trio.meter === 'high-impedance' ? prediction.highImpedance : prediction.lowImpedance;
  const phantom = read.map((_, i) => trio.meter === 'high-impedance' && (prediction.phantom[i] ?? false));
  const line = Math.max(prediction.variant.circuit.hotVolts, 1);
  return supplies(prediction, read, expected).some((supply) =>
    read.every((volts, i) => {
      if (phantom[i]) return volts <= PHANTOM_SHARE * line * supply + METER_FLOOR_VOLTS;
      const wanted = (expected[i] ?? 0) * supply;
      return Math.abs(volts - wanted) <= toleranceOf(prediction, i, wanted);
    }),
  );
}

/** Candidates for the supply's share of nominal: one per reading that could fix it, held to the usual range. */
function supplies({ condition }: Prediction, read: number[], expected: Trio): number[] {
  // The unequal legs are the condition itself: its examples are not stretched.
  if (condition === 'service-neutral-open') return [1, 0.92, 1.08];
  const fixed = read.flatMap((volts, i) => ((expected[i] ?? 0) > STRIKE_VOLTS ? [volts / (expected[i] ?? 1)] : []));
  const held = fixed.map((share) => Math.min(MOST_SUPPLY, Math.max(LEAST_SUPPLY, share)));
  return held.length > 0 ? held : [1];
}

function toleranceOf({ condition }: Prediction, index: number, wanted: number): number {
  const floor = Math.max(METER_FLOOR_VOLTS, METER_SHARE * wanted);
  if (
    condition === 'shared-neutral-open' ||
    condition === 'service-neutral-open' ||
    condition.startsWith('high-resistance')
  )
    return Math.max(floor, 25);
  // A loaded neutral rises a little above ground.
  if (index === 2 && wanted < 1) return NEUTRAL_RISE_VOLTS;
  return condition === 'open-ground-energized' ? 60 : floor;
}

/**
 * A sensor can miss, and can answer for a live slot half an inch away: a quiet slot counts only where the hot slot
 * answered, and an answer counts against a dead ground slot only where the hot slot was quiet or the screw answered too.
 */
function agreesSensor({ slots }: Prediction, sensor: ContactSensor, two: boolean): boolean {
  const live = (slot: 'H' | 'N' | 'G') => slots[slot].volts > SENSOR_VOLTS;
  const driven = (slot: 'H' | 'N' | 'G') => live(slot) && slots[slot].driven;
  const anyLive = live('H') || live('N') || (!two && live('G'));
  const answers = Object.values(sensor).includes(true);
  if (answers && !anyLive) return false;
  if (sensor.hotSlot === true) {
    if (!two && sensor.groundSlot === false && driven('G')) return false;
    if (sensor.neutralSlot === false && driven('N')) return false;
  }
  const certain = sensor.hotSlot === false || sensor.coverScrew === true;
  return two || !(sensor.groundSlot === true && certain && !live('G'));
}

/** A load can be run only where hot and neutral both have a path. */
function agreesLoad({ loaded, highImpedance, variant, condition }: Prediction, test: LoadTest): boolean {
  const share = test.loadedHn / test.noLoadHn;
  if (condition === 'shared-neutral-open' || condition === 'service-neutral-open') return true;
  const noLoad = highImpedance[0];
  if (Math.abs(test.noLoadHn - noLoad) > 0.15 * Math.max(noLoad, 120) && !variant.needsLoad) return false;
  const carries = loaded.hn > 0.5 * Math.max(noLoad, 1) && noLoad > STRIKE_VOLTS - STRIKE_DOUBT_VOLTS;
  return share > 0.5
    ? carries || condition.startsWith('high-resistance')
    : !carries || condition.startsWith('high-resistance');
}

/** A jumper reads as low as a ground does; these instruments cannot tell them apart. */
function agreesGround({ variant, condition }: Prediction, ohms: number): boolean {
  const allowed = new Set<string>();
  if (ohms <= LOW_GROUND_OHMS * DOUBT) allowed.add('low');
  if (ohms > LOW_GROUND_OHMS / DOUBT) allowed.add('poor');
  if (ohms > NO_GROUND_OHMS / DOUBT) allowed.add('none');
  return (
    allowed.has(variant.ground) ||
    (ohms > LOW_GROUND_OHMS && NO_GROUND_CONDITIONS.includes(condition) && ohms > NO_GROUND_OHMS / DOUBT)
  );
}
