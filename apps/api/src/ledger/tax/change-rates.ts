import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer, Handled, ProductKind } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { StaffLog } from '../../accounts/staff-log.js';
import { Clock } from '../../adapters/clock/clock.js';
import { selectRows, touchRows } from '../../database/rows.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import type { SignedIn } from '../../http/person.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { rateText } from '../rate-text.js';

interface Place {
  readonly country: string;
  readonly kind: ProductKind;
  readonly validFrom: string;
}

interface ChangeRow extends Place {
  id: number | string;
  at: Date;
  who: string;
  before: string | number | null;
  after: string | number | null;
  source: string;
  found: number | string;
}

/**
 * Entering and taking back rates. Every change is kept with what stood there before. Receipts carry the rate they
 * were written with, so no change of a rate changes a receipt.
 */
@Injectable()
export class ChangeRates {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly transactions: Transactions,
    private readonly staffLog: StaffLog,
    private readonly clock: Clock,
  ) {}

  async enter(body: Handled<'POST /workshop/ledger/rates'>['body'], person: SignedIn): Promise<void> {
    const after = rateText(body.ratePercent);
    await this.transactions.run(async (tx) => {
      const standing = await this.standing(tx, body);
      const before = standing?.rate ?? null;
      if (before === after && standing?.source === body.source) return;
      await touchRows(
        this.database,
        `INSERT INTO tax_rates (country, product_kind, valid_from, rate_percent, source)
         VALUES (:country, :kind, :validFrom, :after, :source)
         ON DUPLICATE KEY UPDATE rate_percent = :after, source = :source`,
        { ...body, after },
        tx,
      );
      await this.note(tx, person, body, { before, after, source: body.source });
    }, 'read-committed');
  }

  async takeBack(place: Place, person: SignedIn): Promise<void> {
    await this.transactions.run(async (tx) => {
      const standing = await this.standing(tx, place);
      if (!standing) throw notFound('rate');
      if (place.validFrom <= this.clock.now().toISOString().slice(0, 10))
        throw new Refusal(
          'conflict',
          'This rate holds already, and receipts may have been written with it. Enter the right rate from the day on which it holds.',
        );
      await touchRows(
        this.database,
        'DELETE FROM tax_rates WHERE country = :country AND product_kind = :kind AND valid_from = :validFrom',
        { ...place },
        tx,
      );
      await this.note(tx, person, place, { before: standing.rate, after: null, source: '' });
    }, 'read-committed');
  }

  async changes({
    country,
    page,
    size,
  }: Handled<'GET /workshop/ledger/rates/changes'>['query']): Promise<
    Answer<'GET /workshop/ledger/rates/changes'>
  > {
    const rows = await selectRows<ChangeRow>(
      this.database,
      `SELECT id, at, who, country, product_kind AS kind, DATE_FORMAT(valid_from, '%Y-%m-%d') AS validFrom,
              rate_before AS \`before\`, rate_after AS \`after\`, source, COUNT(*) OVER () AS found
       FROM tax_rate_changes WHERE (:country IS NULL OR country = :country)
       ORDER BY id DESC LIMIT :limit OFFSET :offset`,
      { country: country ?? null, limit: size, offset: (page - 1) * size },
    );
    return {
      items: rows.map(({ found: _, id, at, before, after, ...row }) => ({
        ...row,
        id: String(id),
        at: at.toISOString(),
        before: before === null ? null : rateText(before),
        after: after === null ? null : rateText(after),
      })),
      page,
      size,
      total: Number(rows[0]?.found ?? 0),
    };
  }

  private async standing(
    tx: Tx,
    { country, kind, validFrom }: Place,
  ): Promise<{ rate: string; source: string } | null> {
    const [row] = await selectRows<{ rate: string | number; source: string }>(
      this.database,
      `SELECT rate_percent AS rate, source FROM tax_rates
       WHERE country = :country AND product_kind = :kind AND valid_from = :validFrom FOR UPDATE`,
      { country, kind, validFrom },
      tx,
    );
    return row ? { rate: rateText(row.rate), source: row.source } : null;
  }

  private async note(
    tx: Tx,
    person: SignedIn,
    { country, kind, validFrom }: Place,
    { before, after, source }: { before: string | null; after: string | null; source: string },
  ): Promise<void> {
    await touchRows(
      this.database,
      `INSERT INTO tax_rate_changes (country, product_kind, valid_from, rate_before, rate_after, source, who, at)
       VALUES (:country, :kind, :validFrom, :before, :after, :source, :who, :now)`,
      {
        country,
        kind,
        validFrom,
        before,
        after,
        source,
        who: `${person.name} (${person.role})`,
        now: this.clock.now(),
      },
      tx,
    );
    await this.staffLog.record(tx, person, {
      what: after === null ? 'took back a tax rate' : 'entered a tax rate',
      subject: `${country} from ${validFrom}`,
      before: before === null ? null : { ratePercent: before },
      after: after === null ? null : { ratePercent: after, source },
    });
  }
}
