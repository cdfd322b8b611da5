import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Payments, PaymentsRefused, type PaymentSession } from '../adapters/payments/payments.js';
import { CloseOrder } from './close-order.js';
import { FulfilOrder } from './fulfil-order.js';
import { Order } from './order.model.js';

/**
 * Brings an order to where its payment page stands at the payment service now. Events, the job that looks
 * after an order, the order's page and giving up all end here, so neither what arrived first nor how often
 * makes a difference.
 */
@Injectable()
export class SettleOrder {
  constructor(
    @InjectModel(Order) private readonly orders: typeof Order,
    private readonly payments: Payments,
    private readonly fulfilling: FulfilOrder,
    private readonly closing: CloseOrder,
  ) {}

  /**
   * @returns how the page stands, or null where it is of no order here
   * @throws PaymentsUnreachable
   */
  async settle(sessionId: string): Promise<PaymentSession['state'] | null> {
    return this.follow(await this.payments.session(sessionId));
  }

  /** The same with a page just read. */
  async follow(session: PaymentSession): Promise<PaymentSession['state'] | null> {
    const order = session.orderId ? await this.orders.findByPk(session.orderId) : null;
    if (!order) return null;
    const isDone = order.paidAt !== null && order.sessionId === session.id;
    if (session.state === 'paid' && !isDone)
      await this.fulfilling.fulfil(order.id, { session, cardCountry: await this.cardCountry(session) });
    // A page that the order does not know ends without any effect on the order.
    if (session.state === 'expired' && order.sessionId === session.id)
      await this.closing.close(order.id, 'expired', { why: 'the payment page has ended unpaid' });
    return session.state;
  }

  private async cardCountry({ paymentIntentId }: PaymentSession): Promise<string | null> {
    if (!paymentIntentId) return null;
    try {
      return await this.payments.cardCountry(paymentIntentId);
    } catch (fault) {
      if (fault instanceof PaymentsRefused) return null;
      throw fault;
    }
  }
}
