import {
  Payments,
  PaymentsRefused,
  type PaymentDispute,
  type PaymentEvent,
  type PaymentRefund,
  type PaymentSession,
  type RefundRequest,
  type SessionRequest,
} from '../../adapters/payments/payments.js';
import type { BalanceEntry, BalancePage } from '../../adapters/payments/reconciliation.js';
import type { Clock } from '../../adapters/clock/clock.js';

interface Intent {
  readonly session: PaymentSession;
  readonly cardCountry: string;
}
const PAGE = 100;

/** A payment service in memory, as the shop sees one, with a book of its own of every movement. */
export class SimulatedPayments extends Payments {
  private readonly sessions = new Map<string, PaymentSession>();
  private readonly intents = new Map<string, Intent>();
  private readonly refunds = new Map<string, PaymentRefund>();
  private readonly disputes = new Map<string, PaymentDispute>();
  readonly book: BalanceEntry[] = [];
  private count = 0;

  constructor(private readonly clock: Pick<Clock, 'now'>) {
    super();
  }

  openSession(request: SessionRequest): Promise<PaymentSession> {
    const session: PaymentSession = {
      id: this.id('cs'),
      url: 'https://pay.example/page',
      state: 'open',
      orderId: request.orderId,
      paymentIntentId: null,
      amountMinor: request.lines.reduce((sum, line) => sum + line.amountMinor, 0),
      currency: request.currency,
      email: request.email,
      billingCountry: null,
      billingName: null,
      billingLines: [],
      expiresAt: request.expiresAt,
    };
    this.sessions.set(session.id, session);
    return Promise.resolve(session);
  }

  session(sessionId: string): Promise<PaymentSession> {
    const session = this.sessions.get(sessionId);
    return session ? Promise.resolve(session) : Promise.reject(new PaymentsRefused('no such page'));
  }

  async expireSession(sessionId: string): Promise<PaymentSession> {
    const session = await this.session(sessionId);
    if (session.state !== 'open') return session;
    return this.keep({ ...session, state: 'expired' });
  }

  cardCountry(paymentIntentId: string): Promise<string | null> {
    return Promise.resolve(this.intents.get(paymentIntentId)?.cardCountry ?? null);
  }

  refund(request: RefundRequest): Promise<PaymentRefund> {
    return Promise.resolve(this.giveBack(request.paymentIntentId, request.amountMinor, request.metadata));
  }

  findRefund(refundId: string): Promise<PaymentRefund> {
    const refund = this.refunds.get(refundId);
    return refund ? Promise.resolve(refund) : Promise.reject(new PaymentsRefused('no such refund'));
  }

  refundsOf(paymentIntentId: string): Promise<readonly PaymentRefund[]> {
    return Promise.resolve(
      [...this.refunds.values()].filter((one) => one.paymentIntentId === paymentIntentId).reverse(),
    );
  }

  findDispute(disputeId: string): Promise<PaymentDispute> {
    const dispute = this.disputes.get(disputeId);
    return dispute ? Promise.resolve(dispute) : Promise.reject(new PaymentsRefused('no such dispute'));
  }

  disputesOf(paymentIntentId: string): Promise<readonly PaymentDispute[]> {
    return Promise.resolve(
      [...this.disputes.values()].filter((one) => one.paymentIntentId === paymentIntentId).reverse(),
    );
  }

  readEvent(): PaymentEvent {
    throw new Error('Nothing is told by events here.');
  }

  /** What the service's own list of movements gives, page by page, newest first. */
  listBalance(from: Date, to: Date, after: string | null = null): Promise<BalancePage> {
    const within = this.book.filter(({ occurredAt }) => occurredAt >= from && occurredAt < to).reverse();
    const start = after === null ? 0 : within.findIndex((entry) => entry.id === after) + 1;
    const entries = within.slice(start, start + PAGE);
    const hasMore = start + PAGE < within.length;
    return Promise.resolve({ entries, next: hasMore ? (entries.at(-1)?.id ?? null) : null });
  }

  /** The buyer pays. @returns the payment's id */
  pay(sessionId: string, billing: string, card: string): string {
    const session = this.sessions.get(sessionId);
    if (session?.state !== 'open') throw new Error('This page cannot be paid.');
    const paymentIntentId = this.id('pi');
    const paid = this.keep({ ...session, state: 'paid', paymentIntentId, billingCountry: billing });
    this.intents.set(paymentIntentId, { session: paid, cardCountry: card });
    this.note('payment', paymentIntentId, this.id('ch'), paid.amountMinor);
    return paymentIntentId;
  }

  /** Money goes back, asked for by the shop or made at the service's own pages. */
  giveBack(
    paymentIntentId: string,
    amountMinor: number,
    metadata: Readonly<Record<string, string>> = {},
  ): PaymentRefund {
    const refund: PaymentRefund = {
      id: this.id('re'),
      paymentIntentId,
      chargeId: null,
      amountMinor,
      currency: this.currencyOf(paymentIntentId),
      state: 'succeeded',
      failure: null,
      metadata,
      createdAt: this.clock.now(),
    };
    this.refunds.set(refund.id, refund);
    this.note('refund', paymentIntentId, refund.id, -amountMinor);
    return refund;
  }

  /** The buyer's bank takes the money. @returns the dispute's id */
  dispute(paymentIntentId: string, amountMinor: number): string {
    const id = this.id('dp');
    this.disputes.set(id, {
      id,
      paymentIntentId,
      chargeId: '',
      amountMinor,
      currency: this.currencyOf(paymentIntentId),
      reason: 'product_not_received',
      state: 'needs-response',
      evidenceDueAt: null,
      hasEvidence: false,
      createdAt: this.clock.now(),
    });
    this.note('dispute', paymentIntentId, id, -amountMinor);
    return id;
  }

  decide(disputeId: string, state: 'won' | 'lost'): void {
    const dispute = this.disputes.get(disputeId);
    if (!dispute?.paymentIntentId) throw new Error('There is no such dispute.');
    this.disputes.set(disputeId, { ...dispute, state });
    if (state === 'won')
      this.note('dispute-reversed', dispute.paymentIntentId, disputeId, dispute.amountMinor);
  }

  private keep(session: PaymentSession): PaymentSession {
    this.sessions.set(session.id, session);
    return session;
  }

  private currencyOf(paymentIntentId: string): string {
    return this.intents.get(paymentIntentId)?.session.currency ?? '';
  }

  private note(
    kind: BalanceEntry['kind'],
    paymentIntentId: string,
    sourceId: string,
    amountMinor: number,
  ): void {
    this.book.push({
      id: this.id('txn'),
      kind,
      amountMinor,
      feeMinor: 0,
      netMinor: amountMinor,
      currency: this.currencyOf(paymentIntentId),
      occurredAt: this.clock.now(),
      sourceId,
      paymentIntentId,
      description: null,
    });
  }

  private id(prefix: string): string {
    this.count += 1;
    return `${prefix}_${String(this.count).padStart(9, '0')}`;
  }
}
