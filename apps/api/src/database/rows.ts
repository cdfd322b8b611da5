import { QueryTypes, type Sequelize, type Transaction } from 'sequelize';

type Values = Record<string, unknown>;

/** Rows of a written query; on hot paths a written join is many times faster than `findAll` with `include`. */
export const selectRows = <Row extends object>(
  database: Sequelize,
  sql: string,
  values: Values = {},
  transaction?: Transaction,
): Promise<Row[]> =>
  database.query<Row>(sql, {
    type: QueryTypes.SELECT,
    replacements: values,
    transaction: transaction ?? null,
  });

/** Runs a conditional UPDATE, DELETE or INSERT IGNORE; answers how many rows it touched. */
export const touchRows = async (
  database: Sequelize,
  sql: string,
  values: Values = {},
  transaction?: Transaction,
): Promise<number> => {
  const [header] = await database.query(sql, {
    type: QueryTypes.RAW,
    replacements: values,
    transaction: transaction ?? null,
  });
  return (header as unknown as { affectedRows: number }).affectedRows;
};
