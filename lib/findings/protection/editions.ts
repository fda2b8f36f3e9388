import type { EditionRow } from './edition-row';
import { AFCI_ROWS, DEVICE_ROWS } from './editions-device';
import { GFCI_ROWS } from './editions-gfci';

export type EditionRowId =
  (typeof GFCI_ROWS)[number]['id'] | (typeof AFCI_ROWS)[number]['id'] | (typeof DEVICE_ROWS)[number]['id'];

/** Every row, in the order of the fact base. */
export const EDITION_ROWS: readonly EditionRow<EditionRowId>[] = [...GFCI_ROWS, ...AFCI_ROWS, ...DEVICE_ROWS];

const BY_ID = new Map<string, EditionRow<EditionRowId>>(EDITION_ROWS.map((entry) => [entry.id, entry]));

/** The row of that id. Throws where a row was taken out of the lists by mistake. */
export function editionRow(id: EditionRowId): EditionRow<EditionRowId> {
  const found = BY_ID.get(id);
  if (!found) throw new Error(`no edition row ${id}`);
  return found;
}
