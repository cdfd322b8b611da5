import { page, mm } from '../../typesetting/page-geometry.js';
import type { WrittenSection } from './sections.js';
import type { Sheet } from '../../typesetting/sheet.js';
import { styles } from '../../typesetting/text-styles.js';

const columnWidth = mm(68);
const linesAColumn = 5;

/** The sections and their pages, in two columns that lead there. */
export const writeContents = (sheet: Sheet, sections: readonly WrittenSection[], top: number): void => {
  sheet.group('TOC', () =>
    sections.forEach(({ title, pageNumber, place }, at) => {
      const x = page.left + Math.floor(at / linesAColumn) * (columnWidth + mm(14));
      const lineTop = top + (at % linesAColumn) * (styles.body.leading + 5);
      sheet.block('TOCI', () => {
        sheet.put([{ text: title, goTo: place }], styles.body, { x, width: columnWidth - mm(10) }, lineTop);
        sheet.put(
          [{ text: String(pageNumber), goTo: place }],
          styles.body,
          { x, width: columnWidth, align: 'right' },
          lineTop,
        );
      });
      sheet.rule(x, lineTop + styles.body.leading + 2, columnWidth);
    }),
  );
};
