import type { LampPattern } from '../facts';
import { lampsInWords } from '../evidence';
import type { Lamp, Meter, Supply, WiringCondition } from '../vocabulary';
import type { Slots } from './fit';
import { hypothesesFor, type Hypothesis } from './hypotheses';
import { STRIKE_VOLTS, Variant, type Trio } from './instruments';
import { ohmsOf, type Wiring } from './wiring';

export type ReadingOptions = {
  nominalVolts?: 120 | 240;
  supply?: Supply;
  /** Watts at 120 V of what is connected here. */
  loadWatts?: number;
  /** Watts at 120 V on the other leg of a shared neutral. */
  otherLegWatts?: number;
  /** The bad joint of a high-resistance condition, in ohms. */
  jointOhms?: number;
  /** From hot to an open ground that a fault energizes, in ohms. */
  leakOhms?: number;
  /** What the two legs of the house draw in watts where the service neutral is open. */
  legWatts?: readonly [number, number];
};

export type ExpectedReadings = {
  lamps: LampPattern;
  highImpedance: [number, number, number];
  lowImpedance: [number, number, number];
};

/**
 * What lamps and both meters show on a condition, V rms at a 120 V supply, from the circuit model: 15 m of 12 AWG flat
 * cable, 200 kilohm lamps that strike at 75 V, 10 megohm and 3 kilohm meters, one pair at a time. Options set what is
 * not known of a real one; without them the loads, joint and leak are those of facts.md section 3. Throws where a
 * receptacle of that voltage cannot have the condition.
 */
export function expectedReadings(condition: WiringCondition, options: ReadingOptions = {}): ExpectedReadings {
  const variant = variantFor(condition, options);
  return {
    lamps: lampsOf(variant),
    highImpedance: [...variant.meterVolts('high-impedance')],
    lowImpedance: [...variant.meterVolts('low-impedance')],
  };
}

/** The single variant that `expectedReadings` speaks of. */
export function variantFor(condition: WiringCondition, options: ReadingOptions = {}): Variant {
  const { nominalVolts = 120, supply = '120/240' } = options;
  const wiring = typicalWiring(condition, options);
  if (wiring && nominalVolts === 120) return new Variant(wiring, supply);
  const hypothesis = hypothesesFor(nominalVolts, supply).find((row) => row.condition === condition);
  const variant = hypothesis && nominalOf(hypothesis);
  if (!variant) throw new RangeError(`a ${nominalVolts} volt receptacle cannot have ${condition}`);
  return variant;
}

const GOOD: Wiring['ties'] = { H: 'L1', N: 'P', G: 'P' };

/** Conditions whose readings depend on a size. */
function typicalWiring(condition: WiringCondition, options: ReadingOptions): Wiring | undefined {
  const { loadWatts = 100, otherLegWatts = 200, jointOhms, leakOhms = 20_000, legWatts = [1000, 2350] } = options;
  const atNeutral = { a: 'H', b: 'N', ohms: ohmsOf(loadWatts) } as const;
  const heater = { a: 'H', b: 'N', ohms: ohmsOf(options.loadWatts ?? 1500) } as const;
  switch (condition) {
    case 'open-neutral-with-load':
      return { ties: { H: 'L1', G: 'P' }, loads: [atNeutral] };
    case 'bootleg-ground-open-neutral':
      return { ties: { H: 'L1' }, jumper: true, loads: [atNeutral] };
    case 'shared-neutral-open':
      return {
        ties: { H: 'L1', G: 'P' },
        loads: [atNeutral, { a: 'L2', b: 'N', ohms: ohmsOf(otherLegWatts) }],
      };
    case 'service-neutral-open':
      return { ties: GOOD, legWatts };
    case 'high-resistance-neutral':
      return { ties: GOOD, joints: { N: jointOhms ?? 5 }, loads: [heater] };
    case 'high-resistance-hot':
      return { ties: GOOD, joints: { H: jointOhms ?? 5 }, loads: [heater] };
    case 'high-resistance-ground':
      return { ties: GOOD, joints: { G: jointOhms ?? 25 } };
    case 'open-ground-energized':
      return { ties: { H: 'L1', N: 'P' }, loads: [{ a: 'H', b: 'G', ohms: leakOhms }] };
    default:
      return undefined;
  }
}

/** The variant of the plain cable, without other coupling; else the first. */
function nominalOf({ family }: Hypothesis, loadsOff = false): Variant | undefined {
  const standing = loadsOff ? family.filter((variant) => !variant.wiring.removable) : family;
  return standing.find((variant) => !variant.wiring.stray) ?? standing[0] ?? family[0];
}

function lampsOf(variant: Variant): LampPattern {
  const [hn, hg, ng] = variant.lampVolts.map((volts): Lamp => (volts >= STRIKE_VOLTS ? 'lit' : 'off'));
  return { hn: hn ?? 'off', hg: hg ?? 'off', ng: ng ?? 'off' };
}

const typical = new Map<WiringCondition, Variant>();

function typicalOf(hypothesis: Hypothesis, loadsOff: boolean): Variant | undefined {
  const nominal = nominalOf(hypothesis, loadsOff);
  const wiring = typicalWiring(hypothesis.condition, {});
  // A 240 V receptacle, or a circuit without loads, has no typical load.
  if (!wiring || loadsOff || !nominal || nominal.wiring.ties.N === 'L2') return nominal;
  const known = typical.get(hypothesis.condition) ?? new Variant(wiring, '120/240');
  typical.set(hypothesis.condition, known);
  return known;
}

/** In words, for the reason why a condition is ruled out. */
export function predictedLamps(hypothesis: Hypothesis, loadsOff: boolean, slots: Slots): string {
  const variant = typicalOf(hypothesis, loadsOff);
  if (!variant) return 'nothing';
  const lamps = lampsOf(variant);
  return slots === 2 ? `hot to neutral ${lamps.hn}` : lampsInWords(lamps);
}

/** "about 120, 62 and 57 volts" in the order hot–neutral, hot–ground, neutral–ground. */
export function predictedVolts(hypothesis: Hypothesis, meter: Meter, loadsOff: boolean, slots: Slots): string {
  const variant = typicalOf(hypothesis, loadsOff);
  if (!variant) return 'nothing';
  const [hn, hg, ng] = roundTrio(variant.meterVolts(meter));
  return slots === 2 ? `about ${hn} volts` : `about ${hn}, ${hg} and ${ng} volts`;
}

function roundTrio(trio: Trio): Trio {
  return [Math.round(trio[0]), Math.round(trio[1]), Math.round(trio[2])];
}
