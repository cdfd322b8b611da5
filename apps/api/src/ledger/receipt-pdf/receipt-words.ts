import { formatMoney } from '@windchest/money';
import { dayText } from '../../typesetting/number-text.js';
import type { DocumentKind, ReceiptDocument } from './receipt-document.js';

export const titles: Record<DocumentKind, string> = {
  receipt: 'Receipt',
  invoice: 'Invoice',
  'credit-note': 'Credit note',
};

const regions = new Intl.DisplayNames('en-GB', { type: 'region' });
export const countryName = (code: string): string => regions.of(code) ?? code;

/** With the true minus sign, which is as wide as a plus. */
export const amountText = (minor: number, { currency, locale }: ReceiptDocument): string =>
  formatMoney({ minor, currency }, locale).replace('-', '−');

/** What the document is about, under its title. */
export const leadOf = (document: ReceiptDocument): string => {
  const { corrects } = document;
  if (!corrects) return `Order ${document.orderNumber}, paid on ${dayText(document.suppliedAt)}.`;
  const why =
    corrects.cause === 'dispute'
      ? 'The amounts below went back to the buyer by a decision of their bank.'
      : 'The amounts below go back to the buyer the way they were paid.';
  return `Corrects ${corrects.kind} ${corrects.number} of ${dayText(corrects.issuedAt)}, order ${document.orderNumber}. ${why}`;
};

/** What the law wants said about the tax, besides its figures. */
export const taxNoteOf = ({ treatment, buyer, rates }: ReceiptDocument): string | null => {
  if (treatment === 'reverse-charge')
    return `Reverse charge: the customer, VAT number ${buyer.vatNumber ?? ''}, is liable for the VAT (Directive 2006/112/EC, articles 44 and 196).`;
  if (treatment === 'business-abroad')
    return 'No VAT is charged: the customer is a business established outside the European Union (Directive 2006/112/EC, article 44).';
  if (rates.every((rate) => rate.taxMinor === 0)) return 'No VAT is charged.';
  return null;
};

export const natureOfLines = 'Digital files to print, handed over by download.';
