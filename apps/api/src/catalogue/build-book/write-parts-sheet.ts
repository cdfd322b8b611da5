import type { BookPart } from './build-book.js';
import { drawPart } from './draw-part.js';
import { drawScaleBar } from './dimension-line.js';
import { scaleText } from './drawing-scale.js';
import { contentWidth, page } from '../../typesetting/page-geometry.js';
import { layOutPartsSheet, type DrawnPart, type PlacedPart } from './parts-sheet-layout.js';
import type { BookSheet } from './book-sheet.js';
import type { Span } from '../../typesetting/text-lines.js';
import { inks } from '../../typesetting/page-geometry.js';
import { styles } from '../../typesetting/text-styles.js';
import { bookStyles } from './book-styles.js';
import { partPlace } from './write-notes.js';

const introHeight = 30;

export const drawnParts = (parts: readonly BookPart[]): DrawnPart[] =>
  parts.flatMap((part) => (part.drawing ? [{ ...part, drawing: part.drawing }] : []));

const labelOf = ({ code, quantity }: BookPart): Span[] => [
  { text: code },
  ...(quantity > 1 ? [{ text: ` × ${quantity}`, face: 'regular' as const, colour: inks.soft }] : []),
];

/** Every part as an outline with its code, all to one scale; on as many pages as they need. */
export const writePartsSheet = (sheet: BookSheet, parts: readonly BookPart[]): void => {
  const drawn = drawnParts(parts);
  const widthOf = (part: BookPart): number =>
    sheet.lines(labelOf(part), bookStyles.partCode, contentWidth)[0]?.width ?? 0;
  // All pages are as high as the first, which has the heading.
  const room = { width: contentWidth, height: sheet.roomLeft - introHeight };
  const { ratio, pages, lastHeight } = layOutPartsSheet(drawn, room, widthOf);
  writeIntro(sheet, parts, ratio);
  const top = sheet.y;
  pages.forEach((placed, at) => {
    if (at > 0) sheet.newPage();
    const from = at > 0 ? sheet.y : top;
    for (const one of placed) drawOne(sheet, one, from, ratio);
    sheet.y = from + (at === pages.length - 1 ? lastHeight : room.height);
  });
};

const writeIntro = (sheet: BookSheet, parts: readonly BookPart[], ratio: number): void => {
  const undrawn = parts.filter(({ drawing }) => !drawing).map(({ code }) => code);
  const isAllDrawn = undrawn.length === 0;
  const words = [
    undrawn.length === parts.length
      ? 'No part has a drawing.'
      : `All parts to one scale, ${scaleText(ratio)}.`,
    ...(isAllDrawn || undrawn.length === parts.length ? [] : [`Not drawn: ${undrawn.join(', ')}.`]),
  ].join(' ');
  const top = sheet.y;
  sheet.block('P', () => {
    sheet.y += sheet.put(words, styles.lead, { x: page.left, width: contentWidth * 0.66 }, sheet.y);
  });
  if (undrawn.length < parts.length)
    sheet.decoration(() =>
      drawScaleBar(sheet, { right: page.right, y: top + 8, lengthMm: ratio > 0.7 ? 50 : 100, ratio }),
    );
  sheet.y = Math.max(sheet.y, top + introHeight - 14) + 14;
};

const drawOne = (sheet: BookSheet, { part, ...at }: PlacedPart, top: number, ratio: number): void => {
  const y = top + at.y;
  sheet.doc.addNamedDestination(partPlace(part.code), 'XYZ', page.edge, Math.max(0, y - 20), 0);
  sheet.block(
    'Figure',
    () => {
      drawPart(sheet.doc, part.drawing, { x: page.left + at.x, y, ratio }, sheet.shades);
      sheet.put(
        labelOf(part),
        bookStyles.partCode,
        { x: page.left + at.cellX - 20, width: at.cellWidth + 40, align: 'centre' },
        y + at.height + 3,
      );
    },
    `${part.code} ${part.name}`,
  );
};
