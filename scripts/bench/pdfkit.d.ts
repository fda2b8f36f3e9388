/** The few calls of pdfkit that the bench uses; the package ships no types. */
declare module 'pdfkit' {
  export default class PDFDocument {
    constructor(options: { size: string; margin: number });
    on(event: 'data' | 'end', listener: () => void): void;
    text(words: string): void;
    image(bytes: Buffer, options: { width: number }): void;
    end(): void;
  }
}
