import { describe, expect, test } from 'vitest';
import type { GfciTrial } from '@/lib/findings/facts';
import { assessGfci } from '@/lib/findings/protection/gfci';
import { lamps } from '../support/facts';

/** A GFCI receptacle that did all that it should, read before the trial as correct. */
const works: GfciTrial = {
  device: 'receptacle',
  lamps: lamps('110'),
  button: 'trips',
  faceDead: true,
  resets: true,
  tester: 'trips',
};
/** A point that went dead on the upstream button and came back. */
const fed: GfciTrial = { device: 'downstream', lamps: lamps('110'), button: 'trips', faceDead: true, resets: true };
const breaker: GfciTrial = {
  device: 'breaker',
  breakerMarking: 'class-a-gfci',
  lamps: lamps('110'),
  button: 'trips',
  faceDead: true,
  resets: true,
};
const untouched: GfciTrial = { device: 'receptacle', lamps: lamps('110') };

// Decision table of facts section 1.1, trade practice and derived; one line for each way into a row.
const TABLE: [row: string, verdict: string, protects: string, trial: GfciTrial, why: string][] = [
  ['D03', 'replace', 'unproven', { ...works, endOfLife: true }, 'its end-of-life lamp is on, and all else worked'],
  [
    'D03',
    'replace',
    'unproven',
    { ...untouched, endOfLife: true },
    'its end-of-life lamp is on, and nothing was tried',
  ],
  ['D18', 'power-left-off', 'unproven', { device: 'downstream', tester: 'trips' }, 'the tester put a fed point out'],
  ['D18', 'power-left-off', 'unproven', { ...fed, button: 'no-trip', tester: 'trips', resets: false }, 'it stays out'],
  ['D18', 'power-left-off', 'unproven', { device: 'downstream', lamps: lamps('011'), tester: 'trips' }, 'any lamps'],
  ['D09', 'no-reset', 'unproven', { ...untouched, tester: 'trips', resets: false }, 'the tester tripped it for good'],
  ['D09', 'no-reset', 'unproven', { ...untouched, lamps: lamps('010'), tester: 'trips', resets: false }, 'any lamps'],
  ['D02', 'no-power', 'unproven', { ...untouched, deadBefore: true }, 'it was dead before the test'],
  ['D02', 'no-power', 'unproven', { ...works, deadBefore: true, resets: false }, 'dead before, and it stays so'],
  [
    'D02',
    'no-power',
    'unproven',
    { ...untouched, lamps: lamps('000'), button: 'no-trip' },
    'no lamp, button does nothing',
  ],
  ['D00', 'hold', 'unproven', { ...works, lamps: lamps('001') }, 'lamps 001'],
  ['D00', 'hold', 'unproven', { ...works, lamps: lamps('010') }, 'lamps 010'],
  ['D00', 'hold', 'unproven', { ...works, lamps: lamps('011') }, 'lamps 011'],
  ['D00', 'hold', 'unproven', { ...untouched, lamps: lamps('111'), notTestedReason: 'wet' }, 'lamps 111'],
  ['D00', 'hold', 'unproven', { ...untouched, lamps: lamps('101'), notTestedReason: 'wet' }, 'lamps 101, untouched'],
  ['D00', 'hold', 'unproven', { ...untouched, lamps: lamps('000') }, 'no lamp, untouched'],
  ['D00', 'hold', 'unproven', { ...untouched, lamps: lamps('101'), tester: 'no-trip' }, 'lamps 101, tester alone'],
  ['D01', 'not-tested', 'unproven', { ...untouched, notTestedReason: 'medical equipment' }, 'a reason is given'],
  ['D01', 'reason-required', 'unproven', untouched, 'no reason is given'],
  ['D01', 'reason-required', 'unproven', { device: 'downstream', notTestedReason: '  ' }, 'the reason is blank'],

  ['D09', 'no-reset', 'unproven', { ...fed, resets: false }, 'a fed point does not come back'],
  ['D04', 'incomplete', 'unproven', { ...fed, resets: undefined }, 'nobody saw a fed point come back'],
  ['D15', 'upstream-protects-no-ground', 'yes', { ...fed, lamps: lamps('100') }, 'fed, no ground'],
  [
    'D15',
    'upstream-protects-no-ground',
    'yes',
    { ...fed, lamps: lamps('100'), tester: 'no-trip' },
    'and no tester trip',
  ],
  ['D26', 'upstream-protects-ground-doubtful', 'yes', { ...fed, tester: 'no-trip' }, 'fed, tester does nothing'],
  ['D14', 'upstream-protects', 'yes', fed, 'it went dead on the upstream button'],
  ['D14', 'upstream-protects', 'yes', { ...fed, lamps: undefined, tester: 'no-trip' }, 'fed, lamps not read'],
  ['D14', 'upstream-protects', 'yes', { device: 'downstream', tester: 'trips', resets: true }, 'the tester put it out'],
  ['D14', 'upstream-protects', 'yes', { ...fed, faceDead: false, tester: 'trips' }, 'another device protects it'],
  [
    'D17',
    'unconfirmed-tester-invalid',
    'unproven',
    { device: 'downstream', lamps: lamps('100'), tester: 'no-trip' },
    'no ground',
  ],
  [
    'D17',
    'unconfirmed-tester-invalid',
    'unproven',
    { ...fed, lamps: lamps('101'), button: 'no-trip', tester: 'trips', resets: true },
    'tester set aside',
  ],
  [
    'D16',
    'unconfirmed',
    'unproven',
    { device: 'downstream', lamps: lamps('110'), tester: 'no-trip' },
    'nothing put it out',
  ],
  ['D16', 'unconfirmed', 'unproven', { ...fed, faceDead: false }, 'the upstream button left it live'],

  [
    'D05',
    'line-load-reversed',
    'no',
    { ...works, faceDead: false, downstreamDead: true },
    'points behind die, face lives',
  ],
  [
    'D05',
    'line-load-reversed',
    'no',
    { ...works, button: undefined, faceDead: false, downstreamDead: true },
    'by tester',
  ],
  ['D06', 'face-stays-live', 'no', { ...works, faceDead: false }, 'it clicks and stays live'],
  [
    'D06',
    'face-stays-live',
    'no',
    { ...works, faceDead: false, downstreamDead: false },
    'nothing behind it died either',
  ],
  ['D08', 'button-failed', 'unproven', { ...works, button: 'no-trip' }, 'only the tester trips it'],
  ['D07', 'failed', 'no', { ...works, button: 'no-trip', tester: 'no-trip' }, 'neither trips it'],
  ['D07', 'failed', 'unproven', { ...works, lamps: lamps('101'), button: 'no-trip' }, 'the tester is set aside'],
  ['D04', 'incomplete', 'unproven', { ...works, faceDead: undefined }, 'nobody looked at the face'],
  ['D09', 'no-reset', 'unproven', { ...works, resets: false }, 'it does not reset'],
  ['D10', 'load-side-fault', 'unproven', { ...works, retrips: 'unloaded' }, 'it trips again unplugged'],
  [
    'D11',
    'appliance-suspected',
    'unproven',
    { ...works, retrips: 'with-appliance' },
    'it trips again with an appliance',
  ],
  ['D21', 'slow', 'no', { ...works, measured: { milliamps: 6, seconds: 5.7 } }, '5.7 s at 6 mA'],
  ['D21', 'slow', 'no', { ...works, measured: { milliamps: 300, seconds: 0.026 } }, '26 ms past the curve'],
  ['D04', 'incomplete', 'unproven', { ...works, resets: undefined }, 'nobody saw it reset'],
  ['D27', 'breaker-type-unproven', 'unproven', { ...breaker, breakerMarking: 'afci' }, 'an AFCI breaker'],
  [
    'D27',
    'breaker-type-unproven',
    'unproven',
    { ...breaker, breakerMarking: undefined, tester: 'no-trip' },
    'marking not read',
  ],
  ['D13', 'ground-doubtful', 'unproven', { ...works, tester: 'no-trip' }, 'the tester does nothing, ground shown'],
  ['D13', 'ground-doubtful', 'unproven', { ...breaker, tester: 'no-trip' }, 'at a breaker too'],
  ['D22', 'works-button-only', 'yes', { ...works, lamps: undefined, tester: 'no-trip' }, 'the ground was not read'],
  [
    'D12',
    'works-no-ground',
    'yes',
    { ...works, lamps: lamps('100'), tester: 'no-trip' },
    'no ground, tester does nothing',
  ],
  ['D12', 'works-no-ground', 'yes', { ...works, lamps: lamps('100'), tester: undefined }, 'no ground, no tester'],
  ['D12', 'works-no-ground', 'yes', { ...breaker, lamps: lamps('100') }, 'no ground, at a breaker'],
  ['D19', 'breaker-works', 'yes', breaker, 'the breaker’s own button'],
  ['D19', 'breaker-works', 'unproven', { ...breaker, lamps: lamps('101'), tester: 'trips' }, 'lamps 101'],
  ['D20', 'works-upstream-tripped-first', 'yes', { ...works, upstreamTrippedFirst: true }, 'another tripped first'],
  ['D24', 'works-local-only', 'yes', { ...works, downstreamDead: false }, 'the other point stayed live'],
  ['D23', 'works', 'yes', works, 'button and tester'],
  ['D23', 'works', 'yes', { ...breaker, breakerMarking: 'dual-function', tester: 'trips' }, 'a dual-function breaker'],
  ['D22', 'works-button-only', 'yes', { ...works, tester: undefined }, 'the tester was not used'],
  ['D22', 'works-button-only', 'unproven', { ...works, lamps: lamps('101') }, 'lamps 101'],
  ['D25', 'tester-only', 'unproven', { ...works, button: undefined }, 'its button was not pressed'],
  ['D16', 'unconfirmed', 'unproven', { ...untouched, tester: 'no-trip' }, 'the tester alone did nothing'],
  [
    'D17',
    'unconfirmed-tester-invalid',
    'unproven',
    { ...untouched, lamps: lamps('100'), tester: 'no-trip' },
    'no ground',
  ],
];

