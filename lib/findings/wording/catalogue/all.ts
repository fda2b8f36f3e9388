import { ABSENT_ROWS } from './absent';
import { ARC_ROWS } from './arc';
import { DEVICE_TYPE_ROWS } from './device-type';
import type { CatalogueEntry } from './entry';
import { GFCI_ROWS } from './gfci';
import { GFCI_NOTE_ROWS } from './gfci-notes';
import { LIVE_ROWS } from './live';
import { PHYSICAL_ROWS } from './physical';
import { SUPPLY_ROWS } from './supply';
import { WIRING_ROWS } from './wiring';

/** Every finding that the engine can make. */
export const CATALOGUE: readonly CatalogueEntry[] = [
  ...WIRING_ROWS,
  ...SUPPLY_ROWS,
  ...LIVE_ROWS,
  ...GFCI_ROWS,
  ...GFCI_NOTE_ROWS,
  ...ABSENT_ROWS,
  ...ARC_ROWS,
  ...PHYSICAL_ROWS,
  ...DEVICE_TYPE_ROWS,
];

const BY_CODE = new Map(CATALOGUE.map((entry) => [entry.code, entry]));

/** The row of a code. Throws for a code that no row has: that is a mistake in a rule. */
export function catalogueEntry(code: string): CatalogueEntry {
  const entry = BY_CODE.get(code);
  if (!entry) throw new Error(`the catalogue has no row ${code}`);
  return entry;
}
