import type { Address } from './schema/firms';

/** Text as plain lower-case words with one space between: no accents, no punctuation; "O'Brien" is one word. */
export function searchWords(text: string): string[] {
  return text
    .toLowerCase()
    .normalize('NFKD')
    .replace(/[\p{Mark}'’.]/gu, '')
    .split(/[^\p{Letter}\p{Number}]+/u)
    .filter((word) => word !== '')
    .map((word) => word.slice(0, 60));
}

/** The query for rows of one firm that have, for each word, one that starts with it. */
export function searchQuery(firmId: string, search: string): string {
  const firm = firmId.replaceAll('-', '').toLowerCase();
  return [`'${firm}'`, ...searchWords(search).map((word) => `'${word}':*`)].join(' & ');
}

/** What the list finds an inspection by: number, address, and the names of its parties. */
export function searchText(number: number, address: Address, people: { name: string }[]): string {
  const { street, unit, city, county, state, zip } = address;
  const names = people.map((party) => party.name);
  return searchWords([number, street, unit, city, county, state, zip, ...names].join(' ')).join(' ');
}
