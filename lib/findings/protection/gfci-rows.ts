import type { GfciTrial } from '../facts';
import type { GfciVerdict, Protects } from '../vocabulary';
import { maxTripSeconds } from './trip-time';

/**
 * A trial as the table reads it: which bits the lamps showed before, what the lamps said of the ground, and whether a
 * tester result was set aside because of them.
 */
export type Seen = GfciTrial & {
  bits: string | undefined;
  ground: 'yes' | 'no' | 'unknown';
  testerSetAside?: boolean;
};
export type Row = {
  id: string;
  verdict: GfciVerdict;
  protects?: Protects;
  when: (t: Seen) => boolean;
  says: string | ((t: Seen) => string);
};

const HOLD_BITS = ['001', '010', '011', '111'];
export const trips = (result: GfciTrial['button']) => result === 'trips';
const tripped = (t: Seen) => trips(t.button) || trips(t.tester);
const upstreamKilled = (t: Seen) => trips(t.button) && t.faceDead === true;

/** Before any row that uses the tester's result. First match wins. */
export const FIRST: Row[] = [
  {
    id: 'D03',
    verdict: 'replace',
    when: (t) => t.endOfLife === true,
    says: 'The device says that it has reached its end of life. Replace it, whatever else it showed.',
  },
  {
    id: 'D18',
    verdict: 'power-left-off',
    when: (t) => t.device === 'downstream' && trips(t.tester) && t.resets !== true && !upstreamKilled(t),
    says: 'The tester put something out that is not back on. Find the device, or say what is off and who was told.',
  },
  {
    id: 'D09',
    verdict: 'no-reset',
    when: (t) => t.device !== 'downstream' && t.button === undefined && trips(t.tester) && t.resets === false,
    says: 'It tripped and does not reset. Leave it off and tell the occupant.',
  },
  {
    id: 'D02',
    verdict: 'no-power',
    when: (t) => (t.deadBefore === true && t.resets !== true) || (t.bits === '000' && t.button === 'no-trip'),
    says: 'No power reached it. It may have tripped, be tripped upstream, be miswired or be at its end of life. This is not a trip test, and a dead device is not a failed one.',
  },
  {
    id: 'D00',
    verdict: 'hold',
    when: (t) => HOLD_BITS.includes(t.bits ?? ''),
    says: 'Press no button. Find and mend the wiring first: a GFCI cannot work without its neutral, and the hot may still be live. Protection is unproven.',
  },
];

export const HELD: Row[] = [
  {
    id: 'D00',
    verdict: 'hold',
    when: (t) => (t.bits === '101' || t.bits === '000') && t.button === undefined && t.tester === undefined,
    says: 'The lamps do not read correct. Describe the wiring, and do not press the tester’s button here.',
  },
  {
    id: 'D01',
    verdict: 'not-tested',
    when: (t) => t.button === undefined && t.tester === undefined && Boolean(t.notTestedReason?.trim()),
    says: 'It was not tested, for the reason given. Its protection is unproven.',
  },
  {
    id: 'D01',
    verdict: 'reason-required',
    when: (t) => t.button === undefined && t.tester === undefined,
    says: 'It was not tested. Say why.',
  },
];

const INCOMPLETE = 'D04';

