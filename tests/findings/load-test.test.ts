import { describe, expect, test } from 'vitest';
import type { LoadTest } from '@/lib/findings/facts';
import { assessLoadTest } from '@/lib/findings/supply/load-test';

// Worked tests of facts section 4, derived: R = (Vnl − Vl)/I, % = 100(Vnl − Vl)/Vnl, fault current = Vnl/R.
test.each([
  {
    noLoadHn: 121.4,
    loadedHn: 117.2,
    amps: 12,
    drop: 4.2,
    percent: 3.46,
    ohms: 0.35,
    fault: 346.9,
    at15: 4.32,
    at20: 5.77,
  },
  { noLoadHn: 120, loadedHn: 116.4, amps: 15, drop: 3.6, percent: 3.0, ohms: 0.24, fault: 500, at15: 3.0, at20: 4.0 },
  { noLoadHn: 120, loadedHn: 114, amps: 15, drop: 6, percent: 5.0, ohms: 0.4, fault: 300, at15: 5.0, at20: 6.67 },
  {
    noLoadHn: 122,
    loadedHn: 108,
    amps: 12,
    drop: 14,
    percent: 11.48,
    ohms: 1.167,
    fault: 104.6,
    at15: 14.35,
    at20: 19.13,
  },
])('$noLoadHn V to $loadedHn V at $amps A is $percent % and $ohms ohms', (worked) => {
  const found = assessLoadTest(worked);
  expect(found.dropVolts).toBeCloseTo(worked.drop, 2);
  expect(found.dropPercent).toBeCloseTo(worked.percent, 2);
  expect(found.loopOhms).toBeCloseTo(worked.ohms, 3);
  expect(found.faultAmps).toBeCloseTo(worked.fault, 1);
  // The table's last two columns were computed from rounded values; they hold within 0.01.
  expect(Math.abs(found.percentAt15 - worked.at15)).toBeLessThan(0.01);
  expect(Math.abs(found.percentAt20 - worked.at20)).toBeLessThan(0.01);
});

describe('the band of a drop', () => {
  test.each([
    [120, 'good'],
    [116.4, 'good'],
    [116.39, 'above-3'],
    [114, 'above-3'],
    [113.99, 'above-5'],
    [110.4, 'above-5'],
    [110.39, 'above-8'],
  ])('120 V that falls to %s V is %s', (loadedHn, band) => {
    expect(assessLoadTest({ amps: 12, noLoadHn: 120, loadedHn }).band).toBe(band);
  });

  test('a voltage that rises under load is no drop', () => {
    expect(assessLoadTest({ amps: 12, noLoadHn: 119, loadedHn: 120 })).toMatchObject({
      band: 'good',
      faultAmps: Infinity,
    });
  });
});

/** ΔV is 4.2 V at 12 A, as in the worked examples of the false-ground rule (facts section 3, simulated). */
const loaded = (noLoadNg: number, loadedNg: number): LoadTest => ({
  amps: 12,
  noLoadHn: 121.4,
  loadedHn: 117.2,
  noLoadNg,
  loadedNg,
});

describe('whether neutral and ground are joined at the receptacle', () => {
  test.each([
    [0.05, 2.1, 'no-joint-here', 'worked example: half of the drop'],
    [0.02, 0.02, 'suspected', 'worked example: neutral to ground does not move'],
    [0.05, 0.6, 'undecided', 'worked example: a small share'],
    [0.1, 0.22, 'suspected', 'at 0.1 V plus 0.01 ohms times the load'],
    [0.1, 0.23, 'undecided', 'just above it'],
    [0.11, 0.11, 'undecided', 'not quiet without load'],
    [0, 1.26, 'no-joint-here', 'at 0.30 of the drop'],
    [0, 1.25, 'undecided', 'just below 0.30'],
    [0, 2.52, 'no-joint-here', 'at 0.60 of the drop'],
    [0, 2.53, 'neutral-doubtful', 'above 0.60'],
    [3, 0.02, 'undecided', 'it falls: another leg carries the neutral'],
  ])('N-G %s V then %s V: %s', (noLoadNg, loadedNg, ground, why) => {
    expect(assessLoadTest(loaded(noLoadNg, loadedNg)).ground, why).toBe(ground);
  });

  test('nobody is accused near a bond, or on a neutral that another leg may balance', () => {
    const quiet = loaded(0.02, 0.02);
    expect(assessLoadTest(quiet, { nearBondedPanel: true }).ground).toBe('undecided');
    expect(assessLoadTest(quiet, { sharedNeutral: 'yes' }).ground).toBe('undecided');
    expect(assessLoadTest(quiet, { sharedNeutral: 'unknown' }).ground).toBe('undecided');
    expect(assessLoadTest(quiet, { nearBondedPanel: false, sharedNeutral: 'no' }).ground).toBe('suspected');
  });

  test('it takes a drop of 3 V and both neutral-to-ground readings', () => {
    const drop = (loadedHn: number): LoadTest => ({ ...loaded(0.02, 0.02), noLoadHn: 120.3, loadedHn });
    expect(assessLoadTest(drop(117.3)).ground).toBe('suspected');
    expect(assessLoadTest(drop(117.4)).ground).toBe('not-assessed');
    expect(assessLoadTest({ ...loaded(0.02, 0.02), noLoadNg: undefined }).ground).toBe('not-assessed');
    expect(assessLoadTest({ ...loaded(0.02, 0.02), loadedNg: undefined }).ground).toBe('not-assessed');
  });

  test('a bad hot joint raises the drop alone and accuses no one of a joint by its share', () => {
    expect(assessLoadTest({ amps: 12, noLoadHn: 121.4, loadedHn: 103, noLoadNg: 0.15, loadedNg: 1.6 }).ground).toBe(
      'undecided',
    );
  });
});

test('a load test without a load or without a voltage is refused', () => {
  expect(() => assessLoadTest({ amps: 0, noLoadHn: 120, loadedHn: 118 })).toThrow(RangeError);
  expect(() => assessLoadTest({ amps: 12, noLoadHn: 0, loadedHn: 0 })).toThrow(RangeError);
  expect(() => assessLoadTest({ amps: Number.NaN, noLoadHn: 120, loadedHn: 118 })).toThrow(RangeError);
});
