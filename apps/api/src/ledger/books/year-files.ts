import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { selectPortions } from '../../database/portions.js';
import { csvRecord } from '../../http/csv.js';
import { YearRecords, type Span } from '../../orders/year-records.js';
import { ExportReceipts } from '../export-receipts.js';
import {
  disputeColumns,
  lineColumns,
  orderColumns,
  rateColumns,
  refundColumns,
  settledColumns,
  type RateRow,
  type SettledRow,
  type YearColumn,
} from './year-columns.js';

export interface YearFile {
  readonly name: string;
  readonly lines: AsyncIterable<string> | Iterable<string>;
}

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
      { name: 'orders.csv', lines: csvLines(orderColumns, this.orders.orders(span)) },
      { name: 'order-lines.csv', lines: csvLines(lineColumns, this.orders.lines(span)) },
      { name: 'receipts.csv', lines: this.receipts.lines({ kind: 'receipt', year }) },
      { name: 'credit-notes.csv', lines: this.receipts.lines({ kind: 'credit-note', year }) },
      { name: 'refunds.csv', lines: csvLines(refundColumns, this.orders.refunds(span)) },
      { name: 'disputes.csv', lines: csvLines(disputeColumns, this.orders.disputes(span)) },
      { name: 'tax-rates.csv', lines: csvLines(rateColumns, this.rates()) },
      { name: 'settled-countries.csv', lines: csvLines(settledColumns, this.settlements(span)) },
      { name: 'READ-ME.txt', lines: [readMe(year)] },
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

async function* csvLines<Row>(
  columns: readonly YearColumn<Row>[],
  rows: AsyncIterable<Row>,
): AsyncGenerator<string> {
  yield csvRecord(columns.map(([head]) => head));
  for await (const row of rows) yield csvRecord(columns.map(([, cell]) => cell(row)));
}

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
