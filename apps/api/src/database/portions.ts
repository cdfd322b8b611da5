import type { Sequelize } from 'sequelize';
import { selectRows } from './rows.js';

const PORTION = 1000;

/**
 * All rows of a query in portions, so that no length of a table is held in memory: each goes on after the last row of
 * the one before. The query selects `at`, a moment, and `id`, which order the rows; it has no ORDER BY of its own.
 */
export async function* selectPortions<Row extends { at: Date; id: string }>(
  database: Sequelize,
  sql: string,
  values: Record<string, unknown> = {},
): AsyncGenerator<Row> {
  let last: Row | undefined;
  do {
    const rows: Row[] = await selectRows<Row>(
      database,
      `SELECT * FROM (${sql}) kept WHERE :afterAt IS NULL OR at > :afterAt OR (at = :afterAt AND id > :afterId)
       ORDER BY at, id LIMIT ${PORTION}`,
      { ...values, afterAt: last?.at ?? null, afterId: last?.id ?? '' },
    );
    yield* rows;
    last = rows.length === PORTION ? rows.at(-1) : undefined;
  } while (last);
}
