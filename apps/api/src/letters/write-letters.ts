import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Letter as ShownLetter, LetterBody } from '@windchest/contracts';
import { StaffLog } from '../accounts/staff-log.js';
import { Clock } from '../adapters/clock/clock.js';
import { newId } from '../database/columns.js';
import { Transactions, type Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { checkFields } from './letter-fields.js';
import { LetterMatters } from './letter-matter.js';
import { Letter } from './letter.model.js';
import { ShowLetters } from './show-letters.js';

/** Drafts, changes and deletes letters; what is under way or sent stays as it is. */
@Injectable()
export class WriteLetters {
  constructor(
    @InjectModel(Letter) private readonly letters: typeof Letter,
    private readonly transactions: Transactions,
    private readonly staffLog: StaffLog,
    private readonly matters: LetterMatters,
    private readonly show: ShowLetters,
    private readonly clock: Clock,
  ) {}

  async draft(person: SignedIn, body: LetterBody): Promise<ShownLetter> {
    await this.check(body);
    const id = newId();
    const now = this.clock.now();
    await this.transactions.run(async (tx) => {
      await this.letters.create(
        { id, ...body, state: 'draft', writtenBy: person.id, createdAt: now, updatedAt: now },
        { transaction: tx },
      );
      await this.staffLog.record(tx, person, { what: 'drafted a letter', subject: body.subject });
    });
    return this.show.one(id);
  }

  async change(person: SignedIn, letterId: string, body: LetterBody): Promise<ShownLetter> {
    await this.check(body);
    await this.inDraft(letterId, async (tx, letter) => {
      const before = wordsOf(letter);
      await letter.update({ ...body, updatedAt: this.clock.now() }, { transaction: tx });
      await this.staffLog.record(tx, person, {
        what: 'changed a letter',
        subject: body.subject,
        before,
        after: wordsOf(letter),
      });
    });
    return this.show.one(letterId);
  }

  async delete(person: SignedIn, letterId: string): Promise<void> {
    await this.inDraft(letterId, async (tx, letter) => {
      await letter.destroy({ transaction: tx });
      await this.staffLog.record(tx, person, {
        what: 'deleted a letter',
        subject: letter.subject,
        before: wordsOf(letter),
      });
    });
  }

  private async check(body: LetterBody): Promise<void> {
    checkFields(body);
    await this.matters.of(body);
    const { ownsKit, reportedParts, heldFromId, heldToId } = body.audience;
    if (body.kitId === null && (ownsKit || reportedParts.length > 0 || heldFromId || heldToId))
      throw new Refusal('validation-failed', 'The audience asks about a kit: choose the kit first.', {
        fields: { kitId: 'Choose the kit that the audience owns.' },
      });
  }

  private inDraft(letterId: string, work: (tx: Tx, letter: Letter) => Promise<void>): Promise<void> {
    return this.transactions.run(async (tx) => {
      const letter = await this.letters.findByPk(letterId, { transaction: tx, lock: tx.LOCK.UPDATE });
      if (!letter) throw notFound('letter');
      if (letter.state !== 'draft')
        throw new Refusal(
          'letter-is-final',
          'This letter is on its way or was sent; it stays as its readers got it.',
        );
      await work(tx, letter);
    });
  }
}

const wordsOf = ({ kind, subject, body, kitId, revisionId, audience, perMinute }: Letter) => ({
  kind,
  subject,
  body,
  kitId,
  revisionId,
  audience,
  perMinute,
});
