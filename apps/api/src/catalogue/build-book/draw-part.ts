import type { PartDrawing } from './build-book.js';
import { pointsPerMm } from '../../typesetting/page-geometry.js';
import type { KitShades } from './kit-shades.js';

/** Draws a part with its upper left corner where told, at a scale (1 is life size). */
export const drawPart = (
  doc: PDFKit.PDFDocument,
  drawing: PartDrawing,
  at: { readonly x: number; readonly y: number; readonly ratio: number },
  shades: KitShades,
): void => {
  const pointsPerUnit = pointsPerMm * at.ratio;
  const [left = 0, top = 0] = drawing.viewBox.split(/[ ,]+/).map(Number);
  doc.save();
  doc.translate(at.x, at.y).scale(pointsPerUnit).translate(-left, -top);
  doc.lineJoin('round').lineCap('round');
  if (drawing.path !== '') {
    doc.lineWidth(0.6 / pointsPerUnit);
    doc.path(drawing.path).fillAndStroke(shades.wash, shades.deep, 'even-odd');
  }
  if (drawing.edges !== '') {
    doc.lineWidth(0.3 / pointsPerUnit);
    doc.path(drawing.edges).stroke(shades.deep);
  }
  doc.restore();
};
