import type { WiringEvidence } from '../facts';
import type { CheckKind, Danger } from './checks';

/** The check in the imperative, with what keeps the person who does it from harm. */
export function instructionFor(kind: CheckKind, evidence: WiringEvidence, danger: Danger): string {
  const caution = danger.liveGround ? LIVE_CAUTION : danger.openGround ? OPEN_CAUTION : '';
  return `${TEXTS[kind](evidence)}${caution}`;
}

const LIVE_CAUTION =
  ' The ground slot, the cover and any appliance case may be live: touch no metal, and treat them as live whatever the lamps show.';
const OPEN_CAUTION = ' The ground may be open: touch no metal of the cover or of an appliance while testing.';

const TEXTS: Record<CheckKind, (evidence: WiringEvidence) => string> = {
  sensor: sensorText,
  power: () =>
    'Check that the breaker is on, that no GFCI upstream has tripped and that no wall switch feeds this outlet. Then read again.',
  unplug: () =>
    'Switch off and unplug everything on this circuit, holding plugs by their insulated bodies, and switch off what is wired in: lights, smoke alarms, a doorbell transformer. Then read the lamps again.',
  'high-impedance': ({ slots }) =>
    slots === 2
      ? 'With a high-impedance meter, read the voltage between the two slots. Keep fingers behind the guards of the probes.'
      : 'With a high-impedance meter, read hot to neutral, hot to ground and neutral to ground. Keep fingers behind the guards of the probes.',
  'low-impedance-neutral': () =>
    'Set the meter to low impedance and read neutral to ground, and no other pair on that setting.',
  'low-impedance-all': ({ slots }) =>
    slots === 2
      ? 'Set the meter to low impedance and read the voltage between the two slots.'
      : 'Set the meter to low impedance and read neutral to ground, hot to neutral and last hot to ground. The last draws about 40 milliamperes and trips a GFCI: first make sure that nothing on this circuit has to stay on.',
  'load-test': () =>
    'Do a load test: read hot to neutral and neutral to ground without load, then with a 12 to 15 ampere plug-in load, and take the load off at once. Where another circuit may share the neutral, have that one off. Leave it out where there is heat damage, or where something on this circuit has to stay on.',
  'ground-ohms': () =>
    'Read the ground path in ohms with a ground-impedance instrument. It trips GFCIs, and it has no place near medical equipment.',
};

function sensorText({ slots, sensor }: WiringEvidence): string {
  if (slots === 2)
    return 'Prove the non-contact sensor on an outlet known to be live, then hold it to the hot slot and to the neutral slot. Its silence counts only where the hot slot answers.';
  if (sensor?.groundSlot !== undefined && sensor.hotSlot !== undefined)
    return 'Hold the non-contact sensor to the cover screw, away from the hot slot. Prove the sensor on an outlet known to be live before and after.';
  return 'Prove the non-contact sensor on an outlet known to be live, then hold it to the hot slot, the neutral slot, the ground slot and the cover screw. Its silence counts only where the hot slot answers.';
}
