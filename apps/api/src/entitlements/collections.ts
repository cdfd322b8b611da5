import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer } from '@windchest/contracts';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import { Transactions } from '../database/transactions.js';
import { RateLimits } from '../http/rate-limits.js';
import { notFound } from '../http/refusal.js';
import { OrdersReader } from '../orders/orders-reader.js';
import { DownloadLinks } from './download-links.js';
import { Entitlement } from './entitlement.model.js';
import { toShelfRevision } from './shelf-revision.js';

/** The page behind a mailed link, and fresh links. */
@Injectable()
export class Collections {
  constructor(
    @InjectModel(Entitlement) private readonly entitlements: typeof Entitlement,
    private readonly transactions: Transactions,
    private readonly catalogue: CatalogueReader,
    private readonly orders: OrdersReader,
    private readonly links: DownloadLinks,
    private readonly limits: RateLimits,
  ) {}

  /** Opening the page uses nothing up: mail scanners open links. */
  async open(token: string, network: string): Promise<Answer<'GET /collect/:token'>> {
    await this.limits.take('token', network);
    const link = await this.links.byToken(token);
    const order = await this.orders.byId(link.orderId);
    if (!order) throw notFound('order');
    const left = await this.entitlements.findAll({
      where: { orderId: link.orderId, state: ['active', 'suspended'] },
      order: [
        ['createdAt', 'ASC'],
        ['id', 'ASC'],
      ],
    });
    const active = left.filter((one) => one.state === 'active');
    const state = this.links.stateOf(link);
    const kits = await this.kitsOf(active);
    return {
      orderNumber: order.number,
      expiresAt: link.expiresAt.toISOString(),
      usesLeft: link.usesLeft,
      state: active.length > 0 ? state : left.length > 0 ? 'suspended' : 'ended',
      kits: state === 'replaced' ? [] : kits,
    };
  }

  async replace(token: string, network: string): Promise<void> {
    const link = await this.links.byToken(token);
    await this.limits.take('mailed-link', link.email);
    await this.limits.take('mailed-link-network', network);
    await this.transactions.run((tx) => this.links.replace(tx, link.orderId, link.email));
  }

  /** Says nothing about whether the address ever bought anything. */
  async replaceAllOf(email: string, network: string): Promise<void> {
    await this.limits.take('mailed-link', email);
    await this.limits.take('mailed-link-network', network);
    const active = await this.entitlements.findAll({
      attributes: ['orderId'],
      where: { email, state: 'active', source: ['purchase', 'gift'] },
      group: ['orderId'],
      limit: 20,
    });
    await this.transactions.run(async (tx) => {
      for (const { orderId } of active) if (orderId) await this.links.replace(tx, orderId, email);
    });
  }

  async resend(orderId: string): Promise<void> {
    const order = await this.orders.byId(orderId);
    if (!order) throw notFound('order');
    const holder = order.gift?.email ?? order.email;
    await this.transactions.run((tx) => this.links.replace(tx, order.id, holder));
  }

  private async kitsOf(active: readonly Entitlement[]): Promise<Answer<'GET /collect/:token'>['kits']> {
    const kits = await this.catalogue.kitsByIds(active.map((one) => one.kitId));
    const licences = await this.catalogue.licencesByIds(active.flatMap((one) => one.licenceId ?? []));
    const shown = await Promise.all(
      active.map(async (one) => {
        const kit = kits.find(({ id }) => id === one.kitId);
        const newest = (await this.catalogue.revisionsOf(one.kitId)).find(
          (revision) => !revision.isWithdrawn,
        );
        if (!kit || !newest) return [];
        const licenceName = licences.find(({ id }) => id === one.licenceId)?.name ?? '';
        return [
          {
            slug: kit.slug,
            name: kit.name,
            colour: kit.colour,
            licenceName,
            newest: toShelfRevision(newest),
          },
        ];
      }),
    );
    return shown.flat();
  }
}
