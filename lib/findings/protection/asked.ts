import { CONFIDENCES, NEC_EDITIONS, type Confidence } from '../vocabulary';
import { afciRules } from './asked-afci';
import { coverRules, tamperRules, weatherRules } from './asked-device';
import { gfciRules } from './asked-gfci';
import { editionRow } from './editions';
import type { Asked, AskedPlace, Ruling, Spot } from './ruling';

export type { Asked } from './ruling';

/** The list of the 2026 text was not seen beyond the rows that name that edition. */
const LAST_EDITION_SEEN_WHOLE = 2023;
const NOT_SEEN_WHOLE = 'The list of this edition was not seen in full; earlier rows are taken to stand.';

/**
 * What an edition of the model code asks at a receptacle: GFCI, AFCI, tamper-resistant, weather-resistant, in-use cover.
 * Several places are a union. A distance or exposure that matters and is not given makes "depends", never "no". An
 * edition between two printed ones is the earlier. `since` is the edition from which on this point was asked it without
 * a break, never a date on which a town enforced it; `rows` are those that decide, newest first, and those before them
 * back to `since`. Of "no", `rows` are those that come near. Never throws. Source: the rows of editions.ts, each with its
 * mark.
 */
export function protectionAsked(p: AskedPlace): {
  gfci: Asked;
  afci: Asked;
  tamperResistant: Asked;
  weatherResistant: Asked;
  inUseCover: Asked;
} {
  const places = [p.place].flat();
  const edition = NEC_EDITIONS.findLast((printed) => printed <= p.edition) ?? p.edition;
  const answer = (rules: (spot: Spot) => Ruling[]) =>
    combine((at) => places.flatMap((place) => rules({ ...p, place, edition: at })), edition);
  return {
    gfci: answer(gfciRules),
    afci: answer(afciRules),
    tamperResistant: answer(tamperRules),
    weatherResistant: answer(weatherRules),
    inUseCover: answer(coverRules),
  };
}

type RulingsAt = (edition: number) => Ruling[];

function combine(rulingsAt: RulingsAt, edition: number): Asked {
  const rulings = rulingsAt(edition);
  const asked = verdictOf(rulings);
  const deciding = rulings.filter((ruling) => ruling.asked === asked);
  const history = asked === 'no' ? [] : historyOf(rulingsAt, edition, asked);
  const since = history.at(-1)?.edition;
  const seenWhole = edition <= LAST_EDITION_SEEN_WHOLE;
  const notes = [...deciding.flatMap((ruling) => ruling.note ?? []), ...(seenWhole ? [] : [NOT_SEEN_WHOLE])];
  return {
    asked,
    ...(since === undefined ? {} : { since }),
    rows: [...new Set([...deciding, ...history.flatMap((step) => step.rulings)].map((ruling) => ruling.row))],
    confidence: confidenceOf(deciding, asked, seenWhole),
    note: [...new Set(notes)].join(' '),
  };
}

function verdictOf(rulings: Ruling[]): Asked['asked'] {
  if (rulings.some((ruling) => ruling.asked === 'yes')) return 'yes';
  return rulings.some((ruling) => ruling.asked === 'depends') ? 'depends' : 'no';
}

/** The editions from this one back that asked as much, newest first, each with the rulings that say so. */
function historyOf(
  rulingsAt: RulingsAt,
  edition: number,
  asked: 'yes' | 'depends',
): { edition: number; rulings: Ruling[] }[] {
  const history = [];
  for (const printed of NEC_EDITIONS.filter((candidate) => candidate <= edition).toReversed()) {
    const rulings = rulingsAt(printed);
    const then = verdictOf(rulings);
    if (then === 'no' || (asked === 'yes' && then === 'depends')) break;
    history.push({ edition: printed, rulings: rulings.filter((ruling) => ruling.asked === then) });
  }
  return history;
}

/** One sure row is enough for "yes"; "depends" and "no" are only as sure as their weakest row. */
function confidenceOf(deciding: Ruling[], asked: Asked['asked'], seenWhole: boolean): Confidence {
  const ranks = deciding.map((ruling) => CONFIDENCES.indexOf(editionRow(ruling.row).confidence));
  const rank = asked === 'yes' ? Math.min(...ranks) : Math.max(0, ...ranks);
  return CONFIDENCES[seenWhole ? rank : Math.max(rank, CONFIDENCES.indexOf('medium'))] ?? 'low';
}
