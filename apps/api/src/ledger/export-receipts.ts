import { Injectable } from '@nestjs/common';
import { decimalText } from '@windchest/money';
import { csvRecord } from '../http/csv.js';
import { ListReceipts, type ReceiptFilter } from './list-receipts.js';

const HEAD = [
  'number',
  'kind',
  'issued_at',
  'order',
  'email',
  'tax_country',
  'tax_rate_percent',
  'currency',
  'net',
  'tax',
  'gross',
];

/** Receipts and credit notes as CSV, a row for each rate of tax; credit notes below zero, so that columns add up. */
@Injectable()
export class ExportReceipts {
  constructor(private readonly receipts: ListReceipts) {}

  async *lines(filter: ReceiptFilter): AsyncGenerator<string> {
    yield csvRecord(HEAD);
    for await (const row of this.receipts.all(filter)) {
      // A number of our own, so it is handed over as one also where it begins with a minus.
      const amount = (minor: number): number =>
        Number(decimalText({ minor: row.sign * minor + 0, currency: row.currency }));
      for (const { country, ratePercent, netMinor, taxMinor } of row.tax)
        yield csvRecord([
          row.number,
          row.kind,
          row.issuedAt.toISOString(),
          row.orderNumber,
          row.email,
          country,
          ratePercent,
          row.currency,
          amount(netMinor),
          amount(taxMinor),
          amount(netMinor + taxMinor),
        ]);
    }
  }
}
