import { describe, expect, test } from 'vitest';
import { evaluateInspection } from '@/lib/findings';
import { find, gapsAt, one, says } from '../support/evaluated';
import { circuit, emptyHouse, lamps, notice, read, readings, receptacle } from '../support/facts';
import { houseOf2021 } from '../support/house-of-2021';
import { houseOf1988 } from '../support/houses';

describe('one cause is told once', () => {
  test('points that are dead behind a fault upstream belong to it', () => {
    const facts = emptyHouse({
      receptacles: [
        receptacle({ id: 'a', order: 1 }),
        receptacle({ id: 'b', order: 2, fedFromReceptacleId: 'a' }),
        receptacle({ id: 'c', order: 3, fedFromReceptacleId: 'b' }),
      ],
      readings: readings([read('a', '010'), read('b', '000'), read('c', '000')]),
    });
    const { findings } = evaluateInspection(facts);
    expect(findings.map((finding) => finding.id)).toEqual(['W04:a']);
    expect(findings[0]?.subject).toMatchObject({ receptacleIds: ['a', 'b', 'c'] });
  });

  test('two circuits with one open shared neutral are one finding', () => {
    const { findings } = evaluateInspection(houseOf1988());
    expect(findings.filter((finding) => finding.code === 'W20').map((finding) => finding.place)).toEqual([
      'Breakers 5 and 7',
    ]);
  });

  test('what a trial left off is still off, and no fault of its own', () => {
    const facts = houseOf1988();
    const dark = {
      ...facts,
      readings: [
        ...facts.readings,
        { ...read('sump', '000'), id: 'r50', order: 50, by: 'x', recordedAt: '2026-12-01T15:50:00Z' },
      ],
    };
    expect(find(dark, 'W05:sump')).toBeUndefined();
    expect(gapsAt(dark, 'sump').join()).toContain('still-off');
    expect(find(dark, 'G21:sump')).toMatchObject({ signal: 'NOTICE', urgency: 'U1' });
  });
});

describe('evidence', () => {
  test('a corrected reading no longer counts', () => {
    const facts = one([read('a', '101'), { ...read('a', '110'), supersedes: 'r1' }]);
    expect(evaluateInspection(facts).findings).toEqual([]);
  });

  test('two lamp patterns that cannot both be right are a conflict, and the graver one is told', () => {
    const facts = one([read('a', '011'), read('a', '110')]);
    expect(gapsAt(facts, 'a').join()).toContain('conflict: The lamps were read in two ways');
    expect(find(facts, 'W03:a')).toBeDefined();
  });

  test('lamps with and without loads are no conflict; those without count', () => {
    const facts = one([
      { kind: 'wiring', receptacleId: 'a', evidence: { lamps: lamps('011'), loadsUnplugged: 'no' } },
      { kind: 'wiring', receptacleId: 'a', evidence: { lamps: lamps('010'), loadsUnplugged: 'yes' } },
    ]);
    expect(gapsAt(facts, 'a').join()).not.toContain('conflict');
    expect(find(facts, 'W04:a')).toBeDefined();
    expect(find(facts, 'W03:a')).toBeUndefined();
  });

  test('a tester that trips a GFCI where the lamps show no ground is a conflict', () => {
    const facts = one([
      read('a', '100'),
      {
        kind: 'gfci',
        receptacleId: 'a',
        evidence: {
          device: 'receptacle',
          lamps: lamps('100'),
          button: 'trips',
          faceDead: true,
          tester: 'trips',
          resets: true,
        },
      },
    ]);
    expect(gapsAt(facts, 'a').join()).toContain('a ground path that the lamps missed');
  });

  test('a person who was told closes "not told", and stands in the evidence', () => {
    const facts = one([{ kind: 'physical', receptacleId: 'a', evidence: { signs: ['scorched'] } }]);
    expect(gapsAt(facts, 'a').join()).toContain('not-told');
    const told = {
      ...facts,
      notices: [notice({ id: 'n', kind: 'danger-told', receptacleId: 'a', whom: 'Dell Arden' })],
    };
    expect(gapsAt(told, 'a').join()).not.toContain('not-told');
    expect(says(find(told, 'P02:a'))).toContain('Told: Dell Arden');
  });

  test('a dim lamp is unproven, and never clean', () => {
    for (const bits of ['1d0', 'd10', 'dd0', '11d', '0dd']) {
      const facts = one([read('a', bits)]);
      const told = evaluateInspection(facts).findings.length + gapsAt(facts, 'a').length;
      expect(told, bits).toBeGreaterThan(0);
    }
  });

  test('a receptacle without a label is named by its number', () => {
    const facts = one([read('a', '101')], { label: '' });
    expect(find(facts, 'W02:a')?.place).toBe('Living room, receptacle 1');
  });

  test('photos of the receptacle stand with its finding', () => {
    expect(find(houseOf1988(), 'W08:bed-1')?.photoIds).toEqual(['p1']);
  });
});

test('supply: drop, high and low legs, ground path', () => {
  const drop = one([{ kind: 'load', receptacleId: 'a', evidence: { amps: 12, noLoadHn: 122, loadedHn: 114.5 } }]);
  expect(find(drop, 'W12:a')).toMatchObject({ signal: 'CAUTION', urgency: 'U3' });
  const poor = one([{ kind: 'wiring', receptacleId: 'a', evidence: { lamps: lamps('110'), groundOhms: 2.5 } }]);
  expect(find(poor, 'W13:a')).toMatchObject({ signal: 'WARNING', urgency: 'U2' });
  expect(
    find(one([{ kind: 'wiring', receptacleId: 'a', evidence: { lamps: lamps('110'), groundOhms: 0.4 } }]), 'W13:a'),
  ).toBeUndefined();
});

test('a breaker trial that is no Class A GFCI is not taken for one', () => {
  const facts = emptyHouse({
    circuits: [circuit({ id: 'c', breaker: '4' })],
    receptacles: [receptacle({ id: 'a', circuitId: 'c' })],
    readings: readings([
      read('a', '110'),
      {
        kind: 'gfci',
        circuitId: 'c',
        evidence: {
          device: 'breaker',
          button: 'trips',
          faceDead: true,
          resets: true,
          breakerMarking: 'afci',
          wentDead: ['a'],
        },
      },
    ]),
  });
  expect(find(facts, 'G19:c')).toMatchObject({ signal: 'WARNING', urgency: 'U2', place: 'Breaker 4' });
});

test('a house where nearly everything answers has few findings', () => {
  expect(evaluateInspection(houseOf2021()).findings.map((finding) => finding.id)).toEqual([
    'G10:house',
    'P07:g-1',
    'T03:house',
  ]);
});
