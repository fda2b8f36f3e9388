import type { StateProfileCode } from '@/lib/findings/vocabulary';

/** What a state profile is called where a person chooses one. */
export const STATE_NAMES: readonly (readonly [StateProfileCode, string])[] = [
  ['general', 'Another state: general rules'],
  ['FL', 'Florida'],
  ['IL', 'Illinois'],
  ['MA', 'Massachusetts'],
  ['NJ', 'New Jersey'],
  ['NY', 'New York'],
  ['NC', 'North Carolina'],
  ['TX', 'Texas'],
  ['WA', 'Washington'],
];
