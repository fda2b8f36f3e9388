import { renderToBuffer } from '@react-pdf/renderer';
import type { Locale } from '@/lib/findings/vocabulary';
import { en } from '@/lib/messages/en';
import type { ReportSnapshot } from '@/lib/schemas/snapshot';
import { ReportDocument } from '@/components/report/report-document';
import { registerFonts } from '@/components/report/report-fonts';

export type ReportAssets = {
  /** JPEG bytes by photo id. */
  photos: ReadonlyMap<string, Buffer>;
  logo?: Buffer;
  signatureImage?: Buffer;
};

/** The PDF of a frozen snapshot: no look-ups, no network, no clock. The same input gives the same bytes. */
export async function renderReportPdf(
  snapshot: ReportSnapshot,
  sha256: string,
  locale: Locale,
  assets: ReportAssets,
): Promise<{ pdf: Buffer; pages: number }> {
  registerFonts();
  let pages = 0;
  const print = { snapshot, sha256, locale, messages: en.report, ...assets, pages: new Map<string, number>() };
  const pdf = await renderToBuffer(<ReportDocument print={print} />);
  pages = countPages(pdf);
  return { pdf, pages };
}

/** Page objects are never compressed by the writer. */
function countPages(pdf: Buffer): number {
  return pdf.toString('latin1').match(/\/Type \/Page\b/g)?.length ?? 0;
}
