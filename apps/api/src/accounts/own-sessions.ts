import { createHash } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import { Op } from 'sequelize';
import type { Tx } from '../database/transactions.js';
import { SessionRecord } from './session.model.js';

/** A person's own open sessions. The store's ids are secrets and are shown only as a short hash. */
@Injectable()
export class OwnSessions {
  constructor(@InjectModel(SessionRecord) private readonly sessions: typeof SessionRecord) {}

  async list(personId: string, thisSid: string): Promise<Answer<'GET /account/sessions'>> {
    const rows = await this.sessions.findAll({
      where: { personId },
      order: [['updatedAt', 'DESC']],
      limit: 100,
    });
    return rows.map((row) => ({
      id: createHash('sha256').update(row.sid).digest('hex').slice(0, 16),
      startedAt: row.createdAt.toISOString(),
      lastSeenAt: row.updatedAt.toISOString(),
      userAgent: (JSON.parse(row.data ?? '{}') as { userAgent?: string }).userAgent ?? '',
      isThis: row.sid === thisSid,
    }));
  }

  async endOthers(personId: string, keepSid: string | null, tx?: Tx): Promise<void> {
    await this.sessions.destroy({
      where: { personId, ...(keepSid ? { sid: { [Op.ne]: keepSid } } : {}) },
      transaction: tx ?? null,
    });
  }
}
