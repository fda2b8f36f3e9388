import { expect, test } from 'vitest';
import type { GfciTrial } from '@/lib/findings/facts';
import { assessGfci } from '@/lib/findings/protection/gfci';
import { lamps } from '../support/facts';

/** Everything good, at the device itself, at a breaker and at a point that another device feeds. */
const own: GfciTrial = {
  device: 'receptacle',
  lamps: lamps('110'),
  button: 'trips',
  faceDead: true,
  resets: true,
  tester: 'trips',
};
const breaker: GfciTrial = { ...own, device: 'breaker', breakerMarking: 'class-a-gfci' };
const fed: GfciTrial = { ...own, device: 'downstream' };
const byTester: GfciTrial = { ...own, button: undefined, faceDead: undefined };
const untouched: GfciTrial = { device: 'receptacle', lamps: lamps('110'), notTestedReason: 'a freezer' };
const slow = { measured: { milliamps: 6, seconds: 5.7 } };

type TwoRows = [first: string, second: string, trial: GfciTrial, without: Partial<GfciTrial>];

/** Each trial fits two rows; without what makes it fit the first, the second holds. Facts section 1.1, as printed. */
const BEFORE_ANY_ROW_OF_A_DEVICE: TwoRows[] = [
  ['D03', 'D18', { ...fed, faceDead: undefined, resets: undefined, endOfLife: true }, { endOfLife: false }],
  ['D03', 'D09', { ...byTester, resets: false, endOfLife: true }, { endOfLife: false }],
  ['D03', 'D02', { ...untouched, deadBefore: true, endOfLife: true }, { endOfLife: false }],
  ['D03', 'D00', { ...own, lamps: lamps('111'), endOfLife: true }, { endOfLife: false }],
  ['D03', 'D01', { ...untouched, endOfLife: true }, { endOfLife: false }],
  ['D03', 'D06', { ...own, faceDead: false, endOfLife: true }, { endOfLife: false }],
  ['D18', 'D02', { device: 'downstream', tester: 'trips', deadBefore: true }, { tester: undefined }],
  ['D18', 'D00', { device: 'downstream', tester: 'trips', lamps: lamps('011') }, { resets: true }],
  ['D18', 'D14', { ...fed, button: 'no-trip', resets: undefined }, { resets: true }],
  ['D09', 'D02', { ...byTester, resets: false, deadBefore: true }, { tester: undefined }],
  ['D09', 'D00', { ...byTester, resets: false, lamps: lamps('010') }, { resets: true }],
  ['D09', 'D00', { ...byTester, resets: false, lamps: lamps('000') }, { resets: undefined }],
  ['D09', 'D05', { ...byTester, resets: false, faceDead: false, downstreamDead: true }, { resets: true }],
  ['D09', 'D06', { ...byTester, resets: false, faceDead: false }, { resets: true }],
  ['D02', 'D00', { ...own, resets: undefined, deadBefore: true, lamps: lamps('001') }, { deadBefore: false }],
  ['D02', 'D01', { ...untouched, deadBefore: true }, { deadBefore: false }],
  ['D02', 'D07', { ...own, button: 'no-trip', lamps: lamps('000') }, { lamps: lamps('110'), tester: undefined }],
  ['D02', 'D06', { ...own, faceDead: false, resets: false, deadBefore: true }, { deadBefore: false }],
  ['D00', 'D01', { ...untouched, lamps: lamps('111') }, { lamps: lamps('110') }],
  ['D00', 'D01', { ...untouched, lamps: lamps('101') }, { lamps: lamps('100') }],
  ['D00', 'D06', { ...own, lamps: lamps('010'), faceDead: false }, { lamps: lamps('110') }],
  ['D00', 'D15', { ...fed, lamps: lamps('011') }, { lamps: lamps('100') }],
];

const AT_A_FED_POINT: TwoRows[] = [
  ['D09', 'D15', { ...fed, resets: false, lamps: lamps('100') }, { resets: true }],
  ['D09', 'D26', { ...fed, resets: false, tester: 'no-trip' }, { resets: true }],
  ['D04', 'D15', { ...fed, resets: undefined, lamps: lamps('100') }, { resets: true }],
  ['D04', 'D14', { ...fed, resets: undefined }, { resets: true }],
  ['D15', 'D14', { ...fed, lamps: lamps('100') }, { lamps: lamps('110') }],
  ['D26', 'D14', { ...fed, tester: 'no-trip' }, { lamps: undefined }],
  ['D14', 'D17', { ...fed, lamps: undefined, tester: 'no-trip' }, { faceDead: false }],
  ['D14', 'D16', fed, { faceDead: false, tester: undefined }],
  // What stays live at a fed point accuses no face; what its upstream button does not do accuses no device.
  ['D14', 'D05', { ...fed, faceDead: false, downstreamDead: true }, { device: 'receptacle' }],
  ['D16', 'D07', { ...fed, button: 'no-trip', tester: 'no-trip' }, { device: 'receptacle' }],
];

