import type { WiringEvidence } from '../facts';
import { bitsOf } from '../evidence';
import type { WiringCondition } from '../vocabulary';
import { loadsAreOff, sensorSays, triosOf } from './fit';
import { assessGround } from './standing';

/** What the evidence at a receptacle cannot tell, in sentences; never empty. */
export function listNotProven(fitting: readonly WiringCondition[], evidence: WiringEvidence, read: boolean): string[] {
  if (!read) return ['Nothing was read here, so nothing about this wiring is known.', ...faceLimits(evidence)];
  return [
    ...lampLimits(evidence),
    ...(fitting.includes('correct') ? correctLimits(fitting, evidence) : []),
    ...meterLimits(evidence),
    ...sensorLimits(evidence),
    ...loadLimits(fitting, evidence),
    ...loadTestLimits(evidence),
    ...groundLimits(evidence),
    ...faceLimits(evidence),
    'This covers the slots that were read, as they were at that moment, and not the other half of a split outlet, a switch, or joints elsewhere on the circuit.',
  ];
}

function lampLimits({ lamps, slots }: WiringEvidence): string[] {
  if (!lamps) return [];
  const limits = [
    'Lamps do not show how good a ground is, neutral and ground swapped, a jumper in place of a ground, or several faults at once.',
  ];
  if (Object.values(lamps).includes('dim'))
    limits.push('A dim lamp can count as lit or as off, so both were considered; it never excludes a live ground.');
  const bits = bitsOf(lamps);
  if ((slots === 3 && bits === '000') || (slots === 2 && lamps.hn === 'off'))
    limits.push(
      'Lamps off does not mean power off: treat the slots, the ground and any metal case as live until a sensor, proved on a known live outlet, stays quiet.',
    );
  return limits;
}

function correctLimits(fitting: readonly WiringCondition[], { slots, wiringMethod }: WiringEvidence): string[] {
  if (slots === 2) return [];
  const limits: string[] = [];
  if (fitting.includes('bootleg-ground'))
    limits.push('That the ground slot reaches a real ground is unproven: a jumper to the neutral reads the same.');
  if (fitting.includes('reversed-bootleg-ground'))
    limits.push(
      'That the ground slot is not live is unproven: swapped wires with a jumper read the same on lamps and meters.',
    );
  if (fitting.includes('shared-neutral-open') || fitting.includes('service-neutral-open'))
    limits.push('That the neutral holds when the loads on the two legs of the supply differ is unproven.');
  if (wiringMethod === 'two-wire')
    limits.push('The ground is unproven: two-wire cable brings none, whatever the ground slot reads.');
  return limits;
}

function meterLimits(evidence: WiringEvidence): string[] {
  const trios = triosOf(evidence);
  if (trios.length === 0) return [];
  const limits = ['Voltage without load does not show a joint that fails under load.'];
  if (trios.every((trio) => trio.meter === 'high-impedance'))
    limits.push(
      'On a high-impedance meter a wire tied to nothing shows a phantom voltage, from a few volts to most of the line.',
    );
  return limits;
}

function sensorLimits({ sensor, lamps, slots }: WiringEvidence): string[] {
  if (!sensor) return [];
  const limits: string[] = [];
  const silent = sensor.groundSlot === false || sensor.neutralSlot === false || sensor.coverScrew === false;
  if (silent && sensor.hotSlot !== true)
    limits.push('The live-wire sensor did not answer at the hot slot, so its silence elsewhere proves nothing.');
  if (sensor.groundSlot && !sensorSays(sensor).groundLive)
    limits.push(
      'The live-wire sensor reaches half an inch from the hot slot, so its answer at the ground slot may be the hot slot’s. Treat the ground as live until the cover screw is tried.',
    );
  if (sensor.groundSlot && lamps && bitsOf(lamps) === '100')
    limits.push('Without a ground, the answer at the ground slot may be a phantom voltage. Treat it as live.');
  if (slots === 2 && sensor.coverScrew)
    limits.push(
      'Why the cover screw is live is unproven: this face has no ground slot to read. Treat the metal as live.',
    );
  return limits;
}

function loadLimits(fitting: readonly WiringCondition[], evidence: WiringEvidence): string[] {
  const { loadsUnplugged, lamps } = evidence;
  if (!lamps || loadsAreOff(evidence) || !fitting.some((condition) => condition !== 'correct')) return [];
  if (loadsUnplugged === 'yes')
    return [
      'Plug-in loads were out; what is wired in (lights, alarms, a doorbell transformer) can still change the lamps.',
    ];
  return ['What is plugged in or wired in elsewhere on the circuit can change the lamps.'];
}

function loadTestLimits(evidence: WiringEvidence): string[] {
  const load = assessGround(evidence);
  if (!load || evidence.slots === 2) return [];
  const limits = ['The load test is about hot and neutral: it says nothing of the resistance of the ground path.'];
  switch (load.ground) {
    case 'no-joint-here':
      limits.push(
        'A jumper farther upstream, and swapped wires with a jumper here, are not excluded by the load test.',
      );
      break;
    case 'suspected':
      limits.push(
        evidence.nearBondedPanel === undefined
          ? 'A jumper is suspected and not proven, and only if the receptacle is not near the panel.'
          : 'A jumper is suspected and not proven: the load test only raises the suspicion.',
      );
      break;
    case 'undecided':
      limits.push('The load test does not decide whether neutral and ground are joined here.');
      break;
    case 'not-assessed':
    case 'neutral-doubtful':
      limits.push('The load test does not judge whether neutral and ground are joined here.');
      break;
  }
  return limits;
}

function groundLimits({ groundOhms, slots }: WiringEvidence): string[] {
  if (groundOhms === undefined || slots === 2) return [];
  return ['A reading of the ground path in ohms cannot tell a ground wire from a jumper to the neutral.'];
}

function faceLimits({ slots, nominalVolts }: WiringEvidence): string[] {
  if (slots === 2)
    return ['Polarity is unproven, and whether the box has a ground: a two-slot face offers one reading only.'];
  return nominalVolts === 240
    ? ['Which leg is on which slot is unproven, and so is the neutral of the circuit if it has one.']
    : [];
}
