import { describe, expect, test } from 'vitest';
import { diagnoseWiring } from '@/lib/findings';
import type { VoltTrio, WiringEvidence } from '@/lib/findings/facts';
import type { WiringCondition } from '@/lib/findings/vocabulary';
import { conditionsOf, lampsOf, leadingOf } from '../support/wiring';

const HOUSE = { slots: 3, supply: '120/240' } as const;
const high = (hn: number, hg: number, ng: number): VoltTrio => ({ hn, hg, ng, meter: 'high-impedance' });
const low = (hn: number, hg: number, ng: number): VoltTrio => ({ hn, hg, ng, meter: 'low-impedance' });

function read(evidence: Partial<WiringEvidence>) {
  const diagnosis = diagnoseWiring({ ...HOUSE, ...evidence });
  return { ...diagnosis, all: conditionsOf(diagnosis), leading: leadingOf(diagnosis) };
}

describe('what lamps mean most often', () => {
  test.each<[string, WiringCondition[]]>([
    ['110', ['correct']],
    ['100', ['open-ground']],
    ['010', ['open-neutral']],
    ['011', ['open-neutral-with-load']],
    ['101', ['hot-neutral-reversed']],
    ['000', ['no-power', 'open-hot']],
    ['001', ['hot-on-neutral-hot-open', 'hot-on-ground-hot-open']],
    ['111', ['line-to-line-240', 'shared-neutral-open']],
  ])('%s', (bits, leading) => {
    expect(read({ lamps: lampsOf(bits) }).leading).toEqual(leading);
  });

  test('the words are "most often" and "also possible", and never a percentage', () => {
    for (const bits of ['000', '001', '010', '011', '100', '101', '110', '111'])
      for (const { standing, because } of read({ lamps: lampsOf(bits) }).candidates) {
        expect(because).toMatch(standing === 'leading' ? /^Most often: / : /^Also possible: /);
        expect(because).not.toMatch(/%|percent/);
      }
  });

  test('hot and ground swapped stays possible beside an open neutral with a load', () => {
    expect(read({ lamps: lampsOf('011') }).all).toContain('hot-ground-reversed');
  });
});

describe('meters', () => {
  test.each<[string, VoltTrio, WiringCondition[], WiringCondition[]]>([
    ['118.5 + 1.5 = 120 is a circuit under load', high(118.5, 120, 1.5), ['correct'], []],
    ['105 V is a low supply', low(105, 105, 0.1), ['correct'], []],
    ['131.5 V is a high supply', low(131.5, 131.5, 0.1), ['correct'], []],
    ['135 V on both is no supply', high(135, 135, 0), ['service-neutral-open'], ['correct']],
    ['102 V on both is no supply', high(102, 102, 0.4), ['service-neutral-open', 'high-resistance-hot'], ['correct']],
    ['161/161/0', high(161, 161, 0), ['service-neutral-open'], ['correct', 'shared-neutral-open']],
    ['160/120/40', high(160, 120, 40), ['shared-neutral-open'], ['correct', 'service-neutral-open']],
    ['150/120/30', high(150, 120, 30), ['shared-neutral-open'], ['correct']],
    ['78/119/41', low(78, 119, 41), ['high-resistance-neutral', 'shared-neutral-open'], ['correct']],
    ['78/79/1', low(78, 79, 1), ['high-resistance-hot', 'service-neutral-open'], ['correct', 'shared-neutral-open']],
    ['a small phantom', high(119, 108, 11), ['open-ground'], ['correct', 'bootleg-ground']],
    ['a large phantom', high(121, 24, 98), ['open-ground'], ['hot-neutral-reversed', 'open-ground-energized']],
    ['a phantom that collapses', low(121, 0.4, 0.2), ['open-ground'], ['open-ground-energized', 'correct']],
    ['a leak that does not collapse', low(120, 0.1, 16), ['open-ground-energized'], ['open-ground']],
    ['an open neutral on a high-impedance meter', high(88, 121, 31), ['open-neutral'], ['correct']],
    ['an open neutral on a low-impedance meter', low(0.2, 121, 0.1), ['open-neutral'], ['hot-ground-reversed']],
    ['a supply that is dead', low(0, 0, 0), ['no-power', 'open-hot', 'bootleg-ground-open-neutral'], ['correct']],
    ['a phantom on a dead hot wire', high(46, 46, 0), ['no-power', 'open-hot'], ['correct']],
    ['7 V from neutral to ground is no normal rise', high(113, 120, 7), ['high-resistance-neutral'], ['correct']],
  ])('%s', (_name, volts, fits, excluded) => {
    const { all } = read({ volts });
    expect(all).toEqual(expect.arrayContaining(fits));
    for (const condition of excluded) expect(all).not.toContain(condition);
  });

  test('a voltage that moves between two readings points at the shared neutral', () => {
    const { leading } = read({ volts: high(118, 120, 2), moreVolts: [high(150, 120, 30)] });
    expect(leading).toEqual(['shared-neutral-open']);
  });

  test('the reason against a condition names what the meter would show', () => {
    const against = read({ volts: low(121, 0.4, 0.2) }).ruledOut.find((row) => row.condition === 'correct');
    expect(against?.because).toContain('would show about 120, 120 and 0 volts');
  });
});

