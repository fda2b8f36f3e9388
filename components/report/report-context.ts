import type { ReportMessages } from '@/lib/messages/en-report';
import type { Locale } from '@/lib/findings/vocabulary';
import type { ReportSnapshot } from '@/lib/schemas/snapshot';

/** What one rendering is given: the frozen record, its hash, the language, and the bytes of its pictures. */
export type ReportPrint = {
  snapshot: ReportSnapshot;
  sha256: string;
  locale: Locale;
  messages: ReportMessages;
  /** JPEG bytes by photo id. */
  photos: ReadonlyMap<string, Buffer>;
  logo?: Buffer;
  signatureImage?: Buffer;
  /** Page on which each anchor came to stand; filled while the pages are laid out, read when their numbers are set. */
  pages: Map<string, number>;
};

export function wordsIn(locale: Locale, words: { en: string; es?: string }): string {
  return (locale === 'es' ? words.es : undefined) ?? words.en;
}

/** Bookmarks work on every node; the types know them on pages only. */
export function bookmark(title: string): object {
  return { bookmark: { title } };
}
