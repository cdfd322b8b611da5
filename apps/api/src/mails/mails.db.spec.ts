import { selectRows, touchRows } from '../database/rows.js';
import { Transactions } from '../database/transactions.js';
import { MailRefused } from '../adapters/mailer/mailer.js';
import { startTestApp, type TestApp } from '../testing/test-app.js';
import { MailOutbox } from './mail-outbox.js';

describe('the outbox of e-mails', () => {
  let shop: TestApp;
  beforeAll(async () => (shop = await startTestApp()));
  afterAll(() => shop.stop());
  beforeEach(async () => {
    shop.mailer.sent.length = 0;
    await shop.database.query('DELETE FROM jobs');
    await shop.database.query('DELETE FROM mails');
  });

  const add = (key: string) =>
    shop.app.get(Transactions, { strict: false }).run((tx) =>
      shop.app.get(MailOutbox, { strict: false }).add(tx, {
        to: 'wren@mail.example',
        key,
        message: { template: 'sign-in-link', link: 'http://127.0.0.1/x', minutes: 20 },
      }),
    );
  const states = async () =>
    (await selectRows<{ state: string }>(shop.database, 'SELECT state FROM mails')).map((row) => row.state);

  it('sends one mail for one key, under one message id', async () => {
    await add('one');
    await add('one');
    await shop.drain();
    expect(shop.mailer.sent).toHaveLength(1);
    expect(shop.mailer.sent[0]?.messageId).toMatch(/^<[0-9a-f-]{36}@127\.0\.0\.1>$/);
    expect(await states()).toEqual(['sent']);
  });

  it('does not send again what was handed over before the process died', async () => {
    await add('one');
    await touchRows(shop.database, `UPDATE mails SET state = 'handed-over'`);
    await shop.drain();
    expect(shop.mailer.sent).toHaveLength(0);
    expect(await states()).toEqual(['sent']);
  });

  it('sends again what the server did not take', async () => {
    await add('one');
    const send = shop.mailer.send.bind(shop.mailer);
    shop.mailer.send = async (_, steps) => {
      await steps.beforeLastLine();
      throw new Error('connection closed');
    };
    await shop.drain();
    expect(await states()).toEqual(['queued']);
    shop.mailer.send = send;
    shop.clock.advance(5);
    await shop.drain();
    expect(shop.mailer.sent).toHaveLength(1);
  });

  it('gives up on an address that the server refuses for good, and keeps the reason', async () => {
    await add('one');
    const send = shop.mailer.send.bind(shop.mailer);
    shop.mailer.send = () => Promise.reject(new MailRefused('550 no such mailbox'));
    await shop.drain();
    shop.mailer.send = send;
    expect(await selectRows(shop.database, 'SELECT state, last_error AS fault FROM mails')).toEqual([
      { state: 'refused', fault: '550 no such mailbox' },
    ]);
  });
});
