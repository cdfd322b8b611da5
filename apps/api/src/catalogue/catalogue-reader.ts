import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Clearance, FilamentColour, KitCard, RankVoice } from '@windchest/contracts';
import { Op } from 'sequelize';
import type { Tx } from '../database/transactions.js';
import { ChangedBundles } from './changed-parts/changed-bundles.js';
import { Differences } from './comparison/differences.js';
import type { NetRow } from './comparison/net-rows.js';
import { contentTypes } from './files/file-kind.js';
import { Kit } from './kits/kit.model.js';
import { rankOf } from './kits/rank.js';
import { Licence } from './kits/licence.model.js';
import { OfferedLicences, type OfferedLicence } from './kits/offered-licences.js';
import { PrintSheets } from './print/print-sheets.js';
import { ShopKits } from './kits/shop-kits.js';
import { ReleasedBundles, type BundleFile, type ClearanceBundle } from './release/released-bundles.js';
import { servable, type ServableFile } from './release/stored-file-of.js';
import { hasVariants } from './revisions/part-files.js';
import { RevisionContents } from './revisions/revision-contents.js';
import { Revision, type Room } from './revisions/revision.model.js';

export { filamentHex } from './build-book/kit-shades.js';
export type { BundleFile, NetRow, OfferedLicence, ServableFile };

export interface KitFacts {
  readonly id: string;
  readonly slug: string;
  readonly name: string;
  readonly tagline: string;
  readonly colour: FilamentColour;
  readonly newestRevisionId: string | null;
}
export interface ReleasedRevision {
  readonly id: string;
  readonly kitId: string;
  readonly label: string;
  readonly mark: number;
  readonly issue: number;
  readonly releasedAt: Date;
  readonly bundleSha256: string;
  readonly bundleBytes: number;
  /** Of one clearance each, tightest first; none where no part comes in several. */
  readonly bundles: readonly ClearanceBundle[];
  readonly changeNotes: string;
  readonly isWithdrawn: boolean;
  readonly withdrawnReason: string | null;
}

/** What a revision is meant to sound like. */
export interface Voicing {
  readonly rank: RankVoice[];
  readonly room: Room;
  readonly declaredCents: number;
}

/** What other rooms may know of the catalogue: plain facts, nothing of a draft. */
@Injectable()
export class CatalogueReader {
  constructor(
    @InjectModel(Kit) private readonly kits: typeof Kit,
    @InjectModel(Licence) private readonly licences: typeof Licence,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    private readonly offered: OfferedLicences,
    private readonly contents: RevisionContents,
    private readonly bundles: ReleasedBundles,
    private readonly changes: Differences,
    private readonly sheets: PrintSheets,
    private readonly changedBundles: ChangedBundles,
    private readonly shop: ShopKits,
  ) {}

  /** Those of the licences that can be bought now. */
  offeredLicences(licenceIds: readonly string[], tx?: Tx): Promise<OfferedLicence[]> {
    return this.offered.byIds(licenceIds, tx);
  }

  allOfferedLicences(tx?: Tx): Promise<OfferedLicence[]> {
    return this.offered.all(tx);
  }

  async kitsByIds(ids: readonly string[]): Promise<KitFacts[]> {
    if (ids.length === 0) return [];
    return (await this.kits.findAll({ where: { id: [...new Set(ids)] }, order: [['name', 'ASC']] })).map(
      toKit,
    );
  }

  /** Kits that stand in the shop with a released revision, by name. */
  async kitsInShop(tx?: Tx): Promise<KitFacts[]> {
    const rows = await this.kits.findAll({
      where: { isListed: true, newestRevisionId: { [Op.ne]: null } },
      order: [['name', 'ASC']],
      transaction: tx ?? null,
    });
    return rows.map(toKit);
  }

  /** The shop's cards of those kits that are on sale. */
  shopCards(kitIds: readonly string[]): Promise<(KitCard & { id: string })[]> {
    return this.shop.cardsByIds(kitIds);
  }

  /** Kits of which a revision is out, by name. */
  async releasedKits(): Promise<KitFacts[]> {
    const kits = await this.kits.findAll({
      where: { newestRevisionId: { [Op.ne]: null } },
      order: [['name', 'ASC']],
    });
    return kits.map(toKit);
  }

  async kitBySlug(slug: string): Promise<KitFacts | null> {
    const kit = await this.kits.findOne({ where: { slug } });
    return kit && toKit(kit);
  }

  async licencesByIds(
    ids: readonly string[],
  ): Promise<{ id: string; kitId: string; kind: Licence['kind']; name: string; terms: string }[]> {
    if (ids.length === 0) return [];
    const rows = await this.licences.findAll({ where: { id: [...new Set(ids)] } });
    return rows.map(({ id, kitId, kind, name, terms }) => ({ id, kitId, kind, name, terms }));
  }

  /** Released and withdrawn revisions of a kit, newest first. */
  async revisionsOf(kitId: string): Promise<ReleasedRevision[]> {
    const rows = await this.revisions.findAll({
      where: { kitId, ...FINAL },
      order: [
        ['mark', 'DESC'],
        ['issue', 'DESC'],
      ],
    });
    return this.toReleased(rows);
  }

