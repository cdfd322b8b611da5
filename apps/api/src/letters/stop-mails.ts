import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { People } from '../accounts/people.js';
import { LinkTokens } from '../adapters/secrets/link-tokens.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { selectRows } from '../database/rows.js';
import { Transactions } from '../database/transactions.js';
import { RateLimits } from '../http/rate-limits.js';
import { notFound } from '../http/refusal.js';
import { NewsReaders } from './news-readers.js';
import { RevisionWatchers } from './revision-watchers.js';

type Found =
  | { kind: 'news'; id: string; email: string; isStopped: boolean }
  | { kind: 'revisions'; id: string; personId: string; kitId: string; isStopped: boolean };

/** Links that stop mails: whoever has one may stop what it stands for, without signing in (RFC 8058). */
@Injectable()
export class StopMails {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly transactions: Transactions,
    private readonly tokens: LinkTokens,
    private readonly people: People,
    private readonly catalogue: CatalogueReader,
    private readonly news: NewsReaders,
    private readonly watchers: RevisionWatchers,
    private readonly limits: RateLimits,
  ) {}

  async about(token: string, network: string): Promise<Answer<'GET /unsubscribe/:token/about'>> {
    await this.limits.take('token', network);
    const found = await this.find(token);
    if (found.kind === 'news')
      return { kind: 'news', email: found.email, kitName: null, isStopped: found.isStopped };
    const [kit] = await this.catalogue.kitsByIds([found.kitId]);
    return {
      kind: 'revisions',
      email: (await this.people.byId(found.personId))?.email ?? '',
      kitName: kit?.name ?? null,
      isStopped: found.isStopped,
    };
  }

  /** Again and again is the same as once. */
  async stop(token: string): Promise<void> {
    const found = await this.find(token);
    await this.transactions.run((tx) =>
      found.kind === 'news' ? this.news.stop(tx, { id: found.id }) : this.watchers.stop(tx, found.id),
    );
  }

  private async find(token: string): Promise<Found> {
    const hash = this.tokens.hashOf(token);
    const [reader] = await selectRows<{ id: string; email: string; state: string }>(
      this.database,
      'SELECT id, email, state FROM news_readers WHERE stop_hash = :hash',
      { hash },
    );
    if (reader) return { kind: 'news', ...reader, isStopped: reader.state === 'stopped' };
    const [watcher] = await selectRows<{ id: string; personId: string; kitId: string; isOn: number }>(
      this.database,
      'SELECT id, person_id AS personId, kit_id AS kitId, is_on AS isOn FROM revision_watchers WHERE stop_hash = :hash',
      { hash },
    );
    if (!watcher) throw notFound('link');
    return { kind: 'revisions', ...watcher, isStopped: Number(watcher.isOn) === 0 };
  }
}
