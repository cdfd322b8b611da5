import { Injectable } from '@nestjs/common';
import { MailPutOff, MailRefused, Mailer } from '../adapters/mailer/mailer.js';
import { LinkTokens } from '../adapters/secrets/link-tokens.js';
import { InjectConfig, type Config } from '../config/config.js';
import { returnPathOf } from './bounce-address.js';
import type { ClaimedRecipient } from './claim-recipients.js';
import { DeadAddresses, isDeadAddressReply } from './dead-addresses.js';
import type { OpenLetter } from './letter-desk.js';
import type { Letter } from './letter.model.js';
import { LeaseLost, RecipientRecord, type HandedOver } from './recipient-record.js';

const MOST_TRIES = 8;
const WHILE_SERVER_IS_AWAY_SECONDS = 20;

/** Mails a letter to one recipient, once, and writes down what the server said. */
@Injectable()
export class MailLetter {
  private readonly host: string;

  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly mailer: Mailer,
    private readonly tokens: LinkTokens,
    private readonly record: RecipientRecord,
    private readonly dead: DeadAddresses,
  ) {
    this.host = new URL(config.BASE_URL).hostname;
  }

  /** @returns whether the server took it; the caller marks those as sent, many at a time */
  async to(
    letter: Letter,
    open: OpenLetter,
    recipient: ClaimedRecipient & { readonly newsReaderId: string | null },
    worker: string,
  ): Promise<boolean> {
    let handedOver: HandedOver | undefined;
    try {
      const { subject, html, text } = open.composer.for(await open.factsOf(recipient));
      await this.mailer.send(
        {
          to: recipient.email,
          subject,
          html,
          text,
          messageId: `<${recipient.id}@${this.host}>`,
          ...this.returnPath(recipient.id),
          ...(recipient.newsReaderId ? { headers: this.stopHeaders(recipient.newsReaderId) } : {}),
        },
        {
          beforeLastLine: async () => {
            handedOver = await this.record.handOver(recipient.id, worker);
          },
        },
      );
      await handedOver?.isNoted;
      return true;
    } catch (fault) {
      await handedOver?.isNoted;
      await this.writeDown(fault, letter, recipient, worker);
      return false;
    }
  }

  private async writeDown(
    fault: unknown,
    letter: Letter,
    { id, email, tries }: ClaimedRecipient,
    worker: string,
  ): Promise<void> {
    if (fault instanceof LeaseLost) return;
    const reason = (fault as Error).message;
    if (fault instanceof MailRefused) {
      await this.record.markRefused(id, worker, reason);
      if (isDeadAddressReply(reason)) await this.dead.note(email, reason, letter.id);
    } else if (fault instanceof MailPutOff) {
      if (tries + 1 >= MOST_TRIES) await this.record.markRefused(id, worker, reason);
      else
        await this.record.putBack(id, worker, {
          inSeconds: Math.min(30 * 2 ** tries, 3600),
          reason,
          countsAsTry: true,
        });
    }
    // No answer: the server or the way to it is gone, which says nothing about this recipient.
    else
      await this.record.putBack(id, worker, {
        inSeconds: WHILE_SERVER_IS_AWAY_SECONDS,
        reason,
        countsAsTry: false,
      });
  }

  private returnPath(recipientId: string): { returnPath?: string } {
    const { BOUNCE_ADDRESS } = this.config;
    return BOUNCE_ADDRESS ? { returnPath: returnPathOf(BOUNCE_ADDRESS, recipientId, this.tokens) } : {};
  }

  /** One press in the mail program stops the news (RFC 8058): the address takes a POST without a session. */
  private stopHeaders(newsReaderId: string): Record<string, string> {
    const address = `${this.config.BASE_URL}/api/unsubscribe/${this.tokens.tokenOf('stop-news', newsReaderId)}`;
    return {
      'List-Unsubscribe': `<${address}>`,
      'List-Unsubscribe-Post': 'List-Unsubscribe=One-Click',
    };
  }
}
