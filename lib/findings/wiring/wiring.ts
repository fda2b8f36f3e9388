import type { Supply } from '../vocabulary';
import type { Branch, Circuit, CircuitNode, Phasor } from './circuit';

export type SlotNode = 'H' | 'N' | 'G';
type Rail = 'L1' | 'L2' | 'P';

/** One way in which a receptacle can be wired, loaded and placed. Ohms, watts at 120 V, farads. */
export type Wiring = {
  /** What the conductor behind each slot is tied to at the panel; absent where it is open. */
  ties: Partial<Record<SlotNode, Rail>>;
  /** Resistance of a joint in that conductor, ahead of the loads. */
  joints?: Partial<Record<SlotNode, number>>;
  /** Neutral and ground slot joined at the device. */
  jumper?: boolean;
  /** Loads of the circuit, as seen from the receptacle. */
  loads?: readonly { a: CircuitNode; b: CircuitNode; ohms: number }[];
  /** Its load between hot and neutral is the circuit's own, so that unplugging and switching off takes it away. */
  removable?: boolean;
  /** The service neutral has failed: what the two legs of the house draw against the bar, in watts. */
  legWatts?: readonly [number, number];
  /** Coupling to neighbours beyond the cable's own, in farads per slot. */
  stray?: { toEarth?: number; toLive?: number };
};

export const NOMINAL_VOLTS = 120;
/** 15 m of 12 AWG solid copper at 75 °C, 6.34 ohms per km (facts: NEC chapter 9, table 8). */
const CONDUCTOR_OHMS = 15 * 0.00634;
/** Flat cable lies hot, ground, neutral: 60 pF/m between neighbours, 20 pF/m hot to neutral, 5 pF/m to earth; 15 m. */
const ADJACENT_FARADS = 15 * 60e-12;
const FAR_FARADS = 15 * 20e-12;
const EARTH_FARADS = 15 * 5e-12;
const SERVICE_OHMS = 0.01;
const JUMPER_OHMS = 0.001;
/** The usual most that a single ground rod may have. */
const ELECTRODE_OHMS = 25;

/** Ohms of a resistive load from its watts at 120 V. */
export function ohmsOf(watts: number): number {
  return NOMINAL_VOLTS ** 2 / watts;
}

/** Potentials of the legs against earth: opposite on a split phase, a third of a turn apart on a wye. */
function legs(supply: Supply): { L1: Phasor; L2: Phasor } {
  const L1 = { re: NOMINAL_VOLTS, im: 0 };
  if (supply === '120/240') return { L1, L2: { re: -NOMINAL_VOLTS, im: 0 } };
  return { L1, L2: { re: -NOMINAL_VOLTS / 2, im: -NOMINAL_VOLTS * Math.sqrt(0.75) } };
}

/** The circuit of a wiring with nothing in its slots. `lengths` stretches the cable: 1 is 15 m. */
export function circuitOf(wiring: Wiring, supply: Supply, lengths = 1): Circuit {
  return { sources: legs(supply), branches: [...supplyBranches(wiring), ...cableBranches(wiring, lengths)] };
}

function supplyBranches({ legWatts }: Wiring): Branch[] {
  if (!legWatts) return [{ a: 'P', b: 'E', ohms: SERVICE_OHMS }];
  return [
    { a: 'P', b: 'E', ohms: ELECTRODE_OHMS },
    { a: 'L1', b: 'P', ohms: ohmsOf(legWatts[0]) },
    { a: 'L2', b: 'P', ohms: ohmsOf(legWatts[1]) },
  ];
}

function cableBranches({ ties, joints, jumper, loads = [], stray }: Wiring, lengths: number): Branch[] {
  const conductors = (['H', 'N', 'G'] as const).flatMap((slot): Branch[] => {
    const rail = ties[slot];
    return rail ? [{ a: rail, b: slot, ohms: lengths * CONDUCTOR_OHMS + (joints?.[slot] ?? 0) }] : [];
  });
  return [
    ...conductors,
    { a: 'H', b: 'G', farads: lengths * ADJACENT_FARADS },
    { a: 'N', b: 'G', farads: lengths * ADJACENT_FARADS },
    { a: 'H', b: 'N', farads: lengths * FAR_FARADS },
    ...(['H', 'N', 'G'] as const).map((slot) => ({ a: slot, b: 'E' as const, farads: lengths * EARTH_FARADS })),
    ...strayBranches(stray),
    ...(jumper ? [{ a: 'N' as const, b: 'G' as const, ohms: JUMPER_OHMS }] : []),
    ...loads,
  ];
}

function strayBranches(stray: Wiring['stray']): Branch[] {
  const of = (node: 'E' | 'L1', farads: number | undefined): Branch[] =>
    farads ? (['H', 'N', 'G'] as const).map((slot) => ({ a: slot, b: node, farads })) : [];
  return [...of('E', stray?.toEarth), ...of('L1', stray?.toLive)];
}
