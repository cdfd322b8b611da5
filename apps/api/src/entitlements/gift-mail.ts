import { Injectable } from '@nestjs/common';
import type { GiftWish } from '@windchest/contracts';
import { tokenPlaceholder } from '../adapters/secrets/link-tokens.js';
import { InjectConfig, type Config } from '../config/config.js';
import type { Tx } from '../database/transactions.js';
import { MailOutbox } from '../mails/mail-outbox.js';
import { CAUTIONS } from '../orders/order-paid-mail.js';
import type { PaidOrder } from '../orders/order-paid-steps.js';

/** Queues the e-mail that hands a gift over to the one it is for. It tells nothing of what was paid. */
@Injectable()
export class GiftMail {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly mails: MailOutbox,
  ) {}

  async queue(tx: Tx, order: PaidOrder, gift: GiftWish, linkId: string): Promise<void> {
    await this.mails.add(tx, {
      to: gift.email,
      key: `gift:${order.id}`,
      about: `order:${order.id}`,
      message: {
        template: 'gift-received',
        from: gift.giver,
        note: gift.greeting,
        kits: order.lines.map((line) => ({
          kit: line.kitName,
          licence: line.licenceName,
          revision: line.revisionLabel,
        })),
        link: `${this.config.BASE_URL}/collect/${tokenPlaceholder('collect', linkId)}`,
        linkDays: this.config.LINK_DAYS,
        linkUses: this.config.LINK_USES,
        cautionsLine: CAUTIONS,
      },
    });
  }
}
