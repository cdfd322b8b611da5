import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { LinkTokens, tokenPlaceholder } from '../adapters/secrets/link-tokens.js';
import { InjectConfig, type Config } from '../config/config.js';
import { newId } from '../database/columns.js';
import { selectRows, touchRows } from '../database/rows.js';
import { Transactions, type Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { RateLimits } from '../http/rate-limits.js';
import { Refusal } from '../http/refusal.js';
import { MailOutbox } from '../mails/mail-outbox.js';

const CONFIRM_DAYS = 7;
interface Row {
  id: string;
  email: string;
  state: 'asked' | 'confirmed' | 'stopped';
  confirmUntil: Date | null;
}
const COLUMNS = 'id, email, state, confirm_until AS confirmUntil';

/**
 * Who wants news. An address typed by anybody counts only once its owner pressed the mailed link; somebody
 * signed in with a verified address has shown both already.
 */
@Injectable()
export class NewsReaders {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    private readonly transactions: Transactions,
    private readonly tokens: LinkTokens,
    private readonly mails: MailOutbox,
    private readonly limits: RateLimits,
    private readonly clock: Clock,
  ) {}

  /** Answers alike whether or not the address gets news already; one that does is mailed nothing. */
  async ask(email: string, network: string): Promise<void> {
    await this.limits.take('mailed-link', email);
    await this.limits.take('mailed-link-network', network);
    await this.transactions.run((tx) => this.mailConfirmation(tx, email));
  }

  async confirm(token: string, network: string): Promise<{ email: string }> {
    await this.limits.take('token', network);
    return this.transactions.run(async (tx) => {
      const [found] = await selectRows<Row>(
        this.database,
        `SELECT ${COLUMNS} FROM news_readers WHERE confirm_hash = :hash FOR UPDATE`,
        { hash: this.tokens.hashOf(token) },
        tx,
      );
      if (!found) throw new Refusal('not-found', 'This link is not one of ours. Ask for the news again.');
      if (found.state === 'confirmed') return { email: found.email };
      if (found.state === 'stopped')
        throw new Refusal(
          'link-is-used-up',
          'The news were stopped after this link was sent. Ask for them again.',
        );
      if (!found.confirmUntil || found.confirmUntil <= this.clock.now())
        throw new Refusal('link-has-expired', 'This link has expired. Ask for the news again.');
      await this.setConfirmed(tx, found.id);
      return { email: found.email };
    });
  }

  async stateOf(person: SignedIn): Promise<Answer<'GET /account/news'>> {
    const [found] = await selectRows<Row>(
      this.database,
      `SELECT ${COLUMNS} FROM news_readers WHERE email = :email`,
      { email: person.email },
    );
    return { state: found?.state ?? 'none' };
  }

  async setWanted(person: SignedIn, isWanted: boolean): Promise<Answer<'GET /account/news'>> {
    if (isWanted && !person.isVerified) await this.limits.take('mailed-link', person.email);
    await this.transactions.run(async (tx) => {
      if (!isWanted) return this.stop(tx, { email: person.email });
      if (!person.isVerified) return this.mailConfirmation(tx, person.email);
      await this.setConfirmed(tx, await this.rowFor(tx, person.email));
    });
    return this.stateOf(person);
  }

  async stop(tx: Tx, by: { email: string } | { id: string }): Promise<void> {
    await touchRows(
      this.database,
      `UPDATE news_readers SET state = 'stopped', stopped_at = :now WHERE ${'id' in by ? 'id = :id' : 'email = :email'} AND state <> 'stopped'`,
      { ...by, now: this.clock.now() },
      tx,
    );
  }

  private async mailConfirmation(tx: Tx, email: string): Promise<void> {
    const rowId = await this.rowFor(tx, email);
    const [row] = await selectRows<Row>(
      this.database,
      `SELECT ${COLUMNS} FROM news_readers WHERE id = :rowId FOR UPDATE`,
      { rowId },
      tx,
    );
    if (row?.state === 'confirmed') return;
    const linkId = newId();
    await touchRows(
      this.database,
      `UPDATE news_readers SET state = 'asked', asked_at = :now, confirm_hash = :hash, confirm_until = :until WHERE id = :rowId`,
      {
        rowId,
        now: this.clock.now(),
        hash: this.tokens.hashOf(this.tokens.tokenOf('confirm-news', linkId)),
        until: this.clock.in(CONFIRM_DAYS * 86_400),
      },
      tx,
    );
    await this.mails.add(tx, {
      to: email,
      message: {
        template: 'confirm-news',
        link: `${this.config.BASE_URL}/news/confirm#token=${tokenPlaceholder('confirm-news', linkId)}`,
        days: CONFIRM_DAYS,
      },
      key: `confirm-news:${linkId}`,
    });
  }

  private async setConfirmed(tx: Tx, id: string): Promise<void> {
    await touchRows(
      this.database,
      `UPDATE news_readers SET state = 'confirmed', confirmed_at = :now, stopped_at = NULL WHERE id = :id`,
      { id, now: this.clock.now() },
      tx,
    );
  }

  private async rowFor(tx: Tx, email: string): Promise<string> {
    const id = newId();
    await touchRows(
      this.database,
      `INSERT INTO news_readers (id, email, state, stop_hash, asked_at) VALUES (:id, :email, 'asked', :stopHash, :now)
       ON DUPLICATE KEY UPDATE id = id`,
      {
        id,
        email,
        stopHash: this.tokens.hashOf(this.tokens.tokenOf('stop-news', id)),
        now: this.clock.now(),
      },
      tx,
    );
    const [row] = await selectRows<{ id: string }>(
      this.database,
      'SELECT id FROM news_readers WHERE email = :email FOR UPDATE',
      { email },
      tx,
    );
    return row!.id;
  }
}
