import { absentRule } from './absent';
import { afciRule } from './afci';
import { deviceTypeRule } from './device-type';
import { gfciRule } from './gfci';
import { physicalRule } from './physical';
import type { Rule } from './rule';
import { supplyRule } from './supply';
import { wiringRule } from './wiring';

/** Every rule of the engine. The order means nothing. */
export const RULES: readonly Rule[] = [
  wiringRule,
  supplyRule,
  gfciRule,
  afciRule,
  absentRule,
  physicalRule,
  deviceTypeRule,
];
