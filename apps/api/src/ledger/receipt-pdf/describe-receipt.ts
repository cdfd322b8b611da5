import type { TaxTreatment } from '@windchest/contracts';
import { money, spread } from '@windchest/money';
import type { ReceiptBuyer, ReceiptLine, ReceiptSeller, CreditedLine } from '../receipt-parties.js';
import type { ReceiptTax } from '../receipt.model.js';
import type { DocumentLine, ReceiptDocument } from './receipt-document.js';

export interface WrittenReceipt {
  readonly label: string;
  readonly orderNumber: string;
  readonly currency: string;
  readonly totalMinor: number;
  readonly taxTreatment: TaxTreatment;
  readonly tax: readonly ReceiptTax[];
  readonly buyer: ReceiptBuyer;
  readonly seller: ReceiptSeller | null;
  readonly lines: readonly ReceiptLine[];
  readonly issuedAt: Date;
}

export interface WrittenCreditNote {
  readonly label: string;
  readonly totalMinor: number;
  readonly tax: readonly ReceiptTax[];
  readonly lines: readonly CreditedLine[];
  readonly cause: 'refund' | 'dispute';
  readonly issuedAt: Date;
}

/** What is the same on every document of the shop. */
export interface Letterhead {
  readonly shop: ReceiptDocument['shop'];
  /** Who sells now, for receipts that were issued before the seller was written into them. */
  readonly seller: ReceiptSeller;
  readonly locale: string;
}

export const describeReceipt = (receipt: WrittenReceipt, letterhead: Letterhead): ReceiptDocument => ({
  ...common(receipt, letterhead),
  kind: kindOf(receipt.buyer),
  number: receipt.label,
  issuedAt: receipt.issuedAt,
  corrects: null,
  lines: linesOf(receipt),
  rates: receipt.tax,
  totalMinor: receipt.totalMinor,
});

export const describeCreditNote = (
  note: WrittenCreditNote,
  receipt: WrittenReceipt,
  letterhead: Letterhead,
): ReceiptDocument => ({
  ...common(receipt, letterhead),
  kind: 'credit-note',
  number: note.label,
  issuedAt: note.issuedAt,
  corrects: {
    kind: kindOf(receipt.buyer),
    number: receipt.label,
    issuedAt: receipt.issuedAt,
    cause: note.cause,
  },
  lines: note.lines.map((line) => ({
    title: `${line.kit} ${line.revision}`,
    licence: line.licence,
    before: null,
    netMinor: line.netMinor,
    ratePercent: line.ratePercent,
    totalMinor: line.totalMinor,
  })),
  rates: note.tax,
  totalMinor: note.totalMinor,
});

const common = (receipt: WrittenReceipt, { shop, seller, locale }: Letterhead) => ({
  suppliedAt: receipt.issuedAt,
  orderNumber: receipt.orderNumber,
  shop,
  seller: receipt.seller ?? seller,
  buyer: receipt.buyer,
  treatment: receipt.taxTreatment,
  currency: receipt.currency,
  locale,
});

/** Without name and address it is a simplified invoice, which the shop calls a receipt. */
const kindOf = (buyer: ReceiptBuyer): 'receipt' | 'invoice' =>
  buyer.name && buyer.address && buyer.address.length > 0 ? 'invoice' : 'receipt';

/** The net of a rate over its lines by largest remainder, so that the column adds up to the taxable amount. */
const linesOf = ({ lines, tax, currency }: WrittenReceipt): DocumentLine[] => {
  const nets = new Map<string, number>();
  for (const { ratePercent, netMinor } of tax) {
    const ofRate = lines.filter((line) => line.ratePercent === ratePercent);
    const weights = ofRate.map((line) => line.totalMinor);
    spread(money(netMinor, currency), weights).forEach((net, at) => {
      nets.set(ofRate[at]?.orderLineId ?? '', net.minor);
    });
  }
  return lines.map((line) => ({
    title: `${line.kit} ${line.revision}`,
    licence: line.licence,
    before:
      line.discountMinor > 0 ? { priceMinor: line.priceMinor, discountMinor: line.discountMinor } : null,
    netMinor: nets.get(line.orderLineId) ?? 0,
    ratePercent: line.ratePercent,
    totalMinor: line.totalMinor,
  }));
};
