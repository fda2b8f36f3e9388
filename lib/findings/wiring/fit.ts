import type { ContactSensor, LampPattern, LoadTest, VoltTrio, WiringEvidence } from '../facts';
import type { Lamp, Meter, WiringCondition } from '../vocabulary';
import { NOMINAL_VOLTS } from './wiring';
import { STRIKE_BAND_VOLTS, STRIKE_VOLTS, type Trio, type Variant } from './instruments';
import type { Hypothesis } from './hypotheses';

export type Slots = 2 | 3;

/** A supply of 104 to 132 V is a supply; readings scale with it. */
const LEAST_SCALE = 104 / NOMINAL_VOLTS;
const MOST_SCALE = 132 / NOMINAL_VOLTS;
/** What a field meter, its leads and a changing supply are allowed. */
const TOLERANCE_VOLTS = 2;
const TOLERANCE_SHARE = 0.035;
/** From here a pair reads the supply itself: load on the circuit excuses no reading outside its range. */
const FULL_VOLTS = 100;
const METER_ERROR = 0.005;
const BETWEEN = [0, 0.25, 0.5, 0.75] as const;
const RATIO_TOLERANCE = 0.02;
/** Lamps whose voltages differ by less than twice this light or stay off together. */
const LAMP_MATCH_VOLTS = 1;
/** A sensor answers for certain above the one, and never below the other. */
const SENSOR_SURE_VOLTS = 90;
const SENSOR_LEAST_VOLTS = 20;
/** A ground path up to this is what a sound one reads (common practice). */
export const SOUND_GROUND_OHMS = 1;

/** Whether any wiring of this hypothesis, with loads on the circuit only where they can be, passes `test`. */
export function someVariant({ family }: Hypothesis, loadsOff: boolean, test: (variant: Variant) => boolean): boolean {
  return family.some((variant) => !(loadsOff && variant.wiring.removable) && test(variant));
}

/**
 * Lamps in the slots of that variant. The three of one tester strike alike, somewhere in the band of neon lamps; a dim
 * one counts as lit and as off.
 */
export function lampsFit(variant: Variant, lamps: LampPattern, slots: Slots): boolean {
  let least = STRIKE_VOLTS - STRIKE_BAND_VOLTS;
  let most = STRIKE_VOLTS + STRIKE_BAND_VOLTS;
  const shown: Lamp[] = slots === 2 ? [lamps.hn] : [lamps.hn, lamps.hg, lamps.ng];
  for (const [index, lamp] of shown.entries()) {
    const volts = variant.lampVolts[index] ?? 0;
    if (lamp === 'lit') most = Math.min(most, volts - LAMP_MATCH_VOLTS);
    if (lamp === 'off') least = Math.max(least, volts + LAMP_MATCH_VOLTS);
  }
  return least <= most;
}

/**
 * Whether the trio can be read on a hypothesis: on one of its variants, or between two neighbours of a family. With
 * `accept`, only on or beside variants that pass it.
 */
export function trioFits(
  { family }: Hypothesis,
  trio: VoltTrio,
  slots: Slots,
  loadsOff: boolean,
  accept: (variant: Variant) => boolean = () => true,
): boolean {
  const read: Trio = [trio.hn, trio.hg, trio.ng];
  const standing = loadsOff ? family.filter((variant) => !variant.wiring.removable) : family;
  return standing.some((variant, index) => {
    const next = standing[index + 1];
    if (!accept(variant) && !(next && accept(next))) return false;
    const here = variant.meterVolts(trio.meter);
    if (!next) return withinSupply(read, here, slots);
    const there = next.meterVolts(trio.meter);
    return BETWEEN.some((step) => withinSupply(read, blend(here, there, step), slots));
  });
}

/** As `trioFits`, of one variant alone. */
export function trioFitsVariant(variant: Variant, trio: VoltTrio, slots: Slots): boolean {
  return withinSupply([trio.hn, trio.hg, trio.ng], variant.meterVolts(trio.meter), slots);
}

function blend(a: Trio, b: Trio, step: number): Trio {
  const at = (x: number, y: number) => x + step * (y - x);
  return [at(a[0], b[0]), at(a[1], b[1]), at(a[2], b[2])];
}

/** Is there one supply voltage at which all pairs read what was read? */
function withinSupply(read: Trio, predicted: Trio, slots: Slots): boolean {
  let least = LEAST_SCALE;
  let most = MOST_SCALE;
  for (let pair = 0; pair < (slots === 2 ? 1 : 3); pair += 1) {
    const volts = Math.abs(read[pair] ?? 0);
    const expected = predicted[pair] ?? 0;
    const tolerance = TOLERANCE_VOLTS + TOLERANCE_SHARE * volts;
    if (expected < 0.5) {
      if (volts > tolerance) return false;
      continue;
    }
    least = Math.max(least, (volts - tolerance) / expected);
    most = Math.min(most, (volts + tolerance) / expected);
  }
  return least <= most && !isBeyondSupply(read, predicted, slots);
}

