import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import { Op, type WhereOptions } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import type { Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { StaffLogEntry } from './staff-log-entry.model.js';

export interface StaffDeed {
  /** A verb and its object: "released revision". */
  readonly what: string;
  /** What it was done to, as staff would name it: "Curlew Mk 1.4". */
  readonly subject: string;
  readonly before?: unknown;
  readonly after?: unknown;
}

/** Every change by staff: who, what, when, before and after; written in the change's own transaction. */
@Injectable()
export class StaffLog {
  constructor(
    @InjectModel(StaffLogEntry) private readonly entries: typeof StaffLogEntry,
    private readonly clock: Clock,
  ) {}

  async record(tx: Tx, person: SignedIn | null, deed: StaffDeed): Promise<void> {
    await this.entries.create(
      {
        at: this.clock.now(),
        personId: person?.id ?? null,
        who: person ? `${person.name} (${person.role})` : 'the workshop itself',
        what: deed.what,
        subject: deed.subject.slice(0, 200),
        beforeJson: deed.before ?? null,
        afterJson: deed.after ?? null,
      },
      { transaction: tx },
    );
  }

  async list(query: {
    page: number;
    size: number;
    search?: string | undefined;
  }): Promise<Answer<'GET /workshop/log'>> {
    const like = `%${query.search ?? ''}%`;
    const where: WhereOptions = query.search
      ? {
          [Op.or]: [
            { who: { [Op.like]: like } },
            { what: { [Op.like]: like } },
            { subject: { [Op.like]: like } },
          ],
        }
      : {};
    const { rows, count } = await this.entries.findAndCountAll({
      where,
      order: [['id', 'DESC']],
      limit: query.size,
      offset: (query.page - 1) * query.size,
    });
    return {
      items: rows.map((row) => ({
        id: String(row.id),
        at: row.at.toISOString(),
        who: row.who,
        what: row.what,
        subject: row.subject,
        before: row.beforeJson,
        after: row.afterJson,
      })),
      page: query.page,
      size: query.size,
      total: count,
    };
  }
}
