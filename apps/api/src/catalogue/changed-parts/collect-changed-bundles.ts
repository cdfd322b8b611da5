import { Injectable } from '@nestjs/common';
import { Cron, CronExpression } from '@nestjs/schedule';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../../adapters/clock/clock.js';
import { keyOf, Storage } from '../../adapters/storage/storage.js';
import { selectRows, touchRows } from '../../database/rows.js';
import { Transactions } from '../../database/transactions.js';

const UNUSED_DAYS = 30;

/** Throws bundles of changed parts away that nobody has asked for in a month; asked for again they are built again. */
@Injectable()
export class CollectChangedBundles {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly transactions: Transactions,
    private readonly storage: Storage,
    private readonly clock: Clock,
  ) {}

  /** @returns how many went */
  @Cron(CronExpression.EVERY_DAY_AT_3AM)
  async collect(): Promise<number> {
    const cut = this.clock.in(-UNUSED_DAYS * 86_400);
    const rows = await selectRows<{ need_hash: string; sha256: string | null }>(
      this.database,
      'SELECT need_hash, sha256 FROM changed_bundles WHERE used_at < :cut ORDER BY used_at LIMIT 1000',
      { cut },
    );
    let gone = 0;
    for (const { need_hash: needHash, sha256 } of rows) gone += await this.remove(needHash, sha256, cut);
    return gone;
  }

  /** The row's lock keeps whoever asks for it anew waiting until its file is gone too. */
  private remove(needHash: string, sha256: string | null, cut: Date): Promise<number> {
    return this.transactions.run(async (tx) => {
      const gone = await touchRows(
        this.database,
        'DELETE FROM changed_bundles WHERE need_hash = :needHash AND used_at < :cut',
        { needHash, cut },
        tx,
      );
      if (gone === 0 || sha256 === null) return gone;
      const others = await selectRows<object>(
        this.database,
        `SELECT 1 FROM changed_bundles WHERE sha256 = :sha256 UNION ALL SELECT 1 FROM revisions WHERE bundle_sha256 = :sha256
         UNION ALL SELECT 1 FROM revision_bundles WHERE sha256 = :sha256`,
        { sha256 },
        tx,
      );
      if (others.length === 0) await this.storage.delete(keyOf('bundles', sha256));
      return gone;
    });
  }
}
