import type { BookVoice } from './build-book.js';
import type { KitShades } from './kit-shades.js';

interface Box {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
}

/** Nodes of a free bar's first mode lie at 0.224 of its length from each end; there it rests or hangs. */
const nodeOfLength = 0.224;
/** Between layer lines, in points: near enough to read as a print. */
const layerPitch = 3.4;

/** One voice of the rank, with what tells its kind: a cap, an open mouth, a bar's nodes, a tine's clamp. */
export const drawVoice = (
  doc: PDFKit.PDFDocument,
  kind: BookVoice['kind'],
  box: Box,
  shades: KitShades,
): void => {
  const { x, y, width, height } = box;
  const cap = Math.min(2.4, height * 0.06);
  switch (kind) {
    case 'stopped-pipe':
      drawBody(doc, box, shades);
      doc.rect(x, y, width, cap).fill(shades.deep);
      return;
    case 'open-pipe':
      drawBody(doc, box, shades);
      doc.rect(x + width * 0.18, y, width * 0.64, cap).fill(shades.deep);
      return;
    case 'free-bar': {
      drawBody(doc, box, shades);
      const radius = Math.max(0.6, Math.min(width * 0.1, 2.4));
      for (const share of [nodeOfLength, 1 - nodeOfLength])
        doc.circle(x + width / 2, y + height * share, radius).fill(shades.deep);
      return;
    }
    case 'tine':
      drawBody(doc, box, shades);
      doc.rect(x - 0.8, y + height - 2 * cap, width + 1.6, 2 * cap).fill(shades.deep);
      return;
    case 'string':
      doc.rect(x, y, Math.max(0.6, width), height).fill(shades.deep);
      doc.circle(x + width / 2, y + 1.4, Math.max(1.6, width)).fill(shades.deep);
      return;
    case 'vessel':
      doc.save();
      doc.ellipse(x + width / 2, y + height / 2, width / 2, height / 2).clip();
      drawBody(doc, box, shades);
      doc.restore();
      doc.lineWidth(0.7);
      doc
        .ellipse(x + width / 2, y + height / 2, width * 0.38, height * 0.38)
        .fillAndStroke('#ffffff', shades.deep);
  }
};

const drawBody = (doc: PDFKit.PDFDocument, { x, y, width, height }: Box, shades: KitShades): void => {
  doc.rect(x, y, width, height).fill(shades.kit);
  if (width > 4) doc.rect(x, y, width * 0.28, height).fill(shades.lit);
  doc.lineWidth(0.35).strokeColor(shades.line);
  // From the bed upward, as it was printed.
  for (let lineY = y + height - layerPitch; lineY > y; lineY -= layerPitch)
    doc.moveTo(x, lineY).lineTo(x + width, lineY);
  doc.stroke();
};
