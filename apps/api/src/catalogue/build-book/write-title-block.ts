import { drawTitleBlock, titleBlockTop, type TitleCell } from '../../typesetting/title-block.js';
import { boxText, dayText, numberText } from '../../typesetting/number-text.js';
import type { BuildBook } from './build-book.js';
import type { BookSheet } from './book-sheet.js';

export const bookBlockTop = titleBlockTop(3);

/** Owner, title, number, date, sheet, and the kit's facts. */
export const drawBookBlock = (
  sheet: BookSheet,
  book: BuildBook,
  { scale, pageCount }: { scale: string | null; pageCount: number },
): void => drawTitleBlock(sheet, titleRows(book, scale, pageCount));

const titleRows = (book: BuildBook, scale: string | null, pageCount: number): TitleCell[][] => {
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
