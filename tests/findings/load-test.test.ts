import { describe, expect, test } from 'vitest';
import type { LoadTest } from '@/lib/findings/facts';
import { assessLoadTest } from '@/lib/findings/supply/load-test';

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
