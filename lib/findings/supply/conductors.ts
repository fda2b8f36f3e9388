/** Ohms per 1,000 ft of uncoated copper at 75 °C, DC. NEC Chapter 9 Table 8; stranded values from memory. */
export const OHMS_PER_KFT = {
  14: { solid: 3.07, stranded: 3.14 },
  12: { solid: 1.93, stranded: 1.98 },
  10: { solid: 1.21, stranded: 1.24 },
} as const;
export type CopperAwg = keyof typeof OHMS_PER_KFT;

/** Copper at 20 °C has about 0.82 of its resistance at 75 °C (temperature coefficient 0.00323 from 75 °C). */
export const AT_20_C = 0.82;

/** Voltage drop out and back, V, over `feet` of cable (one way) at `amps`. Solid copper at 75 °C, NEC Chapter 9 Table 8. */
export function expectedDropVolts(awg: CopperAwg, feet: number, amps: number): number {
  return ((2 * OHMS_PER_KFT[awg].solid) / 1000) * feet * amps;
}

/** Longest run, ft one way, at which `percent` of `volts` is lost at `amps`. Same table. */
export function longestRunFeet(awg: CopperAwg, amps: number, percent: number, volts = 120): number {
  return ((percent / 100) * volts) / (((2 * OHMS_PER_KFT[awg].solid) / 1000) * amps);
}
