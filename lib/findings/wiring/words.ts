import type { LampPattern, WiringEvidence } from '../facts';
import type { WiringCondition } from '../vocabulary';
import { lampsOf, type Prediction, type Trio } from './predict';

/** Why a condition fits, said once the readings do. */
export const BECAUSE: Record<WiringCondition, string> = {
  correct: 'Every reading is that of hot, neutral and ground each on its own slot.',
  'open-ground': 'Hot and neutral are there; the ground slot is joined to nothing.',
  'open-neutral': 'Hot reaches the slot and finds its way back by the ground only.',
  'open-neutral-with-load': 'With the neutral open, a load that is on makes the neutral slot live.',
  'open-hot': 'No hot arrives at the hot slot.',
  'no-power': 'A breaker that is off, a tripped device or a wall switch reads the same as a broken hot wire.',
  'hot-neutral-reversed': 'The neutral slot is live against ground and the hot slot is not.',
  'hot-ground-reversed': 'The ground slot would be live; it is rare, and it can kill.',
  'hot-on-neutral-hot-open': 'The neutral slot is live and the hot slot has no wire that carries.',
  'hot-on-ground-hot-open': 'The ground slot would be live and the hot slot has no wire that carries.',
  'neutral-on-hot-hot-on-ground-neutral-open':
    'The ground slot would be live, the hot slot neutral, and the neutral slot open.',
  'neutral-ground-swapped': 'Neutral and ground meet at the service, so their swap reads the same as correct.',
  'bootleg-ground': 'A jumper from neutral to the ground slot reads the same as a ground.',
  'reversed-bootleg-ground':
    'With hot and neutral swapped as well, the lamps see the same three differences; the case would be live.',
  'open-ground-hot-neutral-reversed': 'Without a ground there is nothing to compare hot and neutral with.',
  'open-neutral-and-ground': 'Hot may be there with nothing to compare it with.',
  'same-leg-on-both': 'Both slots would be on the same leg, with no voltage between them.',
  'line-to-line-240': 'The two slots are on opposite legs.',
  'shared-neutral-open':
    'With a shared neutral open, the loads of two legs divide 240 volts, and the lamps may still look correct.',
  'service-neutral-open': 'With the service neutral open, hot to neutral and hot to ground move together.',
  'high-resistance-ground': 'Lamps and meters hardly load a ground, so a poor joint in it does not show.',
  'high-resistance-neutral': 'A poor joint in the neutral shows only under load.',
  'high-resistance-hot': 'A poor joint in the hot wire shows only under load.',
  'bootleg-ground-open-neutral':
    'With a jumper and an open neutral all three slots may be live at the same voltage, and no lamp or meter sees it.',
  'open-ground-energized': 'A ground slot that is cut off and made live by a fault reads as hot and neutral reversed.',
};

export function lampWords({ hn, hg, ng }: LampPattern): string {
  return `hot to neutral ${hn}, hot to ground ${hg}, neutral to ground ${ng}`;
}

function voltWords([hn, hg, ng]: Trio, two: boolean): string {
  const shown = two ? [hn] : [hn, hg, ng];
  return `${shown.map((volts) => Math.round(volts)).join(', ')} volts`;
}

/** Why a condition does not fit: what the named evidence would have shown. */
export function ruledOutWords(prediction: Prediction, piece: string, two: boolean): string {
  switch (piece) {
    case 'the lamps': {
      const lamps = lampsOf(prediction.lampVolts);
      return two ? `The lamp would be ${lamps.hn}.` : `The lamps would read ${lampWords(lamps)}.`;
    }
    case 'the high-impedance meter':
      return `A high-impedance meter would read about ${voltWords(prediction.highImpedance, two)}.`;
    case 'the low-impedance meter':
      return `A low-impedance meter would read about ${voltWords(prediction.lowImpedance, two)}.`;
    case 'the contact sensor':
      return prediction.slots.G.driven
        ? 'The sensor would answer at the ground slot.'
        : 'The sensor would not answer there.';
    case 'the load test':
      return 'A load could not have been run, or not with these voltages.';
    case 'the ground path reading':
      return 'The ground path would have read otherwise.';
    default:
      return `It does not go with ${piece}.`;
  }
}

/** What the evidence cannot tell, most general last; never empty. */
export function notProvenWords(evidence: WiringEvidence, remaining: WiringCondition[]): string[] {
  const { lamps, volts, moreVolts, sensor, loadTest, groundOhms, slots } = evidence;
  const metered = volts !== undefined || (moreVolts?.length ?? 0) > 0;
  const words: string[] = [];
  if (!lamps && !metered && !sensor && !loadTest && groundOhms === undefined) words.push('Nothing was read here.');
  if (slots === 2) words.push('There is no ground slot to read. With one link, which slot is hot is unproven.');
  const dark =
    lamps !== undefined && [lamps.hn, ...(slots === 3 ? [lamps.hg, lamps.ng] : [])].every((lamp) => lamp !== 'lit');
  if (dark)
    words.push(
      'Lamps off does not mean power off. Treat the ground slot and cases as live until a proved sensor stays quiet.',
    );
  if (lamps && slots === 3 && lamps.hn === 'lit' && lamps.hg === 'lit' && lamps.ng === 'off') {
    words.push(
      'Lamps compare the slots with each other. They cannot see a jumper from neutral to ground, neutral and ground swapped, or a live ground with hot and neutral swapped.',
    );
  }
  if (lamps && Object.values(lamps).includes('dim'))
    words.push('A dim lamp may count as lit or as off; both were kept.');
  if (sensor && sensor.groundSlot === false) words.push('A quiet sensor can miss a live slot.');
  if (groundOhms !== undefined && remaining.includes('bootleg-ground'))
    words.push('A low reading does not tell a ground from a jumper to neutral.');
  if (
    groundOhms === undefined &&
    slots === 3 &&
    remaining.some((condition) => condition === 'correct' || condition === 'high-resistance-ground')
  ) {
    words.push('The quality of the ground was not measured.');
  }
  if (!loadTest && remaining.some((condition) => condition.startsWith('high-resistance')))
    words.push('Joints were not tested under load.');
  words.push('Wiring behind the wall was not seen, and loads elsewhere can change a reading.');
  return words;
}
