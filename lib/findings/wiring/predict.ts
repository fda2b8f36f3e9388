import type { LampPattern } from '../facts';
import type { Lamp, Meter, Supply, WiringCondition } from '../vocabulary';
import { againstEarth, between, solveCircuit, type Circuit, type Instrument, type Slot } from './circuit';
import { HYPOTHESES, HYPOTHESES_240, type Variant } from './hypotheses';

/** Between hot and neutral, hot and ground, neutral and ground. */
export type Trio = [hn: number, hg: number, ng: number];
export const PAIRS: readonly [Slot, Slot][] = [
  ['H', 'N'],
  ['H', 'G'],
  ['N', 'G'],
];

/** A lamp lights at about this, V rms (strike voltage of the model). */
export const STRIKE_VOLTS = 75;
const LAMP_OHMS = 100_000;
const METER_OHMS: Record<Meter, number> = { 'high-impedance': 10_000_000, 'low-impedance': 3_000 };
/** A sensor answers above about this against earth, V rms. */
export const SENSOR_VOLTS = 40;
const TEST_LOAD_OHMS = 10;

export type Prediction = {
  condition: WiringCondition;
  variant: Variant;
  lampVolts: Trio;
  highImpedance: Trio;
  lowImpedance: Trio;
  /** True where only the cable's capacitance makes the high-impedance reading. */
  phantom: [boolean, boolean, boolean];
  /** Against earth with nothing plugged in, V rms, and whether a wire drives it. */
  slots: Record<Slot, { volts: number; driven: boolean }>;
  /** Hot to neutral and neutral to ground under a 12 A load, V rms. */
  loaded: { hn: number; ng: number };
};

let known: { at120: Prediction[]; at240: Prediction[] } | undefined;

/** Every variant of every condition, solved once. */
export function predictions(nominal: 120 | 240): Prediction[] {
  known ??= { at120: predictAll(HYPOTHESES), at240: predictAll(HYPOTHESES_240) };
  return nominal === 240 ? known.at240 : known.at120;
}

function predictAll(hypotheses: Partial<Record<WiringCondition, Variant[]>>): Prediction[] {
  return Object.entries(hypotheses).flatMap(([condition, variants]) =>
    variants.map((variant) => predict(condition as WiringCondition, variant)),
  );
}

function predict(condition: WiringCondition, variant: Variant): Prediction {
  const { circuit } = variant;
  const lamps = solveCircuit(
    circuit,
    PAIRS.map((pair) => ({ between: pair, ohms: LAMP_OHMS })),
  );
  const idle = solveCircuit(circuit, []);
  const bare = solveCircuit(circuit, [], false);
  const underLoad = solveCircuit(circuit, [{ between: ['H', 'N'], ohms: TEST_LOAD_OHMS }]);
  const highImpedance = meterTrio(circuit, 'high-impedance');
  const withoutCable = meterTrio(circuit, 'high-impedance', false);
  const slotOf = (slot: Slot) => ({ volts: againstEarth(idle, slot), driven: againstEarth(bare, slot) > SENSOR_VOLTS });
  return {
    condition,
    variant,
    lampVolts: trio((a, b) => between(lamps, a, b)),
    highImpedance,
    lowImpedance: meterTrio(circuit, 'low-impedance'),
    phantom: [0, 1, 2].map(
      (i) => Math.abs((highImpedance[i] ?? 0) - (withoutCable[i] ?? 0)) > 5,
    ) as Prediction['phantom'],
    slots: { H: slotOf('H'), N: slotOf('N'), G: slotOf('G') },
    loaded: { hn: between(underLoad, 'H', 'N'), ng: between(underLoad, 'N', 'G') },
  };
}

/** One pair at a time, the other slots empty. */
function meterTrio(circuit: Circuit, meter: Meter, withCable = true): Trio {
  return trio((a, b) => {
    const instrument: Instrument = [{ between: [a, b], ohms: METER_OHMS[meter] }];
    return between(solveCircuit(circuit, instrument, withCable), a, b);
  });
}

function trio(read: (a: Slot, b: Slot) => number): Trio {
  return PAIRS.map(([a, b]) => read(a, b)) as Trio;
}

export function lampsOf(volts: Trio): LampPattern {
  const [hn, hg, ng] = volts.map((one): Lamp => (one >= STRIKE_VOLTS ? 'lit' : 'off'));
  return { hn: hn ?? 'off', hg: hg ?? 'off', ng: ng ?? 'off' };
}

/**
 * What a condition shows, from the circuit model: the three lamps, and a meter of 10 megohms and of 3 kilohms one pair at
 * a time, V rms [hn, hg, ng], with 15 m of flat cable and 120 V. `supply` chooses 120/240 (default) or 208Y/120;
 * `variant` one of the condition's examples. Throws where there is no such example.
 */
export function expectedReadings(
  condition: WiringCondition,
  opts: { supply?: Supply; variant?: number } = {},
): { lamps: LampPattern; highImpedance: Trio; lowImpedance: Trio } {
  const fitting = predictions(120).filter(
    ({ condition: other, variant }) =>
      other === condition && (variant.only === undefined || variant.only === (opts.supply ?? '120/240')),
  );
  const found = fitting[opts.variant ?? 0];
  if (!found) throw new RangeError(`no such example of ${condition}`);
  return { lamps: lampsOf(found.lampVolts), highImpedance: found.highImpedance, lowImpedance: found.lowImpedance };
}
