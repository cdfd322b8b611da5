import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Supporter } from '@windchest/contracts';
import { People } from '../../accounts/people.js';
import { notFound } from '../../http/refusal.js';
import { MailOutbox } from '../../mails/mail-outbox.js';
import { locate } from '../../payments/location-evidence.js';
import { PledgeHistory } from '../pledges/pledge-history.js';
import { PledgePayment } from '../pledges/pledge-payment.model.js';
import { PledgeView } from '../pledges/pledge-view.js';
import { Pledge } from '../pledges/pledge.model.js';

/** One supporter's pledge as the workshop sees it, with all that happened to it. */
@Injectable()
export class ShowSupporter {
  constructor(
    @InjectModel(Pledge) private readonly pledges: typeof Pledge,
    @InjectModel(PledgePayment) private readonly payments: typeof PledgePayment,
    private readonly view: PledgeView,
    private readonly people: People,
    private readonly history: PledgeHistory,
    private readonly mails: MailOutbox,
  ) {}

  async show(pledgeId: string): Promise<Supporter> {
    const pledge = await this.pledges.findByPk(pledgeId);
    if (!pledge) throw notFound('pledge');
    const [shown, person, history, mails, paid] = await Promise.all([
      this.view.one(pledge),
      this.people.byId(pledge.personId),
      this.history.list(pledgeId),
      this.mails.listAbout(`pledge:${pledgeId}`),
      this.payments.sum('amountMinor', { where: { pledgeId } }),
    ]);
    return {
      ...shown,
      name: person?.name ?? '',
      email: person?.email ?? '',
      country: locate(pledge.declaredCountry, pledge.paymentCountry, pledge.cardCountry).country,
      flags: pledge.flags,
      consentText: pledge.consentText,
      consentAt: pledge.consentAt.toISOString(),
      customerId: pledge.customerId,
      subscriptionId: pledge.subscriptionId,
      paid: { minor: Number(paid ?? 0), currency: pledge.currency },
      history: history.map(({ at, what, detail }) => ({ at: at.toISOString(), what, detail })),
      mails: mails.map(({ id, subject, state, sentAt }) => ({
        id,
        subject,
        state,
        sentAt: sentAt?.toISOString() ?? null,
      })),
    };
  }

  async paymentsOf(
    pledgeId: string,
    query: { page: number; size: number },
  ): Promise<Answer<'GET /workshop/supporters/:pledgeId/payments'>> {
    if (!(await this.pledges.findByPk(pledgeId))) throw notFound('pledge');
    return this.view.payments(pledgeId, query);
  }
}
