import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Letter as ShownLetter } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { StaffLog } from '../accounts/staff-log.js';
import { Clock } from '../adapters/clock/clock.js';
import { touchRows } from '../database/rows.js';
import { Transactions, type Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { JobQueue } from '../jobs/job-queue.js';
import { BeginLetter } from './begin-letter.js';
import { beginLetter } from './begin-letter.job.js';
import { Letter } from './letter.model.js';
import { ShowLetters } from './show-letters.js';

type Change = (tx: Tx, letter: Letter, now: Date) => Promise<{ what: string; after?: unknown }>;

/** Sends a letter, now or at a time; pauses it, goes on, and breaks it off. */
@Injectable()
export class SteerLetter {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Letter) private readonly letters: typeof Letter,
    private readonly transactions: Transactions,
    private readonly jobs: JobQueue,
    private readonly begin: BeginLetter,
    private readonly staffLog: StaffLog,
    private readonly show: ShowLetters,
    private readonly clock: Clock,
  ) {}

  send(person: SignedIn, letterId: string, sendAt: Date | null): Promise<ShownLetter> {
    return this.steer(person, letterId, async (tx, letter, now) => {
      if (letter.state !== 'draft') throw final(letter, 'Only a draft can be sent.');
      if (letter.body.trim() === '')
        throw new Refusal('validation-failed', 'The letter is empty. Write it first, then send it.');
      const run = letter.run + 1;
      await letter.update(
        { state: 'scheduled', sendAt: sendAt ?? now, run, slug: letter.slug ?? slugFor(letter) },
        { transaction: tx },
      );
      const options = { key: `letter:${letterId}:${run}:begin`, ...(sendAt ? { runAt: sendAt } : {}) };
      await this.jobs.add(tx, beginLetter, { letterId, run }, options);
      return sendAt
        ? { what: 'scheduled a letter', after: { sendAt: sendAt.toISOString() } }
        : { what: 'sent a letter' };
    });
  }

  pause(person: SignedIn, letterId: string): Promise<ShownLetter> {
    return this.steer(person, letterId, async (tx, letter) => {
      if (letter.state !== 'sending') throw final(letter, 'Only a letter that is going out can be paused.');
      await letter.update({ state: 'paused' }, { transaction: tx });
      return { what: 'paused a letter' };
    });
  }

  resume(person: SignedIn, letterId: string): Promise<ShownLetter> {
    return this.steer(person, letterId, async (tx, letter) => {
      if (letter.state !== 'paused') throw final(letter, 'Only a paused letter can go on.');
      await letter.update({ state: 'sending', run: letter.run + 1 }, { transaction: tx });
      await this.begin.setGoing(tx, letter);
      return { what: 'went on with a letter' };
    });
  }

  /** Before its time it becomes a draft again; half way, those who wait get nothing. */
  cancel(person: SignedIn, letterId: string): Promise<ShownLetter> {
    return this.steer(person, letterId, async (tx, letter, now) => {
      if (letter.state === 'scheduled') {
        await letter.update({ state: 'draft', sendAt: null, run: letter.run + 1 }, { transaction: tx });
        return { what: 'took a scheduled letter back' };
      }
      if (letter.state !== 'sending' && letter.state !== 'paused')
        throw final(letter, 'Only a letter on its way can be broken off.');
      await letter.update({ state: 'cancelled', finishedAt: now }, { transaction: tx });
      const spared = await touchRows(
        this.database,
        `UPDATE letter_recipients SET state = 'left-out', reason = 'cancelled' WHERE letter_id = :letterId AND state = 'queued'`,
        { letterId },
        tx,
      );
      return { what: 'broke a letter off', after: { notSentTo: spared } };
    });
  }

  private async steer(person: SignedIn, letterId: string, change: Change): Promise<ShownLetter> {
    await this.transactions.run(async (tx) => {
      const letter = await this.letters.findByPk(letterId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!letter) throw notFound('letter');
      const before = letter.state;
      const now = this.clock.now();
      const { what, after } = await change(tx, letter, now);
      await letter.update({ updatedAt: now }, { transaction: tx });
      await this.staffLog.record(tx, person, {
        what,
        subject: letter.subject,
        before: { state: before },
        after: { state: letter.state, ...(after as object | undefined) },
      });
    });
    return this.show.one(letterId);
  }
}

const final = (letter: Letter, sentence: string): Refusal =>
  new Refusal('letter-is-final', `${sentence} This one is ${letter.state}.`);

const slugFor = ({ subject, id }: Letter): string => {
  const words = subject
    .normalize('NFKD')
    .toLowerCase()
    .replaceAll(/[\u0300-\u036f]/g, '')
    .replaceAll(/[^a-z0-9]+/g, '-')
    .slice(0, 48)
    .replaceAll(/^-+|-+$/g, '');
  return `${words || 'letter'}-${id.slice(-8)}`;
};