export const DOWNSTREAM: Row[] = [
  {
    id: 'D09',
    verdict: 'no-reset',
    when: (t) => upstreamKilled(t) && t.resets === false,
    says: 'The upstream device put it out and does not reset. Leave it off and tell the occupant.',
  },
  {
    id: INCOMPLETE,
    verdict: 'incomplete',
    when: (t) => upstreamKilled(t) && t.resets === undefined,
    says: 'It went dead on the upstream button. Confirm that it came back.',
  },
  {
    id: 'D15',
    verdict: 'upstream-protects-no-ground',
    protects: 'yes',
    when: (t) => upstreamKilled(t) && t.ground === 'no',
    says: 'It went dead on the upstream button: that is the proof of protection. The lamps show no ground. This reduces shock and gives no ground; it is not for refrigerators or washers. Check for both marks on the plate.',
  },
  {
    id: 'D26',
    verdict: 'upstream-protects-ground-doubtful',
    protects: 'yes',
    when: (t) => upstreamKilled(t) && t.ground === 'yes' && t.tester === 'no-trip',
    says: 'It went dead on the upstream button, and the tester’s ground test did nothing. The ground is doubtful. A reversed jumper ground ahead of the device leaves a case live with no trip: use the contact sensor first.',
  },
  {
    id: 'D14',
    verdict: 'upstream-protects',
    protects: 'yes',
    when: (t) => upstreamKilled(t) || trips(t.tester),
    says: upstreamWords,
  },
  {
    id: 'D17',
    verdict: 'unconfirmed-tester-invalid',
    when: (t) => t.ground !== 'yes',
    says: 'Without a ground the plug-in tester cannot decide. Protection is unproven.',
  },
  { id: 'D16', verdict: 'unconfirmed', when: () => true, says: 'No protection was shown at this point.' },
];

