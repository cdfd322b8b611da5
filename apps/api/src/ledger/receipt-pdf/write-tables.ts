import { contentWidth, inks, mm, page } from '../../typesetting/page-geometry.js';
import type { Sheet } from '../../typesetting/sheet.js';
import { writeTable, type Column } from '../../typesetting/table.js';
import type { Span } from '../../typesetting/text-lines.js';
import { styles } from '../../typesetting/text-styles.js';
import type { DocumentLine, ReceiptDocument } from './receipt-document.js';
import { amountText, countryName, natureOfLines, taxNoteOf } from './receipt-words.js';

/** Both tables stand in the same columns, so that figures of a kind are under each other. */
const widths = (() => {
  const [count, net, tax, gross] = [mm(17), mm(30), mm(23), mm(28)];
  return { first: contentWidth - count - net - tax - gross, count, net, tax, gross };
})();
const rowHeight = styles.table.leading + 7;
const tablesGap = mm(8);
const noteWidth = mm(118);

const columns = (titles: readonly [string, string, string, string, string]): Column[] => [
  { title: titles[0], width: widths.first },
  { title: titles[1], width: widths.count, align: 'right' },
  { title: titles[2], width: widths.net, align: 'right' },
  { title: titles[3], width: widths.tax, align: 'right' },
  { title: titles[4], width: widths.gross, align: 'right' },
];

/** What was sold, one by one, or what of it goes back. */
export const writeLines = (sheet: Sheet, document: ReceiptDocument): void => {
  const amount = (minor: number) => amountText(minor, document);
  const isBack = document.corrects !== null;
  sheet.block('P', () => {
    sheet.y += sheet.put(natureOfLines, styles.lead, { x: page.left, width: contentWidth }, sheet.y);
  });
  sheet.y += 6;
  writeTable(sheet, {
    x: page.left,
    columns: columns(
      isBack
        ? ['Goes back for', 'Quantity', 'Without VAT', 'VAT', 'With VAT']
        : ['Kit', 'Quantity', 'Unit without VAT', 'VAT', 'With VAT'],
    ),
    rows: document.lines.map((line) => [
      describe(line, amount),
      '1',
      amount(line.netMinor),
      rateText(line.ratePercent),
      amount(line.totalMinor),
    ]),
  });
};

const describe = ({ title, licence, before }: DocumentLine, amount: (minor: number) => string): Span[] => [
  { text: title, face: 'semibold' },
  { text: `\n${licence}`, colour: inks.soft },
  ...(before
    ? [{ text: `\n${amount(before.priceMinor)} less ${amount(before.discountMinor)}`, colour: inks.soft }]
    : []),
];

const rateText = (percent: string): string => `${percent} %`;

/** The tax rate by rate, and what is to be said of it; kept on one sheet with so much room below. */
export const writeTax = (sheet: Sheet, document: ReceiptDocument, roomBelow: number): void => {
  const amount = (minor: number) => amountText(minor, document);
  const note = taxNoteOf(document);
  const noteLines = note ? sheet.lines(note, styles.body, noteWidth) : [];
  const height =
    tablesGap + (document.rates.length + 1) * rowHeight + mm(5) + noteLines.length * styles.body.leading;
  sheet.ensure(height + roomBelow);
  sheet.y += tablesGap;
  writeTable(sheet, {
    x: page.left,
    columns: columns(['VAT of', 'Rate', 'Taxable amount', 'VAT', 'Together']),
    rows: document.rates.map((rate) => [
      countryName(rate.country),
      rateText(rate.ratePercent),
      amount(rate.netMinor),
      amount(rate.taxMinor),
      amount(rate.netMinor + rate.taxMinor),
    ]),
  });
  if (noteLines.length === 0) return;
  sheet.y += mm(5);
  sheet.block('P', () => sheet.write(noteLines, styles.body, { x: page.left, width: noteWidth }));
};
