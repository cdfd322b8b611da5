import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { AudienceAnswer, Handled, LeftOutReason, LetterBody } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { selectRows } from '../database/rows.js';
import type { SqlPart } from '../database/sql-part.js';
import type { Tx } from '../database/transactions.js';
import { AudienceQuery } from './audience-query.js';
import { LetterMatters, type LetterMatter } from './letter-matter.js';
import { ReprintBooks } from './reprint-book.js';

export interface Reader {
  readonly reader: string;
  readonly personId: string | null;
  readonly email: string;
  readonly name: string;
  readonly heldId: string | null;
  readonly orderId: string | null;
  readonly leftOut: LeftOutReason | null;
}
type Concerned = Pick<LetterBody, 'kind' | 'kitId' | 'revisionId' | 'audience' | 'leavesOutUnneeded'>;

const COLUMNS =
  'a.reader, a.person_id AS personId, a.email, a.name, a.held AS heldId, a.order_id AS orderId, a.left_out AS leftOut';

/** Whom a letter concerns: how many, who, and who is left out and why. */
@Injectable()
export class Audience {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly query: AudienceQuery,
    private readonly matters: LetterMatters,
    private readonly books: ReprintBooks,
  ) {}

  async show({ body }: Handled<'POST /workshop/letters/audience'>): Promise<AudienceAnswer> {
    const { letter, show, page, size } = body;
    const matter = await this.matters.of(letter);
    const part = await this.query.of(letter, matter);
    const counts = await selectRows<{ leftOut: LeftOutReason | null; count: number | string }>(
      this.database,
      `SELECT a.left_out AS leftOut, COUNT(*) AS count FROM (${part.sql}) a GROUP BY a.left_out ORDER BY count DESC`,
      part.values,
    );
    const which = show === 'readers' ? 'IS NULL' : 'IS NOT NULL';
    const rows = await selectRows<Reader>(
      this.database,
      `SELECT ${COLUMNS} FROM (${part.sql}) a WHERE a.left_out ${which} ORDER BY a.email, a.reader LIMIT :limit OFFSET :offset`,
      { ...part.values, limit: size, offset: (page - 1) * size },
    );
    const book = matter.target && this.books.open(matter.target.id);
    const leftOut = counts.flatMap(({ leftOut: reason, count }) =>
      reason ? [{ reason, count: Number(count) }] : [],
    );
    const total = Number(counts.find((one) => one.leftOut === null)?.count ?? 0);
    return {
      size: total,
      leftOut,
      readers: {
        items: await Promise.all(
          rows.map(async ({ reader, personId, email, name, heldId, leftOut: reason }) => ({
            reader,
            email,
            name,
            held: labelOf(matter, heldId),
            leftOut: reason,
            pieces: book && sumOf((await book.listOf({ personId, heldId })).map(({ quantity }) => quantity)),
          })),
        ),
        page,
        size,
        total: show === 'readers' ? total : sumOf(leftOut.map(({ count }) => count)),
      },
    };
  }

  /** The next readers after one, in the order of `reader`: for freezing them portion by portion. */
  async portion(part: SqlPart, after: string, limit: number, tx: Tx): Promise<Reader[]> {
    return selectRows<Reader>(
      this.database,
      `SELECT ${COLUMNS} FROM (${part.sql}) a WHERE a.reader > :after ORDER BY a.reader LIMIT :limit`,
      { ...part.values, after, limit },
      tx,
    );
  }

  partOf(letter: Concerned, matter: LetterMatter): Promise<SqlPart> {
    return this.query.of(letter, matter);
  }

  /** A certain reader, or else the first one who gets the letter. */
  async one(letter: Concerned, matter: LetterMatter, reader: string | undefined): Promise<Reader | null> {
    const part = await this.query.of(letter, matter);
    const [found] = await selectRows<Reader>(
      this.database,
      `SELECT ${COLUMNS} FROM (${part.sql}) a WHERE ${reader ? 'a.reader = :reader' : 'a.left_out IS NULL'} ORDER BY a.email, a.reader LIMIT 1`,
      { ...part.values, reader },
    );
    return found ?? null;
  }
}

export const labelOf = ({ revisions }: LetterMatter, revisionId: string | null): string | null =>
  revisions.find(({ id }) => id === revisionId)?.label ?? null;

const sumOf = (numbers: readonly number[]): number => numbers.reduce((all, one) => all + one, 0);
