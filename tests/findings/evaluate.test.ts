import { describe, expect, test } from 'vitest';
import { evaluateInspection } from '@/lib/findings';
import { find, gapsAt, one, says } from '../support/evaluated';
import { area, emptyHouse, lamps, read, readings, receptacle } from '../support/facts';
import { houseOf2021 } from '../support/house-of-2021';
import { houseOf1962, houseOf1988 } from '../support/houses';

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
