import { Injectable, type OnModuleInit } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { readPaymentEvent, type PaymentEventFacts } from '../../adapters/payments/payment-event.js';
import { PaymentsRefused, PaymentsUnreachable } from '../../adapters/payments/payments.js';
import { Transactions, type Tx } from '../../database/transactions.js';
import { TryLater } from '../../jobs/job.js';
import { PaymentEventHandlers, type StoredPaymentEvent } from '../../payments/payment-event-handlers.js';
import { LookAtPledge } from './look-at-pledge.js';
import { PledgeHistory } from './pledge-history.js';
import { PledgePayment } from './pledge-payment.model.js';
import { Pledge } from './pledge.model.js';

const AGAIN_SECONDS = 30;

/** Events that tell of a change here; the service sends others beside each of them, and one look is enough. */
const TELLING: ReadonlySet<string> = new Set([
  'customer.subscription.updated',
  'customer.subscription.deleted',
  'invoice.paid',
  'invoice.payment_failed',
  'invoice.voided',
  'invoice.marked_uncollectible',
]);

/**
 * Works on events of pledges: of their pages, subscriptions and invoices, and of money that goes back. An event is
 * a hint to look, not the news itself; so one that comes late, twice or before another does no harm.
 */
@Injectable()
export class PledgeEvents implements OnModuleInit {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    @InjectModel(PledgePayment) private readonly payments: typeof PledgePayment,
    private readonly events: PaymentEventHandlers,
    private readonly transactions: Transactions,
    private readonly looking: LookAtPledge,
    private readonly history: PledgeHistory,
  ) {}

  onModuleInit(): void {
    this.events.register({ name: 'pledges', order: 10, handle: (event) => this.handle(event) });
  }

  private async handle(event: StoredPaymentEvent): Promise<string | null> {
    const facts = readPaymentEvent(event.type, event.subjectId, event.payload);
    switch (facts.subject) {
      case 'page':
        return facts.pageKind === 'order' ? null : this.lookAt(await this.pledgeOf(facts));
      case 'subscription':
      case 'invoice':
        return TELLING.has(event.type) ? this.lookAt(await this.pledgeOf(facts)) : 'nothing to do';
      case 'charge':
      case 'refund':
      case 'dispute':
        return this.noteMoneyBack(event, facts);
      case 'payment':
      case 'customer':
      case 'other':
        return null;
    }
  }

  private async lookAt(pledge: Pledge | null): Promise<string> {
    // The pledge is written before its page is opened: what is not here belongs to somebody else.
    if (!pledge) return 'no pledge here';
    try {
      return `the pledge is ${(await this.looking.look(pledge.id)) ?? 'gone'}`;
    } catch (fault) {
      if (fault instanceof PaymentsUnreachable) throw new TryLater(AGAIN_SECONDS);
      if (!(fault instanceof PaymentsRefused)) throw fault;
      return `the payment service knows no such pledge: ${fault.message}`;
    }
  }

  /** Null where no pledge was paid with it: then it may be an order's. */
  private async noteMoneyBack(event: StoredPaymentEvent, facts: PaymentEventFacts): Promise<string | null> {
    const { paymentIntentId } = facts;
    const payment = paymentIntentId ? await this.payments.findOne({ where: { paymentIntentId } }) : null;
    if (!payment) return null;
    const flag =
      event.type === 'charge.refunded' ? 'refunded-outside' : facts.subject === 'dispute' ? 'disputed' : null;
    if (!flag) return 'nothing to do';
    const detail = `receipt ${payment.receiptNumber ?? 'none'}`;
    await this.withPledge(payment.pledgeId, (tx, pledge) => this.history.flag(tx, pledge, flag, detail));
    if (flag === 'disputed') await this.lookAt(await this.pledges.findByPk(payment.pledgeId));
    const outcome = `noted on pledge ${payment.pledgeId}`;
    await this.withPledge(payment.pledgeId, async (tx, { id }) => {
      if (await this.events.markHandled(tx, event.id, outcome))
        await this.history.add(tx, id, event.type, detail);
    });
    return outcome;
  }

  private withPledge(id: string, work: (tx: Tx, pledge: Pledge) => Promise<void>): Promise<void> {
    return this.transactions.run(async (tx) => {
      const pledge = await this.pledges.findByPk(id, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (pledge) await work(tx, pledge);
    }, 'read-committed');
  }

  private async pledgeOf({ pledgeId, subscriptionId }: PaymentEventFacts): Promise<Pledge | null> {
    const named = pledgeId && UUID.test(pledgeId) ? await this.pledges.findByPk(pledgeId) : null;
    return named ?? (subscriptionId ? this.pledges.findOne({ where: { subscriptionId } }) : null);
  }
}

const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/;
