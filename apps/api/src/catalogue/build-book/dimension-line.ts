import { inks } from '../../typesetting/page-geometry.js';
import type { Sheet } from '../../typesetting/sheet.js';
import { bookStyles } from './book-styles.js';

const tick = 3;

/** A size from `top` to `bottom` at `x`, lettered along the line and read from the right, as on a drawing. */
export const drawUprightDimension = (
  sheet: Sheet,
  { x, top, bottom, text }: { x: number; top: number; bottom: number; text: string },
): void => {
  const { doc } = sheet;
  doc.lineWidth(0.5).strokeColor(inks.soft);
  doc.moveTo(x, top).lineTo(x, bottom);
  for (const y of [top, bottom]) doc.moveTo(x - tick, y).lineTo(x + tick, y);
  doc.stroke();
  const middle = (top + bottom) / 2;
  const width = 80;
  doc.save();
  doc.rotate(-90, { origin: [x, middle] });
  sheet.put(
    text,
    bookStyles.dimension,
    { x: x - width / 2, width, align: 'centre' },
    middle - bookStyles.dimension.leading - 2,
  );
  doc.restore();
};

/** A ruled bar of so many millimetres of the drawing: it tells whether the paper was printed to scale. */
export const drawScaleBar = (
  sheet: Sheet,
  { right, y, lengthMm, ratio }: { right: number; y: number; lengthMm: number; ratio: number },
): void => {
  const { doc } = sheet;
  const length = lengthMm * ratio * (72 / 25.4);
  const left = right - length;
  doc.lineWidth(0.5).strokeColor(inks.soft).moveTo(left, y).lineTo(right, y);
  for (let at = 0; at <= 5; at += 1) {
    const x = left + (length * at) / 5;
    doc.moveTo(x, y - (at % 5 === 0 ? 4 : 2)).lineTo(x, y);
  }
  doc.stroke();
  sheet.put(`${lengthMm} mm`, bookStyles.dimension, { x: right - 80, width: 80, align: 'right' }, y + 1);
};
