import { Injectable } from '@nestjs/common';
import type { Tx } from '../database/transactions.js';

type IsSupporter = (personId: string, tx?: Tx) => Promise<boolean>;

/**
 * Whether a person's pledge is current. The room that keeps pledges registers the answer at start-up; while
 * nobody has, nobody is a supporter.
 */
@Injectable()
export class SupporterCheck {
  private ask: IsSupporter = () => Promise.resolve(false);

  register(isSupporter: IsSupporter): void {
    this.ask = isSupporter;
  }

  isSupporter(personId: string, tx?: Tx): Promise<boolean> {
    return this.ask(personId, tx);
  }
}
