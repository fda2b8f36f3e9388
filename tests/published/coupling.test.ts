import { expect, test } from 'vitest';
import { capacitiveReactanceOhms } from '@/lib/findings/wiring/circuit';

/** X = 1 / (2 pi f C), the textbook formula of capacitive reactance (published; worked values derived from it). */
test.each([
  { farads: 10e-9, hertz: 1e6, ohms: 15.9, within: 0.05 },
  { farads: 10e-9, hertz: 60, ohms: 265_000, within: 500 },
])('$farads F at $hertz Hz has the reactance that the textbook formula gives', ({ farads, hertz, ohms, within }) => {
  expect(Math.abs(capacitiveReactanceOhms(farads, hertz) - ohms)).toBeLessThan(within);
});

test('the coupling is worked out at the 60 Hz of the mains where no frequency is named', () => {
  expect(capacitiveReactanceOhms(10e-9)).toBeCloseTo(capacitiveReactanceOhms(10e-9, 60), 9);
});
