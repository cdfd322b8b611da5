import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import { mostPrinterCards, type Handled, type PrinterCard } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { newId } from '../../database/columns.js';
import { selectRows, touchRows } from '../../database/rows.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import { notFound, Refusal } from '../../http/refusal.js';
import { PrinterCardRecord } from './printer-card.model.js';
import { toCard } from './printer-cards.js';

type Body = Handled<'POST /account/printers'>['body'];

const toColumns = ({ bed, isMain: _, ...rest }: Body): Partial<PrinterCardRecord> => ({
  ...rest,
  bedXMm: bed.xMm,
  bedYMm: bed.yMm,
  bedZMm: bed.zMm,
});

/** Keeps, changes and throws away one's own printer cards, so that exactly one of them is the main one. */
@Injectable()
export class ChangePrinterCards {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(PrinterCardRecord) private readonly cards: typeof PrinterCardRecord,
    private readonly transactions: Transactions,
    private readonly clock: Clock,
  ) {}

  add(personId: string, body: Body): Promise<PrinterCard> {
    return this.transactions.run(async (tx) => {
      await this.holdCardsOf(personId, tx);
      const count = await this.cards.count({ where: { personId }, transaction: tx });
      if (count >= mostPrinterCards)
        throw new Refusal(
          'conflict',
          `An account keeps ${mostPrinterCards} printers at most. Throw one away first, or change one.`,
        );
      const isMain = body.isMain || count === 0;
      if (isMain) await this.endMain(personId, tx);
      const now = this.clock.now();
      const record = await this.cards.create(
        { ...toColumns(body), id: newId(), personId, isMain, createdAt: now, updatedAt: now },
        { transaction: tx },
      );
      return toCard(record);
    });
  }

  change(personId: string, id: string, body: Body): Promise<PrinterCard> {
    return this.transactions.run(async (tx) => {
      await this.holdCardsOf(personId, tx);
      const record = await this.own(personId, id, tx);
      if (record.isMain && !body.isMain)
        throw new Refusal('validation-failed', 'One printer is the main one.', {
          fields: { isMain: 'One printer is the main one. Make another one the main printer instead.' },
        });
      if (body.isMain && !record.isMain) await this.endMain(personId, tx);
      await record.update(
        { ...toColumns(body), isMain: body.isMain, updatedAt: this.clock.now() },
        { transaction: tx },
      );
      return toCard(record);
    });
  }

  remove(personId: string, id: string): Promise<void> {
    return this.transactions.run(async (tx) => {
      await this.holdCardsOf(personId, tx);
      const record = await this.own(personId, id, tx);
      await record.destroy({ transaction: tx });
      if (!record.isMain) return;
      await touchRows(
        this.database,
        `UPDATE printer_cards SET is_main = TRUE, updated_at = :now
         WHERE person_id = :personId ORDER BY created_at, id LIMIT 1`,
        { personId, now: this.clock.now() },
        tx,
      );
    });
  }

  /** Two requests of one person take turns, so that neither limit nor main card is decided twice. */
  private async holdCardsOf(personId: string, tx: Tx): Promise<void> {
    await selectRows(
      this.database,
      'SELECT id FROM people WHERE id = :personId FOR UPDATE',
      { personId },
      tx,
    );
  }

  private async own(personId: string, id: string, tx: Tx): Promise<PrinterCardRecord> {
    const record = await this.cards.findOne({ where: { id, personId }, transaction: tx });
    if (!record) throw notFound('printer card');
    return record;
  }

  private async endMain(personId: string, tx: Tx): Promise<void> {
    await this.cards.update({ isMain: false }, { where: { personId, isMain: true }, transaction: tx });
  }
}
