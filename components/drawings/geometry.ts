import type { SlotPattern, WiringCondition } from '@/lib/findings/vocabulary';

/**
 * Millimeters, origin at the center of the face, y down, seen from the front, ground below. Of 1-15R, 5-15R and 5-20R
 * the spacing (0.500 in), the slots (0.075 by 0.330 and 0.265 in), the arm of the T (0.290 in over all, pointing out),
 * the ground (0.205 in, 0.468 in below the blades) are the least sizes of ANSI/NEMA WD 6-2016, read from a published
 * table of them and not from the standard itself. 6-15R and 6-20R keep those slots, but their spacing, all of 10-30R,
 * 14-30R and 14-50R, and every outline of a face are from memory.
 */
export type Terminal = 'H' | 'N' | 'G' | 'X' | 'Y';
export type SlotShape = 'blade' | 'tee-left' | 'tee-right' | 'ell' | 'arch';
export type Slot = {
  terminal: Terminal;
  shape: SlotShape;
  x: number;
  y: number;
  width: number;
  height: number;
  turn: number;
};
export type Face = { outline: 'flat-round' | 'round'; radius: number; flat: number; volts: 120 | 240; slots: Slot[] };

const slot = (
  terminal: Terminal,
  shape: SlotShape,
  x: number,
  y: number,
  width: number,
  height: number,
  turn = 0,
): Slot => ({
  terminal,
  shape,
  x,
  y,
  width,
  height,
  turn,
});
const small = (volts: 120 | 240, slots: Slot[]): Face => ({
  outline: 'flat-round',
  radius: 17.05,
  flat: 14.3,
  volts,
  slots,
});
const large = (slots: Slot[]): Face => ({ outline: 'round', radius: 27, flat: 27, volts: 240, slots });
const BLADE = 1.9;
const WIDE = 8.4;
const NARROW = 6.7;
const ARCH = slot('G', 'arch', 0, 6.9, 5.2, 5.2);
const neutralAt = (y: number, shape: 'blade' | 'tee-left' = 'blade') => slot('N', shape, -6.35, y, BLADE, WIDE);
const hotAt = (y: number) => slot('H', 'blade', 6.35, y, BLADE, NARROW);

export const FACES: Record<SlotPattern, Face> = {
  '5-15R': small(120, [neutralAt(-5), hotAt(-5), ARCH]),
  '5-20R': small(120, [neutralAt(-5, 'tee-left'), hotAt(-5), ARCH]),
  '1-15R': small(120, [neutralAt(0), hotAt(0)]),
  '6-15R': small(240, [
    slot('X', 'blade', -8.3, -5, BLADE, NARROW, 90),
    slot('Y', 'blade', 8.3, -5, BLADE, NARROW, 90),
    ARCH,
  ]),
  '6-20R': small(240, [
    slot('X', 'blade', -8.3, -5, BLADE, NARROW, 90),
    slot('Y', 'tee-right', 6.35, -5, BLADE, NARROW),
    ARCH,
  ]),
  '10-30R': large([
    slot('X', 'blade', -9.6, -5.5, 2.7, 11, 30),
    slot('Y', 'blade', 9.6, -5.5, 2.7, 11, -30),
    slot('N', 'ell', 0, 11.5, 2.7, 10.5),
  ]),
  '14-30R': large([
    slot('X', 'blade', -11.9, 0, 2.7, 10.5),
    slot('Y', 'blade', 11.9, 0, 2.7, 10.5),
    slot('N', 'ell', 0, 13, 2.7, 10.5),
    slot('G', 'arch', 0, -13, 5.6, 5.6),
  ]),
  '14-50R': large([
    slot('X', 'blade', -11.9, 0, 2.7, 12.5),
    slot('Y', 'blade', 11.9, 0, 2.7, 12.5),
    slot('N', 'blade', 0, 13, 2.7, 11),
    slot('G', 'arch', 0, -13, 5.6, 5.6),
  ]),
};

/** Supply wires: neutral, ground, hot, the other leg, the same leg again. */
export type Supply = 'N' | 'G' | 'H' | 'X' | 'S';
export type Screw = 'N' | 'G' | 'H';
export type Wiring = {
  wires: Partial<Record<Screw, Supply>>;
  open?: Screw[];
  poor?: Screw[];
  /** An open wire is drawn broken near the supply, or near the screw where other wires cross below. */
  breakAt?: 'supply' | 'screw';
  jumper?: boolean;
  /** What joins hot to an open wire: a load that is plugged in, or a leak. */
  bridge?: { to: 'N' | 'G'; word: string };
  /** Loads of the other leg hang on the same neutral. */
  otherLeg?: boolean;
  live?: ('N' | 'G' | 'H')[];
  /** A word at the supply, for what lies upstream. */
  upstream?: string;
  says: string;
};

const straight = { N: 'N', G: 'G', H: 'H' } as const;