  async revisionById(id: string): Promise<ReleasedRevision | null> {
    const revision = await this.finalById(id);
    return revision && ((await this.toReleased([revision]))[0] ?? null);
  }

  /** All revisions of a kit, drafts too, newest first: for staff's choices only. */
  async revisionChoices(kitId: string): Promise<{ id: string; label: string; isReleased: boolean }[]> {
    const rows = await this.revisions.findAll({
      where: { kitId },
      order: [
        ['mark', 'DESC'],
        ['issue', 'DESC'],
      ],
    });
    return rows.map(({ id, label, releasedAt }) => ({ id, label, isReleased: releasedAt !== null }));
  }

  /** The bundle that holds every clearance, or of the one that is asked for; null where there is none. */
  async bundleFile(revisionId: string, clearance: Clearance | null = null): Promise<BundleFile | null> {
    return (
      (await this.bundles.filesOf(await this.finalById(revisionId))).find(
        (one) => one.clearance === clearance,
      ) ?? null
    );
  }

  async bundleByHash(revisionId: string, sha256: string): Promise<BundleFile | null> {
    return (
      (await this.bundles.filesOf(await this.finalById(revisionId))).find((one) => one.sha256 === sha256) ??
      null
    );
  }

  /** Any file of a released revision by its hash: a part, a document, a picture, a sound. */
  async fileOf(revisionId: string, sha256: string): Promise<ServableFile | null> {
    if (!(await this.finalById(revisionId))) return null;
    const file = (await this.contents.filesOf(revisionId)).find((one) => one.sha256 === sha256);
    // Bundles of changed parts are files of their revision, too.
    if (!file) return this.changedBundles.fileOf(revisionId, sha256);
    const { bytes, fileName, kind } = file;
    return servable('files', { sha256, bytes, fileName, contentType: contentTypes[kind] });
  }

  async documentsOf(revisionId: string): Promise<{ sha256: string; fileName: string; bytes: number }[]> {
    if (!(await this.finalById(revisionId))) return [];
    return (await this.contents.documentsOf(revisionId)).map(({ sha256, fileName, bytes }) => ({
      sha256,
      fileName,
      bytes,
    }));
  }

  async cautionsOf(revisionId: string): Promise<string> {
    return (await this.finalById(revisionId))?.cautions ?? '';
  }

  async voicingOf(revisionId: string): Promise<Voicing | null> {
    const revision = await this.finalById(revisionId);
    if (!revision) return null;
    const { room, declaredCents } = revision;
    return { rank: rankOf(await this.contents.voicesOf(revisionId)), room, declaredCents };
  }

  /** Whether parts of a revision come in several clearances, and the part that tells which one to print. */
  async clearancesOf(
    revisionId: string,
  ): Promise<{ hasVariants: boolean; gauge: { code: string; name: string } | null }> {
    const parts = (await this.finalById(revisionId)) ? await this.contents.partsOf(revisionId) : [];
    const gauge = parts.find((part) => part.isGauge);
    return {
      hasVariants: parts.some(hasVariants),
      gauge: gauge ? { code: gauge.code, name: gauge.name } : null,
    };
  }

  /**
   * Part by part, what differs between a revision (or none) and another one of the same kit, net and with each
   * step's mark, for somebody who prints in this clearance; where that is not known, in any of them.
   */
  netDifferences(
    fromRevisionId: string | null,
    toRevisionId: string,
    clearance: Clearance | null,
  ): Promise<NetRow[]> {
    return this.changes.net(fromRevisionId, toRevisionId, clearance);
  }

  /** What a browser lays a released revision out on plates from. */
  async printSheetOf(revisionId: string): Promise<Answer<'GET /kits/:slug/print'> | null> {
    return (await this.finalById(revisionId)) && this.sheets.sheetOf(revisionId);
  }

  private async toReleased(revisions: readonly Revision[]): Promise<ReleasedRevision[]> {
    const bundles = await this.bundles.ofEach(revisions.map(({ id }) => id));
    return revisions.map((revision) => ({
      ...releasedFacts(revision),
      bundles: bundles.get(revision.id) ?? [],
    }));
  }

  private finalById(id: string): Promise<Revision | null> {
    return this.revisions.findOne({ where: { id, ...FINAL } });
  }
}

const FINAL = { state: { [Op.in]: ['released', 'withdrawn'] } };

const toKit = ({ id, slug, name, tagline, colour, newestRevisionId }: Kit): KitFacts => ({
  id,
  slug,
  name,
  tagline,
  colour,
  newestRevisionId,
});

const releasedFacts = (revision: Revision): Omit<ReleasedRevision, 'bundles'> => ({
  id: revision.id,
  kitId: revision.kitId,
  label: revision.label,
  mark: revision.mark,
  issue: revision.issue,
  releasedAt: revision.releasedAt ?? revision.updatedAt,
  bundleSha256: revision.bundleSha256 ?? '',
  bundleBytes: revision.bundleBytes ?? 0,
  changeNotes: revision.changeNotes,
  isWithdrawn: revision.state === 'withdrawn',
  withdrawnReason: revision.withdrawnReason,
});