describe('contact sensor', () => {
  const lamps = lampsOf('110');

  test('a ground slot that answers beside a quiet hot slot excludes correct', () => {
    const { all, leading } = read({ lamps, sensor: { hotSlot: false, groundSlot: true } });
    expect(all).not.toContain('correct');
    expect(leading).toEqual(['reversed-bootleg-ground']);
  });

  test('a cover screw that answers excludes correct, whatever the hot slot does', () => {
    expect(read({ lamps, sensor: { hotSlot: true, groundSlot: true, coverScrew: true } }).all).not.toContain('correct');
  });

  test('a ground slot that answers beside a live hot slot excludes nothing, and is to be treated as live', () => {
    const { all, notProven, nextCheck } = read({ lamps, sensor: { hotSlot: true, groundSlot: true } });
    expect(all).toEqual(expect.arrayContaining(['correct', 'reversed-bootleg-ground']));
    expect(notProven.join(' ')).toContain('Treat the ground as live until the cover screw is tried');
    expect(nextCheck?.instruction).toContain('cover screw');
  });

  test('silence counts only where the hot slot answered', () => {
    const silent = read({ lamps, sensor: { groundSlot: false, coverScrew: false, hotSlot: false } });
    expect(silent.all).toContain('reversed-bootleg-ground');
    expect(silent.notProven.join(' ')).toContain('its silence elsewhere proves nothing');
    const proved = read({ lamps, sensor: { groundSlot: false, hotSlot: true } });
    expect(proved.all).not.toContain('reversed-bootleg-ground');
  });

  test('with no ground, a live ground slot may be a phantom and is treated as live', () => {
    const { all, notProven } = read({ lamps: lampsOf('100'), sensor: { hotSlot: true, groundSlot: true } });
    expect(all).toContain('open-ground');
    expect(notProven.join(' ')).toContain('Treat it as live');
  });

  test('lamps off and a live ground slot: all three slots may be live', () => {
    const { leading, all } = read({ lamps: lampsOf('000'), sensor: { hotSlot: true, coverScrew: true } });
    expect(leading).toEqual(['bootleg-ground-open-neutral']);
    expect(all).not.toContain('no-power');
  });

  test('a screw that answers and a ground slot that does not is a conflict', () => {
    const sensor = { hotSlot: false, groundSlot: false, coverScrew: true };
    expect(read({ lamps: lampsOf('101'), sensor }).conflict).toContain('cover screw');
  });
});

