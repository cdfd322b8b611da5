import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer, FilamentColour, Handled, KitCard, KitPart, VoiceWithNote } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { InjectConfig, type Config } from '../../config/config.js';
import { selectRows } from '../../database/rows.js';
import { notFound } from '../../http/refusal.js';
import { tellingDrawing } from '../files/measured-mesh.js';
import { fromJson } from '../json-column.js';
import { KitsTooBig } from '../print/kits-too-big.js';
import { filesOfPart, hasVariants } from '../revisions/part-files.js';
import { RevisionContents } from '../revisions/revision-contents.js';
import { labelOf, Revision, type Room } from '../revisions/revision.model.js';
import { Kit } from './kit.model.js';
import { Licence } from './licence.model.js';
import { compassOfRank, rankOf } from './rank.js';
import { likeText, PRICE } from './workshop-kits.js';

type ListQuery = Handled<'GET /kits'>['query'];

interface Row {
  id: string;
  slug: string;
  name: string;
  tagline: string;
  colour: FilamentColour;
  revision_id: string;
  mark: number;
  issue: number;
  released_at: Date;
  room: unknown;
  print_estimate: unknown;
  price_minor: number;
  tallest_mm: number | null;
  longest_mm: number | null;
  part_count: number;
  total: number;
}

const orders: Record<ListQuery['sort'], string> = {
  newest: 'released_at DESC, name',
  name: 'name',
  price: 'price_minor, name',
  size: 'longest_mm, name',
};

const side = (axis: 0 | 1 | 2): string => `CAST(JSON_VALUE(m.measurement, '$.sizeMm[${axis}]') AS DOUBLE)`;
const largest = (length: string): string =>
  `(SELECT MAX(${length}) FROM parts p JOIN revision_files f ON f.id = p.file_id
    JOIN measurements m ON m.sha256 = f.sha256 WHERE p.revision_id = r.id)`;

