import type { LampPattern, WiringDiagnosis } from '@/lib/findings/facts';
import type { Lamp, WiringCondition } from '@/lib/findings/vocabulary';

/** "1d0": hot–neutral lit, hot–ground dim, neutral–ground off. */
export function lampsOf(bits: string): LampPattern {
  const lamp = (bit: string | undefined): Lamp => (bit === '1' ? 'lit' : bit === 'd' ? 'dim' : 'off');
  return { hn: lamp(bits[0]), hg: lamp(bits[1]), ng: lamp(bits[2]) };
}

export function conditionsOf({ candidates }: WiringDiagnosis): WiringCondition[] {
  return candidates.map((row) => row.condition);
}

export function leadingOf({ candidates }: WiringDiagnosis): WiringCondition[] {
  return candidates.filter((row) => row.standing === 'leading').map((row) => row.condition);
}
