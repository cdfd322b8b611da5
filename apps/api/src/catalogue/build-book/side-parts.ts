import { drawPart } from './draw-part.js';
import { mm } from '../../typesetting/page-geometry.js';
import type { DrawnPart } from './parts-sheet-layout.js';
import type { BookSheet } from './book-sheet.js';
import { bookStyles } from './book-styles.js';
import { partPlace } from './write-notes.js';

const mostWidth = mm(20);
const mostHeight = mm(23);
/** Of the longer side: a part that would be smaller is drawn larger than the others. */
const leastSize = mm(6);
const mostRatio = 0.5;
const leastCellWidth = mm(8.4);
const columnGap = mm(3);
const labelHeight = 12;
const rowGap = 9;

interface SidePart {
  readonly part: DrawnPart;
  readonly ratio: number;
  readonly width: number;
  readonly height: number;
  readonly cellX: number;
  readonly cellWidth: number;
}
interface SideRow {
  readonly parts: SidePart[];
  width: number;
  height: number;
}

/** Small drawings in rows: those of one step to one scale, but for what would be too small to see. */
export const layOutSideParts = (parts: readonly DrawnPart[], roomWidth: number): SideRow[] => {
  const widestMm = Math.max(0, ...parts.map(({ drawing }) => drawing.widthMm));
  const tallestMm = Math.max(0, ...parts.map(({ drawing }) => drawing.heightMm));
  const common = Math.min(mostRatio, mostWidth / mm(widestMm), mostHeight / mm(tallestMm));
  const rows: SideRow[] = [];
  for (const part of parts) {
    const { widthMm, heightMm } = part.drawing;
    const ratio = Math.max(common, Math.min(mostRatio * 2, leastSize / mm(Math.max(widthMm, heightMm))));
    const [width, height] = [mm(widthMm * ratio), mm(heightMm * ratio)];
    const cellWidth = Math.max(leastCellWidth, width);
    let row = rows.at(-1);
    if (!row || row.width + columnGap + cellWidth > roomWidth) {
      row = { parts: [], width: -columnGap, height: 0 };
      rows.push(row);
    }
    const cellX = row.width + columnGap;
    row.parts.push({ part, ratio, width, height, cellX, cellWidth });
    row.width = cellX + cellWidth;
    row.height = Math.max(row.height, height);
  }
  return rows;
};

export const sideHeight = (rows: readonly SideRow[]): number =>
  rows.reduce((sum, { height }) => sum + height + labelHeight + rowGap, 0);

/** Draws rows downward from `top`; returns their height. */
export const drawSideParts = (sheet: BookSheet, rows: readonly SideRow[], x: number, top: number): number => {
  let y = top;
  for (const row of rows) {
    for (const { part, ratio, width, height, cellX, cellWidth } of row.parts) {
      const left = x + cellX;
      sheet.block(
        'Figure',
        () => {
          const corner = { x: left + (cellWidth - width) / 2, y: y + row.height - height };
          drawPart(sheet.doc, part.drawing, { ...corner, ratio }, sheet.shades);
          sheet.put(
            [{ text: part.code, goTo: partPlace(part.code) }],
            bookStyles.partCode,
            { x: left, width: cellWidth, align: 'centre' },
            y + row.height + 3,
          );
        },
        `${part.code} ${part.name}`,
      );
    }
    y += row.height + labelHeight + rowGap;
  }
  return y - top;
};
