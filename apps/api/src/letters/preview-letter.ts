import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { RenderedEmail } from '@windchest/emails';
import { newId } from '../database/columns.js';
import { Transactions } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { notFound, Refusal } from '../http/refusal.js';
import { MailOutbox } from '../mails/mail-outbox.js';
import { Audience } from './audience.js';
import type { ReaderFacts } from './compose-letter.js';
import { LetterDesk, type OpenLetter } from './letter-desk.js';
import { Letter } from './letter.model.js';

/** A letter as one of its readers gets it: to look at, and to mail to oneself. */
@Injectable()
export class PreviewLetter {
  constructor(
    @InjectModel(Letter) private readonly letters: typeof Letter,
    private readonly desk: LetterDesk,
    private readonly audience: Audience,
    private readonly transactions: Transactions,
    private readonly mails: MailOutbox,
  ) {}

  async show(
    person: SignedIn,
    letterId: string,
    reader: string | undefined,
  ): Promise<RenderedEmail & { to: string }> {
    const { open, facts, to } = await this.layReady(person, letterId, reader);
    return { to, ...open.composer.for(facts) };
  }

  async mailToSelf(person: SignedIn, letterId: string, reader: string | undefined): Promise<void> {
    const { open, facts } = await this.layReady(person, letterId, reader);
    const content = open.composer.contentFor(facts, { isTest: true });
    await this.transactions.run((tx) =>
      this.mails.add(tx, {
        to: person.email,
        message: { template: 'letter-test', content },
        key: `letter-test:${newId()}`,
        about: `letter:${letterId}`,
      }),
    );
  }

  /** A certain reader; else the first of the audience; else the one who looks, as somebody who holds nothing. */
  private async layReady(
    person: SignedIn,
    letterId: string,
    wanted: string | undefined,
  ): Promise<{ open: OpenLetter; facts: ReaderFacts; to: string }> {
    const letter = await this.letters.findByPk(letterId);
    if (!letter) throw notFound('letter');
    const open = await this.desk.open(letter);
    const found = await this.audience.one(letter, open.matter, wanted);
    if (wanted && !found)
      throw new Refusal(
        'not-found',
        'The facts of this letter fit nobody of that name. Choose another reader.',
      );
    const reader = found ?? { name: person.name, email: person.email, personId: person.id, heldId: null };
    const facts = await open.factsOf(reader);
    const stopLink = letter.kind === 'news' ? { stopLink: this.desk.stopNewsLink(newId()) } : {};
    return { open, facts: { ...facts, ...stopLink }, to: reader.email };
  }
}
