import { describe, expect, test } from 'vitest';
import { composeFinding, evaluateInspection } from '@/lib/findings';
import type { Finding, InspectionFacts } from '@/lib/findings/facts';
import {
  area,
  circuit,
  emptyHouse,
  houseOf1962,
  houseOf1988,
  houseOf2021,
  lamps,
  notice,
  read,
  readings,
  receptacle,
} from '../support/facts';

function find(facts: InspectionFacts, id: string): Finding | undefined {
  return evaluateInspection(facts).findings.find((finding) => finding.id === id);
}

function says(finding: Finding | undefined): string {
  if (!finding) return '';
  const { hazard, evidence, unproven, ...parts } = composeFinding(finding, { locale: 'en' });
  return [...Object.values(parts), ...Object.values(hazard), ...evidence, ...unproven].join(' ');
}

function gapsAt(facts: InspectionFacts, receptacleId: string): string[] {
  return evaluateInspection(facts)
    .gaps.filter((gap) => gap.receptacleId === receptacleId)
    .map((gap) => `${gap.kind}: ${gap.says}`);
}

function one(
  rows: Parameters<typeof readings>[0],
  row: Partial<InspectionFacts['receptacles'][number]> = {},
  house: Parameters<typeof emptyHouse>[0] = {},
) {
  return emptyHouse({
    receptacles: [receptacle({ id: 'a', label: 'by the door', ...row })],
    readings: readings(rows),
    ...house,
  });
}

describe('the two-wire house of 1962', () => {
  test('a receptacle that reads correct is called unproven and the jumper is named', () => {
    const facts = houseOf1962();
    expect(gapsAt(facts, 'window').join()).toMatch(/unproven.*jumper.*Next check/is);
    const finding = find(facts, 'W07:house-house');
    expect(finding?.subject).toMatchObject({ receptacleIds: expect.arrayContaining(['window']) });
    expect(says(finding)).toContain('The ground is unproven.');
  });

  test('the ungrounded GFCI whose button works is not called bad', () => {
    const facts = houseOf1962();
    const atSink = evaluateInspection(facts).findings.filter(
      ({ code, subject }) => code !== 'A02' && 'receptacleIds' in subject && subject.receptacleIds.includes('sink'),
    );
    expect(atSink.map((finding) => finding.code)).toEqual(['G05']);
    expect(atSink[0]).toMatchObject({ signal: 'CAUTION', urgency: 'U3' });
    expect(says(atSink[0])).toContain('a plug-in tester needs one to trip it');
    expect(says(atSink[0])).toContain('"No Equipment Ground"');
    expect(gapsAt(facts, 'sink').join()).toContain('it gives no ground');
  });

  test('a GFCI that stays live after its button is to be stopped using now', () => {
    expect(find(houseOf1962(), 'G02:basin')).toMatchObject({ signal: 'WARNING', urgency: 'U1' });
    expect(gapsAt(houseOf1962(), 'basin').join()).toContain('not-told');
  });

  test('a pattern of only hot-ground and neutral-ground is worded "may be", broken neutral first', () => {
    const finding = find(houseOf1962(), 'W03:bed-left');
    expect(finding).toMatchObject({ signal: 'WARNING', urgency: 'U1' });
    expect(says(finding)).toMatch(/May be a broken neutral/);
    expect(says(finding)).toMatch(/Most often: a broken neutral with something still connected/);
    expect(gapsAt(houseOf1962(), 'bed-left')).toEqual([]);
  });

  test('open grounds of one house are one finding, with each receptacle in its evidence', () => {
    const finding = find(houseOf1962(), 'W01:house');
    expect(finding?.subject).toEqual({ kind: 'receptacles', receptacleIds: ['sofa', 'shaver', 'bed-right'] });
    expect(finding?.evidence).toHaveLength(3);
  });

  test('what was not tested is a gap with its reason', () => {
    expect(gapsAt(houseOf1962(), 'closet').join()).toContain('blocked by furniture or stored goods (wardrobe)');
    expect(gapsAt(houseOf1962(), 'freezer').join()).toContain('a freezer or a pump depends on it');
  });
});

