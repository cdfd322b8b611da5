import { decimalText } from '@windchest/money';
import { csvNumber, type CsvValue } from '../../http/csv.js';
import type { DisputeRow, LineRow, OrderRow, RefundRow } from '../../orders/year-records.js';
import { rateText } from '../rate-text.js';

/** A column of an export: its head, and what of a row stands in it. */
export type YearColumn<Row> = readonly [head: string, cell: (row: Row) => CsvValue];

/** A rate as it was entered. */
export interface RateRow {
  readonly id: string;
  readonly at: Date;
  readonly country: string;
  readonly kind: string;
  readonly validFrom: string;
  readonly rate: string | number;
  readonly source: string;
}

/** A receipt that counts in a country chosen by hand. */
export interface SettledRow {
  readonly id: string;
  readonly at: Date;
  readonly receipt: string;
  readonly countryOnReceipt: string;
  readonly country: string;
  readonly rate: string;
  readonly currency: string;
  readonly netMinor: number;
  readonly taxMinor: number;
  readonly reason: string;
  readonly who: string;
}

const moment = (at: Date | null): string | null => at?.toISOString() ?? null;
const amount = (minor: number, { currency }: { readonly currency: string }): CsvValue =>
  csvNumber(decimalText({ minor, currency }));

export const orderColumns: readonly YearColumn<OrderRow>[] = [
  ['number', (row) => row.number],
  ['state', (row) => row.state],
  ['placed_at', (row) => moment(row.at)],
  ['paid_at', (row) => moment(row.paidAt)],
  ['email', (row) => row.email],
  ['declared_country', (row) => row.declaredCountry],
  ['billing_country', (row) => row.billingCountry],
  ['card_country', (row) => row.cardCountry],
  ['settled_country', (row) => row.settledCountry],
  ['tax_treatment', (row) => row.treatment],
  ['business', (row) => row.businessName],
  ['vat_number', (row) => row.vatNumber],
  ['is_gift', (row) => (row.isGift ? 'yes' : 'no')],
  ['currency', (row) => row.currency],
  ['subtotal', (row) => amount(row.subtotalMinor, row)],
  ['discount', (row) => amount(row.discountMinor, row)],
  ['total', (row) => amount(row.totalMinor, row)],
  ['refunded', (row) => amount(row.refundedMinor, row)],
  ['coupon', (row) => row.couponCode],
  ['receipt', (row) => row.receiptNumber],
  ['payment_reference', (row) => row.paymentIntentId],
];

export const lineColumns: readonly YearColumn<LineRow>[] = [
  ['order', (row) => row.order],
  ['line', (row) => row.position + 1],
  ['kit', (row) => row.kit],
  ['revision', (row) => row.revision],
  ['licence', (row) => row.licence],
  ['currency', (row) => row.currency],
  ['price', (row) => amount(row.priceMinor, row)],
  ['discount', (row) => amount(row.discountMinor, row)],
  ['total', (row) => amount(row.totalMinor, row)],
  ['refunded', (row) => amount(row.refundedMinor, row)],
];

export const refundColumns: readonly YearColumn<RefundRow>[] = [
  ['order', (row) => row.order],
  ['asked_at', (row) => moment(row.at)],
  ['settled_at', (row) => moment(row.settledAt)],
  ['origin', (row) => row.origin],
  ['state', (row) => row.state],
  ['currency', (row) => row.currency],
  ['amount', (row) => amount(row.amountMinor, row)],
  ['reason', (row) => row.reason],
  ['asked_by', (row) => row.askedBy],
  ['credit_note', (row) => row.creditNote],
  ['payment_reference', (row) => row.serviceId],
];

export const disputeColumns: readonly YearColumn<DisputeRow>[] = [
  ['order', (row) => row.order],
  ['opened_at', (row) => moment(row.at)],
  ['closed_at', (row) => moment(row.closedAt)],
  ['state', (row) => row.state],
  ['currency', (row) => row.currency],
  ['amount', (row) => amount(row.amountMinor, row)],
  ['reason', (row) => row.reason],
  ['payment_reference', (row) => row.serviceId],
];

export const rateColumns: readonly YearColumn<RateRow>[] = [
  ['country', (row) => row.country],
  ['product_kind', (row) => row.kind],
  ['valid_from', (row) => row.validFrom],
  ['rate_percent', (row) => rateText(row.rate)],
  ['source', (row) => row.source],
];

export const settledColumns: readonly YearColumn<SettledRow>[] = [
  ['receipt', (row) => row.receipt],
  ['country_on_receipt', (row) => row.countryOnReceipt],
  ['counted_in', (row) => row.country],
  ['rate_percent', (row) => row.rate],
  ['currency', (row) => row.currency],
  ['net', (row) => amount(row.netMinor, row)],
  ['tax', (row) => amount(row.taxMinor, row)],
  ['reason', (row) => row.reason],
  ['by', (row) => row.who],
  ['at', (row) => moment(row.at)],
];
