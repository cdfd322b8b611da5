import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import { renderEmail, type EmailMessage } from '@windchest/emails';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { Clock } from '../adapters/clock/clock.js';
import { Mailer, MailRefused } from '../adapters/mailer/mailer.js';
import { LinkTokens, withTokens } from '../adapters/secrets/link-tokens.js';
import { InjectConfig, type Config } from '../config/config.js';
import { selectRows, touchRows } from '../database/rows.js';
import { HandlesJob, type Finish, type JobHandler } from '../jobs/job.js';
import { sendMail } from './send-mail.job.js';

interface MailRow {
  id: string;
  to_address: string;
  message: unknown;
  state: 'queued' | 'handed-over' | 'sent' | 'refused';
}

/** Whether the database took the note, once that is known. */
interface HandedOver {
  readonly isNoted: Promise<boolean>;
}

/**
 * Sends one mail exactly once. The row turns `handed-over` just before the last line goes out: a row
 * found in that state by a later run was delivered by an earlier one that died before it could say so.
 */
@Injectable()
@HandlesJob(sendMail)
export class SendMail implements JobHandler<typeof sendMail.payload> {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectConfig() private readonly config: Config,
    private readonly mailer: Mailer,
    private readonly tokens: LinkTokens,
    private readonly clock: Clock,
  ) {}

  async handle({ mailId }: z.output<typeof sendMail.payload>): Promise<Finish | void> {
    const [mail] = await selectRows<MailRow>(
      this.database,
      'SELECT id, to_address, message, state FROM mails WHERE id = :mailId',
      { mailId },
    );
    if (!mail || mail.state === 'sent' || mail.state === 'refused') return;
    if (mail.state === 'handed-over') return this.markSent(mailId);

    const message = (
      typeof mail.message === 'string' ? JSON.parse(mail.message) : mail.message
    ) as EmailMessage;
    const { subject, html, text } = renderEmail(withTokens(message, this.tokens), {
      name: this.config.WORKSHOP_NAME,
      baseUrl: this.config.BASE_URL,
      address: this.config.WORKSHOP_ADDRESS,
      locale: this.config.WORKSHOP_LOCALE,
    });
    const messageId = `<${mailId}@${new URL(this.config.BASE_URL).hostname}>`;
    let handedOver: HandedOver | undefined;
    try {
      await this.mailer.send(
        { to: mail.to_address, subject, html, text, messageId },
        {
          beforeLastLine: async () => {
            handedOver = await this.handOver(mailId, subject);
          },
        },
      );
    } catch (fault) {
      // What is undone below must have been done first.
      await handedOver?.isNoted;
      if (fault instanceof MailRefused) {
        const { message: reason } = fault;
        return async (tx) => {
          await touchRows(
            this.database,
            `UPDATE mails SET state = 'refused', last_error = :reason WHERE id = :mailId`,
            { reason, mailId },
            tx,
          );
        };
      }
      // The server said no, or never answered the last line while this process lived: it did not take the mail.
      await touchRows(
        this.database,
        `UPDATE mails SET state = 'queued', last_error = :reason WHERE id = :mailId AND state = 'handed-over'`,
        {
          reason: (fault as Error).message,
          mailId,
        },
      );
      throw fault;
    }
    await handedOver?.isNoted;
    return this.markSent(mailId);
  }

  /**
   * The change waits in an open transaction until the database has granted it; its commit and the mail's last
   * line then leave this process within one turn, the commit first. Waiting for the commit's answer would leave
   * a mail noted and unsent, should the process die meanwhile.
   */
  private async handOver(mailId: string, subject: string): Promise<HandedOver> {
    const tx = await this.database.transaction();
    try {
      const mine = await touchRows(
        this.database,
        `UPDATE mails SET state = 'handed-over', subject = :subject WHERE id = :mailId AND state = 'queued'`,
        { mailId, subject },
        tx,
      );
      if (mine !== 1) throw new Error('Another worker is sending this mail.');
    } catch (fault) {
      await tx.rollback();
      throw fault;
    }
    const isNoted = tx.commit().then(
      () => true,
      () => false,
    );
    return { isNoted };
  }

  private markSent(mailId: string): Finish {
    return async (tx) => {
      await touchRows(
        this.database,
        `UPDATE mails SET state = 'sent', sent_at = :now, last_error = NULL WHERE id = :mailId`,
        { now: this.clock.now(), mailId },
        tx,
      );
    };
  }
}
