import { clearanceSigns, type Clearance } from '@windchest/contracts';
import type { BookPart } from './build-book.js';
import { contentWidth, mm, page, textWidth } from '../../typesetting/page-geometry.js';
import type { Sheet } from '../../typesetting/sheet.js';
import { writeTable } from '../../typesetting/table.js';
import { styles } from '../../typesetting/text-styles.js';

/** Clearance is a gap: with more of it a part fits looser. */
const clearanceWords: Record<Clearance, string> = {
  minus: 'tighter',
  zero: 'as drawn',
  plus: 'looser',
};

export const hasClearances = (parts: readonly BookPart[]): boolean =>
  parts.some(({ clearances }) => clearances.length > 0);

/** Which parts come in several clearances, and how to find the one that fits. */
export const writeClearances = (sheet: Sheet, parts: readonly BookPart[]): void => {
  const gauge = parts.find(({ isGauge }) => isGauge);
  const place = { x: page.left, width: textWidth };
  const paragraphs = [
    'Printers differ in the gap they leave between two parts. The parts below come in several clearances: − with less of a gap, which fits tighter, 0 as drawn, and + with more of it, which fits looser. A bundle of one clearance holds the files of that one alone.',
    gauge
      ? `Print the gauge first, ${gauge.code} ${gauge.name}. See which of its clearances fits, then print all parts below in that one.`
      : 'Print one of them in 0 first. Where it is too tight take +, where it is too loose take −, and print all parts below in that one.',
  ];
  for (const words of paragraphs) {
    sheet.block('P', () => sheet.write(sheet.lines(words, styles.body, textWidth), styles.body, place));
    sheet.y += 9;
  }
  writeTable(sheet, {
    x: page.left,
    columns: [
      { title: 'Code', width: mm(16) },
      { title: 'Part', width: mm(42) },
      { title: 'Clearance', width: mm(26) },
      { title: 'File', width: contentWidth - mm(84) },
    ],
    rows: parts.flatMap(({ code, name, clearances }) =>
      clearances.map(({ clearance, fileName }) => [
        [{ text: code, face: 'semibold' as const }],
        name,
        [
          { text: clearanceSigns[clearance], face: 'semibold' as const },
          { text: ` ${clearanceWords[clearance]}` },
        ],
        fileName,
      ]),
    ),
  });
};
