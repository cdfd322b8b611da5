import { Injectable } from '@nestjs/common';
import { Clock } from '../adapters/clock/clock.js';
import { Transactions, type Tx } from '../database/transactions.js';
import type { SignedIn } from '../http/person.js';
import { RateLimits } from '../http/rate-limits.js';
import { AccountLinks } from './account-links.js';
import { wrongCredentials } from './local.strategy.js';
import { OneTimeTokens } from './one-time-tokens.js';
import { OwnSessions } from './own-sessions.js';
import { Passphrases } from './passphrases.js';
import { People, toSignedIn } from './people.js';
import { Person } from './person.model.js';

/** A new passphrase, by the mailed link or by knowing the old one; all other sessions end. */
@Injectable()
export class SetPassphrase {
  constructor(
    private readonly transactions: Transactions,
    private readonly people: People,
    private readonly passphrases: Passphrases,
    private readonly tokens: OneTimeTokens,
    private readonly sessions: OwnSessions,
    private readonly links: AccountLinks,
    private readonly limits: RateLimits,
    private readonly clock: Clock,
  ) {}

  async byLink(token: string, passphrase: string, network: string): Promise<SignedIn> {
    await this.limits.take('token', network);
    const passphraseHash = await this.passphrases.hash(passphrase);
    return this.transactions.run(async (tx) => {
      const { personId, purpose } = await this.tokens.take(tx, token, 'reset', 'invite');
      const person = await this.people.byId(personId, tx);
      if (!person) throw new Error('A token outlived its person.');
      // Refused here the transaction is undone, and the link stays good for another try.
      this.passphrases.check(passphrase, person);
      await this.set(tx, person, passphraseHash, null, purpose === 'reset');
      await this.people.verify(tx, person);
      return toSignedIn(person);
    });
  }

  async byKnowing(signedIn: SignedIn, current: string, next: string, keepSid: string): Promise<void> {
    await this.limits.take('sign-in', signedIn.email);
    const person = await this.people.byId(signedIn.id);
    if (!person || !(await this.passphrases.matches(current, person.passphraseHash)))
      throw wrongCredentials();
    this.passphrases.check(next, person);
    const passphraseHash = await this.passphrases.hash(next);
    await this.transactions.run((tx) => this.set(tx, person, passphraseHash, keepSid, true));
  }

  private async set(
    tx: Tx,
    person: Person,
    passphraseHash: string,
    keepSid: string | null,
    isTold: boolean,
  ): Promise<void> {
    await this.people.change(tx, person, { passphraseHash });
    await this.sessions.endOthers(person.id, keepSid, tx);
    for (const purpose of ['reset', 'sign-in', 'invite'] as const)
      await this.tokens.revoke(tx, person.id, purpose);
    if (isTold) await this.links.sendPassphraseChanged(tx, person, this.clock.now());
  }
}
