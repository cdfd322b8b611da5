import { startTestApp, type TestApp } from '../testing/test-app.js';
import { selectRows, touchRows } from './rows.js';

describe('written queries', () => {
  let shop: TestApp;
  beforeAll(async () => {
    shop = await startTestApp();
    await shop.database.query('CREATE TABLE things (id INT PRIMARY KEY, at DATETIME(6), n INT)');
  });
  afterAll(() => shop.stop());
  const insert = 'INSERT INTO things (id, at, n) VALUES (:id, :at, 0) ON DUPLICATE KEY UPDATE id = id';

  it('keep the milliseconds of a moment', async () => {
    const at = new Date('2026-12-01T10:20:30.456Z');
    await touchRows(shop.database, insert, { id: 1, at });
    expect(await selectRows(shop.database, 'SELECT at FROM things WHERE at = :at', { at })).toEqual([{ at }]);
  });

  it('count the rows they change and no others', async () => {
    expect(await touchRows(shop.database, insert, { id: 2, at: null })).toBe(1);
    expect(await touchRows(shop.database, insert, { id: 2, at: null })).toBe(0);
    expect(await touchRows(shop.database, 'UPDATE things SET n = 5 WHERE id = 2')).toBe(1);
    expect(await touchRows(shop.database, 'UPDATE things SET n = 5 WHERE id = 2')).toBe(0);
    expect(await touchRows(shop.database, 'DELETE FROM things WHERE id = 9')).toBe(0);
  });
});
