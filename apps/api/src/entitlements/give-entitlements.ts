import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { AddressVerifiedSteps, People } from '../accounts/people.js';
import { newId } from '../database/columns.js';
import { selectRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import { OrderFacts } from '../orders/order-facts.js';
import { OrderPaidSteps, type PaidOrder } from '../orders/order-paid-steps.js';
import { DownloadLinks } from './download-links.js';
import { Entitlement } from './entitlement.model.js';
import { GiftMail } from './gift-mail.js';

/** Gives what was paid for, inside the transaction that marks the order paid; joins it to the account of its address. */
@Injectable()
export class GiveEntitlements implements OnModuleInit {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Entitlement) private readonly entitlements: typeof Entitlement,
    private readonly links: DownloadLinks,
    private readonly people: People,
    private readonly giftMail: GiftMail,
    private readonly orderPaid: OrderPaidSteps,
    private readonly orderFacts: OrderFacts,
    private readonly addressVerified: AddressVerifiedSteps,
    private readonly clock: Clock,
  ) {}

  onModuleInit(): void {
    this.orderFacts.registerDownloads((orderId) => this.countDownloads(orderId));
    this.orderPaid.register({ name: 'entitlements', order: 20, run: (tx, order) => this.give(tx, order) });
    this.addressVerified.register({
      name: 'entitlements',
      order: 20,
      run: (tx, person) => this.claim(tx, person.id, person.email),
    });
  }

  private async give(tx: Tx, order: PaidOrder): Promise<void> {
    const now = this.clock.now();
    // What is given away is the other's from the first moment; the buyer has no right to the files.
    const holder = order.gift
      ? { personId: await this.people.verifiedIdByEmail(order.gift.email, tx), email: order.gift.email }
      : { personId: order.personId, email: order.email };
    await this.entitlements.bulkCreate(
      order.lines.map((line) => ({
        id: newId(),
        ...holder,
        kitId: line.kitId,
        licenceId: line.licenceId,
        source: order.gift ? 'gift' : 'purchase',
        orderId: order.id,
        orderLineId: line.id,
        state: 'active',
        createdAt: now,
        updatedAt: now,
      })),
      { transaction: tx },
    );
    order.facts.linkId = await this.links.issue(tx, order.id, holder.email);
    if (order.gift) await this.giftMail.queue(tx, order, order.gift, order.facts.linkId);
  }

  private async countDownloads(orderId: string): Promise<number> {
    const [row] = await selectRows<{ count: number | string }>(
      this.database,
      `SELECT COUNT(*) AS count FROM downloads d JOIN entitlements e ON e.id = d.entitlement_id
       WHERE e.order_id = :orderId AND d.completed_at IS NOT NULL`,
      { orderId },
    );
    return Number(row?.count ?? 0);
  }

  private async claim(tx: Tx, personId: string, email: string): Promise<void> {
    await this.entitlements.update(
      { personId, updatedAt: this.clock.now() },
      { where: { email, personId: null }, transaction: tx },
    );
  }
}
