import type { QueryInterface } from 'sequelize';

/** A migration's step: its statements run one after the other. DDL commits by itself in MariaDB. */
export const inOrder =
  (...statements: string[]) =>
  async (database: QueryInterface): Promise<void> => {
    for (const statement of statements) await database.sequelize.query(statement);
  };
