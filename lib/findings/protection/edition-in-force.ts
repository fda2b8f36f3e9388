import { NEC_EDITIONS } from '../vocabulary';

/** Years that a town may lag behind an edition; beyond that nothing is assumed. */
const USUAL_LAG_YEARS = 6;

/**
 * Edition of the model code that most likely stood when a house was built. With adoptions that the firm recorded (edition,
 * `from` as YYYY-MM-DD, source) the last one in force at the end of the year before; without, only a range of editions.
 * `range` is the oldest and newest edition that can have applied. Never throws. Adoption differs by town and is never
 * assumed (common practice).
 */
export function editionInForce(p: {
  yearBuilt: number;
  adoptions: { edition: number; from: string; source: string }[];
}): {
  edition?: number;
  range: [number, number];
  says: string;
} {
  const { yearBuilt } = p;
  const known = p.adoptions
    .filter(({ from }) => Number(from.slice(0, 4)) <= yearBuilt)
    .toSorted((a, b) => a.from.localeCompare(b.from));
  const changing = known.filter(({ from }) => Number(from.slice(0, 4)) === yearBuilt);
  const before = known.filter(({ from }) => Number(from.slice(0, 4)) < yearBuilt).at(-1);
  const last = known.at(-1);
  if (last && changing.length === 0) {
    return {
      edition: last.edition,
      range: [last.edition, last.edition],
      says: `The ${last.edition} edition, in force since ${last.from}. Source: ${last.source}.`,
    };
  }
  if (last && before) {
    return {
      range: [before.edition, last.edition],
      says: `The ${before.edition} or the ${last.edition} edition: the change came on ${last.from}, in the year of building. Source: ${last.source}.`,
    };
  }
  const published = NEC_EDITIONS.filter((edition) => edition <= yearBuilt);
  const newest = last?.edition ?? published.at(-1) ?? NEC_EDITIONS[0];
  const oldest =
    published.find((edition) => edition >= yearBuilt - USUAL_LAG_YEARS) ?? published.at(-1) ?? NEC_EDITIONS[0];
  return {
    range: [Math.min(oldest, newest), newest],
    says: `No adoption is recorded for this place. A house of ${yearBuilt} may have been built under the ${Math.min(oldest, newest)} to ${newest} editions, or under none.`,
  };
}
