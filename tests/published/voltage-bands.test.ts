import { expect, test } from 'vitest';
import { assessVoltage } from '@/lib/findings/supply/voltage';

// ANSI C84.1, 120 V base. Each limit with its mark; the bands between them are the tool's own (facts section 4).
test.each([
  [114, 'normal', 'Range A', 'Range A service, 114 to 126 V, published in a state rule [S23]'],
  [126, 'normal', 'Range A', 'Range A service, 114 to 126 V, published in a state rule [S23]'],
  [113.9, 'low-normal', '108 V', 'below Range A service'],
  [108, 'low-normal', 'from memory', 'Range A utilization, 2006 text, from memory'],
  [107.9, 'low', '104 V', 'below Range A utilization'],
  [104, 'low', 'from memory', 'Range B utilization, 2006 text, from memory'],
  [126.1, 'high-normal', 'Range A', 'above Range A service'],
  [127, 'high-normal', 'Range A', 'Range B service upper limit 127 V, from memory'],
  [127.1, 'high', 'from memory', 'above Range B service'],
])('%s V reads %s', (volts, band, source, why) => {
  const found = assessVoltage(volts);
  expect(found.band, why).toBe(band);
  expect(found.source).toContain(source);
});

// Common practice, no published limit.
test.each([
  [103.9, 'fault-low'],
  [132, 'high'],
  [132.1, 'urgent-high'],
])('%s V reads %s by common practice', (volts, band) => {
  expect(assessVoltage(volts).band).toBe(band);
});

test('the limits of the 1995 text lie in the low bands, never in the normal one', () => {
  // Published for 1995: Range A utilization from 110 V, Range B service from 110 V, Range B utilization from 106 V [S22].
  expect(assessVoltage(110).band).toBe('low-normal');
  expect(assessVoltage(106).band).toBe('low');
});
