import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { decimalText } from '@windchest/money';
import type { Sequelize } from 'sequelize';
import { selectPortions } from '../../database/portions.js';
import { YearRecords, type Span } from '../../orders/year-records.js';
import { csvNumber, csvRecord, type CsvValue } from '../../http/csv.js';
import { ExportReceipts } from '../export-receipts.js';
import { rateText } from '../rate-text.js';

export interface YearFile {
  readonly name: string;
  readonly lines: AsyncIterable<string>;
}

type Row<Source> = Source extends AsyncGenerator<infer R> ? R : never;

const moment = (at: Date | null): string | null => at?.toISOString() ?? null;
const amounts = (currency: string, ...minors: number[]): CsvValue[] =>
  minors.map((minor) => csvNumber(decimalText({ minor, currency })));

/** What an export of a year holds: one CSV for each kind of record. */
@Injectable()
export class YearFiles {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly orders: YearRecords,
    private readonly receipts: ExportReceipts,
  ) {}

  of(year: number): YearFile[] {
    const span = spanOf(year);
    return [
      { name: 'orders.csv', lines: csvLines(ORDERS, this.orders.orders(span), orderCells) },
      { name: 'order-lines.csv', lines: csvLines(LINES, this.orders.lines(span), lineCells) },
      { name: 'receipts.csv', lines: this.receipts.lines({ kind: 'receipt', year }) },
      { name: 'credit-notes.csv', lines: this.receipts.lines({ kind: 'credit-note', year }) },
      { name: 'refunds.csv', lines: csvLines(REFUNDS, this.orders.refunds(span), refundCells) },
      { name: 'disputes.csv', lines: csvLines(DISPUTES, this.orders.disputes(span), disputeCells) },
      { name: 'tax-rates.csv', lines: csvLines(RATES, this.rates(), rateCells) },
      { name: 'settled-countries.csv', lines: csvLines(SETTLED, this.settlements(span), settledCells) },
      { name: 'READ-ME.txt', lines: oneLine(readMe(year)) },
    ];
  }

  /** About how many lines all files have together. */
  count(year: number): Promise<number> {
    return this.orders.count(spanOf(year));
  }

  /** All rates ever entered: a receipt of this year may rest on one from long before. */
  private rates(): AsyncGenerator<RateRow> {
    return selectPortions<RateRow>(
      this.database,
      `SELECT CONCAT(country, ' ', product_kind) AS id, CAST(valid_from AS DATETIME(6)) AS at, country,
              product_kind AS kind, DATE_FORMAT(valid_from, '%Y-%m-%d') AS validFrom, rate_percent AS rate, source
       FROM tax_rates`,
    );
  }

  private settlements(span: Span): AsyncGenerator<SettledRow> {
    return selectPortions<SettledRow>(
      this.database,
      `SELECT s.receipt_id AS id, s.at, r.label AS receipt, r.country AS countryOnReceipt, s.country, s.rate_percent AS rate,
              r.currency, s.net_minor AS netMinor, s.tax_minor AS taxMinor, s.reason, s.who
       FROM tax_settlements s JOIN receipts r ON r.id = s.receipt_id
       WHERE r.issued_at >= :from AND r.issued_at < :until`,
      { ...span },
    );
  }
}

const spanOf = (year: number): Span => ({
  from: new Date(Date.UTC(year, 0, 1)),
  until: new Date(Date.UTC(year + 1, 0, 1)),
});

async function* csvLines<R>(
  head: readonly string[],
  rows: AsyncIterable<R>,
  cells: (row: R) => CsvValue[],
): AsyncGenerator<string> {
  yield csvRecord(head);
  for await (const row of rows) yield csvRecord(cells(row));
}

// eslint-disable-next-line @typescript-eslint/require-await
async function* oneLine(text: string): AsyncGenerator<string> {
  yield text;
}

