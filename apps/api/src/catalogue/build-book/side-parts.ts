import { drawPart } from './draw-part.js';
import { mm, pointsPerMm } from './page-geometry.js';
import type { DrawnPart } from './parts-sheet-layout.js';
import type { Sheet } from './sheet.js';
import { styles } from './text-styles.js';
import { partPlace } from './write-notes.js';

const cellWidth = mm(14.3);
const mostHeight = mm(21);
const labelHeight = 12;
const rowGap = 9;
/** On its longest side, in mm on paper: a part of 40 mm and more takes all the room, a tiny one a third of it. */
const fullSizeMm = 40;
const leastShare = 0.33;

interface SidePart {
  readonly part: DrawnPart;
  readonly ratio: number;
  readonly width: number;
  readonly height: number;
}
interface SideRow {
  readonly parts: readonly SidePart[];
  readonly height: number;
}

/** Small drawings in rows, not to scale, though what is small stays smaller. */
export const layOutSideParts = (parts: readonly DrawnPart[], width: number): SideRow[] => {
  const aRow = Math.max(1, Math.floor(width / cellWidth));
  const rows: SideRow[] = [];
  for (let at = 0; at < parts.length; at += aRow) {
    const row = parts.slice(at, at + aRow).map(sized);
    rows.push({ parts: row, height: Math.max(...row.map(({ height }) => height)) });
  }
  return rows;
};

const sized = (part: DrawnPart): SidePart => {
  const { widthMm, heightMm } = part.drawing;
  const share = Math.max(leastShare, Math.min(1, Math.sqrt(Math.max(widthMm, heightMm) / fullSizeMm)));
  const points = Math.min(
    ((cellWidth - 8) * share) / Math.max(0.1, widthMm),
    (mostHeight * share) / Math.max(0.1, heightMm),
  );
  return { part, ratio: points / pointsPerMm, width: widthMm * points, height: heightMm * points };
};

export const sideHeight = (rows: readonly SideRow[]): number =>
  rows.reduce((sum, { height }) => sum + height + labelHeight + rowGap, 0);

/** Draws rows downward from `top`; returns their height. */
export const drawSideParts = (sheet: Sheet, rows: readonly SideRow[], x: number, top: number): number => {
  let y = top;
  for (const row of rows) {
    row.parts.forEach(({ part, ratio, width, height }, at) => {
      const left = x + at * cellWidth;
      sheet.block(
        'Figure',
        () => {
          drawPart(
            sheet.doc,
            part.drawing,
            { x: left + (cellWidth - width) / 2, y: y + row.height - height, ratio },
            sheet.shades,
          );
          sheet.put(
            [{ text: part.code, goTo: partPlace(part.code) }],
            styles.partCode,
            { x: left, width: cellWidth, align: 'centre' },
            y + row.height + 3,
          );
        },
        `${part.code} ${part.name}`,
      );
    });
    y += row.height + labelHeight + rowGap;
  }
  return y - top;
};
