import type { Meter, Supply } from '../vocabulary';
import {
  solveCircuit,
  solvePorts,
  voltsBetween,
  type Branch,
  type Circuit,
  type CircuitNode,
  type Phasor,
  type Ports,
  type Potentials,
} from './circuit';
import { circuitOf, NOMINAL_VOLTS, type SlotNode, type Wiring } from './wiring';

/** Hot–neutral, hot–ground, neutral–ground; V rms. */
export type Trio = readonly [number, number, number];
export type LoadPrediction = { noLoad: Trio; loaded: Trio };

const PAIRS = [
  ['H', 'N'],
  ['H', 'G'],
  ['N', 'G'],
] as const;
const METER_OHMS: Record<Meter, number> = { 'high-impedance': 10e6, 'low-impedance': 3000 };
/** A neon lamp with its series resistor, all three in the slots at once. */
const LAMP_OHMS = 200_000;
/** Volts at which a neon lamp lights; real ones differ by about this band. */
export const STRIKE_VOLTS = 75;
export const STRIKE_BAND_VOLTS = 8;
const LOAD_LENGTHS = [1, 4.5] as const;

/** A wiring with what each instrument would read on it. Each is worked out once, when first asked for. */
export class Variant {
  #ports?: Ports;
  #lamps?: Trio;
  #potentials?: Record<SlotNode, number>;
  #groundOhms?: number;
  #meters: Partial<Record<Meter, Trio>> = {};
  #loads = new Map<number, readonly LoadPrediction[]>();

  constructor(
    readonly wiring: Wiring,
    readonly supply: Supply,
  ) {}

  /** V rms over each lamp with all three plugged in. */
  get lampVolts(): Trio {
    this.#lamps ??= trioOf(solveCircuit(withBranches(this.#circuit(), lampBranches())));
    return this.#lamps;
  }

  /** V rms that a meter shows, one pair at a time. */
  meterVolts(meter: Meter): Trio {
    const known = this.#meters[meter];
    if (known) return known;
    const ports = this.#solved();
    const read = (a: SlotNode, b: SlotNode) => voltsAcross(ports, a, b, METER_OHMS[meter]);
    const trio: Trio = [read('H', 'N'), read('H', 'G'), read('N', 'G')];
    this.#meters[meter] = trio;
    return trio;
  }

  /** V rms of each slot against earth with nothing in the slots: what a non-contact sensor feels. */
  get slotPotentials(): Record<SlotNode, number> {
    const against = (slot: SlotNode) => voltsBetween(this.#solved().open, slot, 'E');
    this.#potentials ??= { H: against('H'), N: against('N'), G: against('G') };
    return this.#potentials;
  }

  /** Impedance in ohms from the ground slot to the bar of the panel, sources at rest. */
  get groundOhms(): number {
    if (this.#groundOhms === undefined) {
      const { re, im } = impedance(this.#solved(), 'G', 'P');
      this.#groundOhms = Math.hypot(re, im);
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
        loaded: trioOf(solveCircuit(withBranches(circuit, [{ a: 'H', b: 'N', ohms }]))),
      };
    });
    this.#loads.set(amps, predictions);
    return predictions;
  }

  #solved(): Ports {
    this.#ports ??= solvePorts(this.#circuit(), ['H', 'N', 'G', 'P']);
    return this.#ports;
  }

  #circuit(lengths?: number): Circuit {
    return circuitOf(this.wiring, this.supply, lengths);
  }
}

/** Thévenin: the open voltage, divided between the source's own impedance and the instrument. */
function voltsAcross(ports: Ports, a: SlotNode, b: SlotNode, ohms: number): number {
  const { re, im } = impedance(ports, a, b);
  return (voltsBetween(ports.open, a, b) * ohms) / Math.hypot(ohms + re, im);
}

function impedance({ driven }: Ports, a: CircuitNode, b: CircuitNode): Phasor {
  const at = (node: CircuitNode, port: CircuitNode) => driven[port]?.[node] ?? { re: 0, im: 0 };
  const part = (key: keyof Phasor) => at(a, a)[key] + at(b, b)[key] - at(a, b)[key] - at(b, a)[key];
  return { re: part('re'), im: part('im') };
}

function lampBranches(): Branch[] {
  return PAIRS.map(([a, b]) => ({ a, b, ohms: LAMP_OHMS }));
}

function withBranches(circuit: Circuit, more: readonly Branch[]): Circuit {
  return { ...circuit, branches: [...circuit.branches, ...more] };
}

function trioOf(potentials: Potentials): Trio {
  const read = (a: CircuitNode, b: CircuitNode) => voltsBetween(potentials, a, b);
  return [read('H', 'N'), read('H', 'G'), read('N', 'G')];
}
