import { describe, expect, test } from 'vitest';
import { diagnoseWiring, expectedReadings } from '@/lib/findings';
import type { WiringCondition } from '@/lib/findings/vocabulary';
import type { ReadingOptions } from '@/lib/findings/wiring/predict';
import { lampsOf } from '../support/wiring';

type Row = {
  condition: WiringCondition;
  options?: ReadingOptions;
  bits: string;
  high: [number, number, number];
  low: [number, number, number];
  source: string;
};

const DERIVED =
  'derived: 120 V source, equal lamps that strike at 75 V, 10 megohm and 3 kilohm meters, 15 m of flat cable';
const ON_OFF = 'on/off table and questions of a tester maker, published 2013-01-14; volts derived';
const SIMULATED = 'derived by simulation';
const RPBG = 'ecmweb.com "Failures in outlet testing exposed", 2013; volts derived';
const DIVIDER = 'series divider of 144 and 72 ohms across 240 V, studylib 5726865; derived';

const same = (hn: number, hg: number, ng: number): Pick<Row, 'high' | 'low'> => ({
  high: [hn, hg, ng],
  low: [hn, hg, ng],
});

const ROWS: Row[] = [
  { condition: 'correct', bits: '110', ...same(120, 120, 0), source: ON_OFF },
  { condition: 'open-ground', bits: '100', high: [120, 62, 57], low: [120, 0, 0], source: ON_OFF },
  { condition: 'open-neutral', bits: '010', high: [90, 120, 28], low: [0, 120, 0], source: ON_OFF },
  { condition: 'open-neutral-with-load', bits: '011', high: [0, 120, 120], low: [0, 120, 114], source: ON_OFF },
  { condition: 'open-hot', bits: '000', ...same(0, 0, 0), source: ON_OFF },
  { condition: 'no-power', bits: '000', ...same(0, 0, 0), source: ON_OFF },
  { condition: 'hot-neutral-reversed', bits: '101', ...same(120, 0, 120), source: ON_OFF },
  { condition: 'hot-ground-reversed', bits: '011', ...same(0, 120, 120), source: ON_OFF },
  { condition: 'bootleg-ground-open-neutral', bits: '000', ...same(0, 0, 0), source: SIMULATED },
  { condition: 'open-ground-energized', bits: '101', high: [120, 1, 120], low: [120, 0, 16], source: SIMULATED },
  {
    condition: 'open-ground-energized',
    options: { leakOhms: 0.5 },
    bits: '101',
    high: [120, 0, 120],
    low: [120, 0, 120],
    source: SIMULATED,
  },
  { condition: 'service-neutral-open', bits: '110', ...same(161, 161, 0), source: SIMULATED },
  {
    condition: 'service-neutral-open',
    options: { legWatts: [2350, 1000] },
    bits: '110',
    ...same(79, 79, 0),
    source: SIMULATED,
  },
  { condition: 'high-resistance-neutral', bits: '110', ...same(78, 119, 41), source: SIMULATED },
  { condition: 'high-resistance-hot', bits: '110', ...same(78, 79, 1), source: SIMULATED },
  { condition: 'hot-on-neutral-hot-open', bits: '001', high: [90, 28, 120], low: [0, 0, 120], source: ON_OFF },
  { condition: 'hot-on-ground-hot-open', bits: '001', high: [83, 35, 120], low: [0, 0, 120], source: DERIVED },
  { condition: 'neutral-ground-swapped', bits: '110', ...same(120, 120, 0), source: DERIVED },
  { condition: 'bootleg-ground', bits: '110', ...same(120, 120, 0), source: RPBG },
  { condition: 'reversed-bootleg-ground', bits: '110', ...same(120, 120, 0), source: RPBG },
  {
    condition: 'open-ground-hot-neutral-reversed',
    bits: '100',
    high: [120, 57, 62],
    low: [120, 0, 0],
    source: DERIVED,
  },
  { condition: 'same-leg-on-both', bits: '011', ...same(0, 120, 120), source: DERIVED },
  { condition: 'line-to-line-240', bits: '111', ...same(240, 120, 120), source: DERIVED },
  {
    condition: 'shared-neutral-open',
    options: { loadWatts: 150, otherLegWatts: 150 },
    bits: '110',
    high: [120, 120, 0],
    low: [118, 120, 0],
    source: DIVIDER,
  },
  {
    condition: 'shared-neutral-open',
    options: { loadWatts: 100, otherLegWatts: 200 },
    bits: '110',
    high: [160, 120, 40],
    low: [157, 120, 39],
    source: DIVIDER,
  },
  {
    condition: 'shared-neutral-open',
    options: { loadWatts: 200, otherLegWatts: 100 },
    bits: '110',
    high: [80, 120, 40],
    low: [79, 120, 39],
    source: DIVIDER,
  },
  {
    condition: 'shared-neutral-open',
    options: { loadWatts: 60, otherLegWatts: 1500 },
    bits: '111',
    high: [231, 120, 111],
    low: [230, 120, 110],
    source: ON_OFF,
  },
];

