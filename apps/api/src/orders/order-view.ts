import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { BuyerOrder } from '@windchest/contracts';
import { Clock } from '../adapters/clock/clock.js';
import { CatalogueReader } from '../catalogue/catalogue-reader.js';
import type { SignedIn } from '../http/person.js';
import { OrderFacts } from './order-facts.js';
import { OrderLine } from './order-line.model.js';
import { Order } from './order.model.js';
import { RefundView } from './refunds/refund-view.js';

/** Orders as their buyers see them. */
@Injectable()
export class OrderView {
  constructor(
    @InjectModel(OrderLine) private readonly lines: typeof OrderLine,
    private readonly catalogue: CatalogueReader,
    private readonly refunds: RefundView,
    private readonly facts: OrderFacts,
    private readonly clock: Clock,
  ) {}

  async one(order: Order, person: SignedIn | null): Promise<BuyerOrder> {
    const [shown] = await this.many([order], person);
    if (!shown) throw new Error('An order was shown as nothing.');
    return shown;
  }

  async many(orders: readonly Order[], person: SignedIn | null): Promise<BuyerOrder[]> {
    if (orders.length === 0) return [];
    const lines = await this.lines.findAll({
      where: { orderId: orders.map((order) => order.id) },
      order: [['position', 'ASC']],
    });
    const kits = await this.catalogue.kitsByIds([...new Set(lines.map((line) => line.kitId))]);
    const orderIds = orders.map((order) => order.id);
    const [refunds, rights] = await Promise.all([
      this.refunds.forBuyers(orderIds),
      this.facts.rightsOf(orderIds),
    ]);
    const kitOf = new Map(kits.map((kit) => [kit.id, kit]));
    return orders.map((order) => {
      const money = (minor: number) => ({ minor, currency: order.currency });
      const isPayable =
        order.state === 'open' && order.payUntil !== null && order.payUntil > this.clock.now();
      return {
        id: order.id,
        number: order.number,
        state: order.state,
        email: order.email,
        placedAt: order.createdAt.toISOString(),
        paidAt: order.paidAt?.toISOString() ?? null,
        payUntil: order.state === 'open' ? (order.payUntil?.toISOString() ?? null) : null,
        paymentUrl: isPayable ? order.paymentUrl : null,
        receiptNumber: order.receiptNumber,
        lines: lines
          .filter((line) => line.orderId === order.id)
          .map((line) => ({
            id: line.id,
            kitSlug: kitOf.get(line.kitId)?.slug ?? '',
            kitName: line.kitName,
            colour: kitOf.get(line.kitId)?.colour ?? 'blue',
            licenceName: line.licenceName,
            revision: line.revisionLabel,
            price: money(line.priceMinor),
            discount: money(line.discountMinor),
            total: money(line.totalMinor),
            refunded: money(line.refundedMinor),
            right: rights.get(line.id) ?? null,
          })),
        subtotal: money(order.subtotalMinor),
        discount: money(order.discountMinor),
        total: money(order.totalMinor),
        refunded: money(order.refundedMinor),
        refunds: refunds.get(order.id) ?? [],
        tax: (order.tax ?? []).map((line) => ({
          ratePercent: line.ratePercent,
          net: money(line.netMinor),
          tax: money(line.taxMinor),
        })),
        taxTreatment: order.taxTreatment,
        business: order.business,
        gift: order.gift,
        couponCode: order.couponCode,
        isMine: person !== null && order.personId === person.id,
      };
    });
  }
}
