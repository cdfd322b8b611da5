import { Injectable } from '@nestjs/common';
import { Invoices } from '../../adapters/payments/invoices.js';
import { CardDeclined, Payments, PaymentsRefused } from '../../adapters/payments/payments.js';
import { Subscriptions, type PledgePage } from '../../adapters/payments/subscriptions.js';
import type { PledgeRecord, PledgeView } from './pledge-record.js';
import type { ServiceDeed } from './wishes.js';

/** A view, and where the pledge was found. */
export interface AskedView extends PledgeView {
  readonly subscriptionId: string | null;
}

type Asked = Pick<PledgeRecord, 'sessionId' | 'subscriptionId' | 'cardPageId' | 'flags'>;

/** Asks the payment service how a pledge stands there, and passes on what was wished here. */
@Injectable()
export class AskService {
  constructor(
    private readonly subscriptions: Subscriptions,
    private readonly invoices: Invoices,
    private readonly payments: Payments,
  ) {}

  async view(pledge: Asked): Promise<AskedView> {
    const page =
      pledge.subscriptionId || !pledge.sessionId ? null : await this.subscriptions.findPage(pledge.sessionId);
    const subscriptionId = pledge.subscriptionId ?? page?.subscriptionId ?? null;
    const subscription = subscriptionId ? await this.subscriptions.findSubscription(subscriptionId) : null;
    const invoices = subscriptionId ? await this.invoices.listInvoices(subscriptionId) : [];
    return {
      subscriptionId,
      subscription,
      isPageExpired: page?.state === 'expired',
      billingCountry: page?.billingCountry ?? null,
      invoices,
      disputes: pledge.flags.includes('disputed') ? await this.disputes(invoices) : null,
    };
  }

  /** Doing it again, after a crash or a lost answer, changes nothing more. */
  async perform(subscriptionId: string, deed: ServiceDeed, key: string): Promise<void> {
    try {
      await this.passOn(subscriptionId, deed, key);
    } catch (fault) {
      // The month turned over, or somebody was quicker: how it stands then is found out by asking again.
      if (!(fault instanceof PaymentsRefused)) throw fault;
    }
  }

  private passOn(subscriptionId: string, deed: ServiceDeed, key: string): Promise<unknown> {
    switch (deed.kind) {
      case 'cancel-now':
        return this.subscriptions.cancelNow(subscriptionId);
      case 'cancel-at-period-end':
        return this.subscriptions.cancelAtPeriodEnd(subscriptionId);
      case 'undo-cancel':
        return this.subscriptions.undoCancel(subscriptionId);
      case 'pause':
        return this.subscriptions.pause(subscriptionId);
      case 'resume':
        return this.subscriptions.resume(subscriptionId);
      case 'change-amount':
        return this.subscriptions.changeSubscriptionAmount(subscriptionId, deed.amountMinor, key);
    }
  }

  /**
   * Where a card was given on the page last opened, makes it the pledge's card and tries what is owed with it.
   * @returns how the page stands
   */
  async adoptCard(cardPageId: string): Promise<PledgePage['state']> {
    const page = await this.subscriptions.findPage(cardPageId);
    if (page.state !== 'complete') return page.state;
    const { id } = await this.subscriptions.adoptCard(cardPageId);
    for (const invoice of await this.invoices.listInvoices(id))
      if (invoice.state === 'open' && invoice.attempts > 0) await this.tryAgain(invoice.id);
    return 'complete';
  }

  private async tryAgain(invoiceId: string): Promise<void> {
    try {
      await this.invoices.payInvoice(invoiceId);
    } catch (fault) {
      // The new card was refused as well, or the invoice is paid by now: the next look tells.
      if (!(fault instanceof CardDeclined) && !(fault instanceof PaymentsRefused)) throw fault;
    }
  }

  private async disputes(
    invoices: readonly { id: string; state: string; paymentIntentId: string | null }[],
  ): Promise<NonNullable<PledgeView['disputes']>> {
    const found: { invoiceId: string; state: 'open' | 'lost' | null }[] = [];
    for (const { id, state, paymentIntentId } of invoices) {
      if (state !== 'paid' || !paymentIntentId) continue;
      const states = (await this.payments.disputesOf(paymentIntentId)).map((dispute) => dispute.state);
      const isOpen = states.includes('needs-response') || states.includes('under-review');
      found.push({ invoiceId: id, state: isOpen ? 'open' : states.includes('lost') ? 'lost' : null });
    }
    return found;
  }
}