/** Which supply wire reaches which screw, what is open, what is live where it should not be. */
export const WIRINGS: Record<WiringCondition, Wiring> = {
  correct: { wires: straight, says: 'Hot, neutral and ground each on their own screw.' },
  'open-ground': { wires: straight, open: ['G'], says: 'The ground wire is open before this receptacle.' },
  'open-neutral': { wires: straight, open: ['N'], says: 'The neutral wire is open before this receptacle.' },
  'open-neutral-with-load': {
    wires: straight,
    open: ['N'],
    bridge: { to: 'N', word: 'LOAD' },
    live: ['N'],
    says: 'The neutral is open upstream, and something that is on makes the neutral slot live.',
  },
  'open-hot': { wires: straight, open: ['H'], says: 'The hot wire is open before this receptacle.' },
  'no-power': { wires: straight, upstream: 'OFF UPSTREAM', says: 'The wires may all be whole; no power arrives.' },
  'hot-neutral-reversed': {
    wires: { N: 'H', G: 'G', H: 'N' },
    live: ['N'],
    says: 'Hot and neutral are on each other’s screw.',
  },
  'hot-ground-reversed': {
    wires: { N: 'N', G: 'H', H: 'G' },
    live: ['G'],
    says: 'Hot and ground are on each other’s screw. The ground slot is live.',
  },
  'hot-on-neutral-hot-open': {
    wires: { N: 'H', G: 'G', H: 'N' },
    open: ['H'],
    breakAt: 'screw',
    live: ['N'],
    says: 'The hot wire is on the neutral screw. The hot screw has no whole wire.',
  },
  'hot-on-ground-hot-open': {
    wires: { N: 'N', G: 'H', H: 'G' },
    open: ['H'],
    breakAt: 'screw',
    live: ['G'],
    says: 'The hot wire is on the ground screw. The hot screw has no whole wire. The ground slot is live.',
  },
  'neutral-on-hot-hot-on-ground-neutral-open': {
    wires: { N: 'G', G: 'H', H: 'N' },
    open: ['N'],
    breakAt: 'screw',
    live: ['G'],
    says: 'The neutral wire is on the hot screw and the hot wire on the ground screw. The ground slot is live.',
  },
  'neutral-ground-swapped': {
    wires: { N: 'G', G: 'N', H: 'H' },
    says: 'Neutral and ground are on each other’s screw.',
  },
  'bootleg-ground': {
    wires: { N: 'N', H: 'H' },
    jumper: true,
    says: 'No ground wire. A jumper joins the ground screw to neutral.',
  },
  'reversed-bootleg-ground': {
    wires: { N: 'H', H: 'N' },
    jumper: true,
    live: ['N', 'G'],
    says: 'Hot and neutral are reversed, and a jumper joins the ground screw to the neutral screw. The ground slot is live.',
  },
  'open-ground-hot-neutral-reversed': {
    wires: { N: 'H', G: 'G', H: 'N' },
    open: ['G'],
    breakAt: 'screw',
    live: ['N'],
    says: 'Hot and neutral are reversed, and the ground wire is open.',
  },
  'open-neutral-and-ground': {
    wires: straight,
    open: ['N', 'G'],
    says: 'Neutral and ground are both open before this receptacle.',
  },
  'same-leg-on-both': { wires: { N: 'S', G: 'G', H: 'H' }, live: ['N'], says: 'Both slots are hot, on the same leg.' },
  'line-to-line-240': {
    wires: { N: 'X', G: 'G', H: 'H' },
    live: ['N'],
    says: 'Both slots are hot, on opposite legs: 240 volts.',
  },
  'shared-neutral-open': {
    wires: straight,
    open: ['N'],
    bridge: { to: 'N', word: 'LOAD' },
    otherLeg: true,
    live: ['N'],
    says: 'A neutral shared by two legs is open upstream. The loads of both legs now share 240 volts.',
  },
  'service-neutral-open': {
    wires: straight,
    upstream: 'NEUTRAL OPEN AT THE SERVICE',
    says: 'The service neutral is open or poor. The two legs no longer hold 120 volts each.',
  },
  'high-resistance-ground': { wires: straight, poor: ['G'], says: 'The ground path has a poor joint upstream.' },
  'high-resistance-neutral': { wires: straight, poor: ['N'], says: 'The neutral has a poor joint upstream.' },
  'high-resistance-hot': { wires: straight, poor: ['H'], says: 'The hot wire has a poor joint upstream.' },
  'bootleg-ground-open-neutral': {
    wires: { N: 'N', H: 'H' },
    open: ['N'],
    jumper: true,
    bridge: { to: 'N', word: 'LOAD' },
    live: ['N', 'G'],
    says: 'A jumper joins the ground screw to a neutral that is open upstream. All three slots are live.',
  },
  'open-ground-energized': {
    wires: straight,
    open: ['G'],
    bridge: { to: 'G', word: 'LEAK' },
    live: ['G'],
    says: 'The ground wire is open, and a fault on something connected makes it live.',
  },
};
