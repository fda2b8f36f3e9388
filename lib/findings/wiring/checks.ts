import type { ContactSensor, LampPattern, LoadTest, VoltTrio, WiringEvidence } from '../facts';
import { assessLoadTest } from '../supply/load-test';
import { WIRING_CHECKS, type Meter, type WiringCheck, type WiringCondition } from '../vocabulary';
import { hasMeter, loadsAreOff } from './fit';
import { STRIKE_VOLTS, Variant } from './instruments';
import { piecesOf, standingUnder, type Piece } from './pieces';

export const CHECK_KINDS = WIRING_CHECKS;
export type CheckKind = WiringCheck;

/** What the candidates that stand can do to whoever touches metal there. */
export type Danger = { liveGround: boolean; openGround: boolean };

/** What the model says a check would show on one variant: a label, equal where the answers could not be told apart. */
export type Outcome = string;

const SENSOR_TYPICAL_VOLTS = 55;
const TEST_AMPS = 12;

/** Whether the check could still bring something that the evidence does not hold. */
export function isOpen(kind: CheckKind, evidence: WiringEvidence): boolean {
  const { lamps, loadTest, groundOhms, powerChecked, slots } = evidence;
  switch (kind) {
    case 'sensor':
      return !sensorIsDone(evidence);
    case 'power':
      return powerChecked !== true;
    case 'unplug':
      return lamps !== undefined && !loadsAreOff(evidence);
    case 'high-impedance':
      return !hasMeter(evidence, 'high-impedance');
    case 'low-impedance-neutral':
      return slots === 3 && !hasMeter(evidence, 'low-impedance');
    case 'low-impedance-all':
      return !hasMeter(evidence, 'low-impedance');
    case 'load-test':
      return loadTest === undefined;
    case 'ground-ohms':
      return slots === 3 && groundOhms === undefined;
  }
}

function sensorIsDone({ sensor, slots }: WiringEvidence): boolean {
  if (!sensor || sensor.hotSlot === undefined) return false;
  if (slots === 2) return sensor.neutralSlot !== undefined;
  if (sensor.groundSlot === undefined) return sensor.coverScrew === true;
  // Both slots answer: the screw, which is farther off, decides.
  return !(sensor.groundSlot && sensor.hotSlot) || sensor.coverScrew !== undefined;
}

/**
 * What a check would show on a variant, as the set of conditions that its answer leaves standing. So a check tells two
 * conditions apart exactly where `diagnoseWiring` would.
 */
export function outcomeOf(
  kind: CheckKind,
  variant: Variant,
  condition: WiringCondition,
  evidence: WiringEvidence,
): Outcome {
  const { slots, nominalVolts, supply, loadsUnplugged, hardWiredLoadsOff } = evidence;
  const circuit: WiringEvidence = { slots, nominalVolts, supply, loadsUnplugged, hardWiredLoadsOff };
  switch (kind) {
    case 'sensor':
      return leftBy({ ...circuit, sensor: sensorOn(variant) });
    case 'power':
      return condition === 'no-power' ? 'off' : 'on';
    case 'unplug': {
      const lamps = lampsOn(unloaded(variant));
      return leftBy({ ...circuit, lamps, loadsUnplugged: 'yes', hardWiredLoadsOff: 'yes' });
    }
    case 'high-impedance':
      return leftBy({ ...circuit, volts: trioOn(variant, 'high-impedance') });
    case 'low-impedance-neutral':
      return `neutral to ground ${Math.round(variant.meterVolts('low-impedance')[2] / 40)}`;
    case 'low-impedance-all':
      return leftBy({ ...circuit, volts: trioOn(variant, 'low-impedance') });
    case 'load-test':
      return loadOutcome(variant, circuit, evidence);
    case 'ground-ohms':
      return leftBy({ ...circuit, groundOhms: Number(variant.groundOhms.toPrecision(2)) });
  }
}

function leftBy(reading: WiringEvidence): Outcome {
  const read = piecesOf(reading).find((piece) => READINGS.includes(piece.kind));
  if (!read) return '';
  return [...new Set([...standingUnder(read, reading)].map(({ condition }) => condition))].join();
}

const READINGS: readonly Piece['kind'][] = ['sensor', 'lamps', 'volts', 'load-test', 'ground-ohms'];

/** A meter reads whole volts here, so that like readings are worked out once. */
function trioOn(variant: Variant, meter: Meter): VoltTrio {
  const [hn, hg, ng] = variant.meterVolts(meter);
  return { hn: Math.round(hn), hg: Math.round(hg), ng: Math.round(ng), meter };
}

/** The false-ground rule only moves the suspicion, so its answer counts beside what the drop excludes. */
function loadOutcome(variant: Variant, circuit: WiringEvidence, evidence: WiringEvidence): Outcome {
  // A long cable: on a short one the load moves too little to judge the ground.
  const long = variant.loadVolts(TEST_AMPS).at(-1);
  if (!long || long.noLoad[0] < 1) return 'no voltage to load';
  const tenths = (volts: number) => Math.round(volts * 10) / 10;
  const loadTest: LoadTest = {
    amps: TEST_AMPS,
    noLoadHn: tenths(long.noLoad[0]),
    loadedHn: tenths(long.loaded[0]),
    noLoadNg: tenths(long.noLoad[2]),
    loadedNg: tenths(long.loaded[2]),
  };
  const { nearBondedPanel, sharedNeutral } = evidence;
  const { ground } = assessLoadTest(loadTest, { nearBondedPanel, sharedNeutral });
  return `${leftBy({ ...circuit, loadTest })} ${ground}`;
}

function sensorOn(variant: Variant): ContactSensor {
  const { H, N, G } = variant.slotPotentials;
  const answers = (volts: number) => volts >= SENSOR_TYPICAL_VOLTS;
  return { hotSlot: answers(H), neutralSlot: answers(N), groundSlot: answers(G), coverScrew: answers(G) };
}

function lampsOn(variant: Variant): LampPattern {
  const lamp = (volts: number) => (volts >= STRIKE_VOLTS ? 'lit' : 'off');
  const [hn, hg, ng] = variant.lampVolts;
  return { hn: lamp(hn), hg: lamp(hg), ng: lamp(ng) };
}

const withoutLoads = new WeakMap<Variant, Variant>();

function unloaded(variant: Variant): Variant {
  if (!variant.wiring.removable) return variant;
  // Only what hangs between hot and neutral is the circuit's own; a leak or another circuit's load stays.
  const loads = variant.wiring.loads?.filter((load) => !(load.a === 'H' && load.b === 'N'));
  const known = withoutLoads.get(variant) ?? new Variant({ ...variant.wiring, loads }, variant.supply);
  withoutLoads.set(variant, known);
  return known;
}