/** Kits as everybody sees them: listed, with a released newest revision and something to buy. */
@Injectable()
export class ShopKits {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    @InjectModel(Kit) private readonly kits: typeof Kit,
    @InjectModel(Licence) private readonly licences: typeof Licence,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    private readonly contents: RevisionContents,
    private readonly tooBig: KitsTooBig,
  ) {}

  async list({ query }: Handled<'GET /kits'>): Promise<Answer<'GET /kits'>> {
    const tooBig = await this.tooBigFor(query);
    const rows = await this.rows(
      `AND (k.name LIKE :like OR k.tagline LIKE :like) ${tooBig.length > 0 ? 'AND r.id NOT IN (:tooBig)' : ''}`,
      { like: `%${likeText(query.search)}%`, size: query.size, from: (query.page - 1) * query.size, tooBig },
      `ORDER BY ${orders[query.sort]}, id LIMIT :size OFFSET :from`,
    );
    const voices = await this.voicesOf(rows.map((row) => row.revision_id));
    return {
      items: rows.map((row) => this.cardOf(row, voices.get(row.revision_id) ?? [])),
      page: query.page,
      size: query.size,
      total: Number(rows[0]?.total ?? 0),
    };
  }

  async cardsByIds(kitIds: readonly string[]): Promise<(KitCard & { id: string })[]> {
    if (kitIds.length === 0) return [];
    const rows = await this.rows('AND k.id IN (:kitIds)', { kitIds }, 'ORDER BY name, id');
    const voices = await this.voicesOf(rows.map((row) => row.revision_id));
    return rows.map((row) => ({ ...this.cardOf(row, voices.get(row.revision_id) ?? []), id: row.id }));
  }

  async read(slug: string): Promise<Answer<'GET /kits/:slug'>> {
    const row = await this.rowOf(slug);
    const [kit, revision, voices, licences, revisions] = await Promise.all([
      this.kits.findByPk(row.id),
      this.revisions.findByPk(row.revision_id),
      this.voicesOf([row.revision_id]),
      this.licences.findAll({
        where: { kitId: row.id, isOffered: true },
        order: [
          ['priceMinor', 'ASC'],
          ['id', 'ASC'],
        ],
      }),
      this.revisions.findAll({
        where: { kitId: row.id, state: 'released' },
        order: [
          ['mark', 'DESC'],
          ['issue', 'DESC'],
        ],
      }),
    ]);
    if (!kit || !revision) throw notFound('kit');
    return {
      ...this.cardOf(row, voices.get(row.revision_id) ?? []),
      id: kit.id,
      description: kit.description,
      licences: licences.map(({ id, kind, name, terms, priceMinor, yearlyLimit }) => ({
        id,
        kind,
        name,
        terms,
        price: this.money(priceMinor),
        yearlyLimit,
      })),
      bundleBytes: revision.bundleBytes ?? 0,
      declaredCents: revision.declaredCents,
      room: revision.room,
      buildVolume: revision.buildVolume,
      printSpec: revision.printSpec,
      hardware: revision.hardware,
      cautions: revision.cautions,
      revisions: revisions.map((one) => ({
        label: one.label,
        releasedAt: (one.releasedAt ?? one.updatedAt).toISOString(),
        changeNotes: one.changeNotes,
      })),
    };
  }

  /** Sizes and drawings only: the printable mesh is for those who own it. */
  async parts(slug: string): Promise<KitPart[]> {
    const row = await this.rowOf(slug);
    const parts = await this.contents.partsOf(row.revision_id);
    return parts.map((part) => {
      const [x, y, z] = part.file?.measured?.sizeMm ?? [0, 0, 0];
      return {
        code: part.code,
        name: part.name,
        quantity: part.quantity,
        orientation: part.orientation,
        sizeMm: { x, y, z },
        volumeMm3: part.file?.measured?.volumeMm3 ?? 0,
        areaMm2: part.file?.measured?.areaMm2 ?? 0,
        printSpec: part.printSpec,
        isGauge: part.isGauge,
        clearances: hasVariants(part) ? filesOfPart(part).map((one) => one.clearance) : [],
        drawing: tellingDrawing(part.file?.drawings ?? null),
        previewBytes: part.file?.measured?.previewBytes ?? null,
        previewSha256: part.file?.previewSha256 ?? null,
      };
    });
  }

  /** The revision everybody is offered now. */
  async newestRevisionId(slug: string): Promise<string> {
    return (await this.rowOf(slug)).revision_id;
  }

  private async tooBigFor({ fitsX, fitsY, fitsZ }: ListQuery): Promise<string[]> {
    if (fitsX === undefined || fitsY === undefined || fitsZ === undefined) return [];
    return this.tooBig.revisionsFor({ xMm: fitsX, yMm: fitsY, zMm: fitsZ });
  }

  private async rowOf(slug: string): Promise<Row> {
    const [row] = await this.rows('AND k.slug = :slug', { slug });
    if (!row) throw notFound('kit');
    return row;
  }

  private rows(condition: string, values: Record<string, unknown>, tail = ''): Promise<Row[]> {
    return selectRows<Row>(
      this.database,
      `SELECT found.*, COUNT(*) OVER () AS total FROM (
         SELECT k.id, k.slug, k.name, k.tagline, k.colour, r.id AS revision_id, r.mark, r.issue, r.released_at, r.room,
                r.print_estimate, ${PRICE} AS price_minor,
                ${largest(side(2))} AS tallest_mm,
                ${largest(`GREATEST(${side(0)}, ${side(1)}, ${side(2)})`)} AS longest_mm,
                (SELECT COUNT(*) FROM parts p WHERE p.revision_id = r.id) AS part_count
         FROM kits k JOIN revisions r ON r.id = k.newest_revision_id
         WHERE k.is_listed AND r.state = 'released' ${condition}
       ) AS found WHERE price_minor IS NOT NULL ${tail}`,
      values,
    );
  }

  private async voicesOf(
    revisionIds: readonly string[],
  ): Promise<Map<string, { code: string; voice: VoiceWithNote | null }[]>> {
    if (revisionIds.length === 0) return new Map();
    const rows = await selectRows<{ revision_id: string; code: string; voice: unknown }>(
      this.database,
      'SELECT revision_id, code, voice FROM parts WHERE revision_id IN (:revisionIds) AND voice IS NOT NULL',
      { revisionIds },
    );
    const byRevision = new Map<string, { code: string; voice: VoiceWithNote | null }[]>();
    for (const { revision_id: id, code, voice } of rows)
      byRevision.set(id, [...(byRevision.get(id) ?? []), { code, voice: fromJson<VoiceWithNote>(voice) }]);
    return byRevision;
  }

  private cardOf(row: Row, voices: { code: string; voice: VoiceWithNote | null }[]): KitCard {
    const rank = rankOf(voices);
    const room = fromJson<Room>(row.room) ?? { temperatureC: 20 };
    return {
      slug: row.slug,
      name: row.name,
      tagline: row.tagline,
      colour: row.colour,
      revision: labelOf(row),
      releasedAt: row.released_at.toISOString(),
      compass: compassOfRank(rank, room),
      rank,
      tallestPartMm: Number(row.tallest_mm ?? 0),
      longestPartMm: Number(row.longest_mm ?? 0),
      partCount: Number(row.part_count),
      printEstimate: fromJson<KitCard['printEstimate']>(row.print_estimate),
      price: this.money(row.price_minor),
    };
  }

  private money(minor: number): { minor: number; currency: string } {
    return { minor: Number(minor), currency: this.config.WORKSHOP_CURRENCY };
  }
}
