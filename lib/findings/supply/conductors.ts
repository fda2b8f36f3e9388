/**
 * Direct-current resistance of uncoated copper at 75 °C, in ohms per 1,000 ft and per km. NEC Chapter 9 Table 8; solid
 * values per 1,000 ft as published, stranded and metric ones from memory.
 */
export const COPPER = {
  14: { solidPerKft: 3.07, strandedPerKft: 3.14, solidPerKm: 10.1, strandedPerKm: 10.3 },
  12: { solidPerKft: 1.93, strandedPerKft: 1.98, solidPerKm: 6.34, strandedPerKm: 6.5 },
  10: { solidPerKft: 1.21, strandedPerKft: 1.24, solidPerKm: 3.984, strandedPerKm: 4.07 },
} as const;
export type CopperAwg = keyof typeof COPPER;

/** Aluminum at 75 °C, ohms per 1,000 ft. Same table, from memory. */
export const ALUMINUM_OHMS_PER_KFT = { 12: 3.18, 10: 2.0 } as const;

/** Copper at 20 °C has about 0.82 of its resistance at 75 °C (temperature coefficient 0.00323 from 75 °C). */
export const AT_20_C = 0.82;

/** Voltage drop out and back, V, over `feet` of cable (one way) at `amps`. Solid copper at 75 °C, NEC Chapter 9 Table 8. */
export function expectedDropVolts(awg: CopperAwg, feet: number, amps: number): number {
  return outAndBackOhmsPerFoot(awg) * feet * amps;
}

/** Longest run, ft one way, at which `percent` of `volts` is lost at `amps`. Same table. */
export function longestRunFeet(awg: CopperAwg, amps: number, percent: number, volts = 120): number {
  return ((percent / 100) * volts) / (outAndBackOhmsPerFoot(awg) * amps);
}

function outAndBackOhmsPerFoot(awg: CopperAwg): number {
  return (2 * COPPER[awg].solidPerKft) / 1000;
}