const ORDERS = [
  ...[
    'number',
    'state',
    'placed_at',
    'paid_at',
    'email',
    'declared_country',
    'billing_country',
    'card_country',
  ],
  ...[
    'settled_country',
    'tax_treatment',
    'business',
    'vat_number',
    'is_gift',
    'currency',
    'subtotal',
    'discount',
  ],
  ...['total', 'refunded', 'coupon', 'receipt', 'payment_reference'],
];
const orderCells = (row: Row<ReturnType<YearRecords['orders']>>): CsvValue[] => [
  ...[row.number, row.state, moment(row.at), moment(row.paidAt), row.email],
  ...[row.declaredCountry, row.billingCountry, row.cardCountry, row.settledCountry],
  ...[row.treatment, row.businessName, row.vatNumber, row.isGift ? 'yes' : 'no', row.currency],
  ...amounts(row.currency, row.subtotalMinor, row.discountMinor, row.totalMinor, row.refundedMinor),
  ...[row.couponCode, row.receiptNumber, row.paymentIntentId],
];

const LINES = [
  ...['order', 'line', 'kit', 'revision', 'licence', 'currency', 'price', 'discount', 'total', 'refunded'],
];
const lineCells = (row: Row<ReturnType<YearRecords['lines']>>): CsvValue[] => [
  ...[row.order, row.position + 1, row.kit, row.revision, row.licence, row.currency],
  ...amounts(row.currency, row.priceMinor, row.discountMinor, row.totalMinor, row.refundedMinor),
];

const REFUNDS = [
  ...['order', 'asked_at', 'settled_at', 'origin', 'state', 'currency', 'amount', 'reason', 'asked_by'],
  ...['credit_note', 'payment_reference'],
];
const refundCells = (row: Row<ReturnType<YearRecords['refunds']>>): CsvValue[] => [
  ...[row.order, moment(row.at), moment(row.settledAt), row.origin, row.state, row.currency],
  ...amounts(row.currency, row.amountMinor),
  ...[row.reason, row.askedBy, row.creditNote, row.serviceId],
];

const DISPUTES = [
  ...['order', 'opened_at', 'closed_at', 'state', 'currency', 'amount', 'reason', 'payment_reference'],
];
const disputeCells = (row: Row<ReturnType<YearRecords['disputes']>>): CsvValue[] => [
  ...[row.order, moment(row.at), moment(row.closedAt), row.state, row.currency],
  ...amounts(row.currency, row.amountMinor),
  ...[row.reason, row.serviceId],
];

interface RateRow {
  readonly id: string;
  readonly at: Date;
  readonly country: string;
  readonly kind: string;
  readonly validFrom: string;
  readonly rate: string | number;
  readonly source: string;
}
const RATES = ['country', 'product_kind', 'valid_from', 'rate_percent', 'source'];
const rateCells = (row: RateRow): CsvValue[] => [
  ...[row.country, row.kind, row.validFrom, rateText(row.rate), row.source],
];

interface SettledRow {
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
const SETTLED = [
  ...[
    'receipt',
    'country_on_receipt',
    'counted_in',
    'rate_percent',
    'currency',
    'net',
    'tax',
    'reason',
    'by',
    'at',
  ],
];
const settledCells = (row: SettledRow): CsvValue[] => [
  ...[row.receipt, row.countryOnReceipt, row.country, row.rate, row.currency],
  ...amounts(row.currency, row.netMinor, row.taxMinor),
  ...[row.reason, row.who, moment(row.at)],
];

const readMe = (year: number): string =>
  [
    `Records of ${year}, in UTC. Amounts are decimals of the currency beside them.`,
    'orders.csv and order-lines.csv: all orders placed in the year, also those never paid.',
    'receipts.csv and credit-notes.csv: all issued in the year, a row for each rate of tax; credit notes below zero.',
    'refunds.csv and disputes.csv: begun in the year. A refund of origin "dispute" is the loss of one; no money moved with it.',
    'settled-countries.csv: receipts of the year that count in a country chosen by hand; the receipts stay as they are.',
    'tax-rates.csv: every rate ever entered.',
    '',
    'This is no tax advice. Ask a licensed adviser.',
    '',
  ].join('\r\n');
