import type { Confidence, DistanceEnd, PlaceKind, SinkKind } from '../vocabulary';
import { CONFIDENCES } from '../vocabulary';
import { afciRules } from './asked-afci';
import { coverRules, tamperRules, weatherRules } from './asked-device';
import { gfciRules } from './asked-gfci';
import { editionRow } from './editions';

export type Asked = {
  asked: 'yes' | 'no' | 'depends';
  since?: number;
  rows: string[];
  confidence: Confidence;
  note: string;
};

/** Distances and heights in feet; `'none'` says that there is no such thing near. */
export type AskedPlace = {
  place: PlaceKind | PlaceKind[];
  edition: number;
  volts?: 120 | 240;
  amps?: number;
  finished?: boolean;
  heightFt?: number;
  gradeAccess?: boolean;
  dedicatedAppliance?: boolean;
  sinkFt?: number | 'none';
  sinkKind?: SinkKind;
  tubOrShowerFt?: number | 'none';
  poolFt?: number | 'none';
  measuredTo?: DistanceEnd;
};

/** One place of the union, and everything known of the point. */
export type Spot = Omit<AskedPlace, 'place'> & { place: PlaceKind };
/** What one rule says of a spot; a rule that does not speak of it answers nothing. */
export type Ruling = { asked: 'yes' | 'depends'; row: string; note?: string };

/** The list of the 2026 text was not seen beyond the rows that name that edition. */
const LAST_EDITION_SEEN_WHOLE = 2023;

/**
 * What an edition of the model code asks at a receptacle: GFCI, AFCI, tamper-resistant, weather-resistant, in-use cover.
 * Several places are a union. A distance or exposure that matters and is not given makes "depends", never "no".
 * `since` is the edition that first asked it, not when a town enforced it. Never throws. Source: the rows of editions.ts,
 * each with its mark.
 */
export function protectionAsked(p: AskedPlace): {
  gfci: Asked;
  afci: Asked;
  tamperResistant: Asked;
  weatherResistant: Asked;
  inUseCover: Asked;
} {
  const spots = [p.place].flat().map((place): Spot => ({ ...p, place }));
  const answer = (rules: (spot: Spot) => Ruling[]) => combine(spots.flatMap(rules), p.edition);
  return {
    gfci: answer(gfciRules),
    afci: answer(afciRules),
    tamperResistant: answer(tamperRules),
    weatherResistant: answer(weatherRules),
    inUseCover: answer(coverRules),
  };
}

function combine(rulings: Ruling[], edition: number): Asked {
  const yes = rulings.filter((ruling) => ruling.asked === 'yes');
  const deciding = yes.length > 0 ? yes : rulings;
  if (deciding.length === 0) {
    const seenWhole = edition <= LAST_EDITION_SEEN_WHOLE;
    return {
      asked: 'no',
      rows: [],
      confidence: seenWhole ? 'high' : 'medium',
      note: seenWhole ? '' : 'The list of this edition was not seen in full.',
    };
  }
  const rows = deciding.map((ruling) => editionRow(ruling.row));
  const confidences = rows.map((found) => CONFIDENCES.indexOf(found.confidence));
  // One sure row is enough for "yes"; "depends" is only as sure as its weakest row.
  const confidence = CONFIDENCES[yes.length > 0 ? Math.min(...confidences) : Math.max(...confidences)] ?? 'low';
  const notes = deciding.flatMap((ruling) => ruling.note ?? []);
  return {
    asked: yes.length > 0 ? 'yes' : 'depends',
    since: Math.min(...rows.map((found) => found.edition)),
    rows: [...new Set(rows.map((found) => found.id))],
    confidence,
    note: [...new Set(notes)].join(' '),
  };
}
