import { expect, test } from 'vitest';
import { maxTripSeconds } from '@/lib/findings/protection/gfci';

// "UL 943 Class A trip-time curve", T = (20 / I)^1.43, I in mA, from 6 to 264 mA: published [S1] [S2].
// The values are worked from the formula; they hold within 0.5 %.
test.each([
  [6, 5.594],
  [7, 4.487],
  [8, 3.707],
  [9, 3.133],
  [10, 2.694],
  [15, 1.509],
  [20, 1],
  [30, 0.56],
  [50, 0.27],
  [60, 0.2078],
  [80, 0.1377],
  [100, 0.1001],
  [120, 0.0771],
  [150, 0.0561],
  [200, 0.0372],
  [240, 0.0286],
  [264, 0.02498],
])('at %s mA a Class A GFCI opens within %s s', (milliamps, seconds) => {
  expect(Math.abs((maxTripSeconds(milliamps) ?? 0) / seconds - 1)).toBeLessThan(0.005);
});

test('at 20 mA the limit is one second exactly', () => {
  expect(maxTripSeconds(20)).toBe(1);
});

test('at 264 mA the formula still holds, a hair below the 25 ms that follow', () => {
  expect(maxTripSeconds(264)).toBeCloseTo(0.02498, 5);
});

test('nothing obliges a device to open below 6 mA', () => {
  // Must trip at 6 mA or more, must not below 4 mA: UL 943, published [S1] [S3]. Between them both conform.
  for (const milliamps of [0, 3.9, 4, 5, 5.99]) expect(maxTripSeconds(milliamps)).toBeNull();
});

test('above 264 mA the limit stays at 25 ms', () => {
  // The formula's range ends at 264 mA, 132 V over 500 ohms; 25 ms as quoted [S40b].
  for (const milliamps of [264.1, 300, 5000]) expect(maxTripSeconds(milliamps)).toBe(0.025);
});

test.each([
  [1, 20],
  [0.1, 100.08],
  [0.025, 263.85],
])('the curve gives %s s at %s mA', (seconds, milliamps) => {
  // Inverse of the curve, derived: I = 20 · T^(−1/1.43).
  expect(20 * seconds ** (-1 / 1.43)).toBeCloseTo(milliamps, 1);
  expect(maxTripSeconds(milliamps)).toBeCloseTo(seconds, 3);
});

test('a plug-in tester at 6 to 9 mA has seconds, not 25 ms', () => {
  // Tester current 6 to 9 mA: UL 1436, published [S11]. Its timing opens at 6 to 7.2 s [S12], after the limit at 6 mA.
  expect(maxTripSeconds(6)).toBeLessThan(6);
  expect(maxTripSeconds(9)).toBeGreaterThan(3.1);
});

test('the limit never rises with the current', () => {
  // The 25 ms as quoted is a rounding of the curve's own last value, 24.98 ms.
  const limits = Array.from({ length: 300 }, (_, index) => (maxTripSeconds(6 + index) ?? 0).toFixed(4));
  expect(limits).toEqual(limits.toSorted((a, b) => Number(b) - Number(a)));
});

test('a current that is no number has no limit', () => {
  expect(maxTripSeconds(Number.NaN)).toBeNull();
});
