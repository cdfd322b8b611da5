import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Sequelize } from 'sequelize';
import { People } from '../accounts/people.js';
import { selectRows } from '../database/rows.js';
import type { Tx } from '../database/transactions.js';
import { Refusal } from '../http/refusal.js';
import { SupporterCheck } from './supporter-check.js';

export interface CouponBuyer {
  /** As typed at the checkout; null while nobody has said. */
  readonly email: string | null;
  /** Who is signed in. */
  readonly personId: string | null;
}

/** One buyer under all names known of them. */
interface KnownAs {
  readonly emails: readonly string[];
  readonly personIds: readonly string[];
}

interface BuyerTerms {
  readonly id: string;
  readonly code: string;
  readonly perBuyer: number | null;
  readonly isForSupporters: boolean;
}

/** Whether this buyer may use a coupon, whatever is bought. */
@Injectable()
export class CouponBuyers {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly people: People,
    private readonly supporters: SupporterCheck,
  ) {}

  /** @throws Refusal `coupon-for-supporters`, `coupon-buyer-limit` */
  async check(coupon: BuyerTerms, buyer: CouponBuyer, tx?: Tx): Promise<void> {
    if (coupon.isForSupporters) await this.checkSupporter(coupon, buyer, tx);
    if (coupon.perBuyer !== null) await this.checkLimit(coupon, coupon.perBuyer, buyer, tx);
  }

  /** The account a place is counted under: who is signed in, else who has proved to own the address. */
  async accountOf({ email, personId }: CouponBuyer, tx?: Tx): Promise<string | null> {
    return personId ?? (email ? await this.people.verifiedIdByEmail(email, tx) : null);
  }

  /** Only who is signed in is asked for, or anybody could find out whose address supports the workshop. */
  private async checkSupporter({ code }: BuyerTerms, { personId }: CouponBuyer, tx?: Tx): Promise<void> {
    if (personId && (await this.supporters.isSupporter(personId, tx))) return;
    throw new Refusal(
      'coupon-for-supporters',
      personId
        ? `The coupon ${code} is for supporters, and this account has no current pledge.`
        : `The coupon ${code} is for supporters. Sign in with the account that holds the pledge.`,
    );
  }

  private async checkLimit(
    { id, code }: BuyerTerms,
    perBuyer: number,
    buyer: CouponBuyer,
    tx?: Tx,
  ): Promise<void> {
    const { emails, personIds } = await this.knownAs(buyer, tx);
    if (emails.length === 0 && personIds.length === 0) return;
    const [own] = await selectRows<{ held: number | string | null; redeemed: number | string | null }>(
      this.database,
      `SELECT SUM(state = 'held') AS held, SUM(state = 'redeemed') AS redeemed FROM coupon_places
       WHERE coupon_id = :id AND (email IN (:emails) OR person_id IN (:personIds))`,
      { id, emails: orNone(emails), personIds: orNone(personIds) },
      tx,
    );
    const held = Number(own?.held ?? 0);
    if (held + Number(own?.redeemed ?? 0) < perBuyer) return;
    const times = perBuyer === 1 ? 'once' : `${perBuyer} times`;
    const mend = held > 0 ? ' An open order holds it: pay that order or give it up.' : '';
    throw new Refusal('coupon-buyer-limit', `The coupon ${code} can be used ${times} by each buyer.${mend}`);
  }

  /**
   * The same person as a guest and signed in: the address typed and the one the account has proved, the
   * account signed in to and the one that has proved the address typed.
   */
  private async knownAs({ email, personId }: CouponBuyer, tx?: Tx): Promise<KnownAs> {
    const owner = email ? await this.people.verifiedIdByEmail(email, tx) : null;
    const account = personId ? await this.people.byId(personId, tx) : null;
    return {
      emails: [email, account?.verifiedAt ? account.email : null].filter((one) => one !== null),
      personIds: [personId, owner].filter((one) => one !== null),
    };
  }
}

/** `IN ()` is no SQL. */
const orNone = (values: readonly string[]): readonly string[] => (values.length > 0 ? values : ['']);
