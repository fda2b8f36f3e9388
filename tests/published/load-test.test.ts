import { describe, expect, test } from 'vitest';
import { expectedDropVolts } from '@/lib/findings/supply/conductors';
import { assessLoadTest } from '@/lib/findings/supply/load-test';

/** A drop is read to a tenth of a volt; a worked value holds within the last digit that is printed. */
const within = (value: number, printed: number, digit: number) =>
  expect(Math.abs(value - printed)).toBeLessThanOrEqual(digit);

// Worked tests of facts section 4. Derived: ΔV = Vnl − Vl, R = ΔV / I, % = 100 ΔV / Vnl, fault current ≈ Vnl / R, and
// the drop at another load is R times that load. The arithmetic is Ohm's law; no published table stands behind it.
const WORKED = [
  { vnl: 121.4, vl: 117.2, amps: 12, drop: 4.2, percent: 3.46, ohms: 0.35, fault: 346.9, at15: 4.32, at20: 5.77 },
  { vnl: 120, vl: 116.4, amps: 15, drop: 3.6, percent: 3, ohms: 0.24, fault: 500, at15: 3, at20: 4 },
  { vnl: 120, vl: 114, amps: 15, drop: 6, percent: 5, ohms: 0.4, fault: 300, at15: 5, at20: 6.67 },
  { vnl: 122, vl: 108, amps: 12, drop: 14, percent: 11.48, ohms: 1.167, fault: 104.6, at15: 14.35, at20: 19.13 },
];

test.each(WORKED)('$vnl V that falls to $vl V at $amps A loses $percent %', (worked) => {
  const found = assessLoadTest({ noLoadHn: worked.vnl, loadedHn: worked.vl, amps: worked.amps });
  within(found.dropVolts, worked.drop, 0.001);
  within(found.dropPercent, worked.percent, 0.01);
  within(found.loopOhms, worked.ohms, 0.001);
  within(found.faultAmps, worked.fault, 0.1);
  within(found.percentAt15, worked.at15, 0.01);
  within(found.percentAt20, worked.at20, 0.01);
});

describe('the advice on drop', () => {
  const bandAt = (percent: number) =>
    assessLoadTest({ amps: 12, noLoadHn: 120, loadedHn: 120 * (1 - percent / 100) }).band;

  test('3 % of a branch and 5 % in all are advice, told only above them', () => {
    // Informational note to NEC 210.19, published [S25]; 90.5: a note is not a rule.
    expect([2.9, 3, 3.1, 5, 5.1].map(bandAt)).toEqual(['good', 'good', 'above-3', 'above-3', 'above-5']);
  });

  test('above 8 % strongly suggests a bad joint', () => {
    // Common practice: over 5 % at a short run points at a joint, over 8 % strongly.
    expect([7.9, 8, 8.1].map(bandAt)).toEqual(['above-5', 'above-5', 'above-8']);
  });

  test('the longest usual run of sound copper is told apart from a bad joint', () => {
    // 14 AWG, 100 ft, 15 A: 9.21 V, 7.67 %. Derived from NEC Chapter 9 Table 8, solid at 75 °C, published [S24].
    const loadedHn = 120 - expectedDropVolts(14, 100, 15);
    expect(assessLoadTest({ amps: 15, noLoadHn: 120, loadedHn }).band).toBe('above-5');
  });
});

test.each([
  [15, 10, 0.8],
  [20, 10, 0.6],
  [15, 5, 1.6],
  [20, 5, 1.2],
])(
  'a %s A breaker that opens at once at %s times its rating wants a loop of at most %s ohms',
  (rating, times, ohms) => {
    // Derived from a pick-up of 5 to 10 times the rating, common practice and from memory: makers' curves govern.
    const amps = 12;
    const { faultAmps } = assessLoadTest({ amps, noLoadHn: 120, loadedHn: 120 - ohms * amps });
    within(faultAmps, rating * times, 0.001);
  },
);

// False-ground rule of facts section 3, simulated over 14 to 10 AWG and 10 to 45 m; 121.4 V falls to 117.2 V at 12 A.
test.each([
  [0.05, 2.1, 'no-joint-here'],
  [0.02, 0.02, 'suspected'],
  [0.05, 0.6, 'undecided'],
])('neutral to ground that goes from %s V to %s V: %s', (noLoadNg, loadedNg, ground) => {
  expect(assessLoadTest({ amps: 12, noLoadHn: 121.4, loadedHn: 117.2, noLoadNg, loadedNg }).ground).toBe(ground);
});

test('a real separate ground lets neutral-to-ground rise by 0.2 to 0.5 of the drop, and none of that is an accusation', () => {
  for (const share of [0.2, 0.25, 0.3, 0.4, 0.5]) {
    const { ground } = assessLoadTest({ amps: 12, noLoadHn: 120, loadedHn: 116, noLoadNg: 0, loadedNg: 4 * share });
    expect(ground, `${share}`).toBe(share < 0.3 ? 'undecided' : 'no-joint-here');
  }
});
