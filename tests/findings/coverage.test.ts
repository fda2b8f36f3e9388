import { expect, test } from 'vitest';
import { checkCoverage } from '@/lib/findings';
import { area, emptyHouse, lamps, notice, read, readings, receptacle } from '../support/facts';
import { houseOf1988 } from '../support/houses';

test('an inspection without areas is not complete', () => {
  expect(checkCoverage(emptyHouse({ areas: [] })).complete).toBe(false);
});

test('an area without receptacles asks for them or for a reason', () => {
  expect(checkCoverage(emptyHouse()).areas[0]?.needs).toHaveLength(1);
  const skipped = emptyHouse({ skips: [{ id: 's', areaId: 'living', reason: 'locked' }] });
  expect(checkCoverage(skipped).complete).toBe(true);
  const none = emptyHouse({ receptacles: [receptacle({ id: 'a', presence: 'not-present' })] });
  expect(checkCoverage(none)).toMatchObject({ complete: true, areas: [{ present: 0, tested: 0 }] });
});

test('a receptacle is tested by lamps or a meter, and by nothing else', () => {
  const facts = emptyHouse({
    receptacles: ['a', 'b', 'c', 'd'].map((id, order) => receptacle({ id, order })),
    readings: readings([
      read('a', '110'),
      { kind: 'physical', receptacleId: 'b', evidence: { signs: ['painted'] } },
      { kind: 'wiring', receptacleId: 'c', evidence: { sensor: { hotSlot: true } } },
      { kind: 'wiring', receptacleId: 'd', evidence: {} },
    ]),
  });
  expect(checkCoverage(facts).areas[0]).toMatchObject({ present: 4, tested: 1, skipped: 0 });
  expect(checkCoverage(facts).areas[0]?.needs).toHaveLength(3);
});

test('a GFCI device needs its button pressed, or a reason', () => {
  const row = { id: 'a', device: 'gfci-receptacle' as const };
  const facts = emptyHouse({ receptacles: [receptacle(row)], readings: readings([read('a', '110')]) });
  expect(checkCoverage(facts).areas[0]?.needs.join()).toContain('own button');
  const marked = { ...facts, receptacles: [receptacle({ ...row, doNotTrip: 'medical-equipment' })] };
  expect(checkCoverage(marked).complete).toBe(true);
});

test('what a button put out stays off until it is reset, back on or handed over', () => {
  const trial = (resets: boolean | undefined) =>
    emptyHouse({
      areas: [area({ id: 'living' })],
      receptacles: [
        receptacle({ id: 'a', device: 'gfci-receptacle', order: 1 }),
        receptacle({ id: 'b', order: 2, fedFromReceptacleId: 'a' }),
      ],
      readings: readings([
        read('a', '110'),
        read('b', '110'),
        {
          kind: 'gfci',
          receptacleId: 'a',
          evidence: {
            device: 'receptacle',
            lamps: lamps('110'),
            button: 'trips',
            faceDead: true,
            resets,
            wentDead: ['b'],
          },
        },
      ]),
    });
  expect(checkCoverage(trial(true))).toMatchObject({ complete: true, leftOff: [] });
  expect(checkCoverage(trial(false)).leftOff.toSorted()).toEqual(['a', 'b']);
  expect(checkCoverage(trial(undefined)).leftOff.toSorted()).toEqual(['a', 'b']);

  const handed = {
    ...trial(false),
    notices: [
      notice({ id: 'n1', kind: 'back-on', receptacleId: 'a', readingId: 'r3' }),
      notice({ id: 'n2', kind: 'handed-over', receptacleId: 'b', readingId: 'r3', whom: 'the owner' }),
    ],
  };
  expect(checkCoverage(handed)).toMatchObject({ leftOff: [] });
  const before = { ...trial(false), notices: [notice({ id: 'n1', kind: 'back-on', receptacleId: 'a', order: 1 })] };
  expect(checkCoverage(before).leftOff).toContain('a');
});

test('a lit lamp after the trial shows that a point is back', () => {
  const facts = houseOf1988();
  const later = { ...read('sump', '110'), id: 'r99', order: 99, by: 'R. Okafor', recordedAt: '2026-12-01T16:00:00Z' };
  expect(checkCoverage(facts).leftOff).toContain('sump');
  expect(checkCoverage({ ...facts, readings: [...facts.readings, later] }).leftOff).not.toContain('sump');
});
