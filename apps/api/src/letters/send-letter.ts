import { randomUUID } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { Clock } from '../adapters/clock/clock.js';
import { InjectConfig, type Config } from '../config/config.js';
import { selectRows } from '../database/rows.js';
import { HandlesJob, TryLater, type JobHandler } from '../jobs/job.js';
import { sendLetter } from './begin-letter.job.js';
import { ClaimRecipients, type ClaimedRecipient } from './claim-recipients.js';
import { LetterDesk, type OpenLetter } from './letter-desk.js';
import { Letter } from './letter.model.js';
import { MailLetter } from './mail-letter.js';
import { RecipientRecord } from './recipient-record.js';

/** A lane gives its worker back after this time, so that other jobs get their turn. */
const SLICE_MS = 3000;
/** Mails of one lane under way at once, each over a connection of its own. */
const AT_ONCE = 8;

/** One lane of a letter on its way: claims a few readers, mails each at its turn, and so on for a while. */
@Injectable()
@HandlesJob(sendLetter)
export class SendLetter implements JobHandler<typeof sendLetter.payload> {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Letter) private readonly letters: typeof Letter,
    @InjectConfig() private readonly config: Config,
    private readonly claims: ClaimRecipients,
    private readonly desk: LetterDesk,
    private readonly mail: MailLetter,
    private readonly record: RecipientRecord,
    private readonly clock: Clock,
  ) {}

  async handle({ letterId, run }: z.output<typeof sendLetter.payload>): Promise<void> {
    const letter = await this.letters.findByPk(letterId);
    if (!letter || letter.state !== 'sending' || letter.run !== run) return;
    const open = await this.desk.open(letter);
    const worker = `${process.pid}-${randomUUID().slice(0, 8)}`;
    const until = performance.now() + SLICE_MS;
    while (performance.now() < until) {
      const claim = await this.claims.next(letterId, run, worker);
      if (claim.kind === 'over') return;
      if (claim.kind === 'wait') throw new TryLater(claim.seconds);
      await this.mailAll(letter, open, claim.recipients, worker);
    }
    throw new TryLater(0);
  }

  private async mailAll(
    letter: Letter,
    open: OpenLetter,
    recipients: readonly ClaimedRecipient[],
    worker: string,
  ): Promise<void> {
    const newsReaders =
      letter.kind === 'news' ? await this.newsReaderIds(recipients) : new Map<string, string>();
    const waiting = [...recipients];
    const sent: string[] = [];
    const lane = async (): Promise<void> => {
      for (let one = waiting.shift(); one; one = waiting.shift()) {
        await until(one.at.getTime() - this.clock.now().getTime());
        const newsReaderId = newsReaders.get(one.email.toLowerCase()) ?? null;
        if (await this.mail.to(letter, open, { ...one, newsReaderId }, worker)) sent.push(one.id);
      }
    };
    const beat = setInterval(
      () => void this.record.renew(worker).catch(() => undefined),
      (this.config.JOB_LEASE_SECONDS * 1000) / 3,
    );
    try {
      await Promise.all(Array.from({ length: Math.min(AT_ONCE, recipients.length) }, lane));
    } finally {
      clearInterval(beat);
      await this.record.markSent(sent, worker);
    }
  }

  private async newsReaderIds(recipients: readonly ClaimedRecipient[]): Promise<Map<string, string>> {
    const rows = await selectRows<{ id: string; email: string }>(
      this.database,
      'SELECT id, email FROM news_readers WHERE email IN (:emails)',
      { emails: recipients.map(({ email }) => email) },
    );
    return new Map(rows.map(({ id, email }) => [email.toLowerCase(), id]));
  }
}

const until = (milliseconds: number): Promise<void> =>
  milliseconds > 0 ? new Promise((resolve) => setTimeout(resolve, milliseconds)) : Promise.resolve();
