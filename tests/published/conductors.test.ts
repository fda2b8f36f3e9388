import { expect, test } from 'vitest';
import {
  ALUMINUM_OHMS_PER_KFT,
  AT_20_C,
  COPPER,
  expectedDropVolts,
  longestRunFeet,
} from '@/lib/findings/supply/conductors';

const FEET_PER_KM = 3280.84;

// NEC Chapter 9 Table 8, uncoated copper at 75 °C, solid, ohms per 1,000 ft: published [S24].
test.each([
  [14, 3.07],
  [12, 1.93],
  [10, 1.21],
] as const)('AWG %s solid copper has %s ohms per 1,000 ft', (awg, ohms) => {
  expect(COPPER[awg].solidPerKft).toBe(ohms);
});

// The same table, stranded and per km: from memory.
test.each([
  [14, 3.14, 10.1, 10.3],
  [12, 1.98, 6.34, 6.5],
  [10, 1.24, 3.984, 4.07],
] as const)(
  'AWG %s copper has %s ohms per 1,000 ft stranded, %s and %s per km',
  (awg, stranded, solidKm, strandedKm) => {
    expect(COPPER[awg]).toMatchObject({
      strandedPerKft: stranded,
      solidPerKm: solidKm,
      strandedPerKm: strandedKm,
    });
  },
);

test('the two columns of the table are one resistance', () => {
  // Derived: 1 km is 3,280.84 ft. The metric column is rounded to three digits.
  for (const { solidPerKft, solidPerKm, strandedPerKft, strandedPerKm } of Object.values(COPPER)) {
    expect(Math.abs((solidPerKft * FEET_PER_KM) / 1000 / solidPerKm - 1)).toBeLessThan(0.005);
    expect(Math.abs((strandedPerKft * FEET_PER_KM) / 1000 / strandedPerKm - 1)).toBeLessThan(0.005);
  }
});

test('aluminum of one size has about 1.65 times the resistance of copper', () => {
  // 3.18 and 2.00 ohms per 1,000 ft: the same table, from memory. The ratio is derived.
  expect(ALUMINUM_OHMS_PER_KFT).toEqual({ 12: 3.18, 10: 2 });
  expect(ALUMINUM_OHMS_PER_KFT[12] / COPPER[12].solidPerKft).toBeCloseTo(1.65, 1);
});

test('copper at 20 °C has 82 % of its resistance at 75 °C', () => {
  // Published about 82 % [S24]; derived from the coefficient 0.00323 per °C at 75 °C.
  expect(1 + 0.00323 * (20 - 75)).toBeCloseTo(AT_20_C, 2);
});

// Worked drops of facts section 4, derived from the solid column at 75 °C: volts and percent of 120 V.
test.each([
  [14, 50, 12, 3.68, 3.07],
  [14, 100, 15, 9.21, 7.67],
  [12, 50, 16, 3.09, 2.57],
  [12, 100, 20, 7.72, 6.43],
] as const)('AWG %s over %s ft at %s A loses %s V, %s %%', (awg, feet, amps, volts, percent) => {
  const drop = expectedDropVolts(awg, feet, amps);
  expect(Math.abs(drop - volts)).toBeLessThan(0.01);
  expect(Math.abs(drop / 1.2 - percent)).toBeLessThan(0.01);
});

// Worked lengths of facts section 4, derived: 3 % of 120 V, the advice of the informational note to NEC 210.19 [S25].
test.each([
  [14, 12, 48.9],
  [14, 15, 39.1],
  [12, 16, 58.3],
  [12, 20, 46.6],
] as const)('AWG %s at %s A loses 3 %% over %s ft', (awg, amps, feet) => {
  expect(longestRunFeet(awg, amps, 3)).toBeCloseTo(feet, 1);
});
