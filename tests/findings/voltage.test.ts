import { expect, test } from 'vitest';
import { assessVoltage } from '@/lib/findings/supply/voltage';

const GRADES = ['no-voltage', 'fault-low', 'low', 'low-normal', 'normal', 'high-normal', 'high', 'urgent-high'];

test.each([
  [0, 'no-voltage'],
  [9.9, 'no-voltage'],
  [10, 'fault-low'],
  [79, 'fault-low'],
  [105, 'low'],
  [110, 'low-normal'],
  [120, 'normal'],
  [126.5, 'high-normal'],
  [130, 'high'],
  [161, 'urgent-high'],
])('%s V at a 120 V receptacle is %s', (volts, band) => {
  expect(assessVoltage(volts, 120).band).toBe(band);
});

test('every band is told, and a higher voltage is never in a lower band', () => {
  const bands = Array.from({ length: 1500 }, (_, tenth) => GRADES.indexOf(assessVoltage(tenth / 10).band));
  expect(new Set(bands).size).toBe(GRADES.length);
  expect(bands).toEqual(bands.toSorted((a, b) => a - b));
});

test('a 240 V receptacle has the same bands at twice the voltage', () => {
  for (let volts = 0; volts < 150; volts += 0.5)
    expect(assessVoltage(2 * volts, 240)).toEqual(assessVoltage(volts, 120));
});

test('every band says where its limit comes from', () => {
  for (const volts of [0, 50, 105, 110, 120, 126.5, 130, 140])
    expect(assessVoltage(volts).source).toMatch(/ANSI C84\.1|common practice/);
});

test('a voltage that is no voltage is refused', () => {
  expect(() => assessVoltage(-1)).toThrow(RangeError);
  expect(() => assessVoltage(Number.NaN)).toThrow(RangeError);
});
