const MOST_KEPT = 20_000;
/** NUL, or half of a surrogate pair. */
const UNSTORABLE = /[\0\p{Surrogate}]/u;

/** True where every text in it can be stored: no NUL, and no half of a surrogate pair. Of values as JSON gives them. */
export function storable(value: unknown): boolean {
  if (typeof value === 'string') return !UNSTORABLE.test(value);
  if (Array.isArray(value)) return value.every(storable);
  if (typeof value !== 'object' || value === null) return true;
  return Object.entries(value).every(([key, inner]) => storable(key) && storable(inner));
}

/** A value that could not be read, as text that can be stored, cut to a length that a person would read. */
export function keepable(value: unknown): string {
  try {
    return (JSON.stringify(value) ?? '').slice(0, MOST_KEPT).replace(/[\0\p{Surrogate}]/gu, '?');
  } catch {
    return 'Too deep to be written down';
  }
}
