import { expect, test } from 'vitest';
import type { AfciTrial } from '@/lib/findings/facts';
import { assessAfci } from '@/lib/findings/protection/afci';

const works: AfciTrial = { button: 'trips', circuitDead: true, resets: true };

// Rows A0 to A7 of facts section 2; the button as the only test is published [S14], the rows are trade practice.
const TABLE: [row: string, verdict: string, protects: string, trial: AfciTrial][] = [
  ['A0', 'incomplete', 'unproven', { button: 'trips' }],
  ['A0', 'incomplete', 'unproven', { button: 'trips', circuitDead: true }],
  ['A0', 'incomplete', 'unproven', { button: 'trips', resets: true }],
  ['A0', 'incomplete', 'unproven', { button: 'trips', resets: false }],
  ['A1', 'works', 'yes', works],
  ['A1', 'works', 'yes', { ...works, indicator: 'no-trip' }],
  ['A1', 'works', 'yes', { ...works, indicator: 'trips' }],
  ['A2', 'failed', 'no', { button: 'no-trip' }],
  ['A2', 'failed', 'no', { button: 'no-trip', indicator: 'trips' }],
  ['A3', 'no-reset', 'unproven', { ...works, resets: false }],
  ['A4', 'face-stays-live', 'no', { ...works, circuitDead: false }],
  ['A4', 'face-stays-live', 'no', { button: 'trips', circuitDead: false }],
  ['A5', 'indication-only', 'unproven', { indicator: 'trips' }],
  ['A6', 'inconclusive', 'unproven', { indicator: 'no-trip' }],
  ['A6', 'inconclusive', 'unproven', { indicator: 'no-trip', notTestedReason: 'occupied' }],
  ['A7', 'not-tested', 'unproven', { notTestedReason: 'occupied' }],
  ['A7', 'reason-required', 'unproven', {}],
  ['A7', 'reason-required', 'unproven', { notTestedReason: ' ' }],
];

test.each(TABLE)('%s %s, protects: %s', (row, verdict, protects, trial) => {
  expect(assessAfci(trial)).toMatchObject({ row, verdict, protects });
});

test('a plug-in indicator alone never decides', () => {
  for (const indicator of ['trips', 'no-trip'] as const)
    for (const circuitDead of [undefined, true, false])
      for (const resets of [undefined, true, false])
        expect(assessAfci({ indicator, circuitDead, resets }).protects).toBe('unproven');
});

test('a working AFCI is not said to stop every arc', () => {
  expect(assessAfci(works).says).toContain('not every kind of arc');
});
