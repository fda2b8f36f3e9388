import type { GfciAssessment, GfciTrial, LampPattern } from '../facts';
import type { Lamp } from '../vocabulary';
import { DOWNSTREAM, FIRST, HELD, OWN_DEVICE, trips, type Row, type Seen } from './gfci-rows';

export { maxTripSeconds } from './trip-time';

const SOUND_BITS = ['110', '100'];
/** Gravest first: patterns under which no button is pressed, then those that only set the tester aside. */
const UNSOUND_BITS = ['111', '011', '010', '001', '101', '000'];

const MISSED_GROUND =
  'The lamps showed no ground, and the tester tripped the device through one: there is a ground path that the lamps missed.';
const MEND_FIRST = 'The lamps do not read correct, so protection stays unproven until the wiring is mended.';

/**
 * What a trial of a GFCI proves. Rows D00 to D27 of the decision table, first match in its printed order (trade practice;
 * trip-time limit from UL 943). A dim lamp counts as lit and as off: where both readings are unsound the graver one holds,
 * else the bits are unknown and protection stays unproven. Never throws. `conflict` is set where the lamps and the trial cannot both be right.
 */
export function assessGfci(trial: GfciTrial): GfciAssessment & { conflict?: string } {
  const bits = bitsOf(trial.lamps);
  const seen: Seen = { ...trial, bits, ground: groundOf(bits) };
  const conflict = bits === '100' && trips(trial.tester) ? MISSED_GROUND : undefined;
  return { ...firstMatch(seen), ...(conflict ? { conflict } : {}) };
}

function firstMatch(seen: Seen): GfciAssessment {
  const first = find(FIRST, seen);
  if (first) return first;

  const weighed = seen.bits === '101' || seen.bits === '000' ? withoutTester(seen) : seen;
  const held = find(HELD, weighed);
  if (held) return held;

  const found = find(weighed.device === 'downstream' ? DOWNSTREAM : OWN_DEVICE, weighed);
  if (!found) throw new Error('no row of the GFCI table matched');
  if (found.protects === 'yes' && (weighed.bits === '101' || hasDimLamp(weighed.lamps)))
    return { ...found, protects: 'unproven', says: `${found.says} ${MEND_FIRST}` };
  return weighed.bits === '101' ? { ...found, protects: 'unproven' } : found;
}

/** With these lamps the tester's current proves nothing: its result and its milliamperes are set aside. */
function withoutTester(seen: Seen): Seen {
  return { ...seen, tester: undefined, measured: undefined, testerSetAside: seen.tester !== undefined };
}

function find(rows: Row[], seen: Seen): GfciAssessment | undefined {
  const row = rows.find((candidate) => candidate.when(seen));
  if (!row) return undefined;
  const says = typeof row.says === 'string' ? row.says : row.says(seen);
  return { verdict: row.verdict, row: row.id, protects: row.protects ?? 'unproven', says };
}

function hasDimLamp(lamps: LampPattern | undefined): boolean {
  return lamps !== undefined && [lamps.hn, lamps.hg, lamps.ng].includes('dim');
}

function bitsOf(lamps: LampPattern | undefined): string | undefined {
  if (!lamps) return undefined;
  const readings = [lamps.hn, lamps.hg, lamps.ng].reduce<string[]>(
    (begun, lamp) => begun.flatMap((start) => BITS[lamp].map((bit) => start + bit)),
    [''],
  );
  if (readings.length === 1) return readings[0];
  return readings.some((bits) => SOUND_BITS.includes(bits))
    ? undefined
    : UNSOUND_BITS.find((bits) => readings.includes(bits));
}

const BITS: Record<Lamp, string[]> = { lit: ['1'], off: ['0'], dim: ['0', '1'] };

function groundOf(bits: string | undefined): Seen['ground'] {
  if (bits === '110') return 'yes';
  return bits === '100' ? 'no' : 'unknown';
}
