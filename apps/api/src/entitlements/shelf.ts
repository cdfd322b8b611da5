import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Answer, Clearance } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { PrinterCards } from '../accounts/printers/printer-cards.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { selectRows } from '../database/rows.js';
import { Transactions } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { clearanceFor } from './clearance-for.js';
import { Download } from './download.model.js';
import { Entitlement } from './entitlement.model.js';
import { OwnRevisions } from './own-revisions.js';
import { KeepPrintRecord } from './reprint/keep-print-record.js';
import { ReprintLists } from './reprint/reprint-lists.js';
import { toShelfRevision } from './shelf-revision.js';

const PAGE_SIZE = 24;

/** Where a person's kits stand: the revision held, the newest one, and what differs between them. */
@Injectable()
export class Shelf {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Entitlement) private readonly entitlements: typeof Entitlement,
    @InjectModel(Download) private readonly downloads: typeof Download,
    private readonly catalogue: CatalogueReader,
    private readonly printers: PrinterCards,
    private readonly own: OwnRevisions,
    private readonly lists: ReprintLists,
    private readonly record: KeepPrintRecord,
    private readonly transactions: Transactions,
    private readonly clock: Clock,
  ) {}

  async ownedSlugs(person: SignedIn): Promise<string[]> {
    const mine = await this.entitlements.findAll({
      attributes: ['kitId'],
      where: { personId: person.id, state: 'active' },
      group: ['kitId'],
    });
    return (await this.catalogue.kitsByIds(mine.map((one) => one.kitId))).map((kit) => kit.slug);
  }

  async list(person: SignedIn, page: number): Promise<Answer<'GET /shelf'>> {
    const rows = await selectRows<{ kitId: string; total: number }>(
      this.database,
      `SELECT kit_id AS kitId, COUNT(*) OVER () AS total FROM entitlements WHERE person_id = :personId AND state = 'active'
       GROUP BY kit_id ORDER BY MAX(created_at) DESC, kit_id LIMIT :limit OFFSET :offset`,
      { personId: person.id, limit: PAGE_SIZE, offset: (page - 1) * PAGE_SIZE },
    );
    const items = await Promise.all(rows.map(({ kitId }) => this.itemOf(person, kitId)));
    return {
      items: items.flatMap((item) => item ?? []),
      page,
      size: PAGE_SIZE,
      total: Number(rows[0]?.total ?? 0),
      ...(await this.restingOf(person)),
    };
  }

  /** Names of kits of which all that is left rests: while a payment is in dispute, or with a pledge. */
  private async restingOf(person: SignedIn, kitId?: string): Promise<Resting> {
    const rows = await selectRows<{ kitId: string; isPledge: number }>(
      this.database,
      `SELECT kit_id AS kitId, MIN(source = 'pledge') AS isPledge FROM entitlements
       WHERE person_id = :personId AND state <> 'ended' AND (:kitId IS NULL OR kit_id = :kitId)
       GROUP BY kit_id HAVING SUM(state = 'active') = 0`,
      { personId: person.id, kitId: kitId ?? null },
    );
    const byPledge = new Set(rows.filter((row) => Number(row.isPledge) === 1).map((row) => row.kitId));
    const kits = await this.catalogue.kitsByIds(rows.map((row) => row.kitId));
    return {
      resting: kits.filter(({ id }) => !byPledge.has(id)).map(({ name }) => name),
      restingWithPledge: kits.filter(({ id }) => byPledge.has(id)).map(({ name }) => name),
    };
  }

  async read(person: SignedIn, slug: string): Promise<Answer<'GET /shelf/:slug'>> {
    const kit = await this.catalogue.kitBySlug(slug);
    const item = kit && (await this.itemOf(person, kit.id));
    if (kit && !item) await this.refuseResting(person, kit);
    if (!kit || !item) throw notFound('kit on your shelf');
    const best = await this.bestOf(person, kit.id);
    const card = await this.printers.mainOf(person.id);
    const chosen = clearanceFor(best, card);
    const mine = await this.own.of(person.id, kit.id);
    const [reprint, clearances, documents, cautions, voicing, downloads, [licence]] = await Promise.all([
      this.lists.listFor(person, kit.id, item.newest.id),
      this.catalogue.clearancesOf(item.newest.id),
      this.catalogue.documentsOf(item.newest.id),
      this.catalogue.cautionsOf(item.newest.id),
      this.catalogue.voicingOf((item.held ?? item.newest).id),
      this.downloadsOf(person, kit.id),
      this.catalogue.licencesByIds(best?.licenceId ? [best.licenceId] : []),
    ]);
    if (!voicing) throw notFound('kit on your shelf');
    const labels = new Map(mine.all.map((revision) => [revision.id, revision.label]));
    return {
      ...item,
      // The order behind a gift is the giver's own affair.
      orderId: best && best.source !== 'gift' ? best.orderId : null,
      clearance: {
        ...clearances,
        chosen,
        said: best?.clearance ?? null,
        habit: card?.clearance ? { clearance: card.clearance, printer: card.name } : null,
      },
      revisions: mine.covered.map(toShelfRevision),
      reprint,
      documents,
      licenceTerms: licence?.terms ?? '',
      cautions,
      ...voicing,
      downloads: downloads.map((one) => ({
        at: one.grantedAt.toISOString(),
        revision: labels.get(one.revisionId) ?? '',
        fileName: one.fileName,
        isComplete: one.completedAt !== null,
      })),
    };
  }

  private async refuseResting(person: SignedIn, kit: { id: string; name: string }): Promise<void> {
    const { resting, restingWithPledge } = await this.restingOf(person, kit.id);
    if (resting.length > 0)
      throw new Refusal('forbidden', `Downloads of ${kit.name} rest while its payment is in dispute.`);
    if (restingWithPledge.length > 0)
      throw new Refusal(
        'forbidden',
        `${kit.name} is on your shelf by your pledge, and the pledge rests now.`,
      );
  }

  async sayHeld(person: SignedIn, slug: string, revisionId: string): Promise<Answer<'GET /shelf/:slug'>> {
    const kit = await this.catalogue.kitBySlug(slug);
    const best = kit && (await this.bestOf(person, kit.id));
    const revision = kit && (await this.catalogue.revisionsOf(kit.id)).find((one) => one.id === revisionId);
    if (!best || !revision) throw notFound('kit on your shelf');
    const now = this.clock.now();
    const { clearance } = await this.lists.stateOf(person, kit.id);
    const rows = await this.catalogue.netDifferences(null, revision.id, clearance);
    await this.transactions.run(async (tx) => {
      await this.entitlements.update(
        { heldRevisionId: revision.id, heldSince: now, updatedAt: now },
        { where: { personId: person.id, kitId: kit.id, state: 'active' }, transaction: tx },
      );
      await this.record.fill(tx, { personId: person.id, kitId: kit.id }, rows, revision.id, clearance);
    });
    return this.read(person, slug);
  }

  /** Null forgets what was said. */
  async sayClearance(
    person: SignedIn,
    slug: string,
    clearance: Clearance | null,
  ): Promise<Answer<'GET /shelf/:slug'>> {
    const kit = await this.catalogue.kitBySlug(slug);
    const [said] = kit
      ? await this.entitlements.update(
          { clearance, updatedAt: this.clock.now() },
          { where: { personId: person.id, kitId: kit.id, state: 'active' } },
        )
      : [0];
    if (said === 0) throw notFound('kit on your shelf');
    return this.read(person, slug);
  }

  private async itemOf(
    person: SignedIn,
    kitId: string,
  ): Promise<Answer<'GET /shelf'>['items'][number] | null> {
    const best = await this.bestOf(person, kitId);
    const [kit] = await this.catalogue.kitsByIds([kitId]);
    const { all, active, newest, heldRevisionId } = await this.own.of(person.id, kitId);
    if (!best || !kit || !newest) return null;
    const held = all.find((one) => one.id === heldRevisionId);
    const beyond = all.find((one) => !one.isWithdrawn);
    const [licence] = await this.catalogue.licencesByIds(best.licenceId ? [best.licenceId] : []);
    return {
      slug: kit.slug,
      name: kit.name,
      tagline: kit.tagline,
      colour: kit.colour,
      source: best.source,
      since: best.createdAt.toISOString(),
      sources: active.map((one) => ({
        source: one.source,
        since: one.createdAt.toISOString(),
        until: one.untilAt?.toISOString() ?? null,
        releasedBefore: one.releasedBefore?.toISOString() ?? null,
      })),
      licenceName: licence?.name ?? '',
      held: held ? toShelfRevision(held) : null,
      newest: toShelfRevision(newest),
      newerNotIncluded: beyond && beyond.id !== newest.id ? beyond.label : null,
    };
  }

  /** Of several entitlements to one kit: the one whose files were fetched last, else the first. */
  private bestOf(person: SignedIn, kitId: string): Promise<Entitlement | null> {
    return this.entitlements.findOne({
      where: { personId: person.id, kitId, state: 'active' },
      order: [
        ['heldSince', 'DESC'],
        ['createdAt', 'ASC'],
      ],
    });
  }

  private async downloadsOf(person: SignedIn, kitId: string): Promise<Download[]> {
    const mine = await this.entitlements.findAll({
      attributes: ['id'],
      where: { personId: person.id, kitId },
    });
    return this.downloads.findAll({
      where: { entitlementId: mine.map((one) => one.id) },
      order: [['grantedAt', 'DESC']],
      limit: 20,
    });
  }
}

type Resting = Pick<Answer<'GET /shelf'>, 'resting' | 'restingWithPledge'>;