describe('signals', () => {
  test('DANGER stands only where a live part or case was sensed', () => {
    for (const facts of [houseOf1962(), houseOf2021()])
      expect(evaluateInspection(facts).findings.filter((finding) => finding.signal === 'DANGER')).toEqual([]);
    expect(find(houseOf1988(), 'W08:bed-1')).toMatchObject({ signal: 'DANGER', urgency: 'U1' });
  });

  test.each([
    ['W03', '011'],
    ['W04', '010'],
    ['W06', '001'],
  ])('%s becomes DANGER when the ground senses live', (code, bits) => {
    const quiet = one([
      {
        kind: 'wiring',
        receptacleId: 'a',
        evidence: { lamps: lamps(bits), sensor: { hotSlot: true, groundSlot: false } },
      },
    ]);
    const live = one([
      {
        kind: 'wiring',
        receptacleId: 'a',
        evidence: { lamps: lamps(bits), sensor: { hotSlot: false, groundSlot: true } },
      },
    ]);
    expect(find(quiet, `${code}:a`)?.signal).not.toBe('DANGER');
    expect(find(live, `${code}:a`)).toMatchObject({ signal: 'DANGER', urgency: 'U1' });
  });

  test('a dead outlet whose ground senses live is DANGER', () => {
    const facts = one([
      {
        kind: 'wiring',
        receptacleId: 'a',
        evidence: { lamps: lamps('000'), sensor: { hotSlot: true, groundSlot: true, coverScrew: true } },
      },
    ]);
    expect(find(facts, 'W16:a')).toMatchObject({ signal: 'DANGER', urgency: 'U1' });
    expect(find(facts, 'W05:a')).toBeUndefined();
  });

  test('a ground slot that answers beside a live hot slot accuses no one', () => {
    const facts = one([
      {
        kind: 'wiring',
        receptacleId: 'a',
        evidence: { lamps: lamps('110'), sensor: { hotSlot: true, groundSlot: true } },
      },
    ]);
    expect(find(facts, 'W08:a')).toBeUndefined();
  });

  test('a missing cover is DANGER only with live terminals in sight', () => {
    const plain = one([{ kind: 'physical', receptacleId: 'a', evidence: { signs: ['cover-missing'] } }]);
    const bare = one([
      { kind: 'physical', receptacleId: 'a', evidence: { signs: ['cover-missing', 'live-terminals-exposed'] } },
    ]);
    expect(find(plain, 'P09:a')).toMatchObject({ signal: 'WARNING', urgency: 'U2' });
    expect(find(bare, 'P09:a')).toMatchObject({ signal: 'DANGER', urgency: 'U1', who: 'electrician' });
  });

  test('findings come gravest first', () => {
    const order = ['DANGER', 'WARNING', 'CAUTION', 'NOTICE'];
    const ranks = evaluateInspection(houseOf1988()).findings.map((finding) => order.indexOf(finding.signal));
    expect(ranks).toEqual(ranks.toSorted((a, b) => a - b));
  });
});

describe('protection from shock', () => {
  const bath = { areas: [area({ id: 'bath', name: 'Bathroom', place: 'bathroom' })] };

  test('going dead on another button answers the need', () => {
    const facts = emptyHouse({
      ...bath,
      receptacles: [
        receptacle({ id: 'a', areaId: 'bath', device: 'gfci-receptacle', order: 1 }),
        receptacle({ id: 'b', areaId: 'bath', order: 2 }),
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
            tester: 'trips',
            resets: true,
            wentDead: ['b'],
          },
        },
      ]),
    });
    expect(evaluateInspection(facts)).toMatchObject({ findings: [], gaps: [] });
  });

  test('without a trial it is a gap, not a missing GFCI', () => {
    const facts = one([read('a', '110')], { areaId: 'bath' }, bath);
    expect(find(facts, 'G07:house')).toBeUndefined();
    expect(
      evaluateInspection(facts)
        .gaps.map((gap) => gap.says)
        .join(),
    ).toContain('Whether a GFCI protects it is not known');
  });

  test('with no device found it is "not shown to be protected"', () => {
    const facts = one(
      [
        read('a', '110'),
        {
          kind: 'gfci',
          receptacleId: 'a',
          evidence: { device: 'downstream', lamps: lamps('110'), tester: 'no-trip', deviceFound: false },
        },
      ],
      { areaId: 'bath' },
      bath,
    );
    expect(says(find(facts, 'G07:house'))).toContain('Not shown to be protected');
    expect(find(facts, 'G07:house')?.hook).toMatchObject({ section: '210.8(A)(1)', since: 1975 });
  });

  test.each([
    ['TX', 'Deficient'],
    ['WA', 'advise adding'],
  ] as const)('%s words an absent GFCI in its own way', (stateProfile, words) => {
    const facts = one(
      [
        read('a', '110'),
        {
          kind: 'gfci',
          receptacleId: 'a',
          evidence: { device: 'downstream', lamps: lamps('110'), tester: 'no-trip', deviceFound: false },
        },
      ],
      { areaId: 'bath' },
      { ...bath, inspection: { stateProfile } },
    );
    expect(says(find(facts, 'G07:house'))).toContain(words);
  });

  test('a failed device is told once, and not as missing too', () => {
    const facts = one(
      [
        read('a', '110'),
        {
          kind: 'gfci',
          receptacleId: 'a',
          evidence: { device: 'receptacle', lamps: lamps('110'), button: 'no-trip', tester: 'no-trip' },
        },
      ],
      { areaId: 'bath', device: 'gfci-receptacle' },
      bath,
    );
    expect(evaluateInspection(facts).findings.map((finding) => finding.code)).toEqual(['G01']);
  });

  test('marks that are there are not asked for again', () => {
    const trial = {
      kind: 'gfci' as const,
      receptacleId: 'a',
      evidence: {
        device: 'receptacle' as const,
        lamps: lamps('100'),
        button: 'trips' as const,
        faceDead: true,
        resets: true,
      },
    };
    const device = { device: 'gfci-receptacle' as const, marksChecked: true };
    const marked = one([read('a', '100'), trial], { ...device, marks: ['no-equipment-ground'] });
    expect(evaluateInspection(marked).findings).toEqual([]);
    expect(gapsAt(marked, 'a').join()).toContain('it gives no ground');
    expect(says(find(one([read('a', '100'), trial], device), 'G05:a'))).toContain('is not there');
  });
});

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