test.each(TABLE)('%s %s, protects: %s', (row, verdict, protects, trial, why) => {
  expect(assessGfci(trial), why).toMatchObject({ row, verdict, protects });
});

test('every row of the table is reached', () => {
  const reached = new Set(TABLE.map(([, , , trial]) => assessGfci(trial).row));
  const printed = Array.from({ length: 28 }, (_, index) => `D${String(index).padStart(2, '0')}`);
  expect([...reached].toSorted()).toEqual(printed);
});

describe('where the lamps and the tester cannot both be right', () => {
  test.each([
    ['a receptacle that works', { ...works, lamps: lamps('100') }],
    ['a receptacle that stays off', { ...untouched, lamps: lamps('100'), tester: 'trips', resets: false }],
    ['a fed point', { ...fed, lamps: lamps('100'), tester: 'trips' }],
    ['a device at its end of life', { ...works, lamps: lamps('100'), endOfLife: true }],
  ] as [string, GfciTrial][])('%s shows a ground path that the lamps missed', (_, trial) => {
    expect(assessGfci(trial).conflict).toContain('a ground path that the lamps missed');
  });

  test('a GFCI that the tester tripped is not said to be beyond the tester', () => {
    expect(assessGfci({ ...works, lamps: lamps('100') }).says).not.toContain('cannot trip');
  });

  test('nothing is in conflict where the ground was shown, or the tester did nothing', () => {
    expect(assessGfci(works)).not.toHaveProperty('conflict');
    expect(assessGfci({ ...works, lamps: lamps('100'), tester: 'no-trip' })).not.toHaveProperty('conflict');
  });
});

