import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { QuarterSummary } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { selectRows } from '../../database/rows.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { Refusal } from '../../http/refusal.js';
import { isQuarterOver, quarterDays, quarterName, quarterOf, type Quarter } from './quarter-days.js';
import { SummariseQuarter } from './summarise-quarter.js';
import { TaxQuarters } from './tax-quarters.js';

/** Closes a quarter: its figures are kept as they are now, and no receipt of it can be settled elsewhere any more. */
@Injectable()
export class CloseQuarter {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly transactions: Transactions,
    private readonly quarters: TaxQuarters,
    private readonly summaries: SummariseQuarter,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async close(quarter: Quarter, person: SignedIn): Promise<QuarterSummary> {
    const name = quarterName(quarter);
    if (!isQuarterOver(quarter, this.clock.now()))
      throw new Refusal('conflict', `${name} is not over. Close it an hour after its last day, in UTC.`);
    await this.transactions.run(async (tx) => {
      await this.quarters.lockOpen(tx, quarter);
      const unclear = await this.summaries.countUnclear(quarter, tx);
      if (unclear > 0)
        throw new Refusal(
          'conflict',
          `${unclear} ${unclear === 1 ? 'receipt' : 'receipts'} of ${name} ${unclear === 1 ? 'has' : 'have'} no clear country. Settle ${unclear === 1 ? 'it' : 'them'} first.`,
        );
      const earlier = await this.openBefore(tx, quarter);
      if (earlier)
        throw new Refusal('conflict', `Close ${quarterName(earlier)} first: it comes before ${name}.`);
      const rows = await this.summaries.rows(quarter, tx);
      await this.quarters.close(tx, quarter, `${person.name} (${person.role})`, this.clock.now(), rows);
      await this.staffLog.record(tx, person, { what: 'closed a quarter', subject: name, after: rows });
    }, 'read-committed');
    return this.summaries.summarise(quarter);
  }

  /** The first quarter with receipts before this one that is still open. */
  private async openBefore(tx: Tx, quarter: Quarter): Promise<Quarter | null> {
    const [row] = await selectRows<{ at: Date | null }>(
      this.database,
      `SELECT MIN(r.issued_at) AS at FROM receipts r
       LEFT JOIN tax_quarters q ON q.year = YEAR(r.issued_at) AND q.quarter = QUARTER(r.issued_at)
       WHERE r.issued_at < :from AND r.total_minor > 0 AND q.closed_at IS NULL`,
      { from: quarterDays(quarter).from },
      tx,
    );
    return row?.at ? quarterOf(row.at) : null;
  }
}