/** Of the pair that should read most: it is the supply, less what the loads on the circuit drop. */
function isBeyondSupply(read: Trio, predicted: Trio, slots: Slots): boolean {
  const pairs = slots === 2 ? 1 : 3;
  const expected = Math.max(...predicted.slice(0, pairs));
  if (expected < FULL_VOLTS) return false;
  const scale = Math.abs(read[predicted.indexOf(expected)] ?? 0) / Math.max(expected, NOMINAL_VOLTS);
  return scale < LEAST_SCALE * (1 - METER_ERROR) || scale > MOST_SCALE * (1 + METER_ERROR);
}

/**
 * What of a contact-sensor check counts. It can miss, so silence counts only where the hot slot answered in the same
 * check; it spreads half an inch from the hot slot, so an answer counts only beside a quiet hot slot or at the screw.
 */
export function sensorSays(sensor: ContactSensor): {
  groundLive: boolean;
  groundQuiet: boolean;
  neutralLive: boolean;
  neutralQuiet: boolean;
} {
  return {
    groundLive: sensor.coverScrew === true || (sensor.groundSlot === true && sensor.hotSlot === false),
    groundQuiet: sensor.groundSlot === false && sensor.hotSlot === true,
    neutralLive: sensor.neutralSlot === true && sensor.hotSlot === false,
    neutralQuiet: sensor.neutralSlot === false && sensor.hotSlot === true,
  };
}

/** Whether the slots of that variant can be as the sensor says. A two-slot face has no ground slot to judge. */
export function sensorFits(variant: Variant, sensor: ContactSensor, slots: Slots): boolean {
  const { groundLive, groundQuiet, neutralLive, neutralQuiet } = sensorSays(sensor);
  const { N, G } = variant.slotPotentials;
  if (neutralLive && N < SENSOR_LEAST_VOLTS) return false;
  if (neutralQuiet && N > SENSOR_SURE_VOLTS) return false;
  if (slots === 2) return true;
  return !(groundLive && G < SENSOR_LEAST_VOLTS) && !(groundQuiet && G > SENSOR_SURE_VOLTS);
}

/** Whether hot to neutral falls under the load as it did; the length of the cable is not known. */
export function loadTestFits(variant: Variant, test: LoadTest): boolean {
  if (!(test.amps > 0)) return true;
  const predictions = variant.loadVolts(loadAmps(test));
  const noLoads = predictions.map((prediction) => prediction.noLoad[0]);
  const tolerance = TOLERANCE_VOLTS + TOLERANCE_SHARE * test.noLoadHn;
  if (test.noLoadHn + tolerance < LEAST_SCALE * Math.min(...noLoads)) return false;
  if (test.noLoadHn - tolerance > MOST_SCALE * Math.max(...noLoads)) return false;
  if (test.noLoadHn < tolerance) return true;
  const ratios = predictions.map(({ noLoad, loaded }) => (noLoad[0] > 0 ? loaded[0] / noLoad[0] : 0));
  const ratio = test.loadedHn / test.noLoadHn;
  return ratio > Math.min(...ratios) - RATIO_TOLERANCE && ratio < Math.max(...ratios) + RATIO_TOLERANCE;
}

function loadAmps({ amps }: LoadTest): number {
  return Math.min(20, Math.max(1, Math.round(amps)));
}

/**
 * A low reading proves a path, so it speaks against every wiring without one. A high one speaks against a sound ground
 * alone: a poor ground can stand beside any other fault.
 */
export function groundOhmsFit(variant: Variant, ohms: number, condition: WiringCondition): boolean {
  if (condition === 'correct' && ohms > SOUND_GROUND_OHMS) return false;
  return variant.groundOhms <= Math.max(1.5 * SOUND_GROUND_OHMS, 5 * ohms);
}

/** All trios of the evidence, in the order given. */
export function triosOf({ volts, moreVolts = [] }: WiringEvidence): VoltTrio[] {
  return volts ? [volts, ...moreVolts] : [...moreVolts];
}

export function hasMeter(evidence: WiringEvidence, meter: Meter): boolean {
  return triosOf(evidence).some((trio) => trio.meter === meter);
}

/** "Unplugged" is plug-in loads only, so the circuit is without loads only when the hard-wired ones are off too. */
export function loadsAreOff({ loadsUnplugged, hardWiredLoadsOff }: WiringEvidence): boolean {
  return loadsUnplugged === 'yes' && hardWiredLoadsOff === 'yes';
}
