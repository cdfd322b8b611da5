import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled, LeftOutReason, Letter as ShownLetter } from '@windchest/contracts';
import { Op, type Sequelize, type WhereOptions } from 'sequelize';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { selectRows } from '../database/rows.js';
import { notFound } from '../http/refusal.js';
import { LetterMatters } from './letter-matter.js';
import { Letter } from './letter.model.js';

type Counts = ShownLetter['counts'];
const NONE: Counts = { queued: 0, handedOver: 0, sent: 0, refused: 0, bounced: 0, leftOut: 0 };
const COUNT_OF: Record<string, keyof Counts> = {
  queued: 'queued',
  'handed-over': 'handedOver',
  sent: 'sent',
  refused: 'refused',
  bounced: 'bounced',
  'left-out': 'leftOut',
};

/** Letters as the workshop sees them. */
@Injectable()
export class ShowLetters {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Letter) private readonly letters: typeof Letter,
    private readonly catalogue: CatalogueReader,
    private readonly matters: LetterMatters,
  ) {}

  async list({ query }: Handled<'GET /workshop/letters'>): Promise<Answer<'GET /workshop/letters'>> {
    const where: WhereOptions = {
      ...(query.state ? { state: query.state } : {}),
      ...(query.search ? { subject: { [Op.like]: `%${query.search.replace(/[%_\\]/g, '\\$&')}%` } } : {}),
    };
    const { rows, count } = await this.letters.findAndCountAll({
      where,
      order: [
        ['updatedAt', 'DESC'],
        ['id', 'DESC'],
      ],
      limit: query.size,
      offset: (query.page - 1) * query.size,
    });
    const counts = await this.countsOf(rows.map(({ id }) => id));
    const kits = await this.catalogue.kitsByIds(rows.flatMap(({ kitId }) => kitId ?? []));
    return {
      items: rows.map((row) => ({
        id: row.id,
        kind: row.kind,
        subject: row.subject,
        state: row.state,
        kitName: kits.find(({ id }) => id === row.kitId)?.name ?? null,
        sendAt: row.sendAt?.toISOString() ?? null,
        startedAt: row.startedAt?.toISOString() ?? null,
        updatedAt: row.updatedAt.toISOString(),
        counts: counts.get(row.id) ?? NONE,
      })),
      page: query.page,
      size: query.size,
      total: count,
    };
  }

  async one(letterId: string): Promise<ShownLetter> {
    const letter = await this.letters.findByPk(letterId);
    if (!letter) throw notFound('letter');
    const { kit, target } = await this.matters.of(letter);
    const counts = await this.countsOf([letterId]);
    const leftOut = await selectRows<{ reason: LeftOutReason; count: number | string }>(
      this.database,
      `SELECT reason, COUNT(*) AS count FROM letter_recipients WHERE letter_id = :letterId AND state = 'left-out' GROUP BY reason ORDER BY count DESC`,
      { letterId },
    );
    return {
      id: letter.id,
      kind: letter.kind,
      subject: letter.subject,
      body: letter.body,
      kitId: letter.kitId,
      revisionId: letter.revisionId,
      audience: letter.audience,
      leavesOutUnneeded: letter.leavesOutUnneeded,
      perMinute: letter.perMinute,
      state: letter.state,
      slug: letter.slug,
      kitName: kit?.name ?? null,
      kitSlug: kit?.slug ?? null,
      revisionLabel: target?.label ?? null,
      sendAt: letter.sendAt?.toISOString() ?? null,
      startedAt: letter.startedAt?.toISOString() ?? null,
      finishedAt: letter.finishedAt?.toISOString() ?? null,
      updatedAt: letter.updatedAt.toISOString(),
      counts: counts.get(letterId) ?? NONE,
      leftOut: leftOut.map(({ reason, count }) => ({ reason, count: Number(count) })),
    };
  }

  /** Letters that are going out or stand still half way. */
  async underWay(): Promise<{ id: string; subject: string }[]> {
    const rows = await this.letters.findAll({
      where: { state: ['sending', 'paused'] },
      order: [['startedAt', 'ASC']],
      limit: 5,
    });
    return rows.map(({ id, subject }) => ({ id, subject }));
  }

  private async countsOf(ids: readonly string[]): Promise<Map<string, Counts>> {
    const all = new Map<string, Counts>();
    if (ids.length === 0) return all;
    const rows = await selectRows<{ letterId: string; state: string; count: number | string }>(
      this.database,
      'SELECT letter_id AS letterId, state, COUNT(*) AS count FROM letter_recipients WHERE letter_id IN (:ids) GROUP BY letter_id, state',
      { ids },
    );
    for (const { letterId, state, count } of rows) {
      const counts = all.get(letterId) ?? { ...NONE };
      counts[COUNT_OF[state]!] = Number(count);
      all.set(letterId, counts);
    }
    return all;
  }
}
