import mysql from 'mysql2/promise';

export interface TestDatabase {
  readonly name: string;
  readonly environment: Record<string, string>;
  drop(): Promise<void>;
}

/** A database of its own for one spec file, on the server that `npm test` has started. */
export const createTestDatabase = async (): Promise<TestDatabase> => {
  const {
    WINDCHEST_TEST_DB_HOST: host = '127.0.0.1',
    WINDCHEST_TEST_DB_PORT: port,
    WINDCHEST_TEST_DB_USER: user = 'root',
    WINDCHEST_TEST_DB_PASSWORD: password = '',
  } = process.env;
  if (!port)
    throw new Error('WINDCHEST_TEST_DB_PORT is not set: run database specs through `npm test -- db`.');
  const name = `windchest_test_${process.env['JEST_WORKER_ID'] ?? '1'}_${process.pid}_${Math.floor(performance.now())}`;
  const admin = await mysql.createConnection({ host, port: Number(port), user, password });
  await admin.query(`CREATE DATABASE \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
  return {
    name,
    environment: { DB_HOST: host, DB_PORT: port, DB_USER: user, DB_PASSWORD: password, DB_NAME: name },
    drop: async () => {
      await admin.query(`DROP DATABASE \`${name}\``);
      await admin.end();
    },
  };
};