export const OWN_DEVICE: Row[] = [
  {
    id: 'D05',
    verdict: 'line-load-reversed',
    protects: 'no',
    when: (t) => tripped(t) && t.faceDead === false && t.downstreamDead === true,
    says: 'Points behind it go dead and its own face stays live. Line and load are most likely reversed; the face has no protection.',
  },
  {
    id: 'D06',
    verdict: 'face-stays-live',
    protects: 'no',
    when: (t) => tripped(t) && t.faceDead === false,
    says: 'It clicks, and its face stays live. The face has no protection.',
  },
  {
    id: 'D08',
    verdict: 'button-failed',
    when: (t) => t.button === 'no-trip' && trips(t.tester),
    says: 'Its own button does nothing, so nobody can do the monthly test. Replace it.',
  },
  {
    id: 'D07',
    verdict: 'failed',
    protects: 'no',
    when: (t) => t.button === 'no-trip',
    says: 'Its own button does nothing. No protection was shown. Replace it.',
  },
  {
    id: INCOMPLETE,
    verdict: 'incomplete',
    when: (t) => trips(t.button) && t.faceDead === undefined,
    says: 'It trips. Confirm that its face is dead.',
  },
  {
    id: 'D09',
    verdict: 'no-reset',
    when: (t) => trips(t.button) && t.resets === false,
    says: 'It trips and does not reset: end of life, a standing fault, or a neutral that touches ground behind it. Leave it off and tell the occupant.',
  },
  {
    id: 'D10',
    verdict: 'load-side-fault',
    when: (t) => t.retrips === 'unloaded',
    says: 'It trips again with everything unplugged. The wiring behind it leaks, or a neutral touches ground there.',
  },
  {
    id: 'D11',
    verdict: 'appliance-suspected',
    when: (t) => t.retrips === 'with-appliance',
    says: 'It trips again with one appliance. The appliance is suspect.',
  },
  {
    id: 'D21',
    verdict: 'slow',
    protects: 'no',
    when: isSlow,
    says: 'It opened later than the standard allows at the current that the analyzer showed. Replace it.',
  },
  {
    id: INCOMPLETE,
    verdict: 'incomplete',
    when: (t) => trips(t.button) && t.resets === undefined,
    says: 'It trips. Confirm that it resets.',
  },
  {
    id: 'D27',
    verdict: 'breaker-type-unproven',
    when: (t) =>
      trips(t.button) &&
      t.device === 'breaker' &&
      t.breakerMarking !== 'class-a-gfci' &&
      t.breakerMarking !== 'dual-function',
    says: 'The breaker’s button works, but nothing shows that it protects people from shock. An AFCI’s button does not say so, and its tester result says nothing of the ground.',
  },
  {
    id: 'D13',
    verdict: 'ground-doubtful',
    when: (t) => trips(t.button) && t.tester === 'no-trip' && t.ground === 'yes',
    says: 'The device works by its own button. The tester’s current from hot to ground did not trip it: the ground may be false or poor, or the tester’s current or the voltage low. With a false ground the case may be live: use the contact sensor first.',
  },
  {
    id: 'D22',
    verdict: 'works-button-only',
    protects: 'yes',
    when: (t) => trips(t.button) && t.tester === 'no-trip' && t.ground === 'unknown',
    says: 'It works by its own button. The tester did nothing; whether there is a ground was not read.',
  },
  {
    id: 'D12',
    verdict: 'works-no-ground',
    protects: 'yes',
    when: (t) => trips(t.button) && t.ground === 'no',
    says: (t) =>
      `It works by its own button. ${trips(t.tester) ? 'The lamps show no ground, and yet the tester tripped it' : 'The lamps show no ground, so a plug-in tester cannot trip it, and that says nothing against it'}. It reduces shock and gives no ground; it is not for refrigerators or washers. Check for the mark “No Equipment Ground”.`,
  },
  {
    id: 'D19',
    verdict: 'breaker-works',
    protects: 'yes',
    when: (t) => trips(t.button) && t.device === 'breaker' && t.tester === undefined,
    says: 'The breaker works by its own button. It protects the points that went dead.',
  },
  {
    id: 'D20',
    verdict: 'works-upstream-tripped-first',
    protects: 'yes',
    when: (t) => trips(t.button) && trips(t.tester) && t.upstreamTrippedFirst === true,
    says: 'It works by its own button. The tester tripped another device upstream first, so this one is proven by its button only.',
  },
  {
    id: 'D24',
    verdict: 'works-local-only',
    protects: 'yes',
    when: (t) => trips(t.button) && trips(t.tester) && t.downstreamDead === false,
    says: 'It works by its button and by the tester. The other point that was tried is not fed through it.',
  },
  {
    id: 'D23',
    verdict: 'works',
    protects: 'yes',
    when: (t) => trips(t.button) && trips(t.tester),
    says: 'It works by its button and by the tester. Points that went dead with it are protected too. This does not prove a real ground: a jumper to the neutral before it trips it as well.',
  },
  {
    id: 'D22',
    verdict: 'works-button-only',
    protects: 'yes',
    when: (t) => trips(t.button),
    says: (t) =>
      t.testerSetAside
        ? 'It works by its own button. With these lamps the tester’s result does not count.'
        : 'It works by its own button. The tester was not used.',
  },
  {
    id: 'D25',
    verdict: 'tester-only',
    when: (t) => trips(t.tester),
    says: (t) =>
      t.resets === true
        ? 'The tester tripped it and it reset. Its own button was not pressed.'
        : 'The tester tripped it. Its own button was not pressed. Confirm that it is back on.',
  },
  {
    id: 'D16',
    verdict: 'unconfirmed',
    when: (t) => t.ground === 'yes',
    says: 'The tester did nothing, and its own button was not pressed. No protection was shown.',
  },
  {
    id: 'D17',
    verdict: 'unconfirmed-tester-invalid',
    when: () => true,
    says: 'Without a ground the plug-in tester cannot decide, and its own button was not pressed. Protection is unproven.',
  },
];

function isSlow({ measured }: Seen): boolean {
  if (!measured) return false;
  const limit = maxTripSeconds(measured.milliamps);
  return limit !== null && measured.seconds > limit;
}

function upstreamWords(t: Seen): string {
  if (upstreamKilled(t)) return 'It went dead on the upstream device’s button and came back: that device protects it.';
  const where = t.deviceFound ? 'That device was found.' : 'Where that device is was not recorded.';
  const other = t.button === undefined ? 'a GFCI upstream' : 'a GFCI other than the one whose button was pressed';
  return `The tester put it out and it came back: ${other} protects it. ${where}`;
}