describe('a time that an analyzer showed', () => {
  const timed = (milliamps: number, seconds: number) => assessGfci({ ...works, measured: { milliamps, seconds } });

  test('is not slow at the limit of the curve, nor below 6 mA where there is none', () => {
    expect(timed(20, 1).verdict).toBe('works');
    expect(timed(5, 30).verdict).toBe('works');
    expect(timed(9, 0.2).verdict).toBe('works');
  });

  test('is set aside where the lamps read 101', () => {
    const trial: GfciTrial = { ...works, lamps: lamps('101'), measured: { milliamps: 6, seconds: 7 } };
    expect(assessGfci(trial).verdict).toBe('works-button-only');
  });
});

test('a device that was found tripped and reset is tried like any other', () => {
  expect(assessGfci({ ...works, deadBefore: true }).verdict).toBe('works');
});

describe('a dim lamp', () => {
  test('holds the test where it is unsound both lit and off', () => {
    expect(assessGfci({ ...works, lamps: lamps('0d0') }).row).toBe('D00');
    expect(assessGfci({ ...works, lamps: lamps('01d') }).row).toBe('D00');
  });

  test('leaves protection unproven where one reading of it would be sound', () => {
    expect(assessGfci({ ...works, lamps: lamps('11d') })).toMatchObject({ verdict: 'works', protects: 'unproven' });
    expect(assessGfci({ ...works, lamps: lamps('1d0'), tester: 'no-trip' }).verdict).toBe('works-button-only');
    expect(assessGfci({ ...works, lamps: lamps('11d'), faceDead: false }).protects).toBe('no');
  });
});

describe('what the inspector reads', () => {
  test('tells an ungrounded device’s limits and nothing against the device', () => {
    const { says } = assessGfci({ ...works, lamps: lamps('100'), tester: 'no-trip' });
    expect(says).toContain('reduces shock and gives no ground');
    expect(says).toContain('not for refrigerators or washers');
    expect(says).toContain('“No Equipment Ground”');
  });

  test('never takes lit lamps and a trip for a proven ground', () => {
    expect(assessGfci(works).says).toContain('does not prove a real ground');
  });

  test('says which device protects a fed point, or that nobody knows', () => {
    expect(assessGfci(fed).says).toContain('upstream device’s button');
    const byTester: GfciTrial = { device: 'downstream', tester: 'trips', resets: true };
    expect(assessGfci(byTester).says).toContain('was not recorded');
    expect(assessGfci({ ...byTester, deviceFound: true }).says).toContain('was found');
    expect(assessGfci({ ...byTester, button: 'no-trip' }).says).toContain('other than the one whose button');
  });

  test('sends for the contact sensor where a case may be live', () => {
    expect(assessGfci({ ...works, tester: 'no-trip' }).says).toContain('contact sensor first');
    expect(assessGfci({ ...fed, tester: 'no-trip' }).says).toContain('contact sensor first');
  });
});
