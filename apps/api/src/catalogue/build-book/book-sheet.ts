import { Sheet } from '../../typesetting/sheet.js';
import type { Typeface } from '../../typesetting/typeface.js';
import type { KitShades } from './kit-shades.js';

/** A sheet on which things of one kit are drawn in its colour. */
export class BookSheet extends Sheet {
  constructor(
    doc: PDFKit.PDFDocument,
    typeface: Typeface,
    readonly shades: KitShades,
  ) {
    super(doc, typeface);
  }
}
