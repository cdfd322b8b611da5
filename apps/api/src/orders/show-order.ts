import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { WorkshopOrder } from '@windchest/contracts';
import { notFound } from '../http/refusal.js';
import { MailOutbox } from '../mails/mail-outbox.js';
import { DisputeView } from './disputes/dispute-view.js';
import { placeOf } from './order-country.js';
import { OrderFacts } from './order-facts.js';
import { OrderHistory } from './order-history.js';
import { OrderView } from './order-view.js';
import { Order } from './order.model.js';
import { RefundView } from './refunds/refund-view.js';

/** One order as the workshop sees it, with all that happened to it. */
@Injectable()
export class ShowOrder {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly view: OrderView,
    private readonly refunds: RefundView,
    private readonly disputes: DisputeView,
    private readonly history: OrderHistory,
    private readonly mails: MailOutbox,
    private readonly facts: OrderFacts,
  ) {}

  async show(orderId: string): Promise<WorkshopOrder> {
    const order = await this.orders.findByPk(orderId);
    if (!order) throw notFound('order');
    const [shown, refunds, disputes, history, mails, downloads] = await Promise.all([
      this.view.one(order, null),
      this.refunds.ofOrder(orderId),
      this.disputes.ofOrder(orderId),
      this.history.list(orderId),
      this.mails.listAbout(`order:${orderId}`),
      this.facts.downloadsOf(orderId),
    ]);
    return {
      ...shown,
      // Paying is the buyer's own affair.
      paymentUrl: null,
      country: placeOf(order).country,
      flags: order.flags,
      refunds,
      disputes,
      paymentSessionId: order.sessionId,
      paymentIntentId: order.paymentIntentId,
      consentText: order.consentText,
      consentAt: order.consentAt.toISOString(),
      history: history.map(({ at, what, detail }) => ({ at: at.toISOString(), what, detail })),
      mails: mails.map(({ id, subject, state, sentAt }) => ({
        id,
        subject,
        state,
        sentAt: sentAt?.toISOString() ?? null,
      })),
      downloads,
    };
  }
}
