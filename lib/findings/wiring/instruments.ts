import type { Meter, Supply } from '../vocabulary';
import { solveCircuit, voltsBetween, type Branch, type Circuit, type CircuitNode, type Potentials } from './circuit';
import { circuitOf, NOMINAL_VOLTS, type SlotNode, type Wiring } from './wiring';

/** Hot–neutral, hot–ground, neutral–ground; V rms. */
export type Trio = readonly [number, number, number];
export type LoadPrediction = { noLoad: Trio; loaded: Trio };

export const PAIRS = [
  ['H', 'N'],
  ['H', 'G'],
  ['N', 'G'],
] as const;
export const METER_OHMS: Record<Meter, number> = { 'high-impedance': 10e6, 'low-impedance': 3000 };
/** A neon lamp with its series resistor, all three in the slots at once. */
export const LAMP_OHMS = 200_000;
/** Volts at which a neon lamp lights; real ones differ by about this band. */
export const STRIKE_VOLTS = 75;
export const STRIKE_BAND_VOLTS = 8;
const LOAD_LENGTHS = [1, 4.5] as const;

/** A wiring with what each instrument would read on it. Each is solved once, when first asked for. */
export class Variant {
  #lamps?: Trio;
  #meters: Partial<Record<Meter, Trio>> = {};
  #potentials?: Record<SlotNode, number>;
  #groundOhms?: number;
  #loads = new Map<number, readonly LoadPrediction[]>();

  constructor(
    readonly wiring: Wiring,
    readonly supply: Supply,
  ) {}

  /** V rms over each lamp with all three plugged in. */
  get lampVolts(): Trio {
    this.#lamps ??= trioOf(withBranches(this.#circuit(), lampBranches()));
    return this.#lamps;
  }

  /** V rms that a meter shows, one pair at a time. */
  meterVolts(meter: Meter): Trio {
    const known = this.#meters[meter];
    if (known) return known;
    const read = PAIRS.map(([a, b]) =>
      voltsBetween(withBranches(this.#circuit(), [{ a, b, ohms: METER_OHMS[meter] }]), a, b),
    );
    const trio: Trio = [read[0] ?? 0, read[1] ?? 0, read[2] ?? 0];
    this.#meters[meter] = trio;
    return trio;
  }

  /** V rms of each slot against earth with nothing in the slots: what a non-contact sensor feels. */
  get slotPotentials(): Record<SlotNode, number> {
    if (!this.#potentials) {
      const solved = solveCircuit(this.#circuit());
      const against = (slot: SlotNode) => voltsBetween(solved, slot, 'E');
      this.#potentials = { H: against('H'), N: against('N'), G: against('G') };
    }
    return this.#potentials;
  }

  /** Impedance in ohms from the ground slot to the bar of the panel, sources at rest. */
  get groundOhms(): number {
    if (this.#groundOhms === undefined) {
      const { branches } = this.#circuit();
      const rest = { re: 0, im: 0 };
      const solved = solveCircuit({ sources: { L1: rest, L2: rest }, branches, drive: { into: 'G', outOf: 'P' } });
      this.#groundOhms = voltsBetween(solved, 'G', 'P');
    }
    return this.#groundOhms;
  }

  /** Before and under a plug-in load of so many amperes at 120 V, on a short and on a long cable. */
  loadVolts(amps: number): readonly LoadPrediction[] {
    const known = this.#loads.get(amps);
    if (known) return known;
    const ohms = NOMINAL_VOLTS / amps;
    const predictions = LOAD_LENGTHS.map((lengths) => {
      const circuit = this.#circuit(lengths);
      return {
        noLoad: trioOf(solveCircuit(circuit)),
        loaded: trioOf(withBranches(circuit, [{ a: 'H', b: 'N', ohms }])),
      };
    });
    this.#loads.set(amps, predictions);
    return predictions;
  }

  #circuit(lengths?: number): Circuit {
    return circuitOf(this.wiring, this.supply, lengths);
  }
}

function lampBranches(): Branch[] {
  return PAIRS.map(([a, b]) => ({ a, b, ohms: LAMP_OHMS }));
}

function withBranches(circuit: Circuit, more: readonly Branch[]): Potentials {
  return solveCircuit({ ...circuit, branches: [...circuit.branches, ...more] });
}

function trioOf(potentials: Potentials): Trio {
  const read = (a: CircuitNode, b: CircuitNode) => voltsBetween(potentials, a, b);
  return [read('H', 'N'), read('H', 'G'), read('N', 'G')];
}
