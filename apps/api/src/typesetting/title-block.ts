import { inks, mm, page } from './page-geometry.js';
import type { Sheet } from './sheet.js';
import { styles } from './text-styles.js';

const rowHeight = mm(12.5);
const blockBottom = mm(297 - 16);
const padding = 6;

/** Where a title block of so many rows begins. */
export const titleBlockTop = (rows: number): number => blockBottom - rows * rowHeight;

export interface TitleCell {
  readonly label: string;
  readonly value: string;
  /** Of the row's width, against the other cells'. */
  readonly share: number;
}

/** The ruled fields at the foot of the first page, as on a drawing (after ISO 7200). */
export const drawTitleBlock = (sheet: Sheet, rows: readonly (readonly TitleCell[])[]): void => {
  const width = page.right - page.edge;
  const blockTop = titleBlockTop(rows.length);
  rows.forEach((cells, row) => {
    const top = blockTop + row * rowHeight;
    const whole = cells.reduce((sum, { share }) => sum + share, 0);
    let x = page.edge;
    cells.forEach(({ label, value, share }, at) => {
      const cellWidth = (width * share) / whole;
      const place = { x: x + padding, width: cellWidth - 2 * padding };
      sheet.block('P', () => {
        sheet.put(label, styles.label, place, top + 5);
        sheet.putOneLine(value, styles.fact, place, top + 15);
      });
      if (at > 0) drawUpright(sheet, x, top);
      x += cellWidth;
    });
    if (row > 0) sheet.rule(page.edge, top, width, inks.ink, 0.6);
  });
  sheet.decoration(() => {
    sheet.doc
      .rect(page.edge, blockTop, width, rows.length * rowHeight)
      .lineWidth(0.9)
      .strokeColor(inks.ink)
      .stroke();
  });
};

const drawUpright = (sheet: Sheet, x: number, top: number): void => {
  sheet.decoration(() => {
    sheet.doc
      .moveTo(x, top)
      .lineTo(x, top + rowHeight)
      .lineWidth(0.6)
      .strokeColor(inks.ink)
      .stroke();
  });
};
