import { Injectable } from '@nestjs/common';
import { People } from '../../accounts/people.js';
import { tokenPlaceholder } from '../../adapters/secrets/link-tokens.js';
import { InjectConfig, type Config } from '../../config/config.js';
import type { Tx } from '../../database/transactions.js';
import { MailOutbox } from '../../mails/mail-outbox.js';
import type { MoneyBack } from './money-back-steps.js';

/** Queues the e-mail that tells a buyer of money on its way back, and of what ends with it. */
@Injectable()
export class OrderRefundedMail {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly people: People,
    private readonly mails: MailOutbox,
  ) {}

  async queue(tx: Tx, back: MoneyBack, creditNoteNumber: string): Promise<void> {
    const { order, lines } = back;
    const money = (minor: number) => ({ minor, currency: order.currency });
    const { tax = [], endedKits = [], keptKits = [] } = back.facts;
    const person = order.personId ? await this.people.byId(order.personId, tx) : null;
    await this.mails.add(tx, {
      to: order.email,
      key: `order-refunded:${back.refundId}`,
      about: `order:${order.id}`,
      message: {
        template: 'order-refunded',
        ...(person ? { name: person.name } : {}),
        orderNumber: order.number,
        receiptNumber: order.receiptNumber ?? '',
        creditNoteNumber,
        cause: back.cause,
        amount: money(back.amountMinor),
        tax: tax
          .filter((line) => line.taxMinor > 0)
          .map((line) => ({ rateLabel: `VAT ${line.ratePercent} %`, amount: money(line.taxMinor) })),
        lines: lines
          .filter((line) => line.amountMinor > 0)
          .map(({ kitName, licenceName, amountMinor, endsRight }) => ({
            kit: kitName,
            licence: licenceName,
            amount: money(amountMinor),
            endsRight,
          })),
        endedKits: [...endedKits],
        keptKits: [...keptKits],
        ...(order.gift ? { giftTo: order.gift.email } : {}),
        ...(order.couponCode ? { couponCode: order.couponCode } : {}),
        orderLink: `${this.config.BASE_URL}/orders/${order.id}#key=${tokenPlaceholder('order-key', order.id)}`,
      },
    });
  }
}
