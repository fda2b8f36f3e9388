import type { WiringCondition } from '../vocabulary';

/** Why a condition reads as it does, in one or two sentences for the person with the meter. */
export const MECHANISMS: Record<WiringCondition, string> = {
  correct: 'hot, neutral and ground read as they should at this moment; the same reading hides several faults',
  'open-ground': 'the ground slot is tied to nothing, so it floats; a meter of high impedance shows a phantom voltage',
  'open-neutral': 'the neutral is broken and nothing on the circuit carries current to the neutral slot',
  'open-neutral-with-load':
    'the neutral is broken and something still connected carries hot across to the neutral slot; a smoke alarm, a doorbell transformer or a hard-wired light is enough',
  'open-hot': 'the hot wire does not reach the hot slot; the broken end can still be live behind the face',
  'no-power': 'a breaker, a tripped GFCI or a wall switch keeps the circuit off',
  'hot-neutral-reversed': 'hot and neutral are swapped, with the ground sound',
  'hot-ground-reversed': 'hot is on the ground slot, so the case of whatever is plugged in is live',
  'hot-on-neutral-hot-open': 'hot is on the neutral slot and nothing feeds the hot slot',
  'hot-on-ground-hot-open': 'hot is on the ground slot and nothing feeds the hot slot; a case plugged in is live',
  'neutral-on-hot-hot-on-ground-neutral-open':
    'hot is on the ground slot, neutral on the hot slot and nothing on the neutral slot; a case plugged in is live',
  'neutral-ground-swapped': 'neutral and ground meet at the panel, so swapping them changes no lamp and no voltage',
  'bootleg-ground': 'a jumper from the neutral makes the ground slot read like a ground',
  'reversed-bootleg-ground':
    'with hot and neutral swapped and a jumper to the ground slot, lamps and meters read as they should while a case plugged in is live',
  'open-ground-hot-neutral-reversed': 'without a ground, lamps and meters cannot tell which slot is hot',
  'open-neutral-and-ground': 'with neutral and ground both broken no lamp has a way back, though the hot slot is live',
  'same-leg-on-both': 'hot and neutral slot are on one leg, so nothing shows between them',
  'line-to-line-240': 'hot and neutral slot are on two legs of the supply',
  'shared-neutral-open':
    'the neutral that two circuits share is broken, so the loads on both legs divide the voltage and it moves as they change',
  'service-neutral-open':
    'the neutral of the service lets go, so both legs move against each other while neutral to ground stays near 0; even loads hide it',
  'high-resistance-ground': 'a poor ground joint passes the little current of lamps and meters and would limit a fault',
  'high-resistance-neutral': 'a poor neutral joint shows only while current flows: neutral to ground rises',
  'high-resistance-hot':
    'a poor hot joint shows only while current flows: hot to neutral and hot to ground fall together',
  'bootleg-ground-open-neutral':
    'a jumper joins neutral and ground slot and the neutral is broken upstream, so all three slots are live and nothing shows between them',
  'open-ground-energized':
    'the ground is broken and a fault, often of an appliance on the circuit, brings hot to the ground slot and every case on it',
};
