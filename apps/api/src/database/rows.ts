import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';

type Values = Record<string, unknown>;

/** Sequelize writes a replaced Date without its milliseconds; here they stay. */
const withMilliseconds = (values: Values): Values =>
  Object.fromEntries(
    Object.entries(values).map(([name, value]) => [
      name,
      value instanceof Date ? value.toISOString().replace('T', ' ').replace('Z', '') : value,
    ]),
  );

/** Rows of a written query; on hot paths a written join is many times faster than `findAll` with `include`. */
export const selectRows = <Row extends object>(
  database: Sequelize,
  sql: string,
  values: Values = {},
  transaction?: Transaction,
): Promise<Row[]> =>
  database.query<Row>(sql, {
    type: QueryTypes.SELECT,
    replacements: withMilliseconds(values),
    transaction: transaction ?? null,
  });

/**
 * Runs a conditional UPDATE, DELETE or INSERT; answers how many rows it changed. A row set to what it
 * was before does not count, nor does `ON DUPLICATE KEY UPDATE id = id` on a row that was there.
 */
export const touchRows = async (
  database: Sequelize,
  sql: string,
  values: Values = {},
  transaction?: Transaction,
): Promise<number> => {
  const [header, count] = (await database.query(sql, {
    type: QueryTypes.RAW,
    replacements: withMilliseconds(values),
    transaction: transaction ?? null,
  })) as [unknown, unknown];
  return typeof count === 'number' ? count : (header as { affectedRows: number }).affectedRows;
};
