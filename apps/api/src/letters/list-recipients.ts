import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer, Handled } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { selectRows } from '../database/rows.js';
import { csvRecord } from '../http/csv.js';

type Query = Handled<'GET /workshop/letters/:letterId/recipients'>['query'];
type Shown = Answer<'GET /workshop/letters/:letterId/recipients'>['items'][number];
interface Row {
  id: string;
  email: string;
  name: string;
  heldId: string | null;
  state: Shown['state'];
  reason: string | null;
  tries: number;
  sentAt: Date | null;
}

const PORTION = 500;
const HEAD = ['email', 'name', 'held', 'state', 'reason', 'tries', 'sent_at'];

/** What became of each recipient: a page of it for the screen, all of it as CSV. */
@Injectable()
export class ListRecipients {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly catalogue: CatalogueReader,
  ) {}

  async page(letterId: string, query: Query): Promise<Answer<'GET /workshop/letters/:letterId/recipients'>> {
    const [count] = await selectRows<{ total: number | string }>(
      this.database,
      `SELECT COUNT(*) AS total FROM letter_recipients ${WHERE}`,
      valuesFrom(letterId, query),
    );
    const rows = await this.rows(letterId, query, {
      after: '',
      limit: query.size,
      offset: (query.page - 1) * query.size,
    });
    return {
      items: await this.shown(rows),
      page: query.page,
      size: query.size,
      total: Number(count?.total ?? 0),
    };
  }

  async *csv(letterId: string, query: Query): AsyncGenerator<string> {
    yield csvRecord(HEAD);
    for (let after = ''; ;) {
      const rows = await this.rows(letterId, query, { after, limit: PORTION, offset: 0 });
      for (const one of await this.shown(rows))
        yield csvRecord([one.email, one.name, one.held, one.state, one.reason, one.tries, one.sentAt]);
      const last = rows.at(-1);
      if (!last || rows.length < PORTION) return;
      after = last.email;
    }
  }

  private rows(
    letterId: string,
    query: Query,
    window: { after: string; limit: number; offset: number },
  ): Promise<Row[]> {
    return selectRows<Row>(
      this.database,
      `SELECT id, email, name, held_revision_id AS heldId, state, reason, tries, sent_at AS sentAt
       FROM letter_recipients ${WHERE} AND email > :after ORDER BY email LIMIT :limit OFFSET :offset`,
      { ...valuesFrom(letterId, query), ...window },
    );
  }

  private async shown(rows: readonly Row[]): Promise<Shown[]> {
    const held = [...new Set(rows.flatMap(({ heldId }) => heldId ?? []))];
    const labels = new Map(
      (await Promise.all(held.map((id) => this.catalogue.revisionById(id)))).flatMap((one) =>
        one ? [[one.id, one.label]] : [],
      ),
    );
    return rows.map(({ heldId, sentAt, ...row }) => ({
      ...row,
      held: (heldId && labels.get(heldId)) ?? null,
      sentAt: sentAt?.toISOString() ?? null,
    }));
  }
}

const WHERE =
  'WHERE letter_id = :letterId AND (:state IS NULL OR state = :state) AND (:search IS NULL OR email LIKE :search OR name LIKE :search)';
const valuesFrom = (letterId: string, { state, search }: Query): Record<string, unknown> => ({
  letterId,
  state: state ?? null,
  search: search ? `%${search.replace(/[%_\\]/g, '\\$&')}%` : null,
});
