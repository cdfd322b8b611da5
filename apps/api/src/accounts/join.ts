import { Injectable } from '@nestjs/common';
import type { Handled } from '@windchest/contracts';
import { Transactions } from '../database/transactions.js';
import { RateLimits } from '../http/rate-limits.js';
import { AccountLinks } from './account-links.js';
import { Passphrases } from './passphrases.js';
import { People } from './people.js';

/** A new account, to be verified by e-mail. The answer is the same where the address has one already. */
@Injectable()
export class Join {
  constructor(
    private readonly transactions: Transactions,
    private readonly people: People,
    private readonly passphrases: Passphrases,
    private readonly links: AccountLinks,
    private readonly limits: RateLimits,
  ) {}

  async join(body: Handled<'POST /accounts'>['body'], network: string): Promise<void> {
    this.passphrases.check(body.passphrase, body);
    await this.limits.take('join', network);
    await this.limits.take('mailed-link', body.email);
    // Hashed in either case, so that the time of the answer tells nothing.
    const passphraseHash = await this.passphrases.hash(body.passphrase);
    await this.transactions.run(async (tx) => {
      const known = await this.people.byEmail(body.email, tx);
      if (known) return this.links.sendAlreadyJoined(tx, known);
      const person = await this.people.create(tx, { email: body.email, name: body.name, passphraseHash });
      await this.links.sendVerification(tx, person);
    });
  }
}
