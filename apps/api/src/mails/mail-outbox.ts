import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { EmailMessage } from '@windchest/emails';
import type { Sequelize } from 'sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { newId } from '../database/columns.js';
import { selectRows, touchRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import { JobQueue } from '../jobs/job-queue.js';
import { sendMail } from './send-mail.job.js';

export interface MailRequest {
  readonly to: string;
  readonly message: EmailMessage;
  /** A second mail with the same key is not written: the fact it tells was told. */
  readonly key: string;
  /** What it is about, as `order:<id>`, to list it there. */
  readonly about?: string;
}

export interface MailRecord {
  id: string;
  subject: string;
  state: string;
  sentAt: Date | null;
}

/** E-mails are written in the transaction that causes them and sent by a job. */
@Injectable()
export class MailOutbox {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly jobs: JobQueue,
    private readonly clock: Clock,
  ) {}

  async add(tx: Tx, { to, message, key, about }: MailRequest): Promise<void> {
    const id = newId();
    const written = await touchRows(
      this.database,
      `INSERT INTO mails (id, template, to_address, message, dedupe_key, about, created_at)
       VALUES (:id, :template, :to, :message, :key, :about, :now) ON DUPLICATE KEY UPDATE id = id`,
      {
        id,
        template: message.template,
        to,
        message: JSON.stringify(message),
        key,
        about: about ?? null,
        now: this.clock.now(),
      },
      tx,
    );
    if (written === 1) await this.jobs.add(tx, sendMail, { mailId: id }, { key: `mail:${id}` });
  }

  listAbout(about: string): Promise<MailRecord[]> {
    return selectRows<MailRecord>(
      this.database,
      'SELECT id, COALESCE(subject, template) AS subject, state, sent_at AS sentAt FROM mails WHERE about = :about ORDER BY created_at',
      { about },
    );
  }
}
