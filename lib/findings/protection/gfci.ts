import type { GfciAssessment, GfciTrial, LampPattern } from '../facts';
import { DOWNSTREAM, FIRST, HELD, OWN_DEVICE, trips, type Row, type Seen } from './gfci-rows';

export { maxTripSeconds } from './trip-time';

/**
 * What a trial of a GFCI proves. Rows D00 to D27 of the decision table, first match in its printed order (trade practice;
 * trip-time limit from UL 943). A dim lamp is neither lit nor off: the bits are then unknown. Never throws.
 * `conflict` is set where the lamps and the trial cannot both be right.
 */
export function assessGfci(trial: GfciTrial): GfciAssessment & { conflict?: string } {
  const bits = bitsOf(trial.lamps);
  const seen: Seen = { ...trial, bits, ground: groundOf(bits) };
  const first = find(FIRST, seen);
  if (first) return first;

  // With these lamps the tester's current proves nothing; its result is set aside.
  const weighed: Seen = bits === '101' || bits === '000' ? { ...seen, tester: undefined, measured: undefined } : seen;
  const held = find(HELD, weighed);
  if (held) return held;

  const found = find(trial.device === 'downstream' ? DOWNSTREAM : OWN_DEVICE, weighed);
  if (!found) throw new Error('no row of the GFCI table matched');
  const protects = bits === '101' ? 'unproven' : found.protects;
  const conflict =
    bits === '100' && trips(weighed.tester)
      ? 'The lamps showed no ground, and the tester tripped the device through one: there is a ground path that the lamps missed.'
      : undefined;
  return { ...found, protects, ...(conflict ? { conflict } : {}) };
}

function find(rows: Row[], seen: Seen): GfciAssessment | undefined {
  const row = rows.find((candidate) => candidate.when(seen));
  return row && { verdict: row.verdict, row: row.id, protects: row.protects ?? 'unproven', says: row.says };
}

function bitsOf(lamps: LampPattern | undefined): string | undefined {
  if (!lamps) return undefined;
  return [lamps.hn, lamps.hg, lamps.ng].map((lamp) => ({ lit: '1', off: '0', dim: 'd' })[lamp]).join('');
}

function groundOf(bits: string | undefined): Seen['ground'] {
  if (bits === '110') return 'yes';
  return bits === '100' ? 'no' : 'unknown';
}
