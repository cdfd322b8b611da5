import { Injectable } from '@nestjs/common';
import { Transactions, type Tx } from '../database/transactions.js';
import { RateLimits } from '../http/rate-limits.js';
import type { SignedIn } from '../http/person.js';
import { AccountLinks } from './account-links.js';
import { OneTimeTokens } from './one-time-tokens.js';
import { People, toSignedIn } from './people.js';
import { Person } from './person.model.js';

/** Asking for links by e-mail, and using those that verify an address or sign in. */
@Injectable()
export class MailedLinks {
  constructor(
    private readonly transactions: Transactions,
    private readonly people: People,
    private readonly links: AccountLinks,
    private readonly tokens: OneTimeTokens,
    private readonly limits: RateLimits,
  ) {}

  requestSignIn(email: string, network: string): Promise<void> {
    return this.mailIfKnown(email, network, (tx, person) => this.links.sendSignIn(tx, person));
  }

  requestReset(email: string, network: string): Promise<void> {
    return this.mailIfKnown(email, network, (tx, person) => this.links.sendReset(tx, person));
  }

  async resendVerification(signedIn: SignedIn): Promise<void> {
    await this.limits.take('mailed-link', signedIn.email);
    await this.transactions.run(async (tx) => {
      const person = await this.people.byId(signedIn.id, tx);
      if (person && !person.verifiedAt) await this.links.sendVerification(tx, person);
    });
  }

  /** Whoever has a mailed link reads that address's mail: the address is verified by it. */
  async use(token: string, purpose: 'verify' | 'sign-in', network: string): Promise<SignedIn> {
    await this.limits.take('token', network);
    return this.transactions.run(async (tx) => {
      const { personId } = await this.tokens.take(tx, token, purpose);
      const person = await this.people.byId(personId, tx);
      if (!person) throw new Error('A token outlived its person.');
      await this.people.verify(tx, person);
      return toSignedIn(person);
    });
  }

  /** Answers alike whether or not somebody has this address. */
  private async mailIfKnown(
    email: string,
    network: string,
    send: (tx: Tx, person: Person) => Promise<void>,
  ): Promise<void> {
    await this.limits.take('mailed-link', email);
    await this.limits.take('mailed-link-network', network);
    await this.transactions.run(async (tx) => {
      const person = await this.people.byEmail(email, tx);
      if (person) await send(tx, person);
    });
  }
}
