import type { LoadTest } from '../facts';
import type { YesNoUnknown } from '../vocabulary';

type LoadBand = 'good' | 'above-3' | 'above-5' | 'above-8';
type GroundAnswer = 'not-assessed' | 'suspected' | 'undecided' | 'no-joint-here' | 'neutral-doubtful';
export type LoadAssessment = {
  dropVolts: number;
  dropPercent: number;
  loopOhms: number;
  faultAmps: number;
  percentAt15: number;
  percentAt20: number;
  band: LoadBand;
  ground: GroundAnswer;
};
export type LoadContext = { breakerAmps?: 15 | 20; nearBondedPanel?: boolean; sharedNeutral?: YesNoUnknown };

const LEAST_DROP_VOLTS = 3;
const QUIET_NG_VOLTS = 0.1;
const JOINT_OHMS = 0.01;
const SEPARATE_SHARE = 0.3;
const DOUBTFUL_SHARE = 0.6;

/**
 * What a 12 to 15 A plug-in load shows of the circuit: drop in V and %, hot–neutral loop in ohms, the fault current that
 * loop allows in A (it says nothing of the ground path), the drop at 15 and 20 A in %. Advice of 3 % for a branch is an
 * informational note of the NEC, not a rule; 8 % points at a joint (common practice). `ground` is the false-ground rule,
 * simulated over 14 to 10 AWG and 10 to 45 m. Throws where the no-load voltage or the load is not above zero.
 */
export function assessLoadTest(test: LoadTest, context: LoadContext = {}): LoadAssessment {
  const { amps, noLoadHn, loadedHn } = test;
  if (!(amps > 0) || !(noLoadHn > 0)) throw new RangeError('a load test needs a load and a no-load voltage above zero');
  const dropVolts = noLoadHn - loadedHn;
  const loopOhms = dropVolts / amps;
  const dropPercent = (100 * dropVolts) / noLoadHn;
  const percentAt = (load: number) => (100 * loopOhms * load) / noLoadHn;
  return {
    dropVolts,
    dropPercent,
    loopOhms,
    faultAmps: loopOhms > 0 ? noLoadHn / loopOhms : Infinity,
    percentAt15: percentAt(15),
    percentAt20: percentAt(20),
    band: bandOf(dropPercent),
    ground: groundOf(test, dropVolts, context),
  };
}

function bandOf(measured: number): LoadBand {
  const percent = settled(measured);
  if (percent > 8) return 'above-8';
  if (percent > 5) return 'above-5';
  return percent > 3 ? 'above-3' : 'good';
}

function groundOf(
  { amps, noLoadNg, loadedNg }: LoadTest,
  dropVolts: number,
  { nearBondedPanel, sharedNeutral }: LoadContext,
): GroundAnswer {
  if (noLoadNg === undefined || loadedNg === undefined || settled(dropVolts) < LEAST_DROP_VOLTS) return 'not-assessed';
  const share = settled((loadedNg - noLoadNg) / dropVolts);
  if (share > DOUBTFUL_SHARE) return 'neutral-doubtful';
  if (share >= SEPARATE_SHARE) return 'no-joint-here';
  const quiet = noLoadNg <= QUIET_NG_VOLTS && loadedNg <= settled(QUIET_NG_VOLTS + JOINT_OHMS * amps);
  // Close to a bond, or with a neutral that another leg may balance, a quiet neutral proves nothing.
  const excused = nearBondedPanel === true || sharedNeutral === 'yes' || sharedNeutral === 'unknown';
  return quiet && !excused ? 'suspected' : 'undecided';
}

/** A reading of exactly 3 V or 3 % must not fall on the wrong side by the rounding of a subtraction. */
function settled(measured: number): number {
  return Number(measured.toFixed(6));
}
