import type { BookPart, PartDrawing } from './build-book.js';
import { largestScale, smallestRatio } from './drawing-scale.js';
import { mm } from '../../typesetting/page-geometry.js';

export type DrawnPart = BookPart & { readonly drawing: PartDrawing };

export interface PlacedPart {
  readonly part: DrawnPart;
  /** Of the drawing, from the upper left of the page's room, in points. */
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly height: number;
  /** The cell its lettering is centred in. */
  readonly cellX: number;
  readonly cellWidth: number;
}
export interface PartsSheetLayout {
  readonly ratio: number;
  readonly pages: readonly (readonly PlacedPart[])[];
  /** How far down the last page is used. */
  readonly lastHeight: number;
}

interface Room {
  readonly width: number;
  readonly height: number;
}

export const labelHeight = 12;
const columnGap = 13;
const rowGap = 15;
/** Below a quarter of life size small parts are dots: then rather another page. */
const leastRatio = 1 / 4;
const mostRatio = 1;

/**
 * All parts to one scale, in rows on a common foot: the largest scale that needs one page, or two, or three …,
 * as long as the largest part fits a page.
 * @param labelWidthOf points
 */
export const layOutPartsSheet = (
  parts: readonly DrawnPart[],
  room: Room,
  labelWidthOf: (part: DrawnPart) => number,
): PartsSheetLayout => {
  const fitsRoom = (ratio: number) =>
    parts.every(
      ({ drawing }) =>
        mm(drawing.widthMm * ratio) <= room.width &&
        mm(drawing.heightMm * ratio) + labelHeight <= room.height,
    );
  for (let pageCount = 1; pageCount <= parts.length; pageCount += 1) {
    const fitting = (ratio: number) =>
      fitsRoom(ratio) && pagesAt(parts, ratio, room, labelWidthOf).pages.length <= pageCount;
    const ratio = largestScale(fitting, mostRatio);
    if (fitting(ratio) && (ratio >= leastRatio || !fitsRoom(leastRatio)))
      return { ratio, ...pagesAt(parts, ratio, room, labelWidthOf) };
  }
  return { ratio: smallestRatio, ...pagesAt(parts, smallestRatio, room, labelWidthOf) };
};

interface Row {
  readonly cells: { part: DrawnPart; width: number; height: number; cellX: number; cellWidth: number }[];
  height: number;
  width: number;
}

const pagesAt = (
  parts: readonly DrawnPart[],
  ratio: number,
  room: Room,
  labelWidthOf: (part: DrawnPart) => number,
): Pick<PartsSheetLayout, 'pages' | 'lastHeight'> => {
  const pages: PlacedPart[][] = [];
  let y = Number.POSITIVE_INFINITY;
  for (const row of rowsAt(parts, ratio, room.width, labelWidthOf)) {
    if (y + row.height + labelHeight > room.height) {
      pages.push([]);
      y = 0;
    }
    const foot = y + row.height;
    for (const cell of row.cells)
      pages
        .at(-1)
        ?.push({ ...cell, x: cell.cellX + (cell.cellWidth - cell.width) / 2, y: foot - cell.height });
    y = foot + labelHeight + rowGap;
  }
  return { pages, lastHeight: Math.min(room.height, Math.max(0, y - rowGap)) };
};

const rowsAt = (
  parts: readonly DrawnPart[],
  ratio: number,
  roomWidth: number,
  labelWidthOf: (part: DrawnPart) => number,
): Row[] => {
  const rows: Row[] = [];
  for (const part of parts) {
    const width = mm(part.drawing.widthMm * ratio);
    const height = mm(part.drawing.heightMm * ratio);
    const cellWidth = Math.max(width, labelWidthOf(part));
    let row = rows.at(-1);
    if (!row || row.width + columnGap + cellWidth > roomWidth) {
      row = { cells: [], height: 0, width: -columnGap };
      rows.push(row);
    }
    const cellX = row.width + columnGap;
    row.cells.push({ part, width, height, cellX, cellWidth });
    row.width = cellX + cellWidth;
    row.height = Math.max(row.height, height);
  }
  return rows;
};
