import type { EditionRow } from './edition-row';
import { AFCI_ROWS, DEVICE_ROWS } from './editions-device';
import { GFCI_ROWS } from './editions-gfci';

/** Every row, in the order of the fact base. */
export const EDITION_ROWS: readonly EditionRow[] = [...GFCI_ROWS, ...AFCI_ROWS, ...DEVICE_ROWS];
export type EditionRowId =
  (typeof GFCI_ROWS)[number]['id'] | (typeof AFCI_ROWS)[number]['id'] | (typeof DEVICE_ROWS)[number]['id'];

const BY_ID = new Map(EDITION_ROWS.map((entry) => [entry.id, entry]));

/** The row of that id. Throws where there is none. */
export function editionRow(id: string): EditionRow {
  const found = BY_ID.get(id);
  if (!found) throw new Error(`no edition row ${id}`);
  return found;
}