describe('the circuit model gives the lamp and meter table', () => {
  test.each(ROWS)('$condition: lamps $bits, $high, $low ($source)', ({ condition, options, bits, high, low }) => {
    const expected = expectedReadings(condition, options);
    expect(expected.lamps).toEqual(lampsOf(bits));
    for (const pair of [0, 1, 2] as const) {
      expect(Math.abs(expected.highImpedance[pair] - high[pair])).toBeLessThan(1.01);
      expect(Math.abs(expected.lowImpedance[pair] - low[pair])).toBeLessThan(1.01);
    }
  });

  test('neutral and ground both open: no lamp, little on a high-impedance meter, nothing on the other (derived)', () => {
    const { lamps, highImpedance, lowImpedance } = expectedReadings('open-neutral-and-ground');
    expect(lamps).toEqual(lampsOf('000'));
    expect(Math.max(...highImpedance)).toBeLessThan(40);
    expect(Math.max(...lowImpedance)).toBeLessThan(1);
  });

  test('a poor joint that drops more puts a lamp out: 010 at the neutral, 000 at the hot (derived by simulation)', () => {
    expect(expectedReadings('high-resistance-neutral', { jointOhms: 8 }).lamps).toEqual(lampsOf('010'));
    expect(expectedReadings('high-resistance-hot', { jointOhms: 8 }).lamps).toEqual(lampsOf('000'));
  });

  test('on a 208Y/120 supply: 208/120/120 line to line, 104/120/60 with a shared neutral open (derived by simulation)', () => {
    const line = expectedReadings('line-to-line-240', { supply: '208Y/120' });
    const shared = expectedReadings('shared-neutral-open', { supply: '208Y/120', loadWatts: 150, otherLegWatts: 150 });
    expect(line.highImpedance.map(Math.round)).toEqual([208, 120, 120]);
    expect(shared.highImpedance.map(Math.round)).toEqual([104, 120, 60]);
  });
});

/** The least that a lamp pattern must leave open (derived; table of the lamp and meter rows above). */
const LEAST: Record<string, WiringCondition[]> = {
  '000': ['open-hot', 'no-power', 'open-neutral-and-ground', 'bootleg-ground-open-neutral'],
  '001': ['hot-on-neutral-hot-open', 'hot-on-ground-hot-open'],
  '010': ['open-neutral', 'neutral-on-hot-hot-on-ground-neutral-open'],
  '011': ['open-neutral-with-load', 'hot-ground-reversed', 'same-leg-on-both'],
  '100': ['open-ground', 'open-ground-hot-neutral-reversed'],
  '101': ['hot-neutral-reversed', 'open-ground-energized'],
  '110': [
    'correct',
    'neutral-ground-swapped',
    'bootleg-ground',
    'reversed-bootleg-ground',
    'shared-neutral-open',
    'service-neutral-open',
    'high-resistance-ground',
    'high-resistance-neutral',
    'high-resistance-hot',
  ],
  '111': ['line-to-line-240', 'shared-neutral-open'],
};

test.each(Object.entries(LEAST))('lamps %s leave open at least %j', (bits, least) => {
  const found = diagnoseWiring({ slots: 3, lamps: lampsOf(bits) }).candidates.map((row) => row.condition);
  expect(found).toEqual(expect.arrayContaining(least));
});
