import { Injectable } from '@nestjs/common';
import { tokenPlaceholder } from '../adapters/secrets/link-tokens.js';
import { InjectConfig, type Config } from '../config/config.js';
import type { Tx } from '../database/transactions.js';
import { MailOutbox } from '../mails/mail-outbox.js';
import type { PaidOrder } from './order-paid-steps.js';

/** The whole list of cautions is each kit's own and stands in its build book. */
export const CAUTIONS =
  'Air the room while you print. Wear eye protection when you stretch bands or strings. Small parts: not for children under three. Each build book has the whole list.';

const taxNotes: Partial<Record<PaidOrder['taxTreatment'], string>> = {
  'reverse-charge': 'Reverse charge: your business owes the VAT in its own country.',
  'business-abroad': 'No VAT is charged: your business is established outside the European Union.',
};

/** Queues the e-mail that hands over what was bought. */
@Injectable()
export class OrderPaidMail {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly mails: MailOutbox,
  ) {}

  async queue(tx: Tx, order: PaidOrder, name: string | undefined): Promise<void> {
    const money = (minor: number) => ({ minor, currency: order.currency });
    const { receiptNumber = '', tax = [], linkId } = order.facts;
    const orderLink = `${this.config.BASE_URL}/orders/${order.id}#key=${tokenPlaceholder('order-key', order.id)}`;
    await this.mails.add(tx, {
      to: order.email,
      key: `order-paid:${order.id}`,
      about: `order:${order.id}`,
      message: {
        template: 'order-paid',
        ...(name ? { name } : {}),
        orderNumber: order.number,
        receiptNumber,
        lines: order.lines.map((line) => ({
          kit: line.kitName,
          licence: line.licenceName,
          revision: line.revisionLabel,
          total: money(line.totalMinor),
          ...(line.discountMinor > 0 ? { discount: money(line.discountMinor) } : {}),
        })),
        subtotal: money(order.subtotalMinor),
        ...(order.discountMinor > 0 ? { discount: money(order.discountMinor) } : {}),
        ...(order.couponCode ? { couponCode: order.couponCode } : {}),
        total: money(order.totalMinor),
        tax: tax
          .filter((line) => line.taxMinor > 0)
          .map((line) => ({ rateLabel: `VAT ${line.ratePercent} %`, amount: money(line.taxMinor) })),
        ...(taxNotes[order.taxTreatment] ? { taxNote: taxNotes[order.taxTreatment] } : {}),
        ...(order.gift ? { giftTo: order.gift.email } : {}),
        // The link of a gift is in the mail of the one who gets it.
        link:
          linkId && !order.gift
            ? `${this.config.BASE_URL}/collect/${tokenPlaceholder('collect', linkId)}`
            : orderLink,
        linkDays: this.config.LINK_DAYS,
        linkUses: this.config.LINK_USES,
        orderLink,
        cautionsLine: CAUTIONS,
      },
    });
  }
}
