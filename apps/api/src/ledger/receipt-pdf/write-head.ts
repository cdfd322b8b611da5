import { contentWidth, inks, mm, page } from '../../typesetting/page-geometry.js';
import type { Sheet } from '../../typesetting/sheet.js';
import type { Span } from '../../typesetting/text-lines.js';
import { styles, textStyle } from '../../typesetting/text-styles.js';
import type { ReceiptDocument } from './receipt-document.js';
import { countryName, leadOf, titles } from './receipt-words.js';

const titleStyle = textStyle(34, 38, 'bold', inks.ink, 0.024);
const partiesGap = mm(10);
const columnWidth = (contentWidth - partiesGap) / 2;

/** The shop, what this is, and the two parties. */
export const writeHead = (sheet: Sheet, document: ReceiptDocument): void => {
  const { shop, kind, number } = document;
  const place = { x: page.left, width: contentWidth };
  sheet.block('P', () => sheet.putOneLine(shop.name, styles.fact, place, sheet.y));
  sheet.block('P', () => {
    const spans: Span[] = [{ text: shop.address, url: shop.address, colour: inks.soft }];
    sheet.put(spans, styles.body, { ...place, align: 'right' }, sheet.y);
  });
  sheet.y += mm(16);
  sheet.block('H1', () => {
    sheet.putOneLine(
      [{ text: titles[kind] }, { text: ` ${number}`, face: 'regular', colour: inks.soft }],
      titleStyle,
      place,
      sheet.y,
    );
  });
  sheet.y += titleStyle.leading + 6;
  sheet.block('P', () =>
    sheet.write(sheet.lines(leadOf(document), styles.lead, mm(118)), styles.lead, {
      ...place,
      width: mm(118),
    }),
  );
  sheet.y += mm(10);
  writeParties(sheet, document);
  sheet.y += mm(11);
};

const writeParties = (sheet: Sheet, { seller, buyer }: ReceiptDocument): void => {
  const top = sheet.y;
  const parties: [string, (string | undefined)[]][] = [
    [
      'Sold by',
      [
        seller.name,
        seller.address || undefined,
        countryName(seller.country),
        seller.vatNumber ? `VAT number ${seller.vatNumber}` : undefined,
      ],
    ],
    [
      'Sold to',
      [
        buyer.name ?? buyer.email,
        ...(buyer.address ?? []),
        countryName(buyer.country),
        buyer.name ? buyer.email : undefined,
        buyer.vatNumber ? `VAT number ${buyer.vatNumber}` : undefined,
      ],
    ],
  ];
  const bottoms = parties.map(([label, facts], at) => {
    const x = page.left + at * (columnWidth + partiesGap);
    sheet.rule(x, top, columnWidth, inks.ink, 0.7);
    let y = top + 6;
    sheet.group('Div', () => {
      sheet.block('P', () => {
        y += sheet.put(label, styles.label, { x, width: columnWidth }, y) + 2;
      });
      for (const [line, fact] of facts.filter((one) => one !== undefined).entries())
        sheet.block('P', () => {
          const spans: Span[] = [{ text: fact, ...(line === 0 ? { face: 'semibold' as const } : {}) }];
          y += sheet.put(spans, styles.body, { x, width: columnWidth }, y);
        });
    });
    return y;
  });
  sheet.y = Math.max(...bottoms);
};
