import { Injectable } from '@nestjs/common';
import { InjectConnection, InjectModel } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import type { z } from 'zod';
import { Clock } from '../adapters/clock/clock.js';
import { newId } from '../database/columns.js';
import { touchRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import { DownloadLinks } from '../entitlements/download-links.js';
import { HandlesJob, type Finish, type JobHandler } from '../jobs/job.js';
import { JobQueue } from '../jobs/job-queue.js';
import { Audience, type Reader } from './audience.js';
import { beginLetter, LANES, sendLetter } from './begin-letter.job.js';
import { fieldsIn } from './letter-fields.js';
import { LetterMatters } from './letter-matter.js';
import { Letter } from './letter.model.js';

const PORTION = 1000;

/**
 * Writes one row for each reader, those left out with their reason, portion by portion in one transaction
 * and from one view of the data. From then on the letter knows its readers by itself: a person is written
 * once, by account and by address, however often this runs.
 */
@Injectable()
@HandlesJob(beginLetter)
export class BeginLetter implements JobHandler<typeof beginLetter.payload> {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    @InjectModel(Letter) private readonly letters: typeof Letter,
    private readonly audience: Audience,
    private readonly matters: LetterMatters,
    private readonly links: DownloadLinks,
    private readonly jobs: JobQueue,
    private readonly clock: Clock,
  ) {}

  handle({ letterId, run }: z.output<typeof beginLetter.payload>): Promise<Finish> {
    return Promise.resolve(async (tx) => {
      const letter = await this.letters.findByPk(letterId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!letter || letter.state !== 'scheduled' || letter.run !== run) return;
      await this.freeze(tx, letter);
      const now = this.clock.now();
      await letter.update({ state: 'sending', startedAt: now, updatedAt: now }, { transaction: tx });
      await this.setGoing(tx, letter);
    });
  }

  async setGoing(tx: Tx, { id: letterId, run }: Letter): Promise<void> {
    for (let lane = 0; lane < LANES; lane++)
      await this.jobs.add(
        tx,
        sendLetter,
        { letterId, run, lane },
        { key: `letter:${letterId}:${run}:${lane}` },
      );
  }

  private async freeze(tx: Tx, letter: Letter): Promise<void> {
    const matter = await this.matters.of(letter);
    // What "the newest" meant when it went out is kept: later revisions do not change a letter.
    if (matter.target) await letter.update({ revisionId: matter.target.id }, { transaction: tx });
    const part = await this.audience.partOf(letter, matter);
    const needsLink = fieldsIn(letter.body).has('download_link');
    for (let after = ''; ;) {
      const readers = await this.audience.portion(part, after, PORTION, tx);
      if (readers.length > 0) await this.write(tx, letter.id, readers, needsLink);
      const last = readers.at(-1);
      if (!last || readers.length < PORTION) return;
      after = last.reader;
    }
  }

  private async write(
    tx: Tx,
    letterId: string,
    readers: readonly Reader[],
    needsLink: boolean,
  ): Promise<void> {
    const now = this.clock.now();
    const rows: unknown[][] = [];
    for (const one of readers) {
      // Somebody without an account reaches the files by a link of their own.
      const linkId =
        needsLink && one.personId === null && one.orderId !== null && one.leftOut === null
          ? await this.links.issue(tx, one.orderId, one.email)
          : null;
      rows.push([
        newId(),
        letterId,
        one.personId,
        one.email,
        one.name,
        one.heldId,
        linkId,
        one.leftOut === null ? 'queued' : 'left-out',
        one.leftOut,
        now.toISOString().replace('T', ' ').replace('Z', ''),
      ]);
    }
    await touchRows(
      this.database,
      `INSERT INTO letter_recipients (id, letter_id, person_id, email, name, held_revision_id, link_id, state, reason, due_at)
       VALUES :rows ON DUPLICATE KEY UPDATE letter_recipients.id = letter_recipients.id`,
      { rows },
      tx,
    );
  }
}
