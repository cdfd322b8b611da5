import type { BuildBook } from './build-book.js';
import { boxText, dayText, numberText } from './number-text.js';
import { inks, mm, page } from './page-geometry.js';
import type { Sheet } from './sheet.js';
import { styles } from './text-styles.js';

const rowHeight = mm(12.5);
const blockBottom = mm(297 - 16);
const padding = 6;

export const titleBlockTop = blockBottom - 3 * rowHeight;

interface Cell {
  readonly label: string;
  readonly value: string;
  readonly share: number;
}

/** The ruled fields at the foot of the first page, after ISO 7200: owner, title, number, date, sheet, and the kit's facts. */
export const drawTitleBlock = (
  sheet: Sheet,
  book: BuildBook,
  { scale, pageCount }: { scale: string | null; pageCount: number },
): void => {
  const width = page.right - page.edge;
  titleRows(book, scale, pageCount).forEach((cells, row) => {
    const top = titleBlockTop + row * rowHeight;
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
      .rect(page.edge, titleBlockTop, width, 3 * rowHeight)
      .lineWidth(0.9)
      .strokeColor(inks.ink)
      .stroke();
  });
};

const titleRows = (book: BuildBook, scale: string | null, pageCount: number): Cell[][] => {
  const { kit, revision, workshop, room, buildVolume, parts } = book;
  const pieces = parts.reduce((sum, { quantity }) => sum + quantity, 0);
  return [
    [
      { label: 'Title', value: kit.name, share: 6 },
      { label: 'Document', value: 'Build book', share: 4 },
      { label: 'Revision', value: revision.label, share: 4 },
      { label: 'Released', value: dayText(revision.releasedAt), share: 5 },
    ],
    [
      { label: 'Owner', value: workshop.name, share: 6 },
      {
        label: 'Number',
        value: `${kit.slug} ${revision.label}`.toLowerCase().replaceAll(' ', '-'),
        share: 4,
      },
      { label: 'Scale of this drawing', value: scale ?? '–', share: 4 },
      { label: 'Sheet', value: `1 of ${pageCount}`, share: 5 },
    ],
    [
      {
        label: 'Build volume',
        value: `${boxText(buildVolume.xMm, buildVolume.yMm, buildVolume.zMm)} mm`,
        share: 6,
      },
      { label: 'To print', value: `${pieces} ${pieces === 1 ? 'piece' : 'pieces'}`, share: 4 },
      { label: 'Compass', value: book.compass === '' ? 'No voices' : book.compass, share: 4 },
      {
        label: `Declared at ${numberText(room.temperatureC, 1)} °C`,
        value: book.voices.length === 0 ? '–' : `± ${numberText(book.declaredCents, 1)} cents`,
        share: 5,
      },
    ],
  ];
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