describe('dim lamps', () => {
  test('a dim lamp counts as lit and as off', () => {
    const union = new Set([...read({ lamps: lampsOf('100') }).all, ...read({ lamps: lampsOf('101') }).all]);
    expect(new Set(read({ lamps: lampsOf('10d') }).all)).toEqual(union);
  });

  test('three dim lamps exclude nothing, so no live ground either', () => {
    expect(read({ lamps: lampsOf('ddd') }).ruledOut).toEqual([]);
  });

  test('correct wiring never leads where a lamp is dim', () => {
    for (const bits of ['d10', '1d0', '11d', 'dd0', 'd1d', '1dd', 'ddd'])
      expect(read({ lamps: lampsOf(bits) }).leading).not.toContain('correct');
  });
});

describe('loads', () => {
  const lamps = lampsOf('011');

  test('unplugging alone does not exclude an open neutral with a load', () => {
    expect(read({ lamps, loadsUnplugged: 'yes' }).all).toContain('open-neutral-with-load');
  });

  test('with the hard-wired loads off too it is excluded, and a live ground slot leads', () => {
    const off = read({ lamps, loadsUnplugged: 'yes', hardWiredLoadsOff: 'yes' });
    expect(off.all).not.toContain('open-neutral-with-load');
    expect(off.leading).toEqual(['hot-ground-reversed']);
  });

  test('a circuit with a neutral of its own has no shared one to be open', () => {
    expect(read({ lamps: lampsOf('111'), sharedNeutral: 'no' }).all).toEqual(['line-to-line-240']);
  });
});

describe('a false ground', () => {
  const lamps = lampsOf('110');
  const sensor = { hotSlot: true, neutralSlot: false, groundSlot: false };
  const load = (loadedNg: number) => ({ amps: 12, noLoadHn: 121.4, loadedHn: 117.2, noLoadNg: 0.02, loadedNg });

  test('three slots that read correct on two-wire cable: a jumper leads', () => {
    const { leading, all, notProven } = read({ lamps, wiringMethod: 'two-wire' });
    expect(leading).toEqual(['bootleg-ground']);
    expect(all).toContain('correct');
    expect(notProven.join(' ')).toContain('two-wire cable brings none');
  });

  test('a neutral that stays quiet under load raises the suspicion, away from the panel', () => {
    expect(read({ lamps, sensor, loadTest: load(0.02) }).leading).toEqual(['bootleg-ground']);
    expect(read({ lamps, sensor, loadTest: load(0.02), nearBondedPanel: true }).leading).toEqual(['correct']);
    expect(read({ lamps, sensor, loadTest: load(0.02), sharedNeutral: 'unknown' }).leading).toEqual(['correct']);
  });

  test('a neutral that rises shows no joint here, and a jumper farther upstream stays possible', () => {
    const { leading, all, notProven } = read({ lamps, sensor, loadTest: load(2.1) });
    expect(leading).toEqual(['correct']);
    expect(all).toContain('bootleg-ground');
    expect(notProven.join(' ')).toContain('farther upstream');
  });

  test('a jumper that was seen leaves only what can stand beside it', () => {
    const { leading, all } = read({ lamps, groundJumperSeen: true });
    expect(leading).toEqual(['bootleg-ground']);
    expect(all).not.toContain('correct');
    expect(read({ lamps: lampsOf('101'), groundJumperSeen: true }).conflict).toContain('cannot both be right');
  });

  test('a ground path above 1 ohm is no sound ground', () => {
    const { leading, all } = read({ lamps, groundOhms: 3 });
    expect(leading).toEqual(['high-resistance-ground']);
    expect(all).not.toContain('correct');
    expect(read({ lamps, groundOhms: 0.4 }).all).toEqual(expect.arrayContaining(['correct', 'bootleg-ground']));
  });

  test('a load test that drops far accuses hot or neutral, one that drops little clears both', () => {
    const far = read({ lamps, loadTest: { amps: 12, noLoadHn: 122, loadedHn: 104 } });
    expect(far.leading).toEqual(expect.arrayContaining(['high-resistance-neutral', 'high-resistance-hot']));
    const little = read({ lamps, loadTest: { amps: 12, noLoadHn: 120, loadedHn: 117.8 } });
    expect(little.all).not.toContain('high-resistance-hot');
  });
});

