import { Document, Image as PdfImage, Page, renderToBuffer, Text, View } from '@react-pdf/renderer';
import PDFKit from 'pdfkit';
import { getDocumentProxy } from 'unpdf';
import { fontFile } from '@/components/report/report-fonts';
import { renderReportPdf } from '@/lib/reports/render-pdf';
import { compareAll, ms, type Measured } from './measure';
import { largeReport } from './report';

const ROUNDS = 5;
const FONT = 'Atkinson Hyperlegible';
const MARGIN = 43;
const PHOTO = { width: 200, height: 122 };
/** What one page of the report holds: its lines of text, and its share of the photos. */
type Plain = { lines: string[]; photos: Buffer[] }[];

/** The report against the same lines, page by page, and the same photos, without its drawings, frames and links. */
export async function pdfRows(): Promise<Measured[]> {
  const { snapshot, sha256, photos } = await largeReport();
  const report = () => renderReportPdf(snapshot, sha256, 'en', { photos });
  const { pdf, pages } = await report();
  const plain = await plainOf(pdf, [...photos.values()]);
  const { findings, log } = snapshot;
  const what = `report PDF, ${pages} pages, ${photos.size} photos of 1024 px, ${findings.length} findings, ${log.length} receptacles`;
  const against = [
    { name: 'bare react-pdf', work: () => bareReactPdf(plain), bar: 'at most 1.3' },
    { name: 'pdfkit', work: () => barePdfkit(plain), bar: 'printed' },
  ];
  const pairs = await compareAll(
    ROUNDS,
    against.map(({ work }) => work),
    report,
  );
  return pairs.map(({ floorMs, productMs, ratio }, index) => ({
    what,
    product: ms(productMs),
    floor: `${against[index]?.name}, ${ms(floorMs)}`,
    ratio,
    bar: against[index]?.bar ?? '',
  }));
}

async function plainOf(pdf: Buffer, photos: Buffer[]): Promise<Plain> {
  const document = await getDocumentProxy(new Uint8Array(pdf));
  const perPage = photos.length / document.numPages;
  const plain: Plain = [];
  for (let page = 1; page <= document.numPages; page += 1) {
    const { items } = await (await document.getPage(page)).getTextContent();
    const lines = new Map<number, string>();
    for (const item of items) {
      if (!('str' in item)) continue;
      const height = Math.round(item.transform[5] as number);
      lines.set(height, (lines.get(height) ?? '') + item.str);
    }
    const share = photos.slice(Math.round((page - 1) * perPage), Math.round(page * perPage));
    plain.push({ lines: [...lines.values()].filter((line) => line.trim()), photos: share });
  }
  return plain;
}

function bareReactPdf(plain: Plain): Promise<Buffer> {
  return renderToBuffer(
    <Document>
      {plain.map(({ lines, photos }, page) => (
        <Page key={page} size="LETTER" style={{ padding: MARGIN, fontFamily: FONT, fontSize: 8 }}>
          {lines.map((line, index) => (
            <Text key={index}>{line}</Text>
          ))}
          <View style={{ flexDirection: 'row' }}>
            {photos.map((data, index) => (
              <PdfImage key={index} src={{ data, format: 'jpg' }} style={{ ...PHOTO, objectFit: 'contain' }} />
            ))}
          </View>
        </Page>
      ))}
    </Document>,
  );
}

function barePdfkit(plain: Plain): Promise<void> {
  return new Promise((resolve) => {
    const font = fontFile('atkinson-hyperlegible', 'latin', 400, 'normal');
    const document = new PDFKit({ size: 'LETTER', margin: MARGIN, autoFirstPage: false, font });
    document.on('data', () => {});
    document.on('end', resolve);
    document.fontSize(8);
    for (const { lines, photos } of plain) {
      document.addPage();
      for (const line of lines) document.text(line);
      const { y } = document;
      photos.forEach((photo, index) =>
        document.image(photo, MARGIN + index * PHOTO.width, y, { fit: [PHOTO.width, PHOTO.height] }),
      );
    }
    document.end();
  });
}
