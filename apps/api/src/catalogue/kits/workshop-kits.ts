import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer, FilamentColour, Handled } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { InjectConfig, type Config } from '../../config/config.js';
import { selectRows } from '../../database/rows.js';
import { notFound } from '../../http/refusal.js';
import { labelOf, Revision } from '../revisions/revision.model.js';
import { Kit } from './kit.model.js';
import { Licence } from './licence.model.js';

export type WorkshopKitAnswer = Answer<'GET /workshop/kits/:kitId'>;

interface Row {
  id: string;
  slug: string;
  name: string;
  colour: FilamentColour;
  is_listed: number;
  updated_at: Date;
  newest_mark: number | null;
  newest_issue: number | null;
  draft_mark: number | null;
  draft_issue: number | null;
  price_minor: number | null;
  total: number;
}
interface CountRow {
  revision_id: string;
  parts: number;
}

/** Kits as staff see them. */
@Injectable()
export class WorkshopKits {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    @InjectModel(Kit) private readonly kits: typeof Kit,
    @InjectModel(Licence) private readonly licences: typeof Licence,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
  ) {}

  async list({ query }: Handled<'GET /workshop/kits'>): Promise<Answer<'GET /workshop/kits'>> {
    const rows = await selectRows<Row>(
      this.database,
      `SELECT k.id, k.slug, k.name, k.colour, k.is_listed, k.updated_at, n.mark AS newest_mark, n.issue AS newest_issue,
              d.mark AS draft_mark, d.issue AS draft_issue, ${PRICE} AS price_minor, COUNT(*) OVER () AS total
       FROM kits k LEFT JOIN revisions n ON n.id = k.newest_revision_id
       LEFT JOIN revisions d ON d.kit_id = k.id AND d.state IN ('draft', 'proving')
       WHERE k.name LIKE :like OR k.slug LIKE :like
       ORDER BY k.updated_at DESC, k.id LIMIT :size OFFSET :from`,
      {
        like: `%${likeText(query.search)}%`,
        size: query.size,
        from: (query.page - 1) * query.size,
      },
    );
    return {
      items: rows.map((row) => ({
        id: row.id,
        slug: row.slug,
        name: row.name,
        colour: row.colour,
        isListed: Boolean(row.is_listed),
        newest: labelOrNull(row.newest_mark, row.newest_issue),
        draft: labelOrNull(row.draft_mark, row.draft_issue),
        price: row.price_minor === null ? null : this.money(row.price_minor),
        updatedAt: row.updated_at.toISOString(),
      })),
      page: query.page,
      size: query.size,
      total: Number(rows[0]?.total ?? 0),
    };
  }

  async read(kitId: string): Promise<WorkshopKitAnswer> {
    const kit = await this.kits.findByPk(kitId);
    if (!kit) throw notFound('kit');
    const [licences, revisions, counts] = await Promise.all([
      this.licences.findAll({ where: { kitId }, order: [['createdAt', 'ASC']] }),
      this.revisions.findAll({
        where: { kitId },
        order: [
          ['mark', 'DESC'],
          ['issue', 'DESC'],
        ],
      }),
      selectRows<CountRow>(
        this.database,
        `SELECT p.revision_id, COUNT(*) AS parts FROM parts p JOIN revisions r ON r.id = p.revision_id
         WHERE r.kit_id = :kitId GROUP BY p.revision_id`,
        { kitId },
      ),
    ]);
    const partCounts = new Map(counts.map((row) => [row.revision_id, Number(row.parts)]));
    return {
      id: kit.id,
      slug: kit.slug,
      name: kit.name,
      tagline: kit.tagline,
      description: kit.description,
      colour: kit.colour,
      isListed: kit.isListed,
      licences: licences.map((one) => ({
        id: one.id,
        kind: one.kind,
        name: one.name,
        terms: one.terms,
        price: this.money(one.priceMinor),
        yearlyLimit: one.yearlyLimit,
        isOffered: one.isOffered,
      })),
      revisions: revisions.map((one) => ({
        id: one.id,
        label: one.label,
        state: one.state,
        createdAt: one.createdAt.toISOString(),
        releasedAt: one.releasedAt?.toISOString() ?? null,
        partCount: partCounts.get(one.id) ?? 0,
        bundleBytes: one.bundleBytes,
      })),
    };
  }

  private money(minor: number): { minor: number; currency: string } {
    return { minor: Number(minor), currency: this.config.WORKSHOP_CURRENCY };
  }
}

/** The price a kit is shown with: of the licence for one's own prints, else the cheapest offered. */
export const PRICE = `COALESCE(
  (SELECT MIN(l.price_minor) FROM licences l WHERE l.kit_id = k.id AND l.is_offered AND l.kind = 'personal'),
  (SELECT MIN(l.price_minor) FROM licences l WHERE l.kit_id = k.id AND l.is_offered))`;

/** What somebody typed, as plain text within a LIKE pattern. */
export const likeText = (text: string | undefined): string =>
  (text ?? '').replace(/[\\%_]/g, (sign) => `\\${sign}`);

const labelOrNull = (mark: number | null, issue: number | null): string | null =>
  mark === null || issue === null ? null : labelOf({ mark, issue });
