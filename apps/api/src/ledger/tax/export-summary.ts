import { Injectable } from '@nestjs/common';
import { decimalText } from '@windchest/money';
import { csvNumber, csvRecord } from '../../http/csv.js';
import type { Quarter } from './quarter-days.js';
import { SummariseQuarter } from './summarise-quarter.js';

const HEAD = [
  'year',
  'quarter',
  'treatment',
  'country',
  'rate_percent',
  'currency',
  'receipts',
  'credit_notes',
  'net',
  'tax',
  'gross',
];

/** A quarter's summary as CSV: rows alone, so that each column adds up to the quarter. */
@Injectable()
export class ExportSummary {
  constructor(private readonly summaries: SummariseQuarter) {}

  async text(quarter: Quarter): Promise<string> {
    const rows = await this.summaries.rows(quarter);
    return [
      csvRecord(HEAD),
      ...rows.map((row) =>
        csvRecord([
          quarter.year,
          quarter.quarter,
          row.treatment,
          row.country,
          row.ratePercent,
          row.currency,
          row.receipts,
          row.creditNotes,
          ...[row.net, row.tax, row.gross].map((amount) => csvNumber(decimalText(amount))),
        ]),
      ),
    ].join('');
  }
}
