import type { AfciAssessment, AfciTrial } from '../facts';

type Row = AfciAssessment & { when: (t: AfciTrial) => boolean };

/** Rows A0 to A7, in the order in which they are asked. */
const ROWS: Row[] = [
  {
    row: 'A2',
    verdict: 'failed',
    protects: 'no',
    when: (t) => t.button === 'no-trip',
    says: 'Its own button does nothing while power is on. No arc protection was shown. Replace it.',
  },
  {
    row: 'A4',
    verdict: 'face-stays-live',
    protects: 'no',
    when: (t) => t.button === 'trips' && t.circuitDead === false,
    says: 'It trips and the circuit stays live: miswired, or its contacts have failed.',
  },
  {
    row: 'A3',
    verdict: 'no-reset',
    protects: 'unproven',
    when: (t) => t.button === 'trips' && t.circuitDead === true && t.resets === false,
    says: 'It trips and does not reset: a standing fault, or end of life. Some must go fully off first.',
  },
  {
    row: 'A0',
    verdict: 'incomplete',
    protects: 'unproven',
    when: (t) => t.button === 'trips' && (t.circuitDead === undefined || t.resets === undefined),
    says: 'It trips. Confirm that the circuit is dead and that it resets.',
  },
  {
    row: 'A1',
    verdict: 'works',
    protects: 'yes',
    when: (t) => t.button === 'trips',
    says: 'It works by its own button. That proves its electronics, its trip and its reset, not every kind of arc. It protects the points that went dead.',
  },
  {
    row: 'A5',
    verdict: 'indication-only',
    protects: 'unproven',
    when: (t) => t.indicator === 'trips',
    says: 'A plug-in indicator tripped it. Only its own button is a test.',
  },
  {
    row: 'A6',
    verdict: 'inconclusive',
    protects: 'unproven',
    when: (t) => t.indicator === 'no-trip',
    says: 'A plug-in indicator did not trip it. That proves nothing; press its own button.',
  },
  {
    row: 'A7',
    verdict: 'not-tested',
    protects: 'unproven',
    when: (t) => Boolean(t.notTestedReason?.trim()),
    says: 'It was not tested, for the reason given. Its protection is unproven.',
  },
  {
    row: 'A7',
    verdict: 'reason-required',
    protects: 'unproven',
    when: () => true,
    says: 'It was not tested. Say why.',
  },
];

/** What a trial of an AFCI proves. Only the device's own button is a test (trade practice, after UL 1699). Never throws. */
export function assessAfci(trial: AfciTrial): AfciAssessment {
  const row = ROWS.find((candidate) => candidate.when(trial));
  if (!row) throw new Error('no row of the AFCI table matched');
  const { verdict, row: id, protects, says } = row;
  return { verdict, row: id, protects, says };
}
