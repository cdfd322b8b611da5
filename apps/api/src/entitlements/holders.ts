import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Answer, Handled } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { selectRows } from '../database/rows.js';
import type { EntitlementSource, EntitlementState } from './entitlement.model.js';

interface Row {
  email: string;
  kitId: string;
  source: EntitlementSource;
  state: EntitlementState;
  since: Date;
  heldRevisionId: string | null;
  downloads: number;
  total: number;
}

/** For the workshop: who is entitled to what, and the revision they hold. */
@Injectable()
export class Holders {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly catalogue: CatalogueReader,
  ) {}

  async list({ query }: Handled<'GET /workshop/holders'>): Promise<Answer<'GET /workshop/holders'>> {
    const rows = await selectRows<Row>(
      this.database,
      `SELECT e.email, e.kit_id AS kitId, e.source, e.state, e.created_at AS since, e.held_revision_id AS heldRevisionId,
              (SELECT COUNT(*) FROM downloads d WHERE d.entitlement_id = e.id AND d.completed_at IS NOT NULL) AS downloads,
              COUNT(*) OVER () AS total
       FROM entitlements e
       WHERE (:kitId IS NULL OR e.kit_id = :kitId) AND (:search IS NULL OR e.email LIKE :search)
       ORDER BY e.created_at DESC, e.id DESC LIMIT :limit OFFSET :offset`,
      {
        kitId: query.kitId ?? null,
        search: query.search ? `%${query.search.replace(/[%_\\]/g, '\\$&')}%` : null,
        limit: query.size,
        offset: (query.page - 1) * query.size,
      },
    );
    const kits = await this.catalogue.kitsByIds([...new Set(rows.map((row) => row.kitId))]);
    const revisions = (await Promise.all(kits.map((kit) => this.catalogue.revisionsOf(kit.id)))).flat();
    return {
      items: rows.map((row) => ({
        email: row.email,
        kitName: kits.find((kit) => kit.id === row.kitId)?.name ?? '',
        source: row.source,
        state: row.state,
        since: row.since.toISOString(),
        held: revisions.find((one) => one.id === row.heldRevisionId)?.label ?? null,
        downloads: Number(row.downloads),
      })),
      page: query.page,
      size: query.size,
      total: Number(rows[0]?.total ?? 0),
    };
  }
}
