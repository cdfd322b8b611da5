import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { People } from '../../accounts/people.js';
import { Clock } from '../../adapters/clock/clock.js';
import { newId } from '../../database/columns.js';
import type { Tx } from '../../database/transactions.js';
import { locate } from '../../payments/location-evidence.js';
import { PledgePlan } from '../plans/pledge-plan.model.js';
import type { NewPayment } from './consequences.js';
import { PledgeHistory } from './pledge-history.js';
import { PledgeMails } from './pledge-mails.js';
import { PledgePayment } from './pledge-payment.model.js';
import { PledgePaidSteps, type PaidMonth } from './pledge-steps.js';
import type { Pledge } from './pledge.model.js';

/** Writes a month's payment down with its receipt and its e-mail; the invoice's id lets it happen once. */
@Injectable()
export class RecordPayment {
  constructor(
    @InjectModel(PledgePayment) private readonly payments: typeof PledgePayment,
    @InjectModel(PledgePlan) private readonly plans: typeof PledgePlan,
    private readonly people: People,
    private readonly steps: PledgePaidSteps,
    private readonly mails: PledgeMails,
    private readonly history: PledgeHistory,
    private readonly clock: Clock,
  ) {}

  /** The pledge's row must be locked by this transaction. */
  async record(tx: Tx, pledge: Pledge, { invoice, planId, isFirst }: NewPayment): Promise<void> {
    const plan = await this.plans.findByPk(planId, { transaction: tx, rejectOnEmpty: true });
    const person = await this.people.byId(pledge.personId, tx);
    const now = this.clock.now();
    const { country } = locate(
      pledge.declaredCountry,
      invoice.billingCountry ?? pledge.paymentCountry,
      invoice.cardCountry ?? pledge.cardCountry,
    );
    const payment = await this.payments.create(
      {
        id: newId(),
        pledgeId: pledge.id,
        planId,
        invoiceId: invoice.id,
        paymentIntentId: invoice.paymentIntentId,
        amountMinor: invoice.amountPaidMinor,
        currency: invoice.currency,
        country,
        periodStart: invoice.periodStart,
        periodEnd: invoice.periodEnd,
        paidAt: invoice.paidAt ?? now,
        createdAt: now,
      },
      { transaction: tx },
    );
    const month: PaidMonth = {
      paymentId: payment.id,
      pledgeId: pledge.id,
      personId: pledge.personId,
      email: person?.email ?? '',
      name: person?.name ?? '',
      planName: plan.name,
      amountMinor: payment.amountMinor,
      currency: payment.currency,
      country,
      periodStart: payment.periodStart,
      periodEnd: payment.periodEnd,
      paidAt: payment.paidAt,
      writtenAt: now,
      facts: {},
    };
    await this.steps.run(tx, month);
    const { receiptNumber = null, tax = null } = month.facts;
    await payment.update({ receiptNumber, tax }, { transaction: tx });
    await this.history.add(
      tx,
      pledge.id,
      'paid',
      `${payment.amountMinor} minor units of ${payment.currency}, receipt ${receiptNumber ?? 'none'}, by ${payment.paymentIntentId ?? payment.invoiceId}`,
    );
    if (person) await this.mails.paid(tx, pledge, month, isFirst);
  }
}
