import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { TaxTreatment } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../../database/rows.js';
import type { Tx } from '../../database/transactions.js';
import { creditsOfSettled, type Portion, type SettledReceipt } from './add-up-quarter.js';
import { quarterDays, type Quarter } from './quarter-days.js';

/** The tax of a receipt as rows; the amounts are of one rate each. */
const TAX_LINES = `JSON_TABLE(d.tax, '$[*]' COLUMNS (
  country CHAR(2) PATH '$.country', ratePercent VARCHAR(8) PATH '$.ratePercent',
  netMinor BIGINT PATH '$.netMinor', taxMinor BIGINT PATH '$.taxMinor')) t`;
const SUMS = 'COUNT(DISTINCT d.id) AS documents, SUM(t.netMinor) AS netMinor, SUM(t.taxMinor) AS taxMinor';

interface PortionRow {
  treatment: TaxTreatment;
  country: string;
  ratePercent: string;
  currency: string;
  documents: number | string;
  netMinor: number | string;
  taxMinor: number | string;
}

interface CreditRow extends Omit<SettledReceipt, 'creditNotes'> {
  receiptId: string;
  creditMinor: number;
  issuedAt: Date;
}

/** What was issued in a quarter, by rate, ready to be added up. */
@Injectable()
export class QuarterPortions {
  constructor(@InjectConnection() private readonly database: Sequelize) {}

  async of(quarter: Quarter, tx?: Tx): Promise<Portion[]> {
    return [
      ...(await this.written(quarter, 'receipts', 1, tx)),
      ...(await this.written(quarter, 'credit_notes', -1, tx)),
      ...(await this.settledReceipts(quarter, tx)),
      ...(await this.settledCredits(quarter, tx)),
    ];
  }

  private async written(
    quarter: Quarter,
    table: 'receipts' | 'credit_notes',
    sign: 1 | -1,
    tx?: Tx,
  ): Promise<Portion[]> {
    const receipt = table === 'receipts' ? 'd' : 'r';
    const rows = await selectRows<PortionRow>(
      this.database,
      `SELECT ${receipt}.tax_treatment AS treatment, t.country, t.ratePercent, d.currency, ${SUMS}
       FROM ${table} d ${table === 'receipts' ? '' : 'JOIN receipts r ON r.id = d.receipt_id'} JOIN ${TAX_LINES}
       LEFT JOIN tax_settlements s ON s.receipt_id = ${receipt}.id
       WHERE d.issued_at >= :from AND d.issued_at < :until AND d.total_minor > 0 AND s.receipt_id IS NULL
       GROUP BY treatment, t.country, t.ratePercent, d.currency`,
      { ...quarterDays(quarter) },
      tx,
    );
    return rows.map((row) => toPortion(row, sign));
  }

  private async settledReceipts(quarter: Quarter, tx?: Tx): Promise<Portion[]> {
    const rows = await selectRows<PortionRow>(
      this.database,
      `SELECT s.tax_treatment AS treatment, s.country, s.rate_percent AS ratePercent, r.currency, COUNT(*) AS documents,
              SUM(s.net_minor) AS netMinor, SUM(s.tax_minor) AS taxMinor
       FROM tax_settlements s JOIN receipts r ON r.id = s.receipt_id
       WHERE r.issued_at >= :from AND r.issued_at < :until
       GROUP BY treatment, s.country, ratePercent, r.currency`,
      { ...quarterDays(quarter) },
      tx,
    );
    return rows.map((row) => toPortion(row, 1));
  }

  /** All credit notes of settled receipts that have one in this quarter, also the earlier ones: they share the cents. */
  private async settledCredits(quarter: Quarter, tx?: Tx): Promise<Portion[]> {
    const { from, until } = quarterDays(quarter);
    const rows = await selectRows<CreditRow>(
      this.database,
      `SELECT n.receipt_id AS receiptId, s.tax_treatment AS treatment, s.country, s.rate_percent AS ratePercent,
              r.currency, r.total_minor AS totalMinor, n.total_minor AS creditMinor, n.issued_at AS issuedAt
       FROM credit_notes n JOIN tax_settlements s ON s.receipt_id = n.receipt_id JOIN receipts r ON r.id = n.receipt_id
       WHERE n.receipt_id IN (SELECT receipt_id FROM credit_notes WHERE issued_at >= :from AND issued_at < :until)
       ORDER BY n.receipt_id, n.issued_at, n.id`,
      { from, until },
      tx,
    );
    const receipts = new Map<
      string,
      SettledReceipt & { creditNotes: SettledReceipt['creditNotes'][number][] }
    >();
    for (const { receiptId, creditMinor, issuedAt, ...receipt } of rows) {
      const known = receipts.get(receiptId) ?? { ...receipt, creditNotes: [] };
      known.creditNotes.push({
        totalMinor: creditMinor,
        isInQuarter: issuedAt >= from && issuedAt < until,
      });
      receipts.set(receiptId, known);
    }
    return [...receipts.values()].flatMap(creditsOfSettled);
  }
}

const toPortion = ({ documents, netMinor, taxMinor, ...row }: PortionRow, sign: 1 | -1): Portion => ({
  sign,
  ...row,
  documents: Number(documents),
  netMinor: Number(netMinor),
  taxMinor: Number(taxMinor),
});