describe('faces and supplies', () => {
  test('a two-slot face has one link: never an open ground, polarity unproven', () => {
    const { all, notProven } = read({ slots: 2, lamps: lampsOf('100') });
    expect(all).not.toContain('open-ground');
    expect(all).toEqual(expect.arrayContaining(['correct', 'hot-neutral-reversed']));
    expect(notProven.join(' ')).toContain('Polarity');
  });

  test('line to line on 208Y/120 reads 208, and a shared neutral open reads 104/120/60', () => {
    const wye = { supply: '208Y/120' } as const;
    expect(read({ ...wye, volts: high(208, 120, 120) }).all).toContain('line-to-line-240');
    expect(read({ ...wye, volts: high(104, 120, 60) }).all).toContain('shared-neutral-open');
    expect(read({ volts: high(104, 120, 60) }).all).not.toContain('shared-neutral-open');
  });

  test('a 240 volt receptacle is as expected at 240/120/120', () => {
    expect(read({ nominalVolts: 240, volts: high(241, 121, 120) }).leading).toContain('correct');
    expect(read({ nominalVolts: 240, volts: high(120, 120, 0.1) }).all).not.toContain('correct');
  });
});

describe('conflicts and silence', () => {
  test('lamps 110 and no voltage on the meter cannot both be right', () => {
    const { conflict, candidates } = read({ lamps: lampsOf('110'), volts: low(0, 120, 120) });
    expect(conflict).toContain('cannot both be right');
    expect(candidates).toEqual([]);
  });

  test('no ground on the lamps and a low ground path cannot both be right', () => {
    expect(read({ lamps: lampsOf('100'), groundOhms: 0.3 }).conflict).toContain('cannot both be right');
  });

  test('readings that agree are no conflict', () => {
    expect(read({ lamps: lampsOf('100'), volts: high(120, 70, 48) }).conflict).toBeUndefined();
    expect(read({ lamps: lampsOf('110'), volts: high(150, 120, 30) }).conflict).toBeUndefined();
  });

  test('with nothing read everything is possible and nothing is known', () => {
    const { all, notProven } = read({});
    expect(all).toHaveLength(25);
    expect(notProven[0]).toContain('Nothing was read here');
  });

  test('power that was checked is not off', () => {
    const { all } = read({ lamps: lampsOf('000'), powerChecked: true });
    expect(all).not.toContain('no-power');
    expect(all).toContain('open-hot');
  });
});

describe('the next check', () => {
  const quiet = { hotSlot: true, neutralSlot: false, groundSlot: false };

  test.each(['000', '001', '010', '011', '100', '101', '110'])('lamps %s: the live-wire sensor goes first', (bits) => {
    expect(read({ lamps: lampsOf(bits) }).nextCheck?.instruction).toContain('non-contact sensor');
  });

  test('a quiet ground slot leads to the meter, and the meter to the load test', () => {
    const lamps = lampsOf('110');
    expect(read({ lamps, sensor: quiet }).nextCheck?.instruction).toContain('high-impedance meter');
    const metered = { lamps, sensor: quiet, volts: high(121, 121, 0.2) };
    expect(read(metered).nextCheck?.instruction).toContain('load test');
  });

  test('with an open neutral and a load suspected, unplugging tells most', () => {
    const { nextCheck } = read({ lamps: lampsOf('011'), sensor: { ...quiet, neutralSlot: true } });
    expect(nextCheck?.instruction).toContain('unplug everything');
    expect(nextCheck?.separates).toEqual(expect.arrayContaining(['open-neutral-with-load', 'same-leg-on-both']));
  });

  test('no load is put on more than a supply gives', () => {
    const { nextCheck } = read({ lamps: lampsOf('111'), volts: high(238, 120, 118) });
    expect(nextCheck?.instruction ?? '').not.toContain('load test');
  });

  test('where nothing is left to tell apart there is none', () => {
    expect(read({ lamps: lampsOf('101'), sensor: { hotSlot: true, groundSlot: false } }).nextCheck).toBeUndefined();
  });
});
