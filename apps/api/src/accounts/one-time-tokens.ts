import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import { Clock } from '../adapters/clock/clock.js';
import { LinkTokens, tokenPlaceholder } from '../adapters/secrets/link-tokens.js';
import { newId } from '../database/columns.js';
import type { Tx } from '../database/transactions.js';
import { Refusal } from '../http/refusal.js';
import { OneTimeToken, type OneTimePurpose } from './one-time-token.model.js';

/** Secrets sent by e-mail that work once and for a while; only their hashes are kept. */
@Injectable()
export class OneTimeTokens {
  constructor(
    @InjectModel(OneTimeToken) private readonly tokens: typeof OneTimeToken,
    private readonly secrets: LinkTokens,
    private readonly clock: Clock,
  ) {}

  /** @returns the id, and what an e-mail carries in the token's place until it is sent */
  async issue(
    tx: Tx,
    personId: string,
    purpose: OneTimePurpose,
    minutes: number,
  ): Promise<{ id: string; placeholder: string }> {
    const id = newId();
    await this.tokens.create(
      {
        id,
        personId,
        purpose,
        tokenHash: this.secrets.hashOf(this.secrets.tokenOf(purpose, id)),
        expiresAt: this.clock.in(minutes * 60),
        createdAt: this.clock.now(),
      },
      { transaction: tx },
    );
    return { id, placeholder: tokenPlaceholder(purpose, id) };
  }

  /**
   * Takes a token: marks it used in this transaction and answers whose it is.
   * @throws Refusal `link-is-used-up`, `link-has-expired` or `not-found`
   */
  async take(
    tx: Tx,
    token: string,
    ...purposes: OneTimePurpose[]
  ): Promise<{ personId: string; purpose: OneTimePurpose }> {
    const found = await this.tokens.findOne({
      where: { tokenHash: this.secrets.hashOf(token), purpose: purposes },
      transaction: tx,
      lock: tx.LOCK.UPDATE,
    });
    if (!found)
      throw new Refusal(
        'not-found',
        'This link is not one of ours. Check that the whole address was copied, or ask for a new one.',
      );
    if (found.usedAt)
      throw new Refusal('link-is-used-up', 'This link has been used already. Ask for a new one.');
    if (found.expiresAt <= this.clock.now())
      throw new Refusal('link-has-expired', 'This link has expired. Ask for a new one.');
    await found.update({ usedAt: this.clock.now() }, { transaction: tx });
    return { personId: found.personId, purpose: found.purpose };
  }

  /** All open tokens of a person for a purpose stop working. */
  async revoke(tx: Tx, personId: string, purpose: OneTimePurpose): Promise<void> {
    await this.tokens.update(
      { usedAt: this.clock.now() },
      { where: { personId, purpose, usedAt: null }, transaction: tx },
    );
  }
}
