import { Injectable } from '@nestjs/common';
import { People } from '../../accounts/people.js';
import { InjectConfig, type Config } from '../../config/config.js';
import type { Tx } from '../../database/transactions.js';
import { MailOutbox } from '../../mails/mail-outbox.js';
import type { Order } from '../order.model.js';
import type { Dispute } from './dispute.model.js';

/** Tells those who may refund, bookkeepers and owners, how a dispute stands; once for each turn of it. */
@Injectable()
export class DisputeMail {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly people: People,
    private readonly mails: MailOutbox,
  ) {}

  async queue(tx: Tx, order: Order, dispute: Dispute): Promise<void> {
    for (const person of await this.people.allowedTo('orders:refund', tx))
      await this.mails.add(tx, {
        to: person.email,
        key: `dispute:${dispute.id}:${dispute.state}:${dispute.updatedAt.getTime()}:${person.id}`,
        about: `order:${order.id}`,
        message: {
          template: 'payment-disputed',
          name: person.name,
          orderNumber: order.number,
          buyer: order.email,
          stand: dispute.state,
          amount: { minor: dispute.amountMinor, currency: dispute.currency },
          reason: dispute.reason,
          ...(dispute.answerBy ? { answerBy: dispute.answerBy.toISOString() } : {}),
          orderLink: `${this.config.BASE_URL}/workshop/orders/${order.id}`,
        },
      });
  }
}
