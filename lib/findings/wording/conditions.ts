import type { WiringCondition } from '../vocabulary';

/** Each wiring condition as it stands in a sentence after "most often:" or "also possible:". */
export const CONDITION_WORDS: Record<WiringCondition, string> = {
  correct: 'wiring as expected',
  'open-ground': 'a ground that is not connected',
  'open-neutral': 'a broken neutral',
  'open-neutral-with-load': 'a broken neutral with something still connected to the circuit',
  'open-hot': 'a broken hot wire',
  'no-power': 'power that is off upstream: a breaker, a tripped GFCI or a wall switch',
  'hot-neutral-reversed': 'hot and neutral swapped',
  'hot-ground-reversed': 'hot and ground swapped',
  'hot-on-neutral-hot-open': 'the hot wire on the neutral slot, with the hot slot open',
  'hot-on-ground-hot-open': 'the hot wire on the ground slot, with the hot slot open',
  'neutral-on-hot-hot-on-ground-neutral-open':
    'neutral on the hot slot and hot on the ground slot, with the neutral slot open',
  'neutral-ground-swapped': 'neutral and ground swapped',
  'bootleg-ground': 'a jumper from neutral to the ground slot in place of a ground wire',
  'reversed-bootleg-ground': 'hot and neutral swapped, with a jumper to the ground slot',
  'open-ground-hot-neutral-reversed': 'no ground, with hot and neutral swapped',
  'open-neutral-and-ground': 'a broken neutral and a broken ground',
  'same-leg-on-both': 'the same hot leg on both slots',
  'line-to-line-240': 'about 240 volts on a 120 volt receptacle',
  'shared-neutral-open': 'a broken neutral that two circuits share',
  'service-neutral-open': 'a failing neutral of the service',
  'high-resistance-ground': 'a poor joint in the ground path',
  'high-resistance-neutral': 'a poor joint in the neutral',
  'high-resistance-hot': 'a poor joint in the hot wire',
  'bootleg-ground-open-neutral': 'a jumper to the ground slot with the neutral broken upstream: all three slots live',
  'open-ground-energized': 'a ground slot that is cut off from ground and made live by a fault',
};

/** A condition as a heading. */
export function conditionName(condition: WiringCondition): string {
  const words = CONDITION_WORDS[condition];
  return `${words.charAt(0).toUpperCase()}${words.slice(1)}`;
}

/** "a, b, or c" */
export function conditionList(conditions: readonly WiringCondition[]): string {
  return joinWords(
    conditions.map((condition) => CONDITION_WORDS[condition]),
    'or',
  );
}

/** Joins with semicolons where a part has commas of its own. */
export function joinWords(parts: readonly string[], last: 'and' | 'or'): string {
  if (parts.length < 2) return parts[0] ?? '';
  const between = parts.some((part) => part.includes(',')) ? '; ' : ', ';
  return `${parts.slice(0, -1).join(between)}${between.trim() === ';' ? ';' : parts.length > 2 ? ',' : ''} ${last} ${parts.at(-1)}`;
}
