/** The few calls of pdfkit that the bench uses; the package ships no types. */
declare module 'pdfkit' {
  export default class PDFDocument {
    constructor(options: { size: string; margin: number; autoFirstPage: boolean; font: string });
    readonly y: number;
    on(event: 'data' | 'end', listener: () => void): void;
    fontSize(points: number): void;
    addPage(): void;
    text(words: string): void;
    image(bytes: Buffer, x: number, y: number, options: { fit: [number, number] }): void;
    end(): void;
  }
}
