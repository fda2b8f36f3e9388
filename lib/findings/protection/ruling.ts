import type { Confidence, DistanceEnd, PlaceKind, SinkKind } from '../vocabulary';
import type { EditionRowId } from './editions';
import type { Within } from './distance';

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
export type Ruling = { asked: Asked['asked']; row: EditionRowId; note?: string };

export const yes = (row: EditionRowId, note?: string): Ruling => ({ asked: 'yes', row, note });
export const no = (row: EditionRowId, note?: string): Ruling => ({ asked: 'no', row, note });
export const depends = (row: EditionRowId, note: string): Ruling => ({ asked: 'depends', row, note });
/** A rule about a distance; out of its reach it does not speak of the spot. */
export const by = (answer: Within, row: EditionRowId, note: string): Ruling[] =>
  answer === 'no' ? [] : [{ asked: answer, row, note }];
