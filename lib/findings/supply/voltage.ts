export type VoltageBand =
  'no-voltage' | 'fault-low' | 'low' | 'low-normal' | 'normal' | 'high-normal' | 'high' | 'urgent-high';

const NO_VOLTAGE = 10;
const TOOL = 'tool bands around ANSI C84.1 Range B, common practice';

/** Lower edge of each band at 120 V nominal, V rms, highest first. */
const EDGES: { above: number; orAt: boolean; band: VoltageBand; source: string }[] = [
  { above: 132, orAt: false, band: 'urgent-high', source: 'common practice: over 132 V suggests an open neutral' },
  { above: 127, orAt: false, band: 'high', source: 'ANSI C84.1 Range B service, upper limit 127 V, from memory' },
  { above: 126, orAt: false, band: 'high-normal', source: 'ANSI C84.1 Range A service, 114 to 126 V' },
  { above: 114, orAt: true, band: 'normal', source: 'ANSI C84.1 Range A service, 114 to 126 V' },
  {
    above: 108,
    orAt: true,
    band: 'low-normal',
    source: 'ANSI C84.1 Range A utilization, lower limit 108 V in the 2006 text, from memory',
  },
  {
    above: 104,
    orAt: true,
    band: 'low',
    source: 'ANSI C84.1 Range B utilization, lower limit 104 V in the 2006 text, from memory',
  },
  { above: NO_VOLTAGE, orAt: true, band: 'fault-low', source: TOOL },
];

/**
 * Where a voltage at a receptacle without load lies, V rms; bands at 240 V are twice those at 120 V.
 * Throws on a negative or missing number. Source per band in the answer.
 */
export function assessVoltage(volts: number, nominal: 120 | 240 = 120): { band: VoltageBand; source: string } {
  if (!(volts >= 0)) throw new RangeError(`a voltage must be zero or more, not ${volts}`);
  const at120 = volts / (nominal / 120);
  const edge = EDGES.find(({ above, orAt }) => at120 > above || (orAt && at120 === above));
  return edge ? { band: edge.band, source: edge.source } : { band: 'no-voltage', source: TOOL };
}
