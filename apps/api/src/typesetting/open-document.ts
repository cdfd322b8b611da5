import PDFDocument from 'pdfkit';
import { page } from './page-geometry.js';

export interface DocumentFacts {
  readonly title: string;
  readonly author: string;
  readonly subject: string;
  /** Also what the file's identity is made from: the same facts give the same bytes. */
  readonly date: Date;
}

/** A tagged PDF of A4 pages, which are kept until its end so that they can be written on again. */
export const openDocument = ({ title, author, subject, date }: DocumentFacts): PDFKit.PDFDocument =>
  new PDFDocument({
    size: [page.width, page.height],
    // Documents keep their own margins: pdfkit is never to break a page by itself.
    margin: 0,
    bufferPages: true,
    // Kept from reaching for a font of its own, which is read from a file and never set.
    font: null as unknown as string,
    pdfVersion: '1.7',
    tagged: true,
    displayTitle: true,
    lang: 'en-GB',
    info: {
      Title: title,
      Author: author,
      Subject: subject,
      Creator: 'Windchest',
      CreationDate: date,
      ModDate: date,
    },
  });

/** Call it before writing; the bytes are there once the document has ended. */
export const collectBytes = (doc: PDFKit.PDFDocument): Promise<Buffer> =>
  new Promise((resolve, reject) => {
    const chunks: Buffer[] = [];
    doc.on('data', (chunk: Buffer) => chunks.push(chunk));
    doc.on('end', () => resolve(Buffer.concat(chunks)));
    doc.on('error', reject);
  });
