import { collectBytes, openDocument } from '../../typesetting/open-document.js';
import { dayText } from '../../typesetting/number-text.js';
import { contentWidth, mm, page } from '../../typesetting/page-geometry.js';
import { Sheet } from '../../typesetting/sheet.js';
import { styles } from '../../typesetting/text-styles.js';
import { drawTitleBlock, titleBlockTop, type TitleCell } from '../../typesetting/title-block.js';
import { Typeface } from '../../typesetting/typeface.js';
import { readFontFiles } from '../../typesetting/typeface-files.js';
import type { ReceiptDocument } from './receipt-document.js';
import { amountText, titles } from './receipt-words.js';
import { writeHead } from './write-head.js';
import { writeLines, writeTax } from './write-tables.js';

/** Typesets a receipt, an invoice or a credit note: a tagged PDF, A4. The same facts give the same bytes. */
export const typesetReceipt = async (document: ReceiptDocument): Promise<Buffer> => {
  const { kind, number, shop, seller, orderNumber, issuedAt } = document;
  const doc = openDocument({
    title: `${titles[kind]} ${number}`,
    author: seller.name,
    subject: `${shop.name}, order ${orderNumber}`,
    date: issuedAt,
  });
  const bytes = collectBytes(doc);
  const sheet = new Sheet(doc, new Typeface(doc, await readFontFiles()));
  writeHead(sheet, document);
  writeLines(sheet, document);
  writeTax(sheet, document, page.bottom - titleBlockTop(titleRowCount) + mm(8));
  sheet.group('Sect', () => drawTitleBlock(sheet, titleRows(document, sheet.pageCount)));
  writeFeet(sheet, document);
  doc.end();
  return bytes;
};

const titleRowCount = 3;
const titleRows = (document: ReceiptDocument, pageCount: number): TitleCell[][] => {
  const { kind, number, issuedAt, suppliedAt, orderNumber, corrects, seller, rates, totalMinor } = document;
  const amount = (minor: number) => amountText(minor, document);
  const net = rates.reduce((sum, rate) => sum + rate.netMinor, 0);
  const tax = rates.reduce((sum, rate) => sum + rate.taxMinor, 0);
  return [
    [
      { label: 'Document', value: titles[kind], share: 5 },
      { label: 'Number', value: number, share: 5 },
      { label: 'Issued', value: dayText(issuedAt), share: 6 },
      { label: 'Supplied', value: dayText(suppliedAt), share: 6 },
    ],
    [
      { label: 'Order', value: orderNumber, share: 5 },
      corrects
        ? { label: 'Corrects', value: corrects.number, share: 5 }
        : { label: 'Currency', value: document.currency, share: 5 },
      { label: 'VAT number of the seller', value: seller.vatNumber ?? 'none', share: 6 },
      { label: 'Sheet', value: `${pageCount} of ${pageCount}`, share: 6 },
    ],
    [
      { label: 'Without VAT', value: amount(net), share: 5 },
      { label: 'VAT', value: amount(tax), share: 5 },
      { label: corrects ? 'Goes back, with VAT' : 'Paid, with VAT', value: amount(totalMinor), share: 12 },
    ],
  ];
};

/** The running foot of all sheets but the last, which has the title block instead. */
const writeFeet = (sheet: Sheet, { kind, number, seller }: ReceiptDocument): void => {
  const { doc, pageCount } = sheet;
  const place = { x: page.left, width: contentWidth };
  for (let at = 0; at < pageCount - 1; at += 1) {
    doc.switchToPage(at);
    doc.markContent('Artifact', { type: 'Pagination' });
    sheet.putOneLine(
      [{ text: `${titles[kind]} ${number}`, face: 'semibold' }, { text: `, ${seller.name}` }],
      styles.foot,
      { ...place, width: contentWidth - 60 },
      page.foot,
    );
    sheet.put(`${at + 1} of ${pageCount}`, styles.foot, { ...place, align: 'right' }, page.foot);
    doc.endMarkedContent();
  }
};