const AT_THE_DEVICE: TwoRows[] = [
  ['D05', 'D06', { ...own, faceDead: false, downstreamDead: true }, { downstreamDead: undefined }],
  ['D06', 'D08', { ...own, faceDead: false, button: 'no-trip' }, { faceDead: true }],
  ['D06', 'D09', { ...own, faceDead: false, resets: false }, { faceDead: true }],
  ['D06', 'D21', { ...own, faceDead: false, ...slow }, { faceDead: true }],
  ['D08', 'D07', { ...own, button: 'no-trip' }, { tester: 'no-trip' }],
  ['D08', 'D10', { ...own, button: 'no-trip', retrips: 'unloaded' }, { button: 'trips' }],
  ['D07', 'D11', { ...own, button: 'no-trip', tester: 'no-trip', retrips: 'with-appliance' }, { button: 'trips' }],
  ['D07', 'D21', { ...own, button: 'no-trip', tester: 'no-trip', ...slow }, { button: 'trips' }],
  ['D04', 'D09', { ...own, faceDead: undefined, resets: false }, { faceDead: true }],
  ['D04', 'D10', { ...own, faceDead: undefined, retrips: 'unloaded' }, { faceDead: true }],
  ['D09', 'D10', { ...own, resets: false, retrips: 'unloaded' }, { resets: true }],
  ['D09', 'D21', { ...own, resets: false, ...slow }, { resets: true }],
  ['D09', 'D27', { ...breaker, resets: false, breakerMarking: 'afci' }, { resets: true }],
  ['D10', 'D21', { ...own, retrips: 'unloaded', ...slow }, { retrips: undefined }],
  ['D10', 'D04', { ...own, retrips: 'unloaded', resets: undefined }, { retrips: undefined }],
  ['D10', 'D25', { ...byTester, retrips: 'unloaded' }, { retrips: undefined }],
  ['D11', 'D21', { ...own, retrips: 'with-appliance', ...slow }, { retrips: undefined }],
  ['D21', 'D04', { ...own, ...slow, resets: undefined }, { measured: undefined }],
  ['D21', 'D27', { ...breaker, ...slow, breakerMarking: 'other' }, { measured: undefined }],
  ['D21', 'D13', { ...own, ...slow, tester: 'no-trip' }, { measured: undefined }],
  ['D21', 'D25', { ...byTester, ...slow }, { measured: undefined }],
  ['D04', 'D27', { ...breaker, resets: undefined, breakerMarking: undefined }, { resets: true }],
  ['D04', 'D13', { ...own, resets: undefined, tester: 'no-trip' }, { resets: true }],
  ['D27', 'D13', { ...breaker, breakerMarking: 'afci', tester: 'no-trip' }, { breakerMarking: 'dual-function' }],
  ['D27', 'D12', { ...breaker, breakerMarking: 'afci', lamps: lamps('100') }, { breakerMarking: 'class-a-gfci' }],
  ['D27', 'D19', { ...breaker, breakerMarking: 'other', tester: undefined }, { breakerMarking: 'class-a-gfci' }],
  ['D27', 'D23', { ...breaker, breakerMarking: undefined }, { breakerMarking: 'class-a-gfci' }],
  ['D12', 'D19', { ...breaker, tester: undefined, lamps: lamps('100') }, { lamps: lamps('110') }],
  ['D12', 'D20', { ...own, upstreamTrippedFirst: true, lamps: lamps('100') }, { lamps: lamps('110') }],
  ['D12', 'D24', { ...own, downstreamDead: false, lamps: lamps('100') }, { lamps: lamps('110') }],
  ['D12', 'D23', { ...own, lamps: lamps('100') }, { lamps: undefined }],
  ['D19', 'D22', { ...breaker, tester: undefined }, { device: 'receptacle' }],
  ['D20', 'D24', { ...own, upstreamTrippedFirst: true, downstreamDead: false }, { upstreamTrippedFirst: false }],
  ['D24', 'D23', { ...own, downstreamDead: false }, { downstreamDead: true }],
  ['D23', 'D22', own, { tester: undefined }],
  ['D25', 'D16', byTester, { tester: 'no-trip' }],
  ['D25', 'D17', { ...byTester, lamps: undefined }, { tester: 'no-trip' }],
];

test.each([...BEFORE_ANY_ROW_OF_A_DEVICE, ...AT_A_FED_POINT, ...AT_THE_DEVICE])(
  '%s comes before %s: %#',
  (first, second, trial, without) => {
    expect(assessGfci(trial).row).toBe(first);
    expect(assessGfci({ ...trial, ...without }).row).toBe(second);
  },
);

test('what the tester did is told of a device that its own button proves', () => {
  const says = (change: Partial<GfciTrial>) => assessGfci({ ...own, ...change }).says;
  expect(says({ lamps: undefined, tester: 'no-trip' })).toContain('The tester did nothing');
  expect(says({ tester: undefined })).toContain('The tester was not used');
  expect(says({ lamps: lamps('101') })).toContain('the tester’s result does not count');
});

test('a device that the tester tripped is confirmed to be back on, or asked about', () => {
  expect(assessGfci(byTester).says).toContain('and it reset');
  expect(assessGfci({ ...byTester, resets: undefined }).says).toContain('Confirm that it is back on');
});
