import type { SkipReason } from '../vocabulary';

/** Why something was not tested, as it stands after "Not tested:". */
export const SKIP_WORDS: Record<SkipReason, string> = {
  blocked: 'blocked by furniture or stored goods',
  'in-use': 'in use',
  occupied: 'the room was occupied',
  locked: 'behind a locked door',
  wet: 'wet',
  unsafe: 'the inspector judged it dangerous to test',
  'utility-off': 'the power was off',
  'medical-equipment': 'medical equipment depends on it',
  'freezer-or-sump': 'a freezer or a pump depends on it',
  'computer-or-alarm': 'a computer or an alarm depends on it',
  'owner-refused': 'the owner did not agree',
  'client-excluded': 'left out at the wish of the client',
  'out-of-reach': 'out of reach',
  'representative-sample': 'others like it in the same room were tested',
};
