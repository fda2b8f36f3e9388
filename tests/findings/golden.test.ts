import { describe, expect, test } from 'vitest';
import { composeFinding, evaluateInspection } from '@/lib/findings';
import type { InspectionFacts } from '@/lib/findings/facts';
import { houseOf2021 } from '../support/house-of-2021';
import { houseOf1962, houseOf1988 } from '../support/houses';

/** Whole inspections and their text. A change of wording shows in the diff; `vitest -u` writes the files anew. */
const HOUSES: [string, () => InspectionFacts][] = [
  ['house-of-1962', houseOf1962],
  ['house-of-1988', houseOf1988],
  ['house-of-2021', houseOf2021],
];

describe.each(HOUSES)('%s', (name, build) => {
  test('says what it said before', async () => {
    const { findings, gaps, coverage } = evaluateInspection(build());
    const text = {
      findings: findings.map((finding) => ({
        id: finding.id,
        urgency: finding.urgency,
        place: finding.place,
        readingIds: finding.readingIds,
        ...composeFinding(finding, { locale: 'en' }),
      })),
      gaps: gaps.map(({ id, place, says }) => ({ id, place, says })),
      coverage,
    };
    await expect(`${JSON.stringify(text, null, 2)}\n`).toMatchFileSnapshot(`golden/${name}.json`);
  });
});
