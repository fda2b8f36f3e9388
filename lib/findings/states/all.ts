import type { StateProfileCode } from '../vocabulary';
import { florida } from './florida';
import { general } from './general';
import { illinois } from './illinois';
import { massachusetts } from './massachusetts';
import { newJersey } from './new-jersey';
import { newYork } from './new-york';
import { northCarolina } from './north-carolina';
import { texas } from './texas';
import { washington } from './washington';
import type { StateProfile } from './profile';

/** Every state profile, by its code. */
export const STATE_RULES: Record<StateProfileCode, StateProfile> = {
  NY: newYork,
  TX: texas,
  NJ: newJersey,
  IL: illinois,
  NC: northCarolina,
  WA: washington,
  MA: massachusetts,
  FL: florida,
  general,
};

/** Rules of the state that an inspection is in. Data with its section; a regulator confirms it. */
export function stateProfile(code: StateProfileCode): StateProfile {
  return STATE_RULES[code];
}
