import { NEC_EDITIONS } from '../vocabulary';

/** Years that most towns lag behind an edition; some lag longer, and the words say so. */
const USUAL_LAG_YEARS = 6;

export type Adoption = { edition: number; from: string; source: string };

/**
 * Edition of the model code that most likely stood when a house was built. With adoptions that the firm recorded (edition,
 * `from` as YYYY-MM-DD, source) the last one in force on 1 January, if none came later in the year;
 * otherwise `edition` is absent. `range` is the oldest and newest edition that can have applied. Never throws. Adoption
 * differs by town and is never assumed (common practice).
 */
export function editionInForce(p: { yearBuilt: number; adoptions: Adoption[] }): {
  edition?: number;
  range: [number, number];
  says: string;
} {
  const { yearBuilt } = p;
  const dated = p.adoptions.toSorted((a, b) => (a.from < b.from ? -1 : Number(a.from > b.from)));
  // What came on New Year's Day stood the whole year.
  const before = dated.filter(({ from }) => from <= `${yearBuilt}-01-01`).at(-1);
  const during = dated.filter(({ from }) => from > `${yearBuilt}-01-01` && from <= `${yearBuilt}-12-31`);
  const next = dated.find(({ from }) => from > `${yearBuilt}-12-31`);
  if (during.length > 0) return changed(yearBuilt, before, during);
  if (before) return settled(yearBuilt, before);
  return unrecorded(yearBuilt, next);
}

function settled(yearBuilt: number, { edition, from, source }: Adoption): ReturnType<typeof editionInForce> {
  const permit =
    Number(from.slice(0, 4)) >= yearBuilt - 1
      ? ' A permit taken before that day may have stood under the one before.'
      : '';
  return {
    edition,
    range: [edition, edition],
    says: `The ${edition} edition, in force since ${from}. Source: ${source}.${permit}`,
  };
}

function changed(
  yearBuilt: number,
  before: Adoption | undefined,
  during: Adoption[],
): ReturnType<typeof editionInForce> {
  const editions = during.map(({ edition }) => edition);
  const changes = during.map(({ edition, from, source }) => `the ${edition} edition came on ${from} (${source})`);
  const oldest = before?.edition ?? usualRange(yearBuilt, Math.min(...editions))[0];
  const earlier = before
    ? `Until then the ${before.edition} edition stood (${before.source}).`
    : 'What stood until then is not recorded.';
  return {
    range: [Math.min(oldest, ...editions), Math.max(oldest, ...editions)],
    says: `The edition changed in the year of building: ${changes.join(', ')}. ${earlier}`,
  };
}

function unrecorded(yearBuilt: number, next: Adoption | undefined): ReturnType<typeof editionInForce> {
  const [oldest, newest] = usualRange(yearBuilt, next ? next.edition - 1 : yearBuilt);
  const editions = oldest === newest ? `the ${newest} edition` : `the ${oldest} to ${newest} editions`;
  const later = next
    ? ` The first recorded adoption is the ${next.edition} edition on ${next.from} (${next.source}).`
    : '';
  return {
    range: [oldest, newest],
    says: `No adoption is recorded for this place in ${yearBuilt}. The house may have been built under ${editions}, an older one, or none.${later}`,
  };
}

/** Printed editions that a usual town can have had in force by then, none newer than `newest`. */
function usualRange(yearBuilt: number, newest: number): [number, number] {
  const printed = NEC_EDITIONS.filter((edition) => edition <= Math.min(yearBuilt, newest));
  const last = printed.at(-1) ?? NEC_EDITIONS[0];
  return [printed.find((edition) => edition >= yearBuilt - USUAL_LAG_YEARS) ?? last, last];
}
