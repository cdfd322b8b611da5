import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Clearance, PrinterCard } from '@windchest/contracts';
import type { Tx } from '../../database/transactions.js';
import { PrinterCardRecord } from './printer-card.model.js';

export const toCard = (record: PrinterCardRecord): PrinterCard => ({
  id: record.id,
  name: record.name,
  bed: { xMm: record.bedXMm, yMm: record.bedYMm, zMm: record.bedZMm },
  nozzleMm: record.nozzleMm,
  materials: record.materials,
  clearance: record.clearance,
  isMain: record.isMain,
});

/** People's printers, to read: by themselves, and by rooms that plan prints for them. */
@Injectable()
export class PrinterCards {
  constructor(@InjectModel(PrinterCardRecord) private readonly cards: typeof PrinterCardRecord) {}

  /** A person's cards, the main one first, then the oldest. */
  async listOf(personId: string, tx?: Tx): Promise<PrinterCard[]> {
    const records = await this.cards.findAll({
      where: { personId },
      order: [
        ['isMain', 'DESC'],
        ['createdAt', 'ASC'],
        ['id', 'ASC'],
      ],
      transaction: tx ?? null,
    });
    return records.map(toCard);
  }

  /** The clearance each prints in on their main printer; nothing for who has not said. */
  async habitsOf(personIds: readonly string[]): Promise<Map<string, Clearance>> {
    if (personIds.length === 0) return new Map();
    const records = await this.cards.findAll({
      attributes: ['personId', 'clearance'],
      where: { personId: [...personIds], isMain: true },
    });
    return new Map(records.flatMap(({ personId, clearance }) => (clearance ? [[personId, clearance]] : [])));
  }

  /** The printer a person mostly prints on; null where they have written none down. */
  async mainOf(personId: string, tx?: Tx): Promise<PrinterCard | null> {
    const record = await this.cards.findOne({ where: { personId, isMain: true }, transaction: tx ?? null });
    return record && toCard(record);
  }
}
